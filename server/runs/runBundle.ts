/** All that a device needs to lead a run, with or without the network. */
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import type { RunBundle } from '@/shared/contract/runs';

import { findEntries } from '../entries/queries';
import { startOf } from '../entries/runState';
import { findInstruments } from '../instruments/queries';
import { instrumentToWire } from '../instruments/toWire';
import type { Parts } from '../parts';
import { findPeople } from '../people/queries';
import { ProblemError } from '../problems';
import { getRunDocuments } from '../program/runDocuments';
import { findRunSummaries } from './queries';
import { runSummaryToWire } from './toWire';

/** Reads it all in the caller's transaction. Throws `not-found` once the record has been purged. */
export async function getRunBundle(tx: Tx, parts: Parts, run: RunRow): Promise<RunBundle> {
  const summary = runSummaryToWire(await findRunSummaries(tx).where('runs.id', '=', run.id).executeTakeFirstOrThrow());
  const entries = await findEntries(tx, run.id);
  const first = entries[0];
  if (first === undefined) throw new ProblemError('not-found', 'The time for which this record is kept is over.');
  return {
    run: summary,
    pins: { treeHash: run.tree_hash, profileHash: run.profile_hash, profileRevision: run.profile_revision, settingsHash: run.settings_hash, engine: run.engine },
    start: startOf(first),
    ...(await getRunDocuments(tx, run)),
    instruments: (await findInstruments(tx)).map((row) => instrumentToWire(row, parts.clock())),
    people: await findPeople(tx),
    entries,
    head: summary.head,
  };
}
