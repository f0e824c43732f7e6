import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { freshDatabase, type FreshDatabase } from '@/tests/setup/database';

describe('the login roles of a cluster', () => {
  let database: FreshDatabase;
  let owner: Client;

  beforeAll(async () => {
    database = await freshDatabase();
    owner = new Client({ connectionString: database.ownerUrl });
    await owner.connect();
  });

  afterAll(async () => {
    await owner.end();
    await database.drop();
  });

  it('are no superusers, bypass no row security, make no roles and no databases', async () => {
    const { rows } = await owner.query(
      `SELECT rolname, rolsuper, rolbypassrls, rolcreaterole, rolcreatedb, rolreplication, rolcanlogin
         FROM pg_roles WHERE rolname LIKE 'lampstep\\_%' AND rolname <> 'lampstep_admin' ORDER BY rolname`,
    );
    const nothing = { rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false, rolreplication: false };
    expect(rows).toEqual(
      ['lampstep_keeper', 'lampstep_owner', 'lampstep_server'].map((rolname) => ({ rolname, ...nothing, rolcanlogin: true })),
    );
  });

  it('leave the database to the owner alone', async () => {
    const { rows } = await owner.query('SELECT pg_get_userbyid(datdba) AS owner FROM pg_database WHERE datname = current_database()');
    expect(rows).toEqual([{ owner: 'lampstep_owner' }]);
    const server = new Client({ connectionString: database.serverUrl });
    await server.connect();
    try {
      await expect(server.query('CREATE TABLE public.intruder (id int)')).rejects.toThrow(/permission denied for schema public/);
      await expect(server.query('CREATE SCHEMA intruder')).rejects.toThrow(/permission denied for database/);
    } finally {
      await server.end();
    }
  });

  it('refuse a wrong password', async () => {
    const stranger = new Client({ connectionString: database.serverUrl.replace(/:[^:@]+@/, ':guess@') });
    await expect(stranger.connect()).rejects.toThrow(/password authentication failed/);
  });
});
