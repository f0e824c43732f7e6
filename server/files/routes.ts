/** Photos and papers. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { maySeeFile } from './access';
import { keepFile, wantMayAddTo } from './keepFile';
import { oneAfterTheOther } from './oneAfterTheOther';
import { findFile, findFileUses } from './queries';
import { readUpload } from './readUpload';
import { sendFile } from './sendFile';

/** Adds the routes of files. */
export function addFileRoutes(router: Router, parts: Parts): void {
  const inTurn = oneAfterTheOther();
  bindRoute(router, parts, routes.addFile, async ({ who, query, req, res }) => {
    await wantMayAddTo(parts, who, query.run);
    const sent = await readUpload(req, res);
    // A picture takes much memory while it is unpacked: one at a time, so that many uploads cannot bring the server down.
    return inTurn(() => keepFile(parts, who, sent, query));
  });
  bindRoute(router, parts, routes.file, async ({ who, params, query, req, res }) => {
    const file = await inWorkshop(parts.db, who.workshop, async (tx) => {
      const row = await findFile(tx, params.hash);
      return row !== undefined && maySeeFile(who, await findFileUses(tx, row.hash)) ? row : undefined;
    });
    if (file === undefined) throw new ProblemError('not-found', 'There is no such file, or you may not see it.');
    await sendFile(parts, who.workshop, file, query.size, req, res);
    return {};
  });
}
