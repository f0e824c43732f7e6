/** Machines, releases and tags as the contract shows them. */
import type { Selectable } from 'kysely';

import type { MachineTagsTable } from '@/db/tables';
import type { FittedThing } from '@/flows/document/steps';
import type { Machine, MachineTag, Release } from '@/shared/contract/machines';

import type { findMachines, findReleases } from './queries';

type MachineRow = Awaited<ReturnType<ReturnType<typeof findMachines>['executeTakeFirstOrThrow']>>;
type ReleaseRow = Awaited<ReturnType<typeof findReleases>>[number];

const DAY_MS = 24 * 3_600_000;

/** `now` in epoch milliseconds; a release counts for the workshop's number of days unless later work has made it void. */
export function releaseToWire(row: ReleaseRow, now: number, releaseDays: number): Release {
  return {
    id: row.id,
    run: row.run,
    givenAt: row.given_at.toISOString(),
    givenBy: row.given_by,
    voidedAt: row.voided_at?.toISOString() ?? null,
    voidedByRun: row.void_run,
    voidReason: row.reason,
    valid: row.voided_at === null && now - row.given_at.getTime() <= releaseDays * DAY_MS,
  };
}

/** A machine with its newest release. */
export function machineToWire(row: MachineRow, release: Release | undefined): Machine {
  return {
    id: row.id,
    name: row.name,
    serial: row.serial,
    machineClass: row.machine_class,
    revision: row.revision,
    profileHash: row.hash,
    openRun: row.open_run,
    release: release ?? null,
    tags: Number(row.tags ?? 0),
  };
}

/** One thing that stays on a machine, or one killer that is owed. */
export function tagToWire(row: Selectable<MachineTagsTable>): MachineTag {
  const common = { since: row.since.toISOString(), run: row.run };
  if (row.is === 'fitted') return { is: 'fitted', thing: row.body as FittedThing, ...common };
  const { part, killer } = row.body as { part: string; killer: string };
  return { is: 'killer', part, killer, ...common };
}
