import { describe, expect, it, vi } from 'vitest';

import { createOutbox } from '@/shared/ui/api/outbox';
import type { Outbox, RecordChange } from '@/shared/ui/api/outbox';
import type { ClientProblem } from '@/shared/ui/api/answer';
import type { Replays } from '@/shared/ui/api/ledger';
import type { OutboxStore } from '@/shared/ui/api/outboxStore';
import { longerOf, recordPart } from '@/shared/ui/api/recordPart';
import type { Entry } from '@/shared/contract/entries';

import { ANN, Disk, event, RUN, say, Shop, wordOf } from './shop';

/** The engine of these tests: after "gone" by somebody else it takes no answer called "here". */
const replays: Replays = (held, waiting) => {
  const gone = held.some((e) => wordOf((e.body as { event: never })['event']) === 'gone');
  const at = gone ? waiting.findIndex((q) => wordOf(q.event) === 'here') : -1;
  return at === -1 ? null : { at, why: { say: 'The run has gone on.', rule: null } };
};

function outboxOf(shop: Shop, store: OutboxStore | null, sendPhoto: (hash: string) => Promise<ClientProblem | null> = () => Promise.resolve(null)): Outbox {
  const toSafety = () => [event({ type: 'RESTART' }), event({ type: 'STOP' })];
  return createOutbox({ run: RUN, person: ANN, store, client: shop.client, sendPhoto, replays, toSafety, pause: (_ms, kicked) => kicked });
}

const sent = (shop: Shop, words: string[]) => vi.waitFor(() => expect(shop.words()).toEqual(words));
const troubled = (box: Outbox, code: string) => vi.waitFor(() => expect(box.saved().trouble?.code).toBe(code));

