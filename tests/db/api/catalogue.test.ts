/** What PostgreSQL itself says of roles, rights and walls. */
import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { freshDatabase } from '@/tests/setup/database';
import type { FreshDatabase } from '@/tests/setup/database';

describe('the catalogue of the database', () => {
  let database: FreshDatabase;
  let owner: Client;
  const rows = async <Row>(text: string, values: unknown[] = []) => (await owner.query(text, values)).rows as Row[];

  beforeAll(async () => {
    database = await freshDatabase();
    owner = new Client({ connectionString: database.ownerUrl });
    await owner.connect();
  });
  afterAll(async () => {
    await owner.end();
    await database.drop();
  });

  it('knows three roles of which none is a superuser or passes row security', async () => {
    const roles = await rows<{ rolname: string }>(
      `select rolname, rolsuper, rolbypassrls, rolcreaterole, rolcreatedb, rolreplication from pg_roles where rolname in ('lampstep_owner', 'lampstep_server', 'lampstep_keeper') order by rolname`,
    );
    const none = { rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false, rolreplication: false };
    expect(roles).toEqual(['lampstep_keeper', 'lampstep_owner', 'lampstep_server'].map((rolname) => ({ rolname, ...none })));
  });

  it('makes no role a member of another', async () => {
    expect(await rows(`select r.rolname from pg_auth_members m join pg_roles r on r.oid = m.member where r.rolname like 'lampstep\\_%' and r.rolname <> 'lampstep_admin'`)).toEqual([]);
  });

  it('lets the server and the keeper own nothing', async () => {
    const owned = await rows(
      `select c.relname from pg_class c join pg_roles r on r.oid = c.relowner where r.rolname in ('lampstep_server', 'lampstep_keeper')
       union all select p.proname from pg_proc p join pg_roles r on r.oid = p.proowner where r.rolname in ('lampstep_server', 'lampstep_keeper')
       union all select n.nspname from pg_namespace n join pg_roles r on r.oid = n.nspowner where r.rolname in ('lampstep_server', 'lampstep_keeper')`,
    );
    expect(owned).toEqual([]);
  });

  it('gives the server exactly these rights', async () => {
    const granted = await rows<{ table_name: string; rights: string }>(
      `select table_name, string_agg(lower(privilege_type), ' ' order by privilege_type) as rights from information_schema.role_table_grants
       where grantee = 'lampstep_server' and table_schema = 'public' group by table_name order by table_name`,
    );
    expect(Object.fromEntries(granted.map(({ table_name, rights }) => [table_name, rights]))).toEqual({
      credentials: 'select', entries: 'insert select', file_uses: 'insert select', files: 'insert select', instruments: 'select', machine_tags: 'delete insert select', machines: 'select', members: 'select', people: 'select',
      profile_revisions: 'select', release_voids: 'insert select', releases: 'insert select', run_heads: 'insert select update', runs: 'insert select',
      sessions: 'insert select update', settings: 'select', snapshots: 'delete insert select update', tree_versions: 'select', trees: 'select', workshops: 'select',
    });
    const columnsOf = async (table: string) =>
      (await rows<{ column_name: string }>(`select column_name from information_schema.column_privileges where grantee = 'lampstep_server' and table_name = '${table}' and privilege_type = 'UPDATE' order by column_name`)).map(({ column_name }) => column_name);
    expect(await columnsOf('credentials')).toEqual(['changed_at', 'password_hash']);
    expect(await columnsOf('runs')).toEqual(['closed_at', 'ended', 'former', 'restorer', 'restorer_roles', 'state']);
  });

  it('gives the keeper no right on any table, and nobody a right as PUBLIC', async () => {
    expect(await rows(`select table_name from information_schema.role_table_grants where grantee in ('lampstep_keeper', 'PUBLIC') and table_schema = 'public'`)).toEqual([]);
    expect(await rows(`select has_function_privilege('lampstep_keeper', 'purge_records(uuid, timestamptz)', 'execute') as keeper, has_function_privilege('lampstep_server', 'purge_records(uuid, timestamptz)', 'execute') as server`)).toEqual([{ keeper: true, server: false }]);
  });

  it('puts row security on every table that belongs to a workshop, for the owner too', async () => {
    const tables = await rows<{ relname: string; relrowsecurity: boolean; relforcerowsecurity: boolean }>(
      `select c.relname, c.relrowsecurity, c.relforcerowsecurity from pg_class c where c.relkind = 'r' and c.relnamespace = 'public'::regnamespace
         and (c.relname = 'workshops' or exists (select from pg_attribute a where a.attrelid = c.oid and a.attname = 'workshop')) order by c.relname`,
    );
    expect(tables.length).toBeGreaterThan(14);
    for (const table of tables) expect(table).toMatchObject({ relrowsecurity: true, relforcerowsecurity: true });
  });

  it('leaves only these tables without a wall, and the server has no right on them', async () => {
    const open = await rows<{ relname: string }>(`select relname from pg_class where relkind = 'r' and relnamespace = 'public'::regnamespace and not relrowsecurity order by relname`);
    expect(open.map(({ relname }) => relname)).toEqual(['demo_content', 'kysely_migration', 'kysely_migration_lock']);
    for (const { relname } of open) {
      expect(await rows(`select has_table_privilege('lampstep_server', $1, 'select') or has_table_privilege('lampstep_server', $1, 'insert') as any`, [relname])).toEqual([{ any: false }]);
    }
  });

  it('has on each walled table one policy, by the workshop of the transaction', async () => {
    const policies = await rows<{ tablename: string; qual: string; with_check: string | null; permissive: string; cmd: string }>(`select tablename, qual, with_check, permissive, cmd from pg_policies where schemaname = 'public' and policyname <> 'sessions_ended' order by tablename`);
    const special = ['credentials', 'members', 'people', 'workshops'];
    for (const policy of policies.filter(({ tablename }) => !special.includes(tablename))) {
      expect(policy).toMatchObject({ qual: '(workshop = current_workshop())', with_check: '(workshop = current_workshop())', permissive: 'PERMISSIVE', cmd: 'ALL' });
    }
    // one more may only take away
    const permissive = policies.filter((policy) => policy.permissive === 'PERMISSIVE');
    expect(new Set(permissive.map(({ tablename }) => tablename)).size).toBe(permissive.length);
    expect(policies.filter((policy) => policy.permissive !== 'PERMISSIVE').map(({ tablename, cmd, qual, with_check }) => [tablename, cmd, qual, with_check])).toEqual([
      ['credentials', 'UPDATE', '(person = current_person())', '(person = current_person())'],
    ]);
  });

  it('lets the owner alone reach sessions of every workshop, and only ended ones', async () => {
    expect(await rows(`select tablename, roles::text, qual from pg_policies where policyname = 'sessions_ended'`)).toEqual([
      { tablename: 'sessions', roles: '{lampstep_owner}', qual: `(LEAST(expires_at, revoked_at) < (clock_timestamp() - '1 day'::interval))` },
    ]);
  });

  it('lets no function pass for its owner but the purge and the sweeping of ended sessions', async () => {
    const definers = await rows<{ proname: string; proconfig: string[] }>(`select proname, proconfig from pg_proc where pronamespace = 'public'::regnamespace and prosecdef order by proname`);
    expect(definers).toEqual(['purge_records', 'sweep_sessions'].map((proname) => ({ proname, proconfig: ['search_path=public, pg_temp'] })));
    expect(await rows(`select has_function_privilege('lampstep_keeper', 'sweep_sessions(timestamptz)', 'execute') as keeper, has_function_privilege('lampstep_server', 'sweep_sessions(timestamptz)', 'execute') as server`)).toEqual([{ keeper: false, server: true }]);
  });
});
