/** Countersigns and second persons: what somebody else than the restorer puts into a run. */
import type { Tx } from '@/db/createDb';
import type { RunHeadRow, RunRow } from '@/db/tables';
import type { MachineEvent } from '@/flows/machine/events';
import type { BodyOf } from '@/shared/contract/defineRoute';
import type { routes } from '@/shared/contract/routes';
import type { Head } from '@/shared/contract/runSummary';
import type { RecordEntry } from '@/shared/record/recordEntry';

import { outOfSequence } from '../entries/postEntries';
import { findEntriesById, lockHead } from '../entries/queries';
import { getStanding } from '../entries/runState';
import { takeEvents } from '../entries/takeEvents';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { getRunFor, wantOtherThanRestorer } from '../runs/access';
import { signedTime } from './signedEvent';

type Answer = Pick<BodyOf<typeof routes.answerHold>, 'id' | 'seq' | 'answer' | 'reason'>;
type Signed = { entry: RecordEntry; head: Head };

/** Gives or refuses the countersign that the run waits for. The password has been checked. */
export async function answerHold(tx: Tx, parts: Parts, who: { person: string }, runId: string, answer: Answer): Promise<Signed> {
  const head = await lockHead(tx, (await getRunFor(tx, runId)).id);
  const run = await getRunFor(tx, runId);
  wantOtherThanRestorer(who, run, 'This is your own run: another senior has to countersign it.');
  const type = answer.answer === 'given' ? 'HOLD_GIVEN' : 'HOLD_REFUSED';
  const before = await signedBefore(tx, run, head, answer.id, who.person, type);
  if (before !== null) return before;
  if (run.state !== 'open' || head.hold_entry === null) throw new ProblemError('no-hold', 'No countersign is awaited here any more: the run has gone on or was stopped.');
  if (answer.seq !== head.seq + 1) throw await outOfSequence(tx, head, answer.seq);
  const { state } = await getStanding(tx, parts, run, head);
  const common = { ...signedTime(state, head, parts.clock()), step: state.context.key, by: who.person };
  const event: MachineEvent =
    type === 'HOLD_GIVEN'
      ? { ...common, type, ...(answer.reason === undefined ? {} : { note: answer.reason }) }
      : { ...common, type, reason: answer.reason ?? 'no reason given' };
  return takeSigned(tx, parts, run, head, { id: answer.id, actor: who.person, event });
}

/** Signs in a second person at the restorer's device. That person's password has been checked. */
export async function addSecondPerson(tx: Tx, parts: Parts, runId: string, second: { id: string; seq: number; person: string }): Promise<Signed> {
  const head = await lockHead(tx, (await getRunFor(tx, runId)).id);
  const run = await getRunFor(tx, runId);
  wantOtherThanRestorer({ person: second.person }, run, 'The second person has to be somebody else than the restorer.');
  await wantMember(tx, second.person);
  const before = await signedBefore(tx, run, head, second.id, second.person, 'SECOND_PRESENT');
  if (before !== null) return before;
  if (run.state !== 'open') throw new ProblemError('wrong-state', 'This run is closed.');
  if (second.seq !== head.seq + 1) throw await outOfSequence(tx, head, second.seq);
  const { state } = await getStanding(tx, parts, run, head);
  const event: MachineEvent = { ...signedTime(state, head, parts.clock()), type: 'SECOND_PRESENT', by: second.person };
  return takeSigned(tx, parts, run, head, { id: second.id, actor: second.person, event });
}

/** Asked before the password is: nobody's account outside the workshop can be tried here. */
export async function wantMember(tx: Tx, person: string): Promise<void> {
  const member = await tx.selectFrom('members').select('person').where('person', '=', person).where('left_at', 'is', null).executeTakeFirst();
  if (member === undefined) throw new ProblemError('bad-input', 'The second person is no member of this workshop.', { faults: [{ path: 'person', message: 'is no member of this workshop' }] });
}

async function takeSigned(tx: Tx, parts: Parts, run: RunRow, head: RunHeadRow, taken: { id: string; actor: string; event: MachineEvent }): Promise<Signed> {
  const [entry] = await takeEvents(tx, parts, run, head, [taken]);
  if (entry === undefined) throw new Error('an event was taken without an entry');
  return { entry, head: { seq: head.seq, hash: head.hash } };
}

/** The entry that this very request made before, or null; throws `id-taken` when the id was used for something else. */
async function signedBefore(tx: Tx, run: RunRow, head: RunHeadRow, id: string, actor: string, type: MachineEvent['type']): Promise<Signed | null> {
  const [entry] = await findEntriesById(tx, run.id, [id]);
  if (entry === undefined) return null;
  const event = entry.body['event'];
  const same = entry.actor === actor && typeof event === 'object' && event !== null && 'type' in event && event.type === type;
  if (!same) throw new ProblemError('id-taken', 'The id of this entry was used before.', { entry: id });
  return { entry, head: { seq: head.seq, hash: head.hash } };
}
