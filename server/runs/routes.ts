/** Runs: lists, starting one, and the bundle for a device. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import type { ConfirmPassword } from '../session/confirmPassword';
import { getRunFor } from './access';
import { closeStranded, wantStranded } from './closeStranded';
import { findRunSummaries } from './queries';
import { getRunBundle } from './runBundle';
import { startRun } from './startRun';
import { runSummaryToWire } from './toWire';

/** Adds the routes of runs. */
export function addRunRoutes(router: Router, parts: Parts, confirm: ConfirmPassword): void {
  bindRoute(router, parts, routes.runs, ({ who, query }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      const rows = await findRunSummaries(tx)
        .$if(query.mine === '1', (q) => q.where((eb) => eb.or([eb('runs.restorer', '=', who.person), eb.and([eb('runs.state', '=', 'open'), eb('run_heads.offered_to', '=', who.person)])])))
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
  bindRoute(router, parts, routes.closeStranded, async ({ who, params, body }) => {
    await inWorkshop(parts.db, who.workshop, async (tx) => {
      const run = await getRunFor(tx, params.run);
      // one that was closed by this very request is answered as the first time, below
      if (run.state === 'open') wantStranded(run);
    });
    await confirm(who.person, body.password);
    return inWorkshop(parts.db, who.workshop, (tx) => closeStranded(tx, parts, who, params.run, body));
  });
  bindRoute(router, parts, routes.run, ({ who, params }) => inWorkshop(parts.db, who.workshop, async (tx) => getRunBundle(tx, parts, await getRunFor(tx, params.run))));
}
