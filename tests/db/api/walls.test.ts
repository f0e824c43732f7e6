/** Raw SQL as the server's role, the keeper's and the owner's: what each can and cannot do. */
import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { BenchDevice } from '@/tests/setup/BenchDevice';
import { makeWorkshop } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

describe('raw SQL', () => {
  let server: TestServer;
  let here: TestWorkshop;
  let there: TestWorkshop;
  let run: string;
  let raw: Client;
  let keeper: Client;
  let owner: Client;

  beforeAll(async () => {
    server = await openServer();
    [here, there] = [await makeWorkshop(server.database.ownerUrl), await makeWorkshop(server.database.ownerUrl)];
    const device = await BenchDevice.start(await server.as(here.restorer), server, { machine: here.machine }, here.instruments.tester);
    await device.pass().send();
    run = device.run;
    [raw, keeper, owner] = [server.database.serverUrl, server.database.keeperUrl, server.database.ownerUrl].map((connectionString) => new Client({ connectionString })) as [Client, Client, Client];
    await Promise.all([raw.connect(), keeper.connect(), owner.connect()]);
  });
  afterAll(async () => {
    await Promise.all([raw.end(), keeper.end(), owner.end()]);
    await server.stop();
  });

  const inWorkshop = async (client: Client, workshop: string, text: string, values: unknown[] = []) => {
    await client.query('begin');
    try {
      await client.query(`select set_config('lampstep.workshop', $1, true)`, [workshop]);
      return await client.query(text, values);
    } finally {
      await client.query('rollback');
    }
  };

  const walled = ['workshops', 'people', 'members', 'credentials', 'sessions', 'settings', 'machines', 'profile_revisions', 'trees', 'tree_versions', 'instruments', 'runs', 'run_heads', 'entries', 'snapshots', 'releases', 'release_voids', 'machine_tags', 'files', 'file_uses'];

  it.each(walled)('as the server shows no row of %s without a workshop', async (table) => {
    expect((await raw.query(`select * from ${table}`)).rows).toEqual([]);
  });

  it.each(walled.filter((table) => !['workshops', 'people', 'credentials'].includes(table)))('as the server shows no row of %s of the other workshop', async (table) => {
    expect((await inWorkshop(raw, there.id, `select * from ${table} where workshop = $1`, [here.id])).rows).toEqual([]);
  });

  it('as the server shows its own workshop and people, and not the other’s', async () => {
    expect((await inWorkshop(raw, here.id, 'select id from workshops')).rows).toEqual([{ id: here.id }]);
    const { rows } = await inWorkshop(raw, here.id, 'select id from people');
    expect(rows).toHaveLength(7);
    expect(rows.map((row) => (row as { id: string }).id)).not.toContain(there.restorer.id);
    expect((await inWorkshop(raw, here.id, 'select * from credentials')).rows).toEqual([]);
  });

  it('as the server puts no row into the other workshop', async () => {
    const insert = `insert into releases (id, workshop, machine, run, given_by, given_at) values (gen_random_uuid(), $1, $2, $3, $4, now())`;
    await expect(inWorkshop(raw, there.id, insert, [here.id, here.machine, run, here.reviewer.id])).rejects.toThrow(/violates row-level security policy/);
    // The same row dressed up as one of the own workshop finds no such machine and run there.
    await expect(inWorkshop(raw, there.id, insert, [there.id, here.machine, run, there.reviewer.id])).rejects.toThrow(/violates foreign key constraint/);
  });

  it.each([
    ['changes no entry', 'update entries set body = $$ {} $$ where true'],
    ['deletes no entry', 'delete from entries where true'],
    ['empties no table of entries', 'truncate entries'],
    ['changes no release', 'update releases set given_at = now()'],
    ['deletes no release', 'delete from releases'],
    ['takes no void back', 'delete from release_voids'],
    ['moves no pin of a run', `update runs set tree_hash = 'x'`],
    ['deletes no run', 'delete from runs'],
    ['changes no tree', `update tree_versions set document = '{}'`],
    ['makes nobody a senior', `update members set roles = '{senior}'`],
    ['moves no password to another person', `update credentials set person = gen_random_uuid()`],
    ['takes no wall down', 'alter table entries disable row level security'],
    ['takes no trigger off', 'alter table entries disable trigger all'],
    ['makes no function', 'create function public.f() returns int language sql as $$ select 1 $$'],
    ['becomes nobody else', 'set role lampstep_owner'],
    ['purges nothing', `select purge_records(gen_random_uuid(), now())`],
  ])('as the server %s', async (_, text) => {
    await expect(inWorkshop(raw, here.id, text)).rejects.toThrow(/permission denied|must be owner/);
  });

  it('as the server changes the password of the person in whose name it works, and of nobody by their mail address', async () => {
    const changed = async (setting: 'person' | 'mail' | null, value: string) => {
      await raw.query('begin');
      try {
        if (setting !== null) await raw.query(`select set_config('lampstep.${setting}', $1, true)`, [value]);
        return (await raw.query<{ person: string }>(`update credentials set password_hash = 'x' returning person`)).rows.map(({ person }) => person);
      } finally {
        await raw.query('rollback');
      }
    };
    expect(await changed('person', here.senior.id)).toEqual([here.senior.id]);
    expect(await changed('mail', here.senior.mail)).toEqual([]);
    expect(await changed(null, '')).toEqual([]);
  });

  it('changes no entry even as the owner', async () => {
    await expect(inWorkshop(owner, here.id, `update entries set kind = 'answer'`)).rejects.toThrow('rows of entries are never changed');
    await expect(inWorkshop(owner, here.id, `update tree_versions set document = '{}'`)).rejects.toThrow(/has left the draft and is never changed/);
  });

  it('as the keeper reads and deletes nothing by hand', async () => {
    for (const text of ['select * from entries', 'delete from entries', 'select * from people', 'update runs set purged_at = now()']) await expect(inWorkshop(keeper, here.id, text)).rejects.toThrow(/permission denied/);
  });

  it('as the keeper purges whole accepted records whose time is over, and nothing else', async () => {
    const device = await BenchDevice.start(await server.as(there.restorer), server, { machine: there.machine }, there.instruments.tester);
    await device.pass().do({ type: 'STOP' }).dead().do({ type: 'CLOSE' }).do({ type: 'CLOSE' }).send();
    const purge = async (workshop: string) => (await keeper.query<{ gone: number }>('select purge_records($1, now()) as gone', [workshop])).rows[0]?.gone;
    const left = async () => Number((await server.query<{ n: string }>('select count(*) as n from entries where run = $1', [device.run]))[0]?.n);
    const before = await left();
    await server.query(`update runs set closed_at = now() - interval '11 years' where id = $1`, [device.run]);
    expect([await purge(there.id), await left()]).toEqual([0, before]);
    await server.query(`update runs set state = 'accepted', closed_at = now() - interval '9 years' where id = $1`, [device.run]);
    expect([await purge(there.id), await left()]).toEqual([0, before]);
    // A clock set forward by the caller does not shorten the time.
    expect((await keeper.query<{ gone: number }>(`select purge_records($1, now() + interval '50 years') as gone`, [there.id])).rows[0]?.gone).toBe(0);
    await server.query(`update runs set closed_at = now() - interval '11 years' where id = $1`, [device.run]);
    expect(await purge(here.id)).toBe(0);
    expect([await purge(there.id), await left()]).toEqual([1, 0]);
    expect(await purge(there.id)).toBe(0);
    const reviewer = await server.as(there.reviewer);
    const { status, body } = await reviewer.get(`/api/records/${device.run}`);
    expect([status, body['say']]).toEqual([404, 'The time for which this record is kept is over.']);
    expect((await reviewer.get('/api/records')).status).toBe(200);
  });

  it('tries the attack by text, and the table is still there', async () => {
    const attack = `x'; drop table entries; --`;
    const stranger = server.stranger();
    await stranger.post('/api/session', { mail: `a@example.org`, password: attack });
    await stranger.post('/api/session', { mail: `${attack}@example.org`, password: attack });
    await (await server.as(here.reviewer)).post(`/api/records/${run}/findings`, { id: crypto.randomUUID(), entry: attack, grade: 'note', text: attack });
    expect(Number((await server.query<{ n: string }>('select count(*) as n from entries'))[0]?.n)).toBeGreaterThan(0);
  });
});
