/** A run changes hands: the restorer offers it and signs, the next one takes it and signs. */
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import type { MachineEvent } from '@/flows/machine/events';
import type { BodyOf } from '@/shared/contract/defineRoute';
import { GIVES, TAKES } from '@/shared/contract/handOver';
import type { routes } from '@/shared/contract/routes';

import { outOfSequence } from '../entries/postEntries';
import { getHead, lockHead } from '../entries/queries';
import { getStanding } from '../entries/runState';
import { signedBefore, takeSigned } from '../entries/signedEntry';
import type { Signed } from '../entries/signedEntry';
import { signedTime } from '../entries/signedTime';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { getRunFor, wantRestorer } from '../runs/access';
import type { SignedIn } from '../session/access';

type Who = Pick<SignedIn, 'person' | 'roles'>;

/** Offers the run. The password of the restorer has been checked. */
export async function offerRun(tx: Tx, parts: Parts, who: Who, runId: string, body: Omit<BodyOf<typeof routes.handOver>, 'password'>): Promise<Signed> {
  const head = await lockHead(tx, (await getRunFor(tx, runId)).id);
  const run = await getRunFor(tx, runId);
  wantRestorer(who, run);
  const before = await signedBefore(tx, run, head, body.id, who.person, 'HANDED_OVER');
  if (before !== null) return before;
  wantOpen(run);
  await wantQualified(tx, body.to);
  if (body.seq !== head.seq + 1) throw await outOfSequence(tx, head, body.seq);
  const { state } = await getStanding(tx, parts, run, head);
  const event: MachineEvent = { ...signedTime(state, head, parts.clock()), type: 'HANDED_OVER', by: who.person, to: body.to, meaning: GIVES, ...(body.note === undefined ? {} : { note: body.note }) };
  return takeSigned(tx, parts, run, head, { id: body.id, actor: who.person, event });
}

/** Takes the run. The password of the one who takes has been checked; the roles of that moment count from now on. */
export async function takeRun(tx: Tx, parts: Parts, who: Who, runId: string, body: Omit<BodyOf<typeof routes.takeOver>, 'password'>): Promise<Signed> {
  const head = await lockHead(tx, (await getRunFor(tx, runId)).id);
  const run = await getRunFor(tx, runId);
  const before = await signedBefore(tx, run, head, body.id, who.person, 'TAKEN_OVER');
  if (before !== null) return before;
  wantOpen(run);
  if (head.offered_to !== who.person) throw new ProblemError('not-offered');
  if (body.seq !== head.seq + 1) throw await outOfSequence(tx, head, body.seq);
  const { state } = await getStanding(tx, parts, run, head);
  const event: MachineEvent = { ...signedTime(state, head, parts.clock()), type: 'TAKEN_OVER', by: who.person, senior: who.roles.includes('senior'), meaning: TAKES };
  return takeSigned(tx, parts, run, head, { id: body.id, actor: who.person, event, roles: who.roles });
}

/** Asked before the password is: the run has to be offered to this person. One who has taken it already may ask again. */
export async function wantOffered(tx: Tx, who: Who, runId: string): Promise<void> {
  const run = await getRunFor(tx, runId);
  const { offered_to } = await getHead(tx, run.id);
  if (offered_to !== who.person && run.restorer !== who.person) throw new ProblemError('not-offered');
}

/** Only somebody who may lead runs can be asked: a member now, restorer or senior. */
export async function wantQualified(tx: Tx, person: string): Promise<void> {
  const member = await tx.selectFrom('members').select('roles').where('person', '=', person).where('left_at', 'is', null).executeTakeFirst();
  const fault = member === undefined ? 'is no member of this workshop' : member.roles.includes('restorer') || member.roles.includes('senior') ? null : 'is neither a restorer nor a senior';
  if (fault === null) return;
  const say = member === undefined ? 'A run can only be handed to a member of this workshop.' : 'A run can only be handed to a restorer or a senior: nobody else leads one.';
  throw new ProblemError('bad-input', say, { faults: [{ path: 'to', message: fault }] });
}

function wantOpen(run: RunRow): void {
  if (run.state !== 'open') throw new ProblemError('wrong-state', 'This run is closed; there is nothing to hand over any more.');
}
