/** Handing a run over. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { getRunFor, wantRestorer } from '../runs/access';
import type { ConfirmPassword } from '../session/confirmPassword';
import { offerRun, takeRun, wantOffered, wantQualified } from './service';

/** Adds the routes of handing a run over. */
export function addHandOverRoutes(router: Router, parts: Parts, confirm: ConfirmPassword): void {
  bindRoute(router, parts, routes.handOver, async ({ who, params, body }) => {
    await inWorkshop(parts.db, who.workshop, async (tx) => {
      wantRestorer(who, await getRunFor(tx, params.run));
      await wantQualified(tx, body.to);
    });
    await confirm(who.person, body.password);
    return inWorkshop(parts.db, who.workshop, (tx) => offerRun(tx, parts, who, params.run, body));
  });
  bindRoute(router, parts, routes.takeOver, async ({ who, params, body }) => {
    await inWorkshop(parts.db, who.workshop, (tx) => wantOffered(tx, who, params.run));
    await confirm(who.person, body.password);
    return inWorkshop(parts.db, who.workshop, (tx) => takeRun(tx, parts, who, params.run, body));
  });
}
