/** Queries of hold points. */
import type { Tx } from '@/db/createDb';

import { findRunSummaries } from '../runs/queries';

/** Open runs that wait at a hold point, longest wait first. */
export async function findWaitingRuns(tx: Tx) {
  const rows = await findRunSummaries(tx).where('runs.state', '=', 'open').where('run_heads.hold_entry', 'is not', null).execute();
  return rows.sort((a, b) => a.heard_at.getTime() - b.heard_at.getTime());
}
