/** The job queue in PostgreSQL: a job is stored in the same transaction as what it is about, and done once that is committed. */
import { Logger as QueueLogger, parseCronItems, run } from 'graphile-worker';
import type { CronItem, TaskList } from 'graphile-worker';
import { sql } from 'kysely';
import type { Logger } from 'pino';

import { createPool } from '@/db/createDb';
import type { Tx } from '@/db/createDb';

/** Stores a job in the caller's transaction. The same `key` twice is one job. */
export async function addJob(tx: Tx, task: string, payload: object, key: string): Promise<void> {
  await sql`select graphile_worker.add_job(${task}, payload => ${JSON.stringify(payload)}::json, job_key => ${key}, max_attempts => 12)`.execute(tx);
}

/**
 * Starts working on jobs; failed ones are tried again, later each time.
 * @param regular what is done by the clock, once for all servers of the database
 */
export async function startJobs(databaseUrl: string, taskList: TaskList, log: Logger, regular: readonly CronItem[] = []): Promise<{ stop: () => Promise<void> }> {
  const levels = { error: 'error', warning: 'warn', info: 'debug', debug: 'trace' } as const;
  // A pool of our own: stopping waits until its last connection is closed, so that the database can go down right after.
  const pgPool = createPool(databaseUrl, { connections: 3, onBroken: (error) => log.warn({ err: error }, 'a connection of the job queue broke') });
  const runner = await run({
    pgPool,
    taskList,
    concurrency: 2,
    pollInterval: 2_000,
    noHandleSignals: true,
    parsedCronItems: parseCronItems([...regular]),
    logger: new QueueLogger(() => (level, message) => log[levels[level]](message)),
  });
  return {
    stop: async () => {
      await runner.stop();
      await pgPool.end();
    },
  };
}
