import { DEMO_PASSWORD } from '@/db/seeds/demoPeople';

import { BenchPage } from './BenchPage';
import { expect, test } from './fixtures';
import { readRun } from './readRun';
import { addRestMachine } from './restMachine';
import { passDoor, signIn } from './signIn';

const TREE = 'Dormant three-rail supply: first power';
const linear = { answers: { 'Which kind of regulator': 'No, it is linear' } };

test.describe('what goes wrong at the bench is said where it was made, and the run is as it was', () => {
  test.setTimeout(120_000);

  test('readings that are no number, of another quantity, or could mean two things', async ({ stack, openDevice }) => {
    const page = await openDevice();
    await page.clock.install();
    const machine = await addRestMachine(stack.ownerUrl, 'T-0001');
    await signIn(page, 'restorer');
    const bench = new BenchPage(page);
    await bench.start(machine, TREE);
    await bench.playUntil((seen) => seen.title === 'Prove dead' && seen.entry !== null);
    const record = page.getByRole('button', { name: /^Record/ });
    await bench.allSaved();
    const before = await bench.look();
    const held = await readRun(stack.ownerUrl, bench.run);

    await bench.type('five');
    await expect(page.getByRole('alert')).toHaveText(/“five” is not a number.*4\.97, 470m or 4k7/);
    await expect(record).toBeDisabled();
    await bench.type('47 ohm');
    await expect(page.getByRole('alert')).toHaveText(/That is ohms; this step reads volts/);
    await expect(record).toBeDisabled();
    await bench.type('1,234');
    await expect(page.getByRole('alert')).toHaveText(/Do you mean 1\.234 or 1234\?/);
    await expect(record).toBeDisabled();
    await page.getByRole('button', { name: '1.234 V' }).click();
    await expect(page.getByRole('alert')).toBeHidden();
    await expect(page.getByRole('button', { name: 'Record 1.234 V' })).toBeEnabled();

    await bench.type('');
    expect((await bench.look()).text).toBe(before.text);
    await bench.allSaved();
    expect(await readRun(stack.ownerUrl, bench.run)).toEqual(held);
  });

  test('an answer in a tab that the run has left behind', async ({ stack, openDevice }) => {
    const first = await openDevice();
    const machine = await addRestMachine(stack.ownerUrl, 'T-0002');
    await signIn(first, 'restorer');
    const bench = new BenchPage(first);
    await bench.start(machine, TREE);
    await bench.playUntil((seen) => seen.title === 'Papers and the owner’s limits');
    await bench.allSaved();

    const second = await first.context().newPage();
    await second.goto(new URL(first.url()).pathname);
    const other = new BenchPage(second);
    await expect(second.getByRole('heading', { level: 1, name: 'Papers and the owner’s limits' })).toBeVisible();
    await other.move(await other.look());
    await other.allSaved();
    const held = await readRun(stack.ownerUrl, bench.run);

    await bench.answer('No, or it is not clear');
    await expect(first.getByText('An answer was not taken')).toBeVisible();
    await expect(first.getByText(/make it safe first/)).toBeVisible();
    await expect(first.getByRole('heading', { level: 1, name: 'Make safe: take every source out' })).toBeVisible();
    await bench.allSaved();
    const after = await readRun(stack.ownerUrl, bench.run);
    expect(after.entries.slice(0, held.entries.length)).toEqual(held.entries);
    expect(after.entries.slice(held.entries.length).map((e) => e.kind)).not.toContain('answer');
  });

  test('a countersign by the restorer of the run', async ({ stack, openDevice }) => {
    const page = await openDevice();
    await signIn(page, 'restorer');
    const waiting = page.getByRole('link', { name: /^Go on with Ostrel 16, serial 16\/2093/ });
    const run = (await waiting.getAttribute('href'))?.split('/').at(-1) ?? '';
    const before = await readRun(stack.ownerUrl, run);
    const answer = await page.evaluate(
      async ({ path, body }) => {
        const sent = await fetch(path, { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) });
        return { status: sent.status, text: await sent.text() };
      },
      { path: `/api/runs/${run}/holds`, body: { id: '01980000-0000-7000-8000-000000000001', seq: before.head.seq + 1, answer: 'given', password: DEMO_PASSWORD } },
    );
    expect(answer.status).toBe(403);
    expect(answer.text).toMatch(/[a-z ]{20,}/);
    expect(await readRun(stack.ownerUrl, run)).toEqual(before);
  });

  test('a session that runs out in mid-run', async ({ stack, openDevice }) => {
    const page = await openDevice();
    const machine = await addRestMachine(stack.ownerUrl, 'T-0003');
    await signIn(page, 'restorer');
    const bench = new BenchPage(page);
    await bench.start(machine, TREE);
    await bench.playUntil((seen) => seen.title === 'Papers and the owner’s limits');
    await bench.allSaved();
    await page.context().clearCookies();
    await bench.move(await bench.look());
    await expect(page.getByText('1 answer waits to be sent: sign in again')).toBeVisible();
    const left = await bench.look();
    await page.getByRole('link', { name: 'Sign in, and come back here' }).click();
    await expect(page.getByText(/Nothing that you entered is lost/)).toBeVisible();
    await passDoor(page, 'restorer');
    await expect(page.getByRole('heading', { level: 1, name: left.title })).toBeVisible();
    await bench.allSaved();
    expect((await readRun(stack.ownerUrl, bench.run)).entries.at(-1)?.body['title']).toBe('Papers and the owner’s limits');
  });

  test('a page that is loaded anew in mid-run comes back by way of proving dead', async ({ stack, openDevice }) => {
    const page = await openDevice();
    await page.clock.install();
    const machine = await addRestMachine(stack.ownerUrl, 'T-0004');
    await signIn(page, 'restorer');
    const bench = new BenchPage(page);
    await bench.start(machine, TREE);
    await bench.playUntil((seen) => seen.title === 'Look over the inside');
    await expect(page.getByRole('status', { name: 'Supply' })).toContainText('Proved dead');
    await page.reload();
    await expect(page.getByRole('heading', { level: 1, name: 'Make safe: take every source out' })).toBeVisible();
    await expect(page.getByRole('status', { name: 'Supply' })).toContainText('Not known, treat as live');
    await bench.playUntil((seen) => seen.title === 'Look over the inside');
    await expect(page.getByRole('status', { name: 'Supply' })).toContainText('Proved dead');
    await bench.allSaved();
    expect((await readRun(stack.ownerUrl, bench.run)).entries.map((e) => e.kind)).toContain('lapsed');
  });

  test('Stop from a live step leads to make-safe at once, with no network', async ({ stack, openDevice }) => {
    const page = await openDevice();
    await page.clock.install();
    const senior = await openDevice();
    const machine = await addRestMachine(stack.ownerUrl, 'T-0005');
    await signIn(page, 'restorer');
    const bench = new BenchPage(page, linear);
    await bench.start(machine, TREE);
    await bench.playUntil((seen) => seen.answers.some((b) => b.name === 'Look for the answer now'));
    await signIn(senior, 'senior');
    await bench.countersign(senior, DEMO_PASSWORD);
    await bench.playUntil((seen) => seen.title === 'Reservoir at its working volts' && seen.entry !== null);
    const band = page.getByRole('status', { name: 'Supply' });
    await expect(band).toContainText('Bench supply');

    await page.context().setOffline(true);
    await bench.stop();
    await expect(page.getByRole('heading', { level: 1, name: 'Make safe: take every source out' })).toBeVisible();
    await bench.playUntil((seen) => seen.title === 'Safe: every source out, proved dead');
    await expect(band).toContainText('Proved dead');
    await expect(page.getByText(/wait to be sent: no network/)).toBeVisible();
    await page.context().setOffline(false);
    await bench.allSaved();
    const kinds = (await readRun(stack.ownerUrl, bench.run)).entries.map((e) => e.kind);
    expect(kinds.indexOf('stopped')).toBeGreaterThan(kinds.indexOf('energised'));
  });
});
