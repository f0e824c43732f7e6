/**
 * The outbox of one run. An answer is on the disk before the screen moves, is sent in order when the network allows, and is kept until the
 * server has said that it has it. Nothing is dropped: what the server does not take is kept and shown.
 */
import { v7 } from 'uuid';

import type { MachineEvent } from '@/flows/machine/events';
import type { Entry } from '@/shared/contract/entries';
import type { ClientProblem } from '@/shared/ui/api/answer';
import type { Client } from '@/shared/ui/api/client';
import { acknowledge, headSeq, joined, renumber, setAside, takeOver } from '@/shared/ui/api/ledger';
import type { Ledger, Replays } from '@/shared/ui/api/ledger';
import type { OutboxStore } from '@/shared/ui/api/outboxStore';
import type { Queued } from '@/shared/ui/api/queued';
import { recordPart } from '@/shared/ui/api/recordPart';
import { retryDelayMs, standingOf } from '@/shared/ui/api/sendStanding';

export interface Saved {
  /** answers that the server does not have yet */
  readonly waiting: number;
  readonly notTaken: readonly Queued[];
  /** why the last try to send did not go through */
  readonly trouble: ClientProblem | null;
  /** false where this browser keeps nothing: each answer then has to reach the server before the screen moves */
  readonly onDevice: boolean;
}

export type Added = { ok: true } | { ok: false; say: string };

/** What changed in the record: entries of others at its end, or so much that the run has to be played again. */
export type RecordChange = { is: 'more'; entries: readonly Entry[] } | { is: 'other' };

interface Parts {
  readonly run: string;
  readonly person: string;
  /** null where this browser keeps nothing */
  readonly store: OutboxStore | null;
  readonly client: Pick<Client, 'call'>;
  /** sends the photo of that hash, if this device has it, before the entry that names it */
  readonly sendPhoto: (hash: string) => Promise<ClientProblem | null>;
  readonly replays: Replays;
  /** events that lead an unclear bench to safety, stamped now, or none in a run that is closed: what was done is never undone by a refusal */
  readonly toSafety: (ledger: Ledger) => MachineEvent[];
  /** waits, but no longer than until `kick` */
  readonly pause: (ms: number, kicked: Promise<void>) => Promise<void>;
}

export interface Outbox {
  /** Takes over what is on this device and what the server has, and begins to send. */
  open(held: readonly Entry[]): Promise<void>;
  add(event: MachineEvent): Promise<Added>;
  ledger(): Ledger;
  saved(): Saved;
  /** called after every change of `saved` */
  onSaved(listener: () => void): () => void;
  /** called when the record holds something that this device did not send */
  onRecord(listener: (change: RecordChange) => void): () => void;
  /** asks the server for entries of others */
  poll(): Promise<void>;
  /** tries at once: the network is back, or the page has the focus */
  kick(): void;
  /** the restorer has read what was not taken */
  markSeen(): Promise<void>;
  close(): void;
}

const MOST_AT_ONCE = 50;

/** Refusals after which there is no way to safety to be sent: the run is not led from here any more. */
const OVER: readonly string[] = ['wrong-state', 'handed-over', 'other-engine'];

