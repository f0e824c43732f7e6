/** Entries that a person signs with a password: taken once, and the same request is answered as the first time. */
import type { Tx } from '@/db/createDb';
import type { RunHeadRow, RunRow } from '@/db/tables';
import type { MachineEvent } from '@/flows/machine/events';
import type { Head } from '@/shared/contract/runSummary';
import type { RecordEntry } from '@/shared/record/recordEntry';

import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { findEntriesById } from './queries';
import { takeEvents } from './takeEvents';
import type { TakenEvent } from './takeEvents';

export type Signed = { entry: RecordEntry; head: Head };

/** Takes one signed event; the password has been checked. */
export async function takeSigned(tx: Tx, parts: Parts, run: RunRow, head: RunHeadRow, taken: TakenEvent): Promise<Signed> {
  const [entry] = await takeEvents(tx, parts, run, head, [taken]);
  if (entry === undefined) throw new Error('an event was taken without an entry');
  return { entry, head: { seq: head.seq, hash: head.hash } };
}

/** The entry that this very request made before, or null; throws `id-taken` when the id was used for something else. */
export async function signedBefore(tx: Tx, run: RunRow, head: RunHeadRow, id: string, actor: string, type: MachineEvent['type']): Promise<Signed | null> {
  const [entry] = await findEntriesById(tx, run.id, [id]);
  if (entry === undefined) return null;
  const event = entry.body['event'];
  const same = entry.actor === actor && typeof event === 'object' && event !== null && 'type' in event && event.type === type;
  if (!same) throw new ProblemError('id-taken', 'The id of this entry was used before.', { entry: id });
  return { entry, head: { seq: head.seq, hash: head.hash } };
}
