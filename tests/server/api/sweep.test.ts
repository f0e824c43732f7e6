/** What the server does by the clock, and what its log does not say. */
import { createDb } from '@/db/createDb';
import { sql } from 'kysely';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';

import { createMailer } from '@/server/adapters/mail';
import { startJobs } from '@/server/adapters/jobs';
import { mailTasks } from '@/server/mail/mailTasks';
import { sessionTasks, SWEEP_SESSIONS, sweepNightly, sweepSessions } from '@/server/session/sweepSessions';
import { makeWorkshop } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

const DAY_MS = 24 * 3_600_000;

describe('ended sessions', () => {
  let server: TestServer;
  let here: TestWorkshop;
  let there: TestWorkshop;
  const now = Date.now();

  beforeAll(async () => {
    server = await openServer();
    [here, there] = [await makeWorkshop(server.database.ownerUrl), await makeWorkshop(server.database.ownerUrl)];
  });
  afterAll(() => server.stop());

  const add = (workshop: TestWorkshop, name: string, expiresDays: number, revokedDays: number | null = null) =>
    server.query(
      `insert into sessions (id, workshop, person, generation, token_hash, rotated_at, created_at, expires_at, revoked_at, revoked_why) values (gen_random_uuid(), $1, $2, 1, $3, now(), now(), $4, $5, $6)`,
      [workshop.id, workshop.restorer.id, name, new Date(now + expiresDays * DAY_MS), revokedDays === null ? null : new Date(now + revokedDays * DAY_MS), revokedDays === null ? null : 'signed out'],
    );
  const left = async () => (await server.query<{ token_hash: string }>('select token_hash from sessions order by token_hash')).map(({ token_hash }) => token_hash);
  const fill = async () => {
    await server.query('delete from sessions');
    await add(here, 'in force', 10);
    await add(here, 'ran out lately', -20);
    await add(here, 'ran out long ago', -31);
    await add(here, 'ended lately', 10, -2);
    await add(there, 'ended long ago', 10, -31);
    await add(there, 'in force there', 10);
  };
  const stay = ['ended lately', 'in force', 'in force there', 'ran out lately'];

  it('go thirty days after their end, in every workshop; the others stay', async () => {
    await fill();
    expect(await sweepSessions(server.parts.db, now)).toBe(2);
    expect(await left()).toEqual(stay);
    expect(await sweepSessions(server.parts.db, now)).toBe(0);
  });

  it('stay when somebody asks with a time to come: nothing that counts can be swept', async () => {
    await fill();
    await sweepSessions(server.parts.db, now + 3650 * DAY_MS);
    expect(await left()).toEqual(expect.arrayContaining(['in force', 'in force there']));
  });

  it('are beyond the reach of the server’s role by hand', async () => {
    await expect(sql`delete from sessions`.execute(server.parts.db)).rejects.toThrow(/permission denied/);
  });

  it('are swept by the job queue, which knows the nightly time', async () => {
    await fill();
    const lines: string[] = [];
    const log = pino({ level: 'debug' }, { write: (line: string) => lines.push(line) });
    const tasks = { ...mailTasks({ db: server.parts.db, mailer: createMailer(server.parts.config, log), publicUrl: '' }), ...sessionTasks({ db: server.parts.db, clock: () => now }) };
    const jobs = await startJobs(server.database.serverUrl, tasks, log, [sweepNightly]);
    try {
      await vi.waitFor(async () => expect(await server.query('select identifier from graphile_worker._private_known_crontabs')).toEqual([{ identifier: SWEEP_SESSIONS }]), { timeout: 10_000 });
      await sql`select graphile_worker.add_job(${SWEEP_SESSIONS})`.execute(server.parts.db);
      await vi.waitFor(async () => expect(await left()).toEqual(stay), { timeout: 15_000 });
    } finally {
      await jobs.stop();
    }
  });

});

describe('the log of a connection that broke', () => {
  it('says what happened and nothing of the client, its address or its password', async () => {
    const server = await openServer();
    const lines: string[] = [];
    const log = pino({}, { write: (line: string) => lines.push(line) });
    const secret = decodeURIComponent(new URL(server.database.serverUrl).password);
    expect(secret.length).toBeGreaterThan(5);
    const db = createDb(server.database.serverUrl, { connections: 1, onBroken: (error) => log.warn({ err: error }, 'a database connection broke') });
    try {
      const { rows } = await sql<{ pid: number }>`select pg_backend_pid() as pid`.execute(db);
      await server.query('select pg_terminate_backend($1)', [rows[0]?.pid]);
      await vi.waitFor(() => expect(lines.length).toBeGreaterThan(0), { timeout: 10_000 });
    } finally {
      await db.destroy();
      await server.stop();
    }
    const text = lines.join('\n');
    expect(text).toContain('a database connection broke');
    for (const part of [secret, 'connectionParameters', '"client"', 'processID']) expect(text).not.toContain(part);
  });
});
