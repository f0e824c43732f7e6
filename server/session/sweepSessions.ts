/** Sessions that ended long ago are swept away, once a night. */
import type { CronItem, TaskList } from 'graphile-worker';
import { sql } from 'kysely';

import type { Db } from '@/db/createDb';

import type { Clock } from '../parts';

export const SWEEP_SESSIONS = 'sweep-sessions';

/** An ended session is kept this long, so that somebody who asks can still be told when and why it ended. */
const KEPT_MS = 30 * 24 * 3_600_000;

/** At 03:17 UTC, when nobody works; a night that was missed is not made up for. */
export const sweepNightly: CronItem = { task: SWEEP_SESSIONS, match: '17 3 * * *', options: { backfillPeriod: 0, maxAttempts: 3 } };

/** The number of sessions that went: those that ran out or were ended more than 30 days ago, of every workshop. */
export async function sweepSessions(db: Db, now: number): Promise<number> {
  const { rows } = await sql<{ gone: number }>`select sweep_sessions(${new Date(now - KEPT_MS)}) as gone`.execute(db);
  return rows[0]?.gone ?? 0;
}

/** The task of the job queue. */
export function sessionTasks({ db, clock }: { db: Db; clock: Clock }): TaskList {
  return {
    [SWEEP_SESSIONS]: async (_payload, { logger }) => {
      logger.info(`${String(await sweepSessions(db, clock()))} ended sessions swept away`);
    },
  };
}
