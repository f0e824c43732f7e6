/** The real application on a port of its own, over a real database, with a clock that a test moves. */
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';

import { pino } from 'pino';
import { Client } from 'pg';
import { inject } from 'vitest';

import { createDb } from '@/db/createDb';
import { createObjectStore } from '@/server/adapters/objectStore';
import { readConfig } from '@/server/config';
import type { Config } from '@/server/config';
import { createApp } from '@/server/createApp';
import type { Parts } from '@/server/parts';
import { createProgramCache } from '@/server/program/programCache';

import { freshDatabase } from './database';
import type { FreshDatabase } from './database';
import { password, START } from './factory';
import type { TestPerson } from './factory';
import { HttpClient } from './HttpClient';

export interface TestServer {
  url: string;
  database: FreshDatabase;
  parts: Parts;
  /** epoch milliseconds; the server sees what a test writes here */
  time: { now: number };
  /** a client without a session */
  stranger(): HttpClient;
  /** a client that has signed in */
  as(person: TestPerson): Promise<HttpClient>;
  /** rows of every table, read past row security */
  rows(): Promise<Record<string, number>>;
  /** one query past row security */
  query<Row>(text: string, values?: unknown[]): Promise<Row[]>;
  stop(): Promise<void>;
}

/** Opens it on a fresh database. */
export async function openServer(change: Partial<Config> = {}): Promise<TestServer> {
  const database = await freshDatabase();
  const time = { now: START };
  const config: Config = { ...readConfig({ NODE_ENV: 'test', DATABASE_URL: database.serverUrl, BCRYPT_COST: '4', SIGN_IN_TRIES: '1000', LOG_LEVEL: 'silent' }), ...change };
  const db = createDb(database.serverUrl);
  const parts: Parts = { db, config, clock: () => time.now, log: pino({ level: 'silent' }), programs: createProgramCache(), objects: createObjectStore(config) };
  const server = createServer(createApp(parts));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const url = `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`;
  const admin = new Client({ connectionString: inject('clusterAdminUrl').replace(/\/postgres$/, `/${database.name}`) });
  await admin.connect();
  const query = async <Row>(text: string, values: unknown[] = []) => (await admin.query(text, values)).rows as Row[];
  return {
    url, database, parts, time, query,
    stranger: () => new HttpClient(url),
    as: async (person) => {
      const client = new HttpClient(url);
      const { status } = await client.post('/api/session', { mail: person.mail, password });
      if (status !== 201) throw new Error(`${person.mail} could not sign in: ${String(status)}`);
      return client;
    },
    rows: async () => {
      const tables = await query<{ name: string }>(`select relname as name from pg_class where relkind = 'r' and relnamespace = 'public'::regnamespace order by relname`);
      const counts = await query<Record<string, string>>(`select ${tables.map(({ name }) => `(select count(*) from ${name}) as ${name}`).join(', ')}`);
      return Object.fromEntries(Object.entries(counts[0] ?? {}).map(([name, n]) => [name, Number(n)]));
    },
    stop: async () => {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      await admin.end();
      parts.objects.close();
      await db.destroy();
      await database.drop();
    },
  };
}
