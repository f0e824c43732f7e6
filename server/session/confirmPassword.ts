/** Asking for a password again before something is signed, with a limit on wrong ones. */
import { asPerson } from '@/db/createDb';

import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { checkPassword } from './passwords';
import { findPasswordHash } from './queries';

const WINDOW_MS = 15 * 60_000;

/** Throws `wrong-password`, or `too-many` after too many wrong ones of that person in 15 minutes. */
export type ConfirmPassword = (person: string, password: string) => Promise<void>;

/** The check with its own count of wrong tries, kept in memory. */
export function makeConfirmPassword(parts: Parts): ConfirmPassword {
  const missed = new Map<string, number[]>();
  return async (person, password) => {
    const recent = (missed.get(person) ?? []).filter((at) => at > parts.clock() - WINDOW_MS);
    if (recent.length >= parts.config.signInTries) throw new ProblemError('too-many', 'Too many wrong passwords. Wait 15 minutes, then try again.');
    // Counted before the check, so that many tries at the same moment do not pass the limit together.
    missed.set(person, [...recent, parts.clock()]);
    const found = await asPerson(parts.db, { id: person }, (tx) => findPasswordHash(tx, person));
    if (!(await checkPassword(password, found?.password_hash, parts.config.bcryptCost))) throw new ProblemError('wrong-password');
    missed.delete(person);
  };
}
