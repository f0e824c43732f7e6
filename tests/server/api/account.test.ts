/** The own account: sessions that can be told apart and ended, and a change of password that leaves nobody else signed in. */
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { newPasswordSchema, PASSWORD_MOST_BYTES } from '@/shared/contract/account';
import type { OwnSession } from '@/shared/contract/account';
import { makeWorkshop, password } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import type { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

const STRONG = 'kettle plank ruby fog';

describe('the own account', () => {
  let server: TestServer;
  let here: TestWorkshop;

  beforeAll(async () => {
    server = await openServer({ signInTries: 5 });
  });
  afterAll(() => server.stop());
  beforeEach(async () => {
    here = await makeWorkshop(server.database.ownerUrl);
  });

  const sessionsOf = async (client: HttpClient) => (await client.get('/api/sessions')).body['sessions'] as OwnSession[];

  it('shows own sessions alone, with their device and which is this one', async () => {
    const phone = server.stranger();
    await phone.post('/api/session', { mail: here.restorer.mail, password }, { headers: { 'user-agent': 'Phone\u00e9 1.0' } });
    const desk = await server.as(here.restorer);
    await server.as(here.senior);
    const seen = await sessionsOf(desk);
    expect(seen).toHaveLength(2);
    expect(seen.filter((session) => session.current)).toHaveLength(1);
    expect(seen.find((session) => !session.current)?.device).toMatch(/^Phone/);
  });

  it('ends one of them at once, and none of another person', async () => {
    const [phone, desk, senior] = [await server.as(here.restorer), await server.as(here.restorer), await server.as(here.senior)];
    const other = (await sessionsOf(desk)).find((session) => !session.current);
    const refusedTo = await senior.delete(`/api/sessions/${other?.id ?? ''}`);
    expect([refusedTo.status, refusedTo.body['code']]).toEqual([404, 'not-found']);
    expect((await phone.get('/api/me')).status).toBe(200);
    expect((await desk.delete(`/api/sessions/${other?.id ?? ''}`)).status).toBe(200);
    expect((await phone.get('/api/me')).status).toBe(401);
    expect((await phone.post('/api/session/refresh')).status).toBe(401);
    expect((await desk.delete(`/api/sessions/${other?.id ?? ''}`)).status).toBe(404);
    expect(await sessionsOf(desk)).toHaveLength(1);
  });

  it('takes a new password, after which only this session and the new password count, and a letter says so', async () => {
    const [phone, desk] = [await server.as(here.restorer), await server.as(here.restorer)];
    expect((await desk.post('/api/password', { password, next: STRONG })).status).toBe(201);
    expect((await desk.get('/api/me')).status).toBe(200);
    expect((await phone.get('/api/me')).status).toBe(401);
    const tryWith = async (words: string) => (await server.stranger().post('/api/session', { mail: here.restorer.mail, password: words })).status;
    expect([await tryWith(password), await tryWith(STRONG)]).toEqual([401, 201]);
    const jobs = await server.query<{ payload: { person: string } }>(`select payload from graphile_worker._private_jobs j join graphile_worker._private_tasks t on t.id = j.task_id where t.identifier = 'password-changed'`);
    expect(jobs.map(({ payload }) => payload.person)).toContain(here.restorer.id);
  });

  it('refuses a wrong password of now, and after some tries every one for a while', async () => {
    const client = await server.as(here.reviewer);
    for (let i = 0; i < 5; i += 1) expect((await client.post('/api/password', { password: 'wrong', next: STRONG })).body['code']).toBe('wrong-password');
    expect((await client.post('/api/password', { password, next: STRONG })).body['code']).toBe('too-many');
    server.time.now += 16 * 60_000;
    const later = await server.as(here.reviewer);
    expect((await later.post('/api/password', { password, next: STRONG })).status).toBe(201);
  });

  it.each([
    ['a word that everybody takes', () => 'password12'],
    ['one letter again and again', () => 'aaaaaaaaaaaaaa'],
    ['a row of keys', () => 'qwertzuiop'],
    ['the person’s own mail address', () => here.keeper.mail],
    ['the person’s own name with a year', () => 'Keeper2026'],
  ])('refuses %s, in a sentence at the field, and keeps the old one', async (_, next) => {
    const client = await server.as(here.keeper);
    const answer = await client.post('/api/password', { password, next: next() });
    expect([answer.status, answer.body['code']]).toEqual([422, 'weak-password']);
    expect(answer.body['faults']).toEqual([{ path: 'next', message: answer.body['say'] }]);
    expect(answer.body['say']).toMatch(/^This password is too weak\. [A-Z].*[.!?]$/);
    expect((await server.stranger().post('/api/session', { mail: here.keeper.mail, password })).status).toBe(201);
  });

  it('counts bytes, not letters, where the hash counts no more', () => {
    expect(newPasswordSchema.safeParse('ü'.repeat(PASSWORD_MOST_BYTES / 2)).success).toBe(true);
    expect(newPasswordSchema.safeParse('ü'.repeat(PASSWORD_MOST_BYTES / 2 + 1)).success).toBe(false);
    expect(newPasswordSchema.safeParse('😀'.repeat(18)).success).toBe(true);
    expect(newPasswordSchema.safeParse('😀'.repeat(19)).success).toBe(false);
    expect(newPasswordSchema.safeParse('nine char').success).toBe(false);
  });
});
