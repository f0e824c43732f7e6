import { act, renderHook, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import type { Entry } from '@/shared/contract/entries';
import { createOutbox } from '@/shared/ui/api/outbox';
import type { OutboxStore } from '@/shared/ui/api/outboxStore';
import { useRunMachine } from '@/shared/ui/hooks/useRunMachine';
import { Bench, lampTree, program } from '@/tests/flows/support/bench';

import { ANN, Disk, RUN, Shop } from '../api/shop';

const lamp = program(lampTree);
const start = { run: RUN, restorer: ANN, restorerIsSenior: false, at: Date.UTC(2026, 0, 5), release: false, fitted: [], killers: [] };

async function open(shop: Shop, disk: OutboxStore = new Disk(), held: Entry[] = []) {
  const outbox = createOutbox({
    run: RUN,
    person: ANN,
    store: disk,
    client: shop.client,
    sendPhoto: () => Promise.resolve(null),
    replays: () => null,
    toSafety: () => [],
    pause: (_ms, kicked) => kicked,
  });
  await outbox.open(held);
  let again = 0;
  const hook = renderHook(() => useRunMachine(lamp, start, { outbox, again: () => (again += 1) }));
  return { outbox, hook, againTimes: () => again, now: () => hook.result.current };
}

/** Answers the rows of the bench opening. */
async function openBench(now: () => ReturnType<typeof useRunMachine>) {
  for (let i = 0; i < 20 && now().view.phase === 'opening'; i += 1) {
    const row = now().view.current?.row;
    if (row?.ask !== 'word') throw new Error('the opening asks in words');
    await act(() => now().send({ type: 'ROW', step: now().view.key, row: row.id, word: row.words[0]?.word ?? '' }));
  }
}

describe('useRunMachine', () => {
  it('moves once the answer is on the disk, and the record follows', async () => {
    const shop = new Shop();
    const { now } = await open(shop);
    await openBench(now);
    expect(now().view.key).toBe('look');
    expect(now().account.lines.at(-1)?.words).toMatch(/Yes$/);
    await waitFor(() => expect(shop.entries).toHaveLength(now().account.lines.length));
  });

  it('says a refusal of the engine, with its rule, and leaves the run as it was', async () => {
    const shop = new Shop();
    const { now } = await open(shop);
    await act(() => now().send({ type: 'GUARD_HELD', step: now().view.key, heldMs: 2100 }));
    expect(now().refusal?.say).toBe('No guard is shown now.');
    expect(now().view.phase).toBe('opening');
    expect(shop.entries).toHaveLength(0);
    await openBench(now);
    expect(now().refusal).toBeNull();
  });

  it('stays where it is when the disk has no room', async () => {
    const disk = new Disk();
    const { now } = await open(new Shop(), disk);
    disk.full = true;
    const before = now().view.current?.row.id;
    await act(() => now().send({ type: 'ROW', step: now().view.key, row: before ?? '', word: 'done' }));
    expect(now().view.current?.row.id).toBe(before);
    expect(now().refusal?.say).toMatch(/not saved/);
  });

  it('shows make-safe at once on Stop, with the disk still busy and the network away', async () => {
    const shop = new Shop();
    shop.away = true;
    const disk = new Disk();
    const { now } = await open(shop, { read: () => disk.read(RUN), write: () => new Promise<void>(() => undefined) });
    act(() => void now().send({ type: 'STOP' }));
    expect(now().view.key).toBe('~isolate');
    expect(now().view.title).toMatch(/take every source out/);
  });

  it('plays the run anew when a Stop has overtaken an answer on its way to the disk', async () => {
    const { now, againTimes } = await open(new Shop());
    await act(async () => {
      const answer = now().send({ type: 'ROW', step: now().view.key, row: now().view.current?.row.id ?? '', word: 'done' });
      await Promise.all([answer, now().send({ type: 'STOP' })]);
    });
    expect(now().view.key).toBe('~isolate');
    expect(againTimes()).toBe(1);
  });

  it('takes over a countersign that a senior has given', async () => {
    const shop = new Shop();
    const bench = new Bench(lamp);
    const events = [] as Parameters<Shop['take']>[0][];
    const taken = bench.try.bind(bench);
    bench.try = (event) => {
      const done = taken(event);
      if (done.ok) events.push(bench.stamp(event));
      return done;
    };
    bench.pass();
    bench.answer('sound').dead().pass().pass().dead();
    bench.do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' });
    for (const event of events) shop.take(event);
    const { now, outbox } = await open(shop, new Disk(), [...shop.entries]);
    expect(now().view.phase).toBe('hold-wait');
    shop.take(bench.stamp({ type: 'HOLD_GIVEN', step: 'lamp', by: 'sam' }));
    await act(() => outbox.poll());
    expect(now().view.phase).toBe('guard');
    expect(now().account.lines.at(-1)?.words).toBe('Countersigned');
  });
});
