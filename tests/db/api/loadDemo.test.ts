import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { demoContent } from '@/db/seeds/demo/content';
import { DEMO_PASSWORD, demoPeople, demoWorkshops } from '@/db/seeds/demoPeople';
import { loadDemoContent } from '@/db/seeds/loadDemoContent';
import { loadDemo } from '@/db/seeds/loadDemo';
import { instrumentsSchema } from '@/shared/contract/instruments';
import { recordSchema, recordsSchema } from '@/shared/contract/records';
import { verifyChain } from '@/shared/record/chain';
import { addMachine, makeWorkshop } from '@/tests/setup/factory';
import { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

describe('loadDemo', () => {
  let server: TestServer;
  const ownerUrl = () => server.database.ownerUrl;

  beforeAll(async () => {
    server = await openServer();
    server.time.now = Date.now();
    expect(await loadDemo({ ownerUrl: ownerUrl() })).toBe('loaded');
  }, 120_000);
  afterAll(() => server.stop());

  const signIn = async (mail: string) => {
    const client = new HttpClient(server.url);
    expect((await client.post('/api/session', { mail, password: DEMO_PASSWORD })).status, mail).toBe(201);
    return client;
  };

  it('makes the accounts that are printed at the start', async () => {
    const printed = Object.values(demoPeople).filter((person) => person.account);
    const wanted = ['restorer', 'restorer2', 'senior', 'senior2', 'senior3', 'reviewer', 'keeper', 'other'];
    expect(printed.map(({ mail }) => mail)).toEqual(wanted.map((name) => `${name}@example.org`));
    for (const { mail } of printed) await signIn(mail);
  });

  it('writes records whose chains hold and whose signatures can be checked', async () => {
    const reviewer = await signIn('reviewer@example.org');
    const { records } = recordsSchema.parse((await reviewer.get('/api/records')).body);
    expect(records.length).toBeGreaterThan(0);
    for (const { id } of records) {
      const { entries, head } = recordSchema.parse((await reviewer.get(`/api/records/${id}`)).body);
      expect(verifyChain(entries, { head: head.hash, count: head.seq })).toMatchObject({ ok: true });
      expect((await reviewer.get(`/api/records/${id}/export`)).status).toBe(200);
    }
  });

  it('shows every state that a run can be in, one of the open ones waiting for a senior', async () => {
    const runs = await server.query<{ state: string; ended: string | null; waits: boolean; hours: number; since: number }>(
      `select state, ended, hold_entry is not null as waits, extract(epoch from heard_at - started_at)::float / 3600 as hours, ($2 - extract(epoch from heard_at) * 1000)::float / 3600000 as since
         from runs join run_heads on run_heads.run = runs.id where runs.workshop = $1 order by started_at`,
      [demoWorkshops.first.id, server.time.now],
    );
    const count = (state: string) => runs.filter((run) => run.state === state).length;
    expect({ open: count('open'), closed: count('closed'), submitted: count('submitted'), returned: count('returned'), accepted: count('accepted') }).toEqual({ open: 2, closed: 1, submitted: 2, returned: 1, accepted: 3 });
    expect(runs.filter(({ state }) => state === 'closed').map(({ ended }) => ended)).toEqual(['stopped']);
    expect(runs.filter(({ state }) => state === 'open').map(({ waits }) => waits).sort()).toEqual([false, true]);
    expect(await server.query('select release_voids.release from releases left join release_voids on release_voids.release = releases.id where releases.workshop = $1 order by release nulls last', [demoWorkshops.first.id])).toMatchObject([{ release: expect.any(String) as string }, { release: null }]);
  });

  it('has six instruments, of which one is out of date', async () => {
    const { instruments } = instrumentsSchema.parse((await (await signIn('restorer@example.org')).get('/api/instruments')).body);
    expect(instruments.map(({ outOfDate }) => outOfDate)).toEqual([false, false, false, false, false, true]);
  });

  it('leaves no letter behind', async () => {
    expect(await server.query('select 1 from graphile_worker._private_jobs')).toEqual([]);
  });

  it('keeps what is there when the content is the same, also when two start at the same moment', async () => {
    const before = await server.query('select max(received_at) as last, count(*) as n from entries');
    expect(await Promise.all([loadDemo({ ownerUrl: ownerUrl() }), loadDemo({ ownerUrl: ownerUrl() })])).toEqual(['kept', 'kept']);
    expect(await server.query('select max(received_at) as last, count(*) as n from entries')).toEqual(before);
  });

  it('makes the demo anew when its content has changed, and touches no other workshop', async () => {
    const own = await makeWorkshop(ownerUrl());
    const small = { ...demoContent, machines: demoContent.machines.slice(0, 1), runs: [] };
    const wish = { ownerUrl: ownerUrl(), now: Date.now(), bcryptCost: 4 };
    expect(await loadDemoContent({ ...wish, content: small })).toBe('rebuilt');
    expect(await server.query('select 1 from machines where workshop = $1', [demoWorkshops.first.id])).toHaveLength(1);
    expect(await server.query('select 1 from members where workshop = $1', [own.id])).toHaveLength(7);
    await addMachine(ownerUrl(), own);
  });

  it('begins anew after a start that was killed half-way', async () => {
    await server.query(`delete from demo_content where name = 'workshops'`);
    const small = { ...demoContent, machines: demoContent.machines.slice(0, 1), runs: [] };
    expect(await loadDemoContent({ ownerUrl: ownerUrl(), now: Date.now(), bcryptCost: 4, content: small })).toBe('loaded');
  });

  it('names the run whose script does not fit its tree', async () => {
    const [run] = demoContent.runs;
    if (run === undefined) throw new Error('the demo has no run');
    const runs = [{ ...run, key: 'broken', moves: [{ to: 'nowhere' }] }];
    await expect(loadDemoContent({ ownerUrl: ownerUrl(), now: Date.now(), bcryptCost: 4, content: { ...demoContent, runs } })).rejects.toThrow(/^demo run “broken”: /);
  });

  it('has invented people at example.org only', () => {
    for (const { mail } of Object.values(demoPeople)) expect(mail).toMatch(/^[a-z0-9.]+@example\.org$/);
  });
});
