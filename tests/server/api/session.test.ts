import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { GRACE_MS } from '@/server/session/service';
import { meSchema } from '@/shared/contract/session';
import { asOwner, makeWorkshop, password } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

const MINUTE = 60_000;

describe('a session', () => {
  let server: TestServer;
  let workshop: TestWorkshop;

  beforeAll(async () => {
    server = await openServer();
    workshop = await makeWorkshop(server.database.ownerUrl);
  });
  afterAll(() => server.stop());

  it('opens with mail address and password, and says who that is', async () => {
    const client = await server.as(workshop.restorer);
    const me = meSchema.parse((await client.get('/api/me')).body);
    expect(me).toMatchObject({ person: { id: workshop.restorer.id, mail: workshop.restorer.mail }, workshop: { id: workshop.id }, roles: ['restorer'] });
  });

  it('takes the mail address however it is written', async () => {
    const { status } = await server.stranger().post('/api/session', { mail: `  ${workshop.restorer.mail.toUpperCase()} `, password });
    expect(status).toBe(201);
  });

  it('travels in cookies that no script reads and no other site sends', async () => {
    const { headers, text } = await server.stranger().post('/api/session', { mail: workshop.restorer.mail, password });
    const cookies = headers.getSetCookie();
    expect(cookies).toHaveLength(2);
    for (const cookie of cookies) expect(cookie).toMatch(/; HttpOnly; SameSite=Strict$/);
    expect(cookies.find((cookie) => cookie.startsWith('lampstep_refresh='))).toMatch(/; Path=\/api\/session;/);
    for (const cookie of cookies) expect(text).not.toContain(cookie.slice(cookie.indexOf('=') + 1, cookie.indexOf(';')));
  });

  it('is marked Secure where the site is reached by https', async () => {
    const secure = await openServer({ publicUrl: 'https://bench.example.org' });
    try {
      const { mail } = (await makeWorkshop(secure.database.ownerUrl)).restorer;
      const { headers } = await secure.stranger().post('/api/session', { mail, password });
      for (const cookie of headers.getSetCookie()) expect(cookie).toContain('; Secure');
      expect(headers.get('strict-transport-security')).toMatch(/max-age=\d{8}/);
    } finally {
      await secure.stop();
    }
  });

  it('says the same of a wrong password and of an unknown address, and opens nothing', async () => {
    const before = await server.rows();
    const wrong = await server.stranger().post('/api/session', { mail: workshop.restorer.mail, password: 'wrong' });
    const unknown = await server.stranger().post('/api/session', { mail: 'nobody@example.org', password: 'wrong' });
    expect([wrong.status, wrong.body]).toEqual([401, { code: 'sign-in-failed', say: 'Mail address and password do not fit together.' }]);
    expect([unknown.status, unknown.body]).toEqual([wrong.status, wrong.body]);
    expect(await server.rows()).toEqual(before);
  });

  it('asks for the parts that are missing, at their place', async () => {
    const { status, body } = await server.stranger().post('/api/session', { mail: 'restorer' });
    expect(status).toBe(422);
    expect(body).toMatchObject({ code: 'bad-input', faults: [{ path: 'mail', message: 'this is not a mail address' }, { path: 'password', message: 'is missing' }] });
  });

  it('runs out after 15 minutes, says so, and is renewed by its refresh cookie', async () => {
    const client = await server.as(workshop.restorer);
    server.time.now += 15 * MINUTE + 1000;
    const late = await client.get('/api/me');
    expect([late.status, late.body['code']]).toEqual([401, 'session-expired']);
    expect((await client.post('/api/session/refresh')).status).toBe(200);
    expect((await client.get('/api/me')).status).toBe(200);
  });

  it('ends when an old refresh token is used again', async () => {
    const client = await server.as(workshop.restorer);
    const thief = new HttpClient(server.url);
    thief.cookies.set('lampstep_refresh', client.cookies.get('lampstep_refresh') ?? '');
    await client.post('/api/session/refresh');
    server.time.now += GRACE_MS + 1000;
    const stolen = await thief.post('/api/session/refresh');
    expect([stolen.status, stolen.body['code']]).toEqual([401, 'session-expired']);
    const after = await client.get('/api/me');
    expect([after.status, after.body['code']]).toEqual([401, 'session-expired']);
    expect((await client.post('/api/session/refresh')).status).toBe(401);
    const [kept] = await server.query<{ why: string }>('select revoked_why as why from sessions where revoked_at is not null order by revoked_at desc limit 1');
    expect(kept?.why).toBe('an old refresh token was used again');
  });

  it('goes on when the answer to a refresh was lost and it is asked for once more at once', async () => {
    const client = await server.as(workshop.restorer);
    const same = new HttpClient(server.url);
    same.cookies.set('lampstep_refresh', client.cookies.get('lampstep_refresh') ?? '');
    await client.post('/api/session/refresh');
    server.time.now += 2000;
    expect((await same.post('/api/session/refresh')).status).toBe(200);
    expect(same.cookies.get('lampstep_refresh')).toBe(client.cookies.get('lampstep_refresh'));
    server.time.now += 10 * MINUTE;
    expect((await client.post('/api/session/refresh')).status).toBe(200);
  });

  it('cannot be renewed with a token of somebody’s own making', async () => {
    const client = await server.as(workshop.restorer);
    const token = client.cookies.get('lampstep_refresh') ?? '';
    for (const forged of ['', 'x', token.replace(/\.1\./, '.2.'), `${token}x`, token.replace(/^[0-9a-f]{8}/, '00000000')]) {
      const forger = new HttpClient(server.url);
      forger.cookies.set('lampstep_refresh', forged);
      expect((await forger.post('/api/session/refresh')).status, forged).toBe(401);
    }
    expect((await client.post('/api/session/refresh')).status).toBe(200);
  });

  it('ends when it is signed out of, for good', async () => {
    const client = await server.as(workshop.restorer);
    const copy = new HttpClient(server.url);
    for (const [name, value] of client.cookies) copy.cookies.set(name, value);
    expect((await client.delete('/api/session')).status).toBe(200);
    expect(client.cookies.size).toBe(0);
    expect((await copy.get('/api/me')).status).toBe(401);
    expect((await copy.post('/api/session/refresh')).status).toBe(401);
  });

  it('is refused with a token that is not ours', async () => {
    const client = new HttpClient(server.url);
    client.cookies.set('lampstep_access', 'eyJhbGciOiJub25lIn0.eyJzdWIiOiJ4In0.');
    const { status, body } = await client.get('/api/me');
    expect([status, body['code']]).toEqual([401, 'signed-out']);
  });

  it('loses a role, or its membership, at the very next request', async () => {
    const client = await server.as(workshop.senior2);
    expect((await client.get('/api/holds')).status).toBe(200);
    await asOwner(server.database.ownerUrl, workshop.id, (tx) => tx.updateTable('members').set({ roles: ['restorer'] }).where('person', '=', workshop.senior2.id).execute());
    expect((await client.get('/api/holds')).status).toBe(403);
    await asOwner(server.database.ownerUrl, workshop.id, (tx) => tx.updateTable('members').set({ left_at: new Date() }).where('person', '=', workshop.senior2.id).execute());
    expect((await client.get('/api/me')).status).toBe(401);
    expect((await server.stranger().post('/api/session', { mail: workshop.senior2.mail, password })).status).toBe(401);
  });

  it('is changed by no request from another site', async () => {
    const client = await server.as(workshop.restorer);
    for (const headers of [{ origin: 'https://elsewhere.example.org' }, { 'sec-fetch-site': 'cross-site' }, { 'sec-fetch-site': 'same-site' }]) {
      const { status, body } = await client.delete('/api/session', { headers });
      expect([status, body['code']], JSON.stringify(headers)).toEqual([403, 'cross-site']);
    }
    expect((await client.get('/api/me')).status).toBe(200);
    expect((await client.delete('/api/session', { headers: { origin: server.url, 'sec-fetch-site': 'same-origin' } })).status).toBe(200);
  });
});

describe('trying passwords', () => {
  it('is stopped after so many misses, with a sentence and a time to wait', async () => {
    const server = await openServer({ signInTries: 3 });
    try {
      const { restorer } = await makeWorkshop(server.database.ownerUrl);
      const statuses: number[] = [];
      for (let i = 0; i < 4; i += 1) statuses.push((await server.stranger().post('/api/session', { mail: restorer.mail, password: `guess ${String(i)}` })).status);
      expect(statuses).toEqual([401, 401, 401, 429]);
      const stopped = await server.stranger().post('/api/session', { mail: restorer.mail, password });
      expect(stopped.body).toEqual({ code: 'too-many', say: 'Too many tries to sign in. Wait 15 minutes, then try again.' });
      expect(stopped.headers.get('retry-after')).toMatch(/^\d+$/);
    } finally {
      await server.stop();
    }
  });
});
