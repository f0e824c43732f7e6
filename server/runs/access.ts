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

/** The work on a run is its restorer's alone. */
export function wantRestorer(who: Pick<SignedIn, 'person'>, run: RunRow): void {
  if (run.restorer !== who.person) throw new ProblemError('not-your-run');
}

/** The doer is never the witness nor the reviewer. */
export function wantOtherThanRestorer(who: Pick<SignedIn, 'person'>, run: RunRow, say: string): void {
  if (run.restorer === who.person) throw new ProblemError('own-run', say);
}
