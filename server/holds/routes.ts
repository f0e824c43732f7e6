/** Hold points: what waits for a senior, and the answers. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import type { Hold } from '@/shared/contract/holds';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { getRunFor, wantNeverRestorer, wantOtherThanRestorer, wantRestorer } from '../runs/access';
import type { ConfirmPassword } from '../session/confirmPassword';
import { holdOf } from './holdOf';
import { findWaitingRuns } from './queries';
import { addSecondPerson, answerHold, OWN_RUN, wantMember } from './service';

/** Adds the routes of hold points and second persons. */
export function addHoldRoutes(router: Router, parts: Parts, confirm: ConfirmPassword): void {
  bindRoute(router, parts, routes.holds, ({ who }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      const holds: Hold[] = [];
      for (const row of await findWaitingRuns(tx)) {
        const hold = await holdOf(tx, parts, row, who.person);
        if (hold !== null) holds.push(hold);
      }
      return { holds };
    }),
  );
  bindRoute(router, parts, routes.answerHold, async ({ who, params, body }) => {
    await inWorkshop(parts.db, who.workshop, async (tx) =>
      wantNeverRestorer(who, await getRunFor(tx, params.run), OWN_RUN),
    );
    await confirm(who.person, body.password);
    return inWorkshop(parts.db, who.workshop, (tx) => answerHold(tx, parts, who, params.run, body));
  });
  bindRoute(router, parts, routes.secondPerson, async ({ who, params, body }) => {
    await inWorkshop(parts.db, who.workshop, async (tx) => {
      const run = await getRunFor(tx, params.run);
      wantRestorer(who, run);
      wantOtherThanRestorer({ person: body.person }, run, 'The second person has to be somebody else than the restorer.');
      await wantMember(tx, body.person);
    });
    await confirm(body.person, body.password);
    return inWorkshop(parts.db, who.workshop, (tx) => addSecondPerson(tx, parts, params.run, body));
  });
}
