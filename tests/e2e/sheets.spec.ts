import { BenchPage } from './BenchPage';
import { expect, test } from './fixtures';
import { addRestMachine } from './restMachine';
import { signIn } from './signIn';

const TREE = 'Dormant three-rail supply: first power';

test('a sheet opened by its link, filled from a machine, noted in a run and found in the record', async ({ stack, openDevice }) => {
  test.setTimeout(60_000);
  const page = await openDevice();
  await page.clock.install();
  const machine = await addRestMachine(stack.ownerUrl, 'T-0030');
  await signIn(page, 'restorer');
  const bench = new BenchPage(page);
  await bench.start(machine, TREE);
  const { run } = bench;
  await bench.allSaved();
  const answer = page.getByRole('status', { name: 'Answer' });

  await test.step('what was typed wrong comes with the link, and is said at its field', async () => {
    await page.goto('/workings/rail-limits?nominalVolts=-12&tolerancePercent=5&guardVolts=0&readingVolts=1%2C234');
    const reading = page.getByRole('textbox', { name: 'Reading, V' });
    await expect(reading).toHaveValue('1,234');
    await expect(page.getByRole('alert')).toHaveText(/Do you mean 1\.234 or 1234\?/);
    await expect(answer).toHaveText(/No answer yet/);
    await reading.fill('');
    await expect(answer).toHaveText('−11.4 V to −12.6 V.');
    await expect(page).toHaveURL(/readingVolts=(&|$)/);
  });
  await test.step('the profile of the machine fills it', async () => {
    await page.getByRole('button', { name: 'Take from a machine' }).click();
    const dialog = page.getByRole('dialog', { name: 'Take from a machine' });
    await dialog.getByRole('combobox', { name: 'Machine' }).selectOption({ label: machine });
    await dialog.getByRole('combobox', { name: 'Which rail' }).selectOption({ label: '+5 V' });
    await dialog.getByRole('button', { name: 'Fill in' }).click();
    await expect(answer).toHaveText('4.75 V to 5.25 V.');
    await expect(page.getByText(/^from the profile of Corvane 12, serial T-0030/)).toHaveCount(2);
  });
  await test.step('it is noted while the network is away, and sent when it is back', async () => {
    await page.getByRole('button', { name: 'Note in a record' }).click();
    const dialog = page.getByRole('dialog', { name: 'Note in a record' });
    await dialog.getByRole('radio', { name: machine }).click();
    await page.context().setOffline(true);
    await dialog.getByRole('button', { name: 'Note it' }).click();
    const done = page.getByRole('status', { name: 'Done' });
    await expect(done).toHaveText(`Noted on this device for the record of ${machine}. It is sent when the network allows, at the latest when that run is opened again.`);
    await page.context().setOffline(false);
    await expect(done).toHaveText(`Noted in the record of ${machine}.`);
  });
  await test.step('it stands in the record, worked out again', async () => {
    await page.goto(`/bench/${run}`);
    await bench.stop();
    await bench.playUntil((seen) => seen.answers.some((b) => b.name === 'Close this run as stopped'));
    await bench.answer('Close this run as stopped');
    await page.getByRole('button', { name: 'Close the record' }).click();
    await page.getByRole('link', { name: 'To the record' }).click();
    await expect(page.getByText('Workings, Rail limits: 4.75 V to 5.25 V.')).toBeVisible();
    await expect(page.getByText('from Nominal volts 5 V, Tolerance 5 %, Guard band 0 V. Worked out again: the same.')).toBeVisible();
  });
});
