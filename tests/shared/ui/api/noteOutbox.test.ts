import { describe, expect, it, vi } from 'vitest';

import type { MachineEvent } from '@/flows/machine/events';
import { openNoteOutbox } from '@/shared/ui/api/noteOutbox';
import { createOutbox } from '@/shared/ui/api/outbox';

import { ANN, Disk, RUN, say, Shop } from './shop';

let clock = 0;
const note = (headline: string) => {
  clock += 1000;
  return {
    type: 'NOTE',
    at: clock,
    monotonic: clock,
    boot: 'b',
    sheet: 'rail-limits',
    inputs: { nominalVolts: 5 },
    headline,
  } as const satisfies MachineEvent;
};
const pause = (_ms: number, kicked: Promise<void>) => kicked;
const open = (shop: Shop, store: Disk | null) => openNoteOutbox({ run: RUN, person: ANN, store, client: shop.client, pause });
const types = (shop: Shop) => shop.entries.map((entry) => (entry.body as unknown as { event: MachineEvent }).event.type);

describe('the notes of a run that is not on the screen', () => {
  it('find their place behind what others have put into the record', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    shop.put('one');
    shop.put('two');
    const box = await open(shop, disk);
    expect(await box.add(note('first'))).toEqual({ ok: true });
    await vi.waitFor(() => expect(types(shop)).toEqual(['ANSWER', 'ANSWER', 'NOTE']));
    await vi.waitFor(() => expect(box.saved()).toMatchObject({ waiting: 0, notTaken: [] }));
  });

  it('wait on the disk without a network, and are sent by the run’s own outbox when that run is opened', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    shop.away = true;
    const box = await open(shop, disk);
    await box.add(note('kept'));
    expect(box.saved().waiting).toBe(1);
    await vi.waitFor(() => expect(box.saved().trouble?.code).toBe('no-network'));
    box.close();
    shop.away = false;
    const own = createOutbox({
      run: RUN,
      person: ANN,
      store: disk,
      client: shop.client,
      sendPhoto: () => Promise.resolve(null),
      replays: () => null,
      toSafety: () => [],
      pause,
    });
    await own.open([]);
    await vi.waitFor(() => expect(types(shop)).toEqual(['NOTE']));
  });

  it('go out by themselves when the network is back', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    shop.away = true;
    const box = await open(shop, disk);
    await box.add(note('later'));
    shop.away = false;
    await vi.waitFor(() => {
      box.kick();
      expect(types(shop)).toEqual(['NOTE']);
    });
  });

  it('leave waiting answers of the run to the run', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    shop.away = true;
    const own = createOutbox({
      run: RUN,
      person: ANN,
      store: disk,
      client: shop.client,
      sendPhoto: () => Promise.resolve(null),
      replays: () => null,
      toSafety: () => [],
      pause,
    });
    await own.open([]);
    await own.add(say('answered offline'));
    // its try to send is over before the network is back
    await vi.waitFor(() => expect(own.saved().trouble?.code).toBe('no-network'));
    own.close();
    shop.away = false;
    const box = await open(shop, disk);
    await box.add(note('now'));
    await vi.waitFor(() => expect(types(shop)).toEqual(['NOTE']));
    await vi.waitFor(() => expect(disk.words()).toEqual(['answered offline']));
  });

  it('say so at once where this browser keeps nothing and the network is away', async () => {
    const shop = new Shop();
    shop.away = true;
    const box = await open(shop, null);
    const added = await box.add(note('lost?'));
    expect(added).toMatchObject({ ok: false });
    expect(added.ok ? '' : added.say).toContain('did not reach the server');
  });
});
