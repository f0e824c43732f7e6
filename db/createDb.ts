/** Opening the database, and the two ways to work in it: as one workshop, or as one person before a workshop is known. */
import { Kysely, PostgresDialect, sql } from 'kysely';
import type { Transaction } from 'kysely';
import { Pool, types } from 'pg';

import type { Database } from './tables';

const INT8 = 20;
const DATE = 1082;

export type Db = Kysely<Database>;
export type Tx = Transaction<Database>;

// int8 holds epoch milliseconds and counts here, all below 2^53; a date stays the text that it is, without a time zone.
const parsers: Record<number, (text: string) => unknown> = { [INT8]: Number, [DATE]: (text) => text };

/**
 * Opens a pool of connections that survives the loss of any of them: when the database restarts, a query under way fails, and the next
 * one opens a connection anew. Without a listener Node would end the process.
 */
export function createPool(url: string, options: { connections?: number; onBroken?: (error: Error) => void } = {}): Pool {
  const onBroken = (error: Error) => options.onBroken?.(withoutClient(error));
  const pool = new Pool({
    connectionString: url,
    max: options.connections ?? 10,
    connectionTimeoutMillis: 10_000,
    types: { getTypeParser: (oid: number, format?: 'text' | 'binary') => (format !== 'binary' && parsers[oid]) || types.getTypeParser(oid, format as 'text') },
  });
  pool.on('error', onBroken);
  // While it is lent out the pool itself does not listen to it.
  pool.on('connect', (client) => client.on('error', onBroken));
  return pool;
}

/** The driver hangs the whole client, with its password, on the error of a connection that broke; no log is to print that. */
function withoutClient(error: Error): Error {
  Reflect.deleteProperty(error, 'client');
  return error;
}

/** The typed door to the database. `destroy()` closes its connections. */
export function createDb(url: string, options: { connections?: number; onBroken?: (error: Error) => void } = {}): Db {
  return new Kysely<Database>({ dialect: new PostgresDialect({ pool: createPool(url, options) }) });
}

/** Runs `work` in one transaction that sees the rows of one workshop only. */
export function inWorkshop<T>(db: Db, workshop: string, work: (tx: Tx) => Promise<T>): Promise<T> {
  return db.transaction().execute(async (tx) => {
    await sql`select set_config('lampstep.workshop', ${workshop}, true)`.execute(tx);
    return work(tx);
  });
}

/** Runs `work` in one transaction that sees one person, by mail address or by id, and that person's memberships. */
export function asPerson<T>(db: Db, who: { mail: string } | { id: string }, work: (tx: Tx) => Promise<T>): Promise<T> {
  return db.transaction().execute(async (tx) => {
    if ('mail' in who) await sql`select set_config('lampstep.mail', ${who.mail}, true)`.execute(tx);
    else await sql`select set_config('lampstep.person', ${who.id}, true)`.execute(tx);
    return work(tx);
  });
}
