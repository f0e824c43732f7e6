/** Queries of runs. */
import { sql } from 'kysely';

import type { Tx } from '@/db/createDb';
import type { InsertableRunRow, RunRow } from '@/db/tables';

export const OPEN_RUN_INDEX = 'runs_one_open_per_machine';
export const RUN_ID_KEY = 'runs_pkey';

/** Runs as lists show them, newest first; the caller narrows it down. */
export function findRunSummaries(tx: Tx) {
  return tx
    .selectFrom('runs')
    .innerJoin('run_heads', 'run_heads.run', 'runs.id')
    .innerJoin('machines', 'machines.id', 'runs.machine')
    .innerJoin('tree_versions', (join) =>
      join.onRef('tree_versions.workshop', '=', 'runs.workshop').onRef('tree_versions.tree', '=', 'runs.tree').onRef('tree_versions.version', '=', 'runs.tree_version'),
    )
    .select([
      'runs.id', 'runs.machine', 'machines.name as machine_name', 'machines.serial', 'runs.tree', 'runs.tree_version', 'runs.restorer', 'runs.former', 'runs.engine', 'runs.state', 'runs.ended',
      'runs.started_at', 'runs.closed_at', 'run_heads.seq', 'run_heads.hash', 'run_heads.heard_at', 'run_heads.band', 'run_heads.step_key', 'run_heads.step_title',
      'run_heads.step_stud', 'run_heads.step_total', 'run_heads.hold_entry', 'run_heads.offered_to',
    ])
    // The title alone: a document may be large, and lists show many runs.
    .select(sql<string>`tree_versions.document ->> 'title'`.as('tree_title'))
    .orderBy('runs.started_at', 'desc')
    .orderBy('runs.id', 'desc');
}

export type RunSummaryRow = Awaited<ReturnType<ReturnType<typeof findRunSummaries>['executeTakeFirstOrThrow']>>;

/** The run, if it is in this workshop. */
export function findRun(tx: Tx, run: string): Promise<RunRow | undefined> {
  return tx.selectFrom('runs').selectAll().where('id', '=', run).executeTakeFirst();
}

/** Stores a run. A second open one on its machine is a violation of `OPEN_RUN_INDEX`. */
export async function insertRun(tx: Tx, row: InsertableRunRow): Promise<void> {
  await tx.insertInto('runs').values(row).execute();
}

/** Moves the run's state; only behind `lockHead`. */
export async function setRunState(tx: Tx, run: string, set: Partial<Pick<RunRow, 'state' | 'ended'>> & { closed_at?: Date }): Promise<void> {
  await tx.updateTable('runs').set(set).where('id', '=', run).execute();
}

/** Hands the run to its next restorer; only behind `lockHead`. */
export async function setRestorer(tx: Tx, run: Pick<RunRow, 'id' | 'restorer' | 'former'>, next: { restorer: string; roles: readonly string[] }): Promise<void> {
  const former = [...run.former, run.restorer].filter((person, i, all) => person !== next.restorer && all.indexOf(person) === i);
  await tx.updateTable('runs').set({ restorer: next.restorer, restorer_roles: [...next.roles], former }).where('id', '=', run.id).execute();
}
