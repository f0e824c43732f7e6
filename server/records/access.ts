/** Who may read a record and who may do what with it. One place for the server's decisions and for what screens offer. */
import type { RunRow } from '@/db/tables';
import type { RecordEntry } from '@/shared/record/recordEntry';

import { ProblemError } from '../problems';
import { everLed } from '../runs/access';
import type { SignedIn } from '../session/access';

/** A restorer reads the records of runs that they lead or ever led; seniors, reviewers and keepers read all of the workshop. */
export function maySeeRecord(who: Pick<SignedIn, 'person' | 'roles'>, run: Pick<RunRow, 'restorer' | 'former'>): boolean {
  return everLed(who.person, run) || who.roles.some((role) => role !== 'restorer');
}

/** A reviewer who never led the run. */
export function wantReviewer(who: Pick<SignedIn, 'person'>, run: Pick<RunRow, 'restorer' | 'former'>): void {
  if (everLed(who.person, run)) throw new ProblemError('own-run', 'This is your own run: another reviewer has to review it.');
}

/** True when that person put a countersign, a presence or an end of their own into the run. */
export function tookPart(person: string, run: Pick<RunRow, 'restorer'>, entries: readonly RecordEntry[]): boolean {
  return run.restorer !== person && entries.some((entry) => entry.actor === person && ((entry.body['event'] ?? null) !== null || entry.kind === 'closed'));
}

export interface RecordRights {
  submit: boolean;
  find: boolean;
  return: boolean;
  reply: boolean;
  accept: boolean;
  release: boolean;
}

/** What the person may do with the record as it stands. */
export function rightsOn(who: Pick<SignedIn, 'person' | 'roles'>, run: Pick<RunRow, 'restorer' | 'former' | 'state' | 'ended'>, entries: readonly RecordEntry[]): RecordRights {
  const own = run.restorer === who.person;
  const works = own && (who.roles.includes('restorer') || who.roles.includes('senior'));
  const reviews = !everLed(who.person, run) && who.roles.includes('reviewer') && run.state === 'submitted';
  const accept = reviews && !tookPart(who.person, run, entries);
  return { submit: works && run.state === 'closed', find: reviews, return: reviews, reply: works && run.state === 'returned', accept, release: accept && run.ended === 'supply-proven' };
}
