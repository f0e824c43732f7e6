/** Machines of the workshop. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { findRunSummaries } from '../runs/queries';
import { runSummaryToWire } from '../runs/toWire';
import { getSettings } from '../settings/queries';
import { findMachines, findMachineTags, findReleases } from './queries';
import { machineToWire, releaseToWire, tagToWire } from './toWire';

/** Adds the routes of machines. */
export function addMachineRoutes(router: Router, parts: Parts): void {
  bindRoute(router, parts, routes.machines, ({ who }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      const { settings } = await getSettings(tx);
      const releases = await findReleases(tx);
      const rows = await findMachines(tx).execute();
      return {
        machines: rows.map((row) => {
          const newest = releases.find((release) => release.machine === row.id);
          return machineToWire(row, newest && releaseToWire(newest, parts.clock(), settings.releaseDays));
        }),
      };
    }),
  );
  bindRoute(router, parts, routes.machine, ({ who, params }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      const row = await findMachines(tx).where('machines.id', '=', params.machine).executeTakeFirst();
      if (row === undefined) throw new ProblemError('not-found', 'There is no such machine in this workshop.');
      const { settings } = await getSettings(tx);
      const releases = (await findReleases(tx, row.id)).map((release) => releaseToWire(release, parts.clock(), settings.releaseDays));
      return {
        machine: machineToWire(row, releases[0]),
        profile: { revision: row.revision, hash: row.hash, document: row.profile },
        runs: (await findRunSummaries(tx).where('runs.machine', '=', row.id).execute()).map(runSummaryToWire),
        releases,
        staysFitted: (await findMachineTags(tx, row.id)).map(tagToWire),
      };
    }),
  );
}
