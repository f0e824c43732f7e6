/** Records and their review. */
import type { Router } from 'express';

import { inWorkshop } from '@/db/createDb';
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import { routes } from '@/shared/contract/routes';

import { bindRoute } from '../http/bindRoute';
import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { getRunFor, wantRestorer } from '../runs/access';
import { findRunSummaries } from '../runs/queries';
import { getRunBundle } from '../runs/runBundle';
import { runSummaryToWire } from '../runs/toWire';
import type { SignedIn } from '../session/access';
import type { ConfirmPassword } from '../session/confirmPassword';
import { maySeeRecord, rightsOn, wantReviewer } from './access';
import { exportRecord } from './exportRecord';
import { findingsOf } from './findingsOf';
import { acceptRecord, addFinding, replyToReview, returnRecord, submitRecord } from './service';

/** Adds the routes of records and their review. */
export function addRecordRoutes(router: Router, parts: Parts, confirm: ConfirmPassword): void {
  bindRoute(router, parts, routes.records, ({ who, query }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      const rows = await findRunSummaries(tx)
        .where('runs.state', query.state === undefined ? '!=' : '=', query.state ?? 'open')
        .limit(1000)
        .execute();
      return { records: rows.filter((row) => maySeeRecord(who, row)).map(runSummaryToWire) };
    }),
  );
  bindRoute(router, parts, routes.record, ({ who, params }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      const run = await getRecordFor(tx, who, params.record);
      const bundle = await getRunBundle(tx, parts, run);
      return { ...bundle, findings: findingsOf(bundle.entries), may: rightsOn(who, run, bundle.entries) };
    }),
  );
  bindRoute(router, parts, routes.exportRecord, ({ who, params }) => inWorkshop(parts.db, who.workshop, async (tx) => exportRecord(tx, parts, await getRecordFor(tx, who, params.record))));

  bindRoute(router, parts, routes.submit, ({ who, params, body }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      wantRestorer(who, await getRunFor(tx, params.run));
      return submitRecord(tx, parts.clock(), who, params.run, body);
    }),
  );
  bindRoute(router, parts, routes.reply, ({ who, params, body }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      wantRestorer(who, await getRecordFor(tx, who, params.record));
      return replyToReview(tx, parts.clock(), who, params.record, body);
    }),
  );
  bindRoute(router, parts, routes.addFinding, ({ who, params, body }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      wantReviewer(who, await getRecordFor(tx, who, params.record));
      return addFinding(tx, parts.clock(), who, params.record, body);
    }),
  );
  bindRoute(router, parts, routes.returnRecord, ({ who, params, body }) =>
    inWorkshop(parts.db, who.workshop, async (tx) => {
      wantReviewer(who, await getRecordFor(tx, who, params.record));
      return returnRecord(tx, parts.clock(), who, params.record, body);
    }),
  );
  bindRoute(router, parts, routes.accept, async ({ who, params, body }) => {
    await inWorkshop(parts.db, who.workshop, async (tx) => wantReviewer(who, await getRecordFor(tx, who, params.record)));
    await confirm(who.person, body.password);
    return inWorkshop(parts.db, who.workshop, (tx) => acceptRecord(tx, parts.clock(), who, params.record, body));
  });
}

/** The record, or `not-found`, also for one that this person may not read or that is not closed yet. */
async function getRecordFor(tx: Tx, who: SignedIn, id: string): Promise<RunRow> {
  const run = await getRunFor(tx, id);
  if (!maySeeRecord(who, run)) throw new ProblemError('not-found', 'There is no such record, or you may not read it.');
  if (run.state === 'open') throw new ProblemError('not-found', 'This run is still open. Its record can be read once it is closed.');
  return run;
}
