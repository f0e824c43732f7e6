import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';

import { sql } from 'kysely';
import { Client } from 'pg';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';

import { createDb } from '@/db/createDb';
import { migrateDown, migrateToLatest, migrations } from '@/db/migrate';
import { databaseName } from '@/server/cli/cluster';
import { openThrowAwayCluster } from '@/server/cli/throwAwayCluster';
import { freshDatabase } from '@/tests/setup/database';
import type { FreshDatabase } from '@/tests/setup/database';

/** SHA-256 of each migration file, spaces at the ends of lines left out. A migration that has gone out is never edited: write a new one. */
const FROZEN: Record<string, string> = {
  '20260301T090000-first-run': 'a932c21ede8d544d80da54d6f55cde481f8c9165be487507335805e38ff233b5',
  '20260301T093000-job-queue': '47e662b96a5f664dbd28a26ef86de88ac188d0a722f828e8eb957149427ed55c',
  '20260302T090000-hand-over': '97083a44d52f8beeed4cbca9696b7e1a2ef6ceaf565b7f7eb55b5fb5b21cbac7',
  '20261201T100000-files': '66fdea06ecb1cdd33101bc01dc2f5a497c44a7933e102fba472d6e932a2fc2f0',
  '20261201T110000-own-account': '33af3b496d134edd09ee42b0479f48b3bdd07004ec06d38c159222672f3a0f9c',
};

describe('migrations', () => {
  let database: FreshDatabase;
  beforeEach(async () => {
    database = await freshDatabase({ migrated: false });
  });
  afterEach(() => database.drop());

  const shape = async () => {
    const client = new Client({ connectionString: database.ownerUrl });
    await client.connect();
    try {
      const { rows } = await client.query<{ line: string }>(
        `select table_schema || '.' || table_name || '.' || column_name || ' ' || data_type || ' ' || is_nullable as line from information_schema.columns
         where table_schema in ('public', 'graphile_worker') and table_name not like 'kysely%' order by 1`,
      );
      const policies = await client.query<{ line: string }>(`select tablename || ' ' || policyname || ' ' || coalesce(qual, '') as line from pg_policies order by 1`);
      return [...rows, ...policies.rows].map(({ line }) => line);
    } finally {
      await client.end();
    }
  };

  it('go up, down to nothing and up to the same again', async () => {
    await migrateToLatest(database.ownerUrl);
    const first = await shape();
    expect(first.filter((line) => line.startsWith('public.entries.')).length).toBe(12);
    await migrateDown(database.ownerUrl);
    expect((await shape()).filter((line) => line.startsWith('public.'))).toEqual([]);
    await migrateToLatest(database.ownerUrl);
    expect(await shape()).toEqual(first);
  });

  it('do nothing the second time', async () => {
    await migrateToLatest(database.ownerUrl);
    const first = await shape();
    await migrateToLatest(database.ownerUrl);
    expect(await shape()).toEqual(first);
  });

  it('can be started by two at the same moment', async () => {
    await migrateToLatest(database.ownerUrl);
    await Promise.all([migrateToLatest(database.ownerUrl), migrateToLatest(database.ownerUrl)]);
  });

  it('are refused to the server’s role', async () => {
    await expect(migrateToLatest(database.serverUrl)).rejects.toThrow(/permission denied/);
  });

  it('say which role is missing and how it is made', async () => {
    // A cluster of its own: roles belong to all databases of one.
    const cluster = await openThrowAwayCluster({ durable: false });
    const admin = new Client({ connectionString: cluster.adminUrl });
    try {
      await admin.connect();
      await admin.query(`revoke all on database "${databaseName}" from lampstep_keeper`);
      await admin.query('drop role lampstep_keeper');
      await expect(migrateToLatest(cluster.ownerUrl)).rejects.toThrow(
        'The database has no role lampstep_keeper. Someone who may create roles makes it with: CREATE ROLE lampstep_keeper LOGIN NOSUPERUSER NOBYPASSRLS PASSWORD',
      );
    } finally {
      await admin.end();
      await cluster.stop();
    }
  });

  it('are each under a name that starts with its time, in order, and are not edited after they went out', () => {
    const names = Object.keys(migrations);
    expect(names).toEqual([...names].sort());
    for (const name of names) expect(name).toMatch(/^\d{8}T\d{6}-[a-z-]+$/);
    const hashes = Object.fromEntries(
      names.map((name) => {
        const text = readFileSync(new URL(`../../../db/migrations/${name}.ts`, import.meta.url), 'utf8').replace(/[ \t]+$/gm, '');
        return [name, createHash('sha256').update(text).digest('hex')];
      }),
    );
    expect(hashes).toEqual(FROZEN);
  });
});

describe('the driver', () => {
  it('gives back whole numbers as numbers, dates as text, times as Date and JSON as it was', async () => {
    const database = await freshDatabase({ migrated: false });
    const db = createDb(database.serverUrl, { connections: 1 });
    try {
      const { rows } = await sql<Record<string, unknown>>`select 9007199254740991::int8 as big, date '2026-01-05' as day, timestamptz '2026-01-05 08:00:00.123+01' as time, '{"b":1,"a":4.97}'::jsonb as sorted, '{"b":1,"a":4.97}'::json as kept, 1.5::float8 as half, 2.50::numeric as exact`.execute(db);
      expect(rows[0]).toEqual({ big: 9007199254740991, day: '2026-01-05', time: new Date('2026-01-05T07:00:00.123Z'), sorted: { a: 4.97, b: 1 }, kept: { b: 1, a: 4.97 }, half: 1.5, exact: '2.50' });
      expect(Object.keys(rows[0]?.['kept'] as object)).toEqual(['b', 'a']);
    } finally {
      await db.destroy();
      await database.drop();
    }
  });
});
