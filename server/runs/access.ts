/** Who may do what with a run. */
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';

import { ProblemError } from '../problems';
import type { SignedIn } from '../session/access';
import { findRun } from './queries';

/** The run, or `not-found`: a run of another workshop is not there for anyone else. */
export async function getRunFor(tx: Tx, run: string): Promise<RunRow> {
  const row = await findRun(tx, run);
  if (row === undefined) throw new ProblemError('not-found', 'There is no such run in this workshop.');
  return row;
}

/** The work on a run is its restorer's alone; one who has handed it over is told so. */
export function wantRestorer(who: Pick<SignedIn, 'person'>, run: RunRow): void {
  if (run.restorer === who.person) return;
  throw new ProblemError(run.former.includes(who.person) ? 'handed-over' : 'not-your-run');
}

/** True for everybody who leads the run or ever led it. */
export function everLed(person: string, run: Pick<RunRow, 'restorer' | 'former'>): boolean {
  return run.restorer === person || run.former.includes(person);
}

/** The doer is never the witness nor the reviewer, also when the run has changed hands since. */
export function wantNeverRestorer(who: Pick<SignedIn, 'person'>, run: RunRow, say: string): void {
  if (everLed(who.person, run)) throw new ProblemError('own-run', say);
}

/** Somebody else than the one who leads the run now. */
export function wantOtherThanRestorer(who: Pick<SignedIn, 'person'>, run: RunRow, say: string): void {
  if (run.restorer === who.person) throw new ProblemError('own-run', say);
}
