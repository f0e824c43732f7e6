/** Who may add and who may see a file. */
import type { RunRow } from '@/db/tables';

import { ProblemError } from '../problems';
import { maySeeRecord } from '../records/access';
import { wantRestorer } from '../runs/access';
import type { SignedIn } from '../session/access';
import type { FileUse } from './queries';

/** A file of a run is seen by those who see its record, any other by the whole workshop. */
export function maySeeFile(who: Pick<SignedIn, 'person' | 'roles'>, uses: readonly FileUse[]): boolean {
  return uses.some(({ restorer, former }) => restorer === null || maySeeRecord(who, { restorer, former: former ?? [] }));
}

/** Photos of a run come from its restorer while it is open; those of machines and instruments from a senior or a keeper. */
export function wantMayAdd(who: Pick<SignedIn, 'person' | 'roles'>, run: RunRow | null): void {
  if (run !== null) {
    wantRestorer(who, run);
    if (run.state !== 'open') throw new ProblemError('wrong-state', 'This run is closed: it takes no more photos.');
  } else if (!who.roles.includes('senior') && !who.roles.includes('keeper')) {
    throw new ProblemError('role-missing', 'Photos of machines and papers of instruments are added by a senior or a keeper.');
  }
}
