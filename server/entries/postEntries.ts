/** Entries from the restorer's device: idempotent, in order, judged by the engine. */
import type { Tx } from '@/db/createDb';
import type { RunHeadRow, RunRow } from '@/db/tables';
import type { SentEntry } from '@/shared/contract/entries';
import type { Head } from '@/shared/contract/runSummary';
import { canonicalJson } from '@/shared/record/canonical';
import type { RecordEntry } from '@/shared/record/recordEntry';

import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { checkInstruments } from './checkInstruments';
import { checkPhotos } from './checkPhotos';
import { findEntries, findEntriesById } from './queries';
import { takeEvents } from './takeEvents';

/** Takes a batch: all of it, or nothing. What the server held before is answered as the first time. */
export async function postEntries(tx: Tx, parts: Parts, run: RunRow, head: RunHeadRow, sent: readonly SentEntry[]): Promise<{ entries: RecordEntry[]; head: Head }> {
  const held = new Map((await findEntriesById(tx, run.id, sent.map((entry) => entry.id))).map((entry) => [entry.id, entry]));
  const fresh: SentEntry[] = [];
  let next = head.seq + 1;
  for (const entry of sent) {
    const before = held.get(entry.id);
    if (before !== undefined) {
      wantSame(before, entry);
      continue;
    }
    if (entry.seq !== next) throw await outOfSequence(tx, head, entry.seq);
    fresh.push(entry);
    next += 1;
  }
  if (fresh.length > 0) {
    if (run.state !== 'open') throw new ProblemError('wrong-state', 'This run is closed; nothing can be added at the bench any more.');
    await checkPhotos(tx, run, fresh);
    await checkInstruments(tx, parts, run, head, fresh);
    const taken = await takeEvents(tx, parts, run, head, fresh.map(({ id, event }) => ({ id, event, actor: run.restorer })));
    for (const entry of taken) held.set(entry.id, entry);
  }
  return { entries: sent.flatMap((entry) => held.get(entry.id) ?? []), head: { seq: head.seq, hash: head.hash } };
}

/** The problem that shows a client where it stands: the head, and every entry from the first place that it does not have right. */
export async function outOfSequence(tx: Tx, head: RunHeadRow, seq: number): Promise<ProblemError> {
  const say =
    seq > head.seq + 1
      ? `Entry ${seq} cannot be added: the record has ${head.seq} so far, something in between is missing.`
      : `Place ${seq} of the record is taken: it has ${head.seq} entries now.`;
  return new ProblemError('out-of-sequence', say, { head: { seq: head.seq, hash: head.hash }, missing: await findEntries(tx, head.run, Math.min(seq - 1, head.seq)) });
}

function wantSame(held: RecordEntry, sent: SentEntry): void {
  if (held.seq === sent.seq && canonicalJson(held.body['event'] ?? null) === canonicalJson(sent.event)) return;
  throw new ProblemError('id-taken', `The id of entry ${sent.seq} was used for another entry before.`, { entry: sent.id });
}
