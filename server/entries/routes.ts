/** Entries of a run. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { getRunFor, wantRestorer } from '../runs/access';
import { postEntries } from './postEntries';
import { findEntries, getHead, lockHead } from './queries';

/** Adds the routes of entries. */
export function addEntryRoutes(router: Router, parts: Parts): void {
  bindRoute(router, parts, routes.entries, ({ who, params, query }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      const run = await getRunFor(tx, params.run);
      // Head first: entries that come in between are then more than the head says, never fewer.
      const { seq, hash } = await getHead(tx, run.id);
      return { entries: await findEntries(tx, run.id, query.after), head: { seq, hash } };
    }),
  );
  bindRoute(router, parts, routes.postEntries, ({ who, params, body }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      wantRestorer(who, await getRunFor(tx, params.run));
      const head = await lockHead(tx, params.run);
      // Read again behind the lock: another request may have closed it.
      return postEntries(tx, parts, await getRunFor(tx, params.run), head, body.entries);
    }),
  );
}
