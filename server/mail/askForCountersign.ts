/** Asking the seniors of a workshop for a countersign, in the transaction that writes the request itself. */
import type { Tx } from '@/db/createDb';

import { addJob } from '../adapters/jobs';

export const COUNTERSIGN_WANTED = 'countersign-wanted';

export interface CountersignJob {
  workshop: string;
  run: string;
  entry: string;
  step: string;
  to: string;
}

/** One job for each senior who never led the run, so that a letter that fails is tried again alone. */
export async function askForCountersign(tx: Tx, ask: { workshop: string; run: string; entry: string; step: string; ledBy: readonly string[] }): Promise<void> {
  const seniors = await tx
    .selectFrom('members')
    .select('person')
    .where('workshop', '=', ask.workshop)
    .where('person', 'not in', ask.ledBy)
    .where('left_at', 'is', null)
    .where((eb) => eb(eb.val('senior'), '=', eb.fn.any('roles')))
    .execute();
  for (const { person } of seniors) {
    const job: CountersignJob = { workshop: ask.workshop, run: ask.run, entry: ask.entry, step: ask.step, to: person };
    await addJob(tx, COUNTERSIGN_WANTED, job, `${COUNTERSIGN_WANTED}:${ask.entry}:${person}`);
  }
}
