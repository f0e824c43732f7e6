/** Countersigns and second persons: what somebody else than the restorer puts into a run. */
import type { Tx } from '@/db/createDb';
import type { MachineEvent } from '@/flows/machine/events';
import type { BodyOf } from '@/shared/contract/defineRoute';
import type { routes } from '@/shared/contract/routes';

import { outOfSequence } from '../entries/postEntries';
import { lockHead } from '../entries/queries';
import { getStanding } from '../entries/runState';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { signedBefore, takeSigned } from '../entries/signedEntry';
import type { Signed } from '../entries/signedEntry';
import { signedTime } from '../entries/signedTime';
import { getRunFor, wantNeverRestorer, wantOtherThanRestorer } from '../runs/access';

export const OWN_RUN = 'This is your own run: another senior has to countersign it.';

type Answer = Pick<BodyOf<typeof routes.answerHold>, 'id' | 'seq' | 'answer' | 'reason'>;

/** Gives or refuses the countersign that the run waits for. The password has been checked. */
export async function answerHold(tx: Tx, parts: Parts, who: { person: string }, runId: string, answer: Answer): Promise<Signed> {
  const head = await lockHead(tx, (await getRunFor(tx, runId)).id);
  const run = await getRunFor(tx, runId);
  wantNeverRestorer(who, run, OWN_RUN);
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
