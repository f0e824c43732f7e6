/** A run as lists show it. */
import { bandSchema, endingSchema } from '@/shared/contract/runSummary';
import type { RunSummary } from '@/shared/contract/runSummary';

import type { RunSummaryRow } from './queries';
import { isStranded } from './stranded';

/** A row of `findRunSummaries` in the form of the contract. */
export function runSummaryToWire(row: RunSummaryRow): RunSummary {
  return {
    id: row.id,
    machine: { id: row.machine, name: row.machine_name, serial: row.serial },
    tree: { id: row.tree, title: row.tree_title, version: row.tree_version },
    restorer: row.restorer,
    former: row.former,
    offeredTo: row.offered_to,
    stranded: isStranded(row),
    state: row.state,
    ended: row.ended === null ? null : endingSchema.parse(row.ended),
    startedAt: row.started_at.toISOString(),
    closedAt: row.closed_at?.toISOString() ?? null,
    heardAt: row.heard_at.toISOString(),
    head: { seq: row.seq, hash: row.hash },
    band: bandSchema.parse(row.band),
    step: row.step_key === null ? null : { key: row.step_key, title: row.step_title ?? row.step_key, stud: row.step_stud ?? '', total: row.step_total },
    awaitsHold: row.hold_entry !== null,
  };
}
