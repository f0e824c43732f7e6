import { DEMO_PASSWORD, demoPeople } from '@/db/seeds/demoPeople';
import { verifyChain } from '@/shared/record/chain';

import { BenchPage } from './BenchPage';
import { expect, phone, test } from './fixtures';
import type { Seen } from './readScreen';
import { readRun } from './readRun';
import { signIn } from './signIn';

const TREE = 'Dormant three-rail supply: first power';

const readings = {
  'Reservoir, series resistance': '470m',
  'Pass device, cold': '4k7',
  'Rails on the bench supply / +5 V': '4.97',
  'Rails on the lamp / +5 V': '4,97',
};

test.describe('a whole bring-up on a phone', () => {
  test.setTimeout(240_000);

  test('is led by a restorer, countersigned by a senior and accepted by a reviewer, across the death of the server', async ({ stack, openDevice }) => {
    const restorer = await openDevice({ viewport: phone });
    await restorer.clock.install();
    const senior = await openDevice({ viewport: phone });
    const reviewer = await openDevice({ viewport: phone });
    await signIn(restorer, 'restorer');
    await signIn(senior, 'senior');
    const bench = new BenchPage(restorer, { readings, answers: { 'Which kind of regulator': 'No, it is linear' } });
    await bench.start('Corvane 12, serial C12-0417', TREE);
    const { run } = bench;

    const atHold = (seen: Seen) => seen.answers.some((b) => b.name === 'Look for the answer now');
    const countersign = () => bench.countersign(senior, DEMO_PASSWORD);

    await test.step('up to the first hold point, with the server killed on the way', async () => {
      await bench.playUntil((seen) => seen.title === 'Every return measured' && seen.entry !== null);
      await bench.allSaved();
      await stack.killServer();
      await bench.move(await bench.look());
      await expect(restorer.getByText('1 answer waits to be sent: no network')).toBeVisible();
      await stack.startServer();
      await bench.allSaved();
      await bench.playUntil(atHold);
      await countersign();
    });
    await test.step('up to the hold point before the lamp', async () => {
      await bench.playUntil(atHold);
      await countersign();
    });
    await test.step('up to the hold point before full mains', async () => {
      await bench.playUntil(atHold);
      await countersign();
    });
    await test.step('to the end, closed and handed in', async () => {
      await bench.playUntil((seen) => seen.title === 'Supply proven');
      await restorer.getByRole('button', { name: 'Close the record' }).click();
      await restorer.getByRole('button', { name: 'Submit for review' }).click();
      await expect(restorer.getByText('Submitted for review.')).toBeVisible();
    });
    await test.step('read, accepted and released', async () => {
      await signIn(reviewer, 'reviewer', '/records');
      await reviewer.getByRole('link', { name: /^Corvane 12 C12-0417, .*under review$/ }).click();
      await expect(reviewer.getByText('Chain whole')).toBeVisible();
      await reviewer.getByRole('button', { name: 'Accept and sign' }).click();
      const dialog = reviewer.getByRole('dialog', { name: 'Accept and sign' });
      await dialog.getByRole('checkbox', { name: /^Release/ }).click();
      await dialog.getByRole('textbox', { name: 'Your password' }).fill(DEMO_PASSWORD);
      await dialog.getByRole('button', { name: 'Accept and sign' }).click();
      await expect(dialog).toBeHidden();
    });

    const held = await readRun(stack.ownerUrl, run);
    const { entries } = held;
    await test.step('the database holds every entry in its place, and the chain is whole', () => {
      expect(held).toMatchObject({ state: 'accepted', ended: 'supply-proven' });
      expect(entries.map((e) => e.seq)).toEqual(entries.map((_, i) => i + 1));
      expect(verifyChain(entries, { head: held.head.hash, count: held.head.seq })).toMatchObject({ ok: true, count: entries.length });
      expect(entries.map((e) => e.receivedAt)).toEqual(entries.map((e) => e.receivedAt).sort());
      expect(entries[0]?.kind).toBe('opened');
      expect(entries.slice(-4).map((e) => e.kind)).toEqual(['closed', 'submitted', 'accepted', 'released']);
      // the way that the tree leads, step by step, with its warnings and every time that power went in and came out
      expect(entries.filter((e) => e.kind === 'energised').map((e) => e.body['step'])).toEqual(['form', 'trip-feed', 'bench-low', 'bench-raise', 'bench-load-up', 'lamp', 'mains']);
      expect(entries.filter((e) => e.kind === 'lapsed')).toEqual([]);
      expect(entries.at(-5)?.body).toMatchObject({ band: 'proved-dead' });
    });
    await test.step('what was typed is kept as typed and as SI', () => {
      const typed = entries.flatMap((e) => (e.kind === 'reading' ? [e.body['event'] as { typed: string; value: number }] : []));
      expect(typed.length).toBeGreaterThan(100);
      const valueOf = (text: string) => typed.find((r) => r.typed === text)?.value;
      expect([valueOf('4.97'), valueOf('4,97'), valueOf('470m'), valueOf('4k7')]).toEqual([4.97, 4.97, 0.47, 4700]);
      expect(entries.filter((e) => e.kind === 'reading' && e.body['step'] === 'returns')).toHaveLength(4);
    });
    await test.step('each act stands under the name of the one who did it', () => {
      const signed = (kind: string) => entries.filter((e) => e.kind === kind).map((e) => e.actor);
      const { restorer: who, senior: other, reviewer: third } = demoPeople;
      expect(signed('hold-asked')).toEqual([who.id, who.id, who.id]);
      expect(signed('hold-given')).toEqual([other.id, other.id, other.id]);
      expect(signed('accepted')).toEqual([third.id]);
      expect(signed('released')).toEqual([third.id]);
      const others = ['hold-given', 'accepted', 'released'];
      expect(entries.filter((e) => !others.includes(e.kind) && e.actor !== who.id)).toEqual([]);
      expect(held.releases).toEqual([{ givenBy: third.id, void: false }]);
      expect(held.machine.openReleases).toBe(1);
    });
  });
});