/** Makes the outbox of a run. */
export function createOutbox(parts: Parts): Outbox {
  const { run, person, store, client, sendPhoto, replays, toSafety, pause } = parts;
  let ledger: Ledger = { held: [], waiting: [], notTaken: [] };
  let trouble: ClientProblem | null = null;
  let saved: Saved = { waiting: 0, notTaken: [], trouble: null, onDevice: store !== null };
  let closed = false;
  let pumping: Promise<void> | null = null;
  let oneAtATime = false;
  let outOfStep = 0;
  let release = () => {};
  let kicked = new Promise<void>((resolve) => (release = resolve));
  let writing: Promise<unknown> = Promise.resolve();
  const savedListeners = new Set<() => void>();
  const recordListeners = new Set<(change: RecordChange) => void>();

  const tell = (change?: RecordChange) => {
    saved = { waiting: ledger.waiting.length, notTaken: ledger.notTaken, trouble, onDevice: store !== null };
    savedListeners.forEach((listener) => listener());
    if (change !== undefined) recordListeners.forEach((listener) => listener(change));
  };

  const kick = () => {
    release();
    kicked = new Promise<void>((resolve) => (release = resolve));
    void pump();
  };

  /** Makes `next` the ledger, writes the difference to the disk and tells about it. */
  const move = async (next: Ledger, change?: RecordChange) => {
    const before = [...ledger.waiting, ...ledger.notTaken];
    const record = recordPart(run, ledger.held, next.held);
    const now = [...next.waiting, ...next.notTaken];
    ledger = next;
    tell(change);
    const put = now.filter((q) => !before.includes(q));
    const gone = before.filter((q) => !now.some((n) => n.id === q.id)).map((q) => q.id);
    // the memory is right already; a disk that is full must not stop the sending
    if (store !== null && (put.length + gone.length > 0 || record !== undefined)) await store.write(put, gone, record).catch(() => undefined);
  };

  const queued = (event: MachineEvent): Queued => ({
    id: v7(),
    run,
    person,
    seq: headSeq(ledger) + ledger.waiting.length + 1,
    event,
    notTaken: null,
    seen: false,
  });

  /** After something was not taken, nobody knows what is true at the bench: the way to safety is queued behind the rest. */
  const withSafety = (next: Ledger, before: Ledger): Ledger => {
    const aside = next.notTaken.slice(before.notTaken.length);
    // the way to safety itself is not asked for again and again
    if (aside.every((q) => q.event.type === 'RESTART' || q.event.type === 'STOP')) return next;
    return renumber({ ...next, waiting: [...next.waiting, ...toSafety(next).map(queued)] });
  };

  const takeServer = async (server: readonly Entry[]) => {
    const before = ledger;
    const next = withSafety(takeOver(before, server, replays, { run, person }), before);
    const more =
      before.waiting.length === 0 &&
      next.waiting.length === 0 &&
      server.length >= before.held.length &&
      before.held.every((entry, i) => server[i]?.hash === entry.hash);
    if (more && server.length === before.held.length) return;
    await move(next, more ? { is: 'more', entries: server.slice(before.held.length) } : { is: 'other' });
    void pump();
  };

  const fetchAll = async (): Promise<boolean> => {
    const answer = await client.call('entries', { params: { run }, query: { after: 0 } });
    if (answer.kind === 'ok') await takeServer(answer.data.entries);
    else {
      trouble = answer;
      tell();
    }
    return answer.kind === 'ok';
  };

  const refused = async (problem: ClientProblem, batch: readonly Queued[]) => {
    const named = batch.findIndex((q) => q.id === problem.details['entry']);
    if (named === -1 && batch.length > 1) {
      // the server takes all or none and did not say which: found out one by one
      oneAtATime = true;
      return;
    }
    const at = ledger.waiting.findIndex((q) => q.id === batch[Math.max(0, named)]?.id);
    if (at === -1) return;
    const before = ledger;
    const aside = setAside(before, at, { say: problem.say, rule: problem.rule });
    await move(OVER.includes(problem.code) ? aside : withSafety(aside, before), { is: 'other' });
  };

  /** What stands in the way of the photos that a batch names. */
  const photoTrouble = async (batch: readonly Queued[]): Promise<ClientProblem | null> => {
    for (const { id, event } of batch) {
      const bad = event.type === 'PHOTO' ? await sendPhoto(event.photo) : null;
      if (bad !== null) return { ...bad, details: { ...bad.details, entry: id } };
    }
    return null;
  };

  /** Sends one batch. True when the next may follow at once. */
  const sendOnce = async (): Promise<boolean> => {
    const batch = ledger.waiting.slice(0, oneAtATime ? 1 : MOST_AT_ONCE);
    const bad = await photoTrouble(batch);
    if (bad !== null) {
      if (standingOf(bad.code) === 'refused') {
        await refused(bad, batch);
        return true;
      }
      trouble = bad;
      tell();
      return false;
    }
    const answer = await client.call('postEntries', {
      params: { run },
      body: { entries: batch.map(({ id, seq, event }) => ({ id, seq, event })) },
    });
    if (answer.kind === 'ok') {
      trouble = null;
      outOfStep = 0;
      const next = acknowledge(ledger, answer.data.entries);
      if (next === null) return fetchAll();
      oneAtATime = oneAtATime && next.waiting.length > 0;
      await move(next);
      return true;
    }
    switch (standingOf(answer.code)) {
      case 'later':
        trouble = answer;
        tell();
        return false;
      case 'out-of-step': {
        const missing = answer.details['missing'];
        const tail = Array.isArray(missing) ? joined(ledger.held, missing as Entry[]) : null;
        // the same refusal again and again would be a loop: after the first, all is fetched, and then it waits
        outOfStep += 1;
        if (tail !== null && tail !== ledger.held && outOfStep === 1) {
          await takeServer(tail);
          return true;
        }
        return (await fetchAll()) && outOfStep <= 2;
      }
      case 'refused':
        await refused(answer, batch);
        return true;
    }
  };

  const pump = (): Promise<void> => {
    pumping ??= (async () => {
      await Promise.resolve();
      let failures = 0;
      while (!closed && ledger.waiting.length > 0) {
        if (await sendOnce()) {
          failures = 0;
          continue;
        }
        if (store === null) break;
        failures += 1;
        await pause(retryDelayMs(failures), kicked);
      }
      // in the same breath as the last look at what waits: an answer given after it starts a pump of its own
      pumping = null;
    })();
    return pumping;
  };

  /** Without a disk the answer has to reach the server before the screen moves; a Stop moves first and is tried again and again. */
  const addDirectly = async (next: Queued): Promise<Added> => {
    ledger = { ...ledger, waiting: [...ledger.waiting, next] };
    tell();
    await pump();
    const stays = ledger.waiting.some((q) => q.id === next.id);
    if (!stays) {
      const aside = ledger.notTaken.find((q) => q.id === next.id);
      return aside === undefined ? { ok: true } : { ok: false, say: aside.notTaken?.say ?? 'It was not taken.' };
    }
    if (next.event.type === 'STOP') return { ok: true };
    ledger = renumber({ ...ledger, waiting: ledger.waiting.filter((q) => q.id !== next.id) });
    tell();
    return { ok: false, say: `This browser keeps no answers, and this one did not reach the server. ${trouble?.say ?? ''} Answer again.` };
  };

  const addKept = async (disk: OutboxStore, next: Queued): Promise<Added> => {
    try {
      await disk.write([next]);
    } catch {
      if (next.event.type !== 'STOP')
        return { ok: false, say: 'This device has no room left: the answer is not saved. Free some room, then answer again.' };
    }
    ledger = { ...ledger, waiting: [...ledger.waiting, next] };
    const numbered = renumber(ledger);
    // something came in while it was being written
    if (numbered.waiting.at(-1) === next) tell();
    else await move(numbered);
    void pump();
    return { ok: true };
  };

  return {
    async open(held) {
      const kept = store === null ? [] : await store.read(run).catch(() => []);
      const inOrder = [...kept].sort((a, b) => a.seq - b.seq || (a.id < b.id ? -1 : 1));
      const before: Ledger = {
        held: [],
        waiting: inOrder.filter((q) => q.notTaken === null),
        notTaken: inOrder.filter((q) => q.notTaken !== null),
      };
      ledger = before;
      await move(withSafety(takeOver(before, held, replays, { run, person }), before));
      void pump();
    },
    add(event) {
      // one after the other: the order on the disk is the order of the record
      const added = writing.then(() => (store === null ? addDirectly(queued(event)) : addKept(store, queued(event))));
      writing = added.catch(() => undefined);
      return added;
    },
    ledger: () => ledger,
    saved: () => saved,
    onSaved(listener) {
      savedListeners.add(listener);
      return () => savedListeners.delete(listener);
    },
    onRecord(listener) {
      recordListeners.add(listener);
      return () => recordListeners.delete(listener);
    },
    async poll() {
      if (ledger.waiting.length > 0) {
        kick();
        return;
      }
      const answer = await client.call('entries', { params: { run }, query: { after: headSeq(ledger) } });
      if (answer.kind === 'problem') {
        trouble = answer;
        tell();
        return;
      }
      if (trouble !== null) {
        trouble = null;
        tell();
      }
      if (answer.data.head.seq < headSeq(ledger)) {
        await fetchAll();
        return;
      }
      const all = joined(ledger.held, answer.data.entries);
      if (all === null) await fetchAll();
      else await takeServer(all);
    },
    kick,
    async markSeen() {
      await move({ ...ledger, notTaken: ledger.notTaken.map((q) => (q.seen ? q : { ...q, seen: true })) });
    },
    close() {
      closed = true;
      release();
    },
  };
}
