/** Runs that were begun under an engine which this server no longer runs: kept and read, never led on. */
import type { RunRow } from '@/db/tables';
import { ENGINE } from '@/flows/machine/compile';

import { ProblemError } from '../problems';

/** True for an open run of another engine. */
export function isStranded(run: Pick<RunRow, 'state' | 'engine'>): boolean {
  return run.state === 'open' && run.engine !== ENGINE;
}

/** Throws `other-engine`: under other rules the same entries could lead elsewhere, so nothing is judged by these. */
export function wantThisEngine(run: Pick<RunRow, 'engine'>): void {
  if (run.engine !== ENGINE) throw new ProblemError('other-engine', undefined, { engine: run.engine });
}
