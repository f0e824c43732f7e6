/** Queries of entries, heads and snapshots. */
import type { Tx } from '@/db/createDb';
import type { EntryRow, InsertableEntryRow, RunHeadRow, UpdateableRunHeadRow } from '@/db/tables';
import type { Json } from '@/shared/record/canonical';
import type { EntryKind, RecordEntry } from '@/shared/record/recordEntry';

export const ENTRY_ID_KEY = 'entries_id';

/** Locks the run's head until the transaction ends: one writer at a time for each record. */
export function lockHead(tx: Tx, run: string): Promise<RunHeadRow> {
  return tx.selectFrom('run_heads').selectAll().where('run', '=', run).forUpdate().executeTakeFirstOrThrow();
}

/** The run's head without a lock. Throws when there is none. */
export function getHead(tx: Tx, run: string): Promise<RunHeadRow> {
  return tx.selectFrom('run_heads').selectAll().where('run', '=', run).executeTakeFirstOrThrow();
}

/** Moves the head; only behind `lockHead`. */
export async function setHead(tx: Tx, run: string, set: UpdateableRunHeadRow): Promise<void> {
  await tx.updateTable('run_heads').set(set).where('run', '=', run).execute();
}

/** Entries of a run in their order, after the place `after`. */
export async function findEntries(tx: Tx, run: string, after = 0): Promise<RecordEntry[]> {
  const rows = await tx.selectFrom('entries').selectAll().where('run', '=', run).where('seq', '>', after).orderBy('seq').execute();
  return rows.map(entryOf);
}

/** Entries of a run that have one of these ids, in their order. */
export async function findEntriesById(tx: Tx, run: string, ids: readonly string[]): Promise<RecordEntry[]> {
  const rows = await tx.selectFrom('entries').selectAll().where('run', '=', run).where('id', 'in', ids).orderBy('seq').execute();
  return rows.map(entryOf);
}

/** Stores sealed entries. A place or an id that is taken is a unique violation. */
export async function insertEntries(tx: Tx, workshop: string, entries: readonly RecordEntry[]): Promise<void> {
  if (entries.length > 0) await tx.insertInto('entries').values(entries.map((entry) => rowOf(workshop, entry))).execute();
}

function entryOf(row: EntryRow): RecordEntry {
  return {
    id: row.id,
    run: row.run,
    seq: row.seq,
    at: row.at.toISOString(),
    monotonic: row.monotonic,
    actor: row.actor,
    kind: row.kind as EntryKind,
    body: row.body as Record<string, Json>,
    receivedAt: row.received_at.toISOString(),
    prev: row.prev,
    hash: row.hash,
  };
}

function rowOf(workshop: string, entry: RecordEntry): InsertableEntryRow {
  const { id, run, seq, at, monotonic, actor, kind, prev, hash } = entry;
  return { id, workshop, run, seq, at, monotonic, received_at: entry.receivedAt, actor, kind, body: JSON.stringify(entry.body), prev, hash };
}