describe('createOutbox', () => {
  it('has an answer on the disk when it says so, and off it when the server has it', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    shop.away = true;
    const box = outboxOf(shop, disk);
    await box.open([]);
    expect(await box.add(say('one'))).toEqual({ ok: true });
    expect(disk.words()).toEqual(['one']);
    await troubled(box, 'no-network');
    shop.away = false;
    box.kick();
    await sent(shop, ['one']);
    await vi.waitFor(() => expect(disk.words()).toEqual([]));
    expect(box.saved()).toMatchObject({ waiting: 0, trouble: null });
  });

  it('sends in order and exactly once what was answered while the network was away', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const box = outboxOf(shop, disk);
    await box.open([]);
    shop.away = true;
    const words = Array.from({ length: 60 }, (_, i) => `a${i}`);
    for (const word of words) await box.add(say(word));
    await troubled(box, 'no-network');
    expect(box.saved().waiting).toBe(60);
    shop.away = false;
    box.kick();
    await sent(shop, words);
  });

  it('goes on after a new page load, and sends nothing twice when an answer of the server was lost', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const before = outboxOf(shop, disk);
    await before.open([]);
    shop.loseNext = true;
    await before.add(say('one'));
    await troubled(before, 'no-network');
    before.close();
    const after = outboxOf(shop, disk);
    await after.open([]);
    await after.add(say('two'));
    await sent(shop, ['one', 'two']);
    await vi.waitFor(() => expect(after.saved().waiting).toBe(0));
  });

  it('does not wait again for what the server has already', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const before = outboxOf(shop, disk);
    await before.open([]);
    shop.loseNext = true;
    await before.add(say('one'));
    await troubled(before, 'no-network');
    before.close();
    const after = outboxOf(shop, disk);
    await after.open(shop.entries);
    expect(after.saved().waiting).toBe(0);
    expect(disk.words()).toEqual([]);
  });

  it('numbers its answers anew behind what somebody else has added', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const box = outboxOf(shop, disk);
    await box.open([]);
    shop.put('hold given');
    const changes: RecordChange[] = [];
    box.onRecord((change) => changes.push(change));
    await box.add(say('mine'));
    await sent(shop, ['hold given', 'mine']);
    expect(changes).toEqual([{ is: 'other' }]);
  });

  it('keeps what the engine takes no more, never drops a Stop, and leads to safety', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const box = outboxOf(shop, disk);
    await box.open([]);
    shop.put('gone');
    shop.away = true;
    await box.add(say('fine'));
    await box.add(say('here'));
    await box.add(event({ type: 'STOP' }));
    await troubled(box, 'no-network');
    shop.away = false;
    box.kick();
    await sent(shop, ['gone', 'fine', 'STOP', 'RESTART', 'STOP']);
    expect(box.saved().notTaken.map((q) => [wordOf(q.event), q.notTaken?.say])).toEqual([['here', 'The run has gone on.']]);
    expect([...disk.kept.values()].map((q) => wordOf(q.event))).toEqual(['here']);
  });

  it('keeps on the disk what the server has, in the same breath in which an answer no longer waits', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const writes: [waiting: string[], record: number[]][] = [];
    const write = disk.write.bind(disk);
    disk.write = async (...args) => {
      await write(...args);
      writes.push([disk.words(), disk.record.map((e) => e.seq)]);
    };
    shop.put('before');
    const box = outboxOf(shop, disk);
    await box.open([...shop.entries]);
    await box.add(say('one'));
    await sent(shop, ['before', 'one']);
    await vi.waitFor(() => expect(box.saved().waiting).toBe(0));
    shop.put('from a senior');
    await box.poll();
    await vi.waitFor(() => expect(disk.record.map((e) => e.id)).toEqual(shop.entries.map((e) => e.id)));
    // never a moment at which an answer is neither waiting nor held
    expect(writes).toEqual([
      [[], [1]],
      [['one'], [1]],
      [[], [1, 2]],
      [[], [1, 2, 3]],
    ]);
  });

  it('writes only what has changed of the record, and takes back what the server has lost', () => {
    const entries = (...hashes: string[]) => hashes.map((hash, i) => ({ seq: i + 1, hash }) as Entry);
    const part = (before: Entry[], next: Entry[]) => {
      const got = recordPart('r', before, next);
      return got === undefined ? null : [got.after, got.entries.map((e) => e.hash)];
    };
    expect(part(entries('a', 'b'), entries('a', 'b'))).toBeNull();
    expect(part(entries('a'), entries('a', 'b', 'c'))).toEqual([1, ['b', 'c']]);
    expect(part(entries('a', 'x', 'y'), entries('a', 'b'))).toEqual([1, ['b']]);
    expect(part(entries('a', 'b', 'c'), entries('a'))).toEqual([1, []]);
    expect(part([], [])).toBeNull();
    // a page's own copy of a run gives way to what the device has heard since, where the two agree
    const words = (got: readonly Entry[]) => got.map((e) => e.hash).join('');
    expect(words(longerOf(entries('a'), entries('a', 'b', 'c')))).toBe('abc');
    expect(words(longerOf(entries('a', 'b'), entries('a')))).toBe('ab');
    expect(words(longerOf(entries('a', 'x'), entries('a', 'b', 'c')))).toBe('ax');
    expect(words(longerOf([], entries('a')))).toBe('');
  });

  it('sends no way to safety into a run that somebody else leads by now; what was done here is kept and shown', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const box = outboxOf(shop, disk);
    await box.open([]);
    shop.away = true;
    await box.add(say('mine'));
    await box.add(event({ type: 'STOP' }));
    await troubled(box, 'no-network');
    shop.away = false;
    shop.handedOver = true;
    box.kick();
    await vi.waitFor(() => expect(box.saved().notTaken.map((q) => [wordOf(q.event), q.notTaken?.say])).toEqual([['mine', 'problem handed-over'], ['STOP', 'problem handed-over']]));
    expect(box.saved().waiting).toBe(0);
    expect(shop.entries).toEqual([]);
  });

  it('keeps what the server refuses with its reason, with all that was built upon it', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    shop.refuses = ['bad'];
    const box = outboxOf(shop, disk);
    await box.open([]);
    shop.away = true;
    for (const word of ['good', 'bad', 'later']) await box.add(say(word));
    await troubled(box, 'no-network');
    shop.away = false;
    box.kick();
    await sent(shop, ['good', 'RESTART', 'STOP']);
    expect(box.saved().notTaken.map((q) => [wordOf(q.event), q.notTaken?.rule])).toEqual([
      ['bad', 'H7'],
      ['later', null],
    ]);
    const again = outboxOf(shop, disk);
    await again.open(shop.entries);
    expect(again.saved().notTaken.map((q) => wordOf(q.event))).toEqual(['bad', 'later']);
  });

  it('finds out one by one which answer is refused when the server does not say', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    shop.refuses = ['bad'];
    shop.mute = true;
    const box = outboxOf(shop, disk);
    await box.open([]);
    shop.away = true;
    for (const word of ['good', 'bad']) await box.add(say(word));
    await troubled(box, 'no-network');
    shop.away = false;
    box.kick();
    await sent(shop, ['good', 'RESTART', 'STOP']);
    expect(box.saved().notTaken.map((q) => wordOf(q.event))).toEqual(['bad']);
  });

  it('keeps answers while nobody is signed in', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    shop.signedOut = true;
    const box = outboxOf(shop, disk);
    await box.open([]);
    await box.add(say('one'));
    await troubled(box, 'session-expired');
    expect(disk.words()).toEqual(['one']);
    shop.signedOut = false;
    box.kick();
    await sent(shop, ['one']);
  });

  it('hears of what others have added', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const box = outboxOf(shop, disk);
    await box.open([]);
    const changes: RecordChange[] = [];
    box.onRecord((change) => changes.push(change));
    const given = shop.put('hold given');
    await box.poll();
    await box.poll();
    expect(changes).toEqual([{ is: 'more', entries: [given] }]);
  });

  it('gives back to the server what it has lost', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const box = outboxOf(shop, disk);
    await box.open([]);
    for (const word of ['one', 'two', 'three']) await box.add(say(word));
    await sent(shop, ['one', 'two', 'three']);
    await vi.waitFor(() => expect(box.saved().waiting).toBe(0));
    shop.entries = shop.entries.slice(0, 1);
    await box.poll();
    await sent(shop, ['one', 'two', 'three']);
  });

  it('refuses an answer for which the disk has no room, and takes a Stop all the same', async () => {
    const [shop, disk] = [new Shop(), new Disk()];
    const box = outboxOf(shop, disk);
    await box.open([]);
    disk.full = true;
    expect(await box.add(say('one'))).toMatchObject({ ok: false, say: expect.stringContaining('no room left') });
    expect(await box.add(event({ type: 'STOP' }))).toEqual({ ok: true });
    await sent(shop, ['STOP']);
  });

  it('waits for the server where the browser keeps nothing', async () => {
    const shop = new Shop();
    const box = outboxOf(shop, null);
    await box.open([]);
    expect(box.saved().onDevice).toBe(false);
    expect(await box.add(say('one'))).toEqual({ ok: true });
    expect(shop.words()).toEqual(['one']);
    shop.away = true;
    expect(await box.add(say('two'))).toMatchObject({ ok: false, say: expect.stringContaining('did not reach the server') });
    expect(box.saved().waiting).toBe(0);
    expect(await box.add(event({ type: 'STOP' }))).toEqual({ ok: true });
    shop.away = false;
    await box.poll();
    await sent(shop, ['one', 'STOP']);
  });

  describe('with a photo', () => {
    const photo = (hash: string) => ({ ...event({ type: 'STOP' }), type: 'PHOTO' as const, step: 'look', photo: hash });
    const problem = (code: 'no-network' | 'bad-file'): ClientProblem => ({ kind: 'problem', code, say: `problem ${code}`, retryable: false, rule: null, faults: [], details: {} });

    it('sends the photo before the entry that names it, and waits with both while the network is away', async () => {
      const shop = new Shop();
      const asked: string[] = [];
      let away = true;
      const box = outboxOf(shop, new Disk(), (hash) => {
        asked.push(`${hash} before ${shop.entries.length + 1}`);
        return Promise.resolve(away ? problem('no-network') : null);
      });
      await box.open([]);
      await box.add(say('one'));
      await sent(shop, ['one']);
      await box.add(photo('aa'));
      await troubled(box, 'no-network');
      expect(shop.words()).toEqual(['one']);
      away = false;
      box.kick();
      await sent(shop, ['one', 'PHOTO']);
      expect(new Set(asked)).toEqual(new Set(['aa before 2']));
    });

    it('sets an entry aside, with the reason, when the server cannot keep its photo', async () => {
      const shop = new Shop();
      const box = outboxOf(shop, new Disk(), (hash) => Promise.resolve(hash === 'bad' ? problem('bad-file') : null));
      await box.open([]);
      await box.add(photo('good'));
      await box.add(photo('bad'));
      await vi.waitFor(() => expect(box.saved().notTaken.map((q) => q.notTaken?.say)).toEqual(['problem bad-file']));
      await vi.waitFor(() => expect(shop.words().slice(0, 1)).toEqual(['PHOTO']));
    });
  });
});
