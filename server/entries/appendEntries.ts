/** Adding entries to a record: the one place that seals, stores and moves the head. */
import type { Tx } from '@/db/createDb';
import type { RunHeadRow } from '@/db/tables';
import { draftEntrySchema } from '@/shared/record/recordEntry';
import type { DraftEntry, RecordEntry } from '@/shared/record/recordEntry';
import { sealEntry } from '@/shared/record/chain';

import { inputSay } from '../http/inputSay';
import { inputProblem, isUniqueViolation, ProblemError } from '../problems';
import { ENTRY_ID_KEY, insertEntries, setHead } from './queries';

export type NewEntry = Omit<DraftEntry, 'run' | 'seq'>;

/**
 * Seals `drafts` one after the other behind the head and stores them.
 * @param head locked in the same transaction; its `seq` and `hash` are moved on
 * @param now epoch milliseconds of the server
 */
export async function appendEntries(tx: Tx, head: RunHeadRow, drafts: readonly NewEntry[], now: number): Promise<RecordEntry[]> {
  const receivedAt = new Date(now).toISOString();
  const sealed: RecordEntry[] = [];
  for (const draft of drafts) {
    const parsed = draftEntrySchema.safeParse({ ...draft, run: head.run, seq: head.seq + 1 }, { error: inputSay });
    if (!parsed.success) throw inputProblem(parsed.error);
    const entry = sealEntry(parsed.data, receivedAt, head.hash);
    sealed.push(entry);
    head.seq = entry.seq;
    head.hash = entry.hash;
  }
  try {
    await insertEntries(tx, head.workshop, sealed);
  } catch (error) {
    if (isUniqueViolation(error, ENTRY_ID_KEY)) throw new ProblemError('id-taken', 'An entry with this id is in another record already.');
    throw error;
  }
  await setHead(tx, head.run, { seq: head.seq, hash: head.hash, heard_at: new Date(now) });
  return sealed;
}
