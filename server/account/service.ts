/** The own account: which sessions it has, and its password. */
import { asPerson, inWorkshop } from '@/db/createDb';
import type { OwnSession } from '@/shared/contract/account';

import { addJob } from '../adapters/jobs';
import { PASSWORD_CHANGED } from '../mail/passwordChanged';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import type { SignedIn } from '../session/access';
import type { ConfirmPassword } from '../session/confirmPassword';
import { hashPassword } from '../session/passwords';
import { findMemberships, findOwnSessions, revokeOwnSessions, updatePassword } from '../session/queries';
import { weaknessOf } from './passwordStrength';

/** Own sessions of this workshop that still count. */
export async function readOwnSessions(parts: Parts, who: SignedIn): Promise<OwnSession[]> {
  const rows = await inWorkshop(parts.db, who.workshop, (tx) => findOwnSessions(tx, who.person, new Date(parts.clock())));
  return rows.map((row) => ({ id: row.id, device: row.device, since: row.created_at.toISOString(), lastSeen: row.rotated_at.toISOString(), current: row.id === who.session }));
}

/** Ends one of the own sessions; somebody else's is not there. */
export async function endOwnSession(parts: Parts, who: SignedIn, session: string): Promise<void> {
  const ended = await inWorkshop(parts.db, who.workshop, (tx) => revokeOwnSessions(tx, who.person, { only: session }, new Date(parts.clock()), 'ended by its person'));
  if (ended === 0) throw new ProblemError('not-found', 'There is no such session of yours; it may have ended already.');
}

/**
 * Changes the password. Every other session of the person ends, in every workshop, because whoever knew the old password may have one;
 * a letter says so.
 */
export async function changePassword(parts: Parts, who: SignedIn, confirm: ConfirmPassword, { password, next }: { password: string; next: string }): Promise<void> {
  await confirm(who.person, password);
  const { workshops, mail } = await asPerson(parts.db, { id: who.person }, async (tx) => ({
    workshops: await findMemberships(tx, who.person),
    mail: (await tx.selectFrom('people').select('mail').where('id', '=', who.person).executeTakeFirstOrThrow()).mail,
  }));
  const weakness = await weaknessOf(next, [who.name, who.code, mail, 'lampstep', ...workshops.map(({ name }) => name)]);
  if (weakness !== null) throw new ProblemError('weak-password', weakness, { faults: [{ path: 'next', message: weakness }] });
  const now = new Date(parts.clock());
  const hash = await hashPassword(next, parts.config.bcryptCost);
  await asPerson(parts.db, { id: who.person }, (tx) => updatePassword(tx, who.person, hash, now));
  for (const { id } of workshops) {
    await inWorkshop(parts.db, id, async (tx) => {
      await revokeOwnSessions(tx, who.person, { but: who.session }, now, 'the password was changed');
      if (id === who.workshop) await addJob(tx, PASSWORD_CHANGED, { person: who.person, workshop: id, at: now.toISOString() }, `${PASSWORD_CHANGED}:${who.person}:${now.getTime()}`);
    });
  }
}
