/** One act of a review: an entry behind the head, and the state that it leads to. */
import type { Tx } from '@/db/createDb';
import type { RunHeadRow, RunRow } from '@/db/tables';
import type { Head, RunState, RunSummary } from '@/shared/contract/runSummary';
import type { Json } from '@/shared/record/canonical';
import { canonicalJson } from '@/shared/record/canonical';
import type { EntryKind, RecordEntry } from '@/shared/record/recordEntry';

import { appendEntries } from '../entries/appendEntries';
import { findEntriesById, lockHead } from '../entries/queries';
import { ProblemError } from '../problems';
import { findRunSummaries, setRunState } from '../runs/queries';
import { getRunFor } from '../runs/access';
import { runSummaryToWire } from '../runs/toWire';

export interface RecordAct {
  id: string;
  kind: EntryKind;
  body: Record<string, Json>;
  /** states in which it can be done */
  from: readonly RunState[];
  /** state that it leads to */
  to: RunState;
  /** said when it cannot be done now */
  otherwise: string;
}

export interface Acted {
  entry: RecordEntry;
  head: Head;
  run: RunSummary;
}

/**
 * Does one act. Doing the same again, with the same id, is answered as the first time.
 * @param check asked behind the lock, before anything is written
 * @param also done in the same transaction, after the entry
 */
export async function recordAct(
  tx: Tx,
  now: number,
  person: string,
  runId: string,
  act: RecordAct,
  check: (run: RunRow) => Promise<void> | void,
  also?: (run: RunRow, head: RunHeadRow) => Promise<void>,
): Promise<Acted> {
  const head = await lockHead(tx, (await getRunFor(tx, runId)).id);
  const run = await getRunFor(tx, runId);
  const [before] = await findEntriesById(tx, runId, [act.id]);
  let entry: RecordEntry | undefined = before;
  if (before !== undefined) {
    const same = before.kind === act.kind && before.actor === person && canonicalJson(before.body) === canonicalJson(act.body);
    if (!same) throw new ProblemError('id-taken', 'The id of this entry was used before.', { entry: act.id });
  } else {
    await check(run);
    if (!act.from.includes(run.state)) throw new ProblemError('wrong-state', act.otherwise, { state: run.state });
    [entry] = await appendEntries(tx, head, [{ id: act.id, actor: person, kind: act.kind, at: new Date(now).toISOString(), monotonic: 0, body: act.body }], now);
    if (act.to !== run.state) await setRunState(tx, runId, { state: act.to });
    await also?.(run, head);
  }
  if (entry === undefined) throw new Error('an act left no entry');
  const row = await findRunSummaries(tx).where('runs.id', '=', runId).executeTakeFirstOrThrow();
  return { entry, head: { seq: head.seq, hash: head.hash }, run: runSummaryToWire(row) };
}
