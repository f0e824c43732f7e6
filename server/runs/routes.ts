/** Runs: lists, starting one, and the bundle for a device. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { getRunFor } from './access';
import { findRunSummaries } from './queries';
import { getRunBundle } from './runBundle';
import { startRun } from './startRun';
import { runSummaryToWire } from './toWire';

/** Adds the routes of runs. */
export function addRunRoutes(router: Router, parts: Parts): void {
  bindRoute(router, parts, routes.runs, ({ who, query }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      const rows = await findRunSummaries(tx)
        .$if(query.mine === '1', (q) => q.where('runs.restorer', '=', who.person))
        .$if(query.open === '1', (q) => q.where('runs.state', '=', 'open'))
        .limit(500)
        .execute();
      return { runs: rows.map(runSummaryToWire) };
    }),
  );
  bindRoute(router, parts, routes.startRun, async ({ who, body }) => {
    const run = await startRun(parts, who, body);
    return inWorkshop(parts.db, who.workshop, (tx) => getRunBundle(tx, parts, run));
  });
  bindRoute(router, parts, routes.run, ({ who, params }) => inWorkshop(parts.db, who.workshop, async (tx) => getRunBundle(tx, parts, await getRunFor(tx, params.run))));
}
