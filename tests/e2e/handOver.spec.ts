import { DEMO_PASSWORD, demoPeople } from '@/db/seeds/demoPeople';
import { verifyChain } from '@/shared/record/chain';

import { BenchPage } from './BenchPage';
import { expect, phone, test } from './fixtures';
import { readRun } from './readRun';
import { addRestMachine } from './restMachine';
import { signIn } from './signIn';

const TREE = 'Dormant three-rail supply: first power';

test.describe('a run that changes hands', () => {
  test('is offered on one phone, taken on another, and goes on there once the bench is proved dead and read back', async ({ stack, openDevice }) => {
    const machine = await addRestMachine(stack.ownerUrl, 'C12-0611');
    const giver = await openDevice({ viewport: phone });
    const taker = await openDevice({ viewport: phone });
    for (const page of [giver, taker]) await page.clock.install();
    await signIn(giver, 'restorer');
    const bench = new BenchPage(giver, { answers: { 'Which kind of regulator': 'No, it is linear' } });
    await bench.start(machine, TREE);
    const { run } = bench;
    const { title } = await bench.playUntil((seen) => seen.title !== 'Open the bench');

    await test.step('offered, with a signature', async () => {
      await giver.getByRole('button', { name: /: show the way$/ }).click();
      await giver.getByRole('dialog').getByRole('button', { name: 'Hand it over' }).click();
      const form = giver.getByRole('dialog', { name: 'Hand this run over' });
      await form.getByRole('combobox', { name: 'Who takes it' }).selectOption({ label: `${demoPeople.restorer2.name}, ${demoPeople.restorer2.code}` });
      await form.getByRole('textbox', { name: /^Word for them/ }).fill('The rear cover screws are in the tray.');
      await form.getByRole('textbox', { name: 'Your password' }).fill(DEMO_PASSWORD);
      await form.getByRole('button', { name: 'Sign and offer the run' }).click();
      await expect(giver.getByRole('heading', { level: 1, name: `Offered to ${demoPeople.restorer2.name}` })).toBeVisible();
    });

    await test.step('taken on the other phone, with a signature', async () => {
      await signIn(taker, 'restorer2');
      await taker.getByRole('link', { name: `Read and take over: ${machine}` }).click();
      await expect(taker.getByText('The rear cover screws are in the tray.')).toBeVisible();
      await taker.getByRole('textbox', { name: 'Your password' }).fill(DEMO_PASSWORD);
      await taker.getByRole('button', { name: 'Sign and take the run over' }).click();
      await expect(taker.getByRole('heading', { level: 1, name: 'Open the bench' })).toBeVisible();
    });

    await test.step('the first phone is out of it', async () => {
      await giver.clock.fastForward(5_000);
      await expect(giver.getByText(`${demoPeople.restorer2.name} has taken this run over`)).toBeVisible();
      await expect(giver.getByRole('button', { name: 'STOP, MAKE SAFE' })).toBeHidden();
    });

    await test.step('and goes on at the same step, behind proved dead and the read-back', async () => {
      const next = new BenchPage(taker);
      await next.playUntil((seen) => seen.title === 'Read back what is on and what is in');
      await expect(taker.getByText('PROVED DEAD')).toBeVisible();
      await next.playUntil((seen) => seen.title === title);
      await next.allSaved();
    });

    const held = await readRun(stack.ownerUrl, run);
    const signed = held.entries.filter((e) => e.kind === 'handed-over' || e.kind === 'taken-over');
    expect(signed.map((e) => [e.kind, e.actor])).toEqual([
      ['handed-over', demoPeople.restorer.id],
      ['taken-over', demoPeople.restorer2.id],
    ]);
    const after = held.entries.slice((signed[1]?.seq ?? 0) - 1);
    expect(new Set(after.map((e) => e.actor))).toEqual(new Set([demoPeople.restorer2.id]));
    expect(verifyChain(held.entries, { head: held.head.hash, count: held.head.seq })).toMatchObject({ ok: true });
  });
});
