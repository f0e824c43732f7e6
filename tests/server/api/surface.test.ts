/** What stands around the routes: the description for machines, the web client, headers, health, logs, starting and stopping. */
import { spawn } from 'node:child_process';
import { mkdtempSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Writable } from 'node:stream';
import { fileURLToPath } from 'node:url';

import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { createDb } from '@/db/createDb';
import { readConfig } from '@/server/config';
import { startServer } from '@/server/main';
import { ROUTE_NAMES, routes } from '@/shared/contract/routes';
import { freshDatabase } from '@/tests/setup/database';
import { makeWorkshop, password } from '@/tests/setup/factory';
import { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

describe('the surface of the server', () => {
  let server: TestServer;
  let web: string;

  beforeAll(async () => {
    web = mkdtempSync(join(tmpdir(), 'lampstep-web-'));
    mkdirSync(join(web, '_expo'));
    writeFileSync(join(web, 'index.html'), '<!doctype html><title>Lampstep</title>');
    writeFileSync(join(web, '_expo', 'entry-0123456789abcdef0123456789abcdef.js'), 'export {};');
    writeFileSync(join(web, 'favicon.ico'), 'x');
    server = await openServer({ webRoot: web });
  });
  afterAll(async () => {
    await server.stop();
    rmSync(web, { recursive: true });
  });

  it('describes every route as OpenAPI 3.1, with its problems', async () => {
    const { body } = await server.stranger().get('/api/openapi.json');
    expect(body['openapi']).toBe('3.1.0');
    const paths = body['paths'] as Record<string, Record<string, { operationId: string; responses: Record<string, unknown>; requestBody?: unknown; security?: unknown }>>;
    const described = Object.values(paths).flatMap((path) => Object.values(path).map(({ operationId }) => operationId));
    expect(described.sort()).toEqual([...ROUTE_NAMES].sort());
    const post = paths['/api/runs/{run}/entries']?.['post'];
    expect(Object.keys(post?.responses ?? {}).sort()).toEqual(['200', '400', '401', '403', '404', '409', '413', '422', '500']);
    expect(post?.requestBody).toBeDefined();
    expect(post?.security).toEqual([{ session: [] }]);
    expect(paths['/healthz']?.['get']?.security).toBeUndefined();
    const { schemas } = body['components'] as { schemas: Record<string, unknown> };
    expect(Object.keys(schemas)).toEqual(expect.arrayContaining(['Problem', 'Entry', 'Tree', 'Profile', 'RunBundle', 'Hold', 'Record']));
    for (const [, ref] of JSON.stringify(body).matchAll(/"\$ref":"#\/components\/schemas\/([^"]+)"/g)) expect(Object.keys(schemas)).toContain(ref);
  });

  it('lets the client’s pages run its own scripts only', async () => {
    const { headers } = await server.stranger().get('/');
    const policy = headers.get('content-security-policy') ?? '';
    expect(policy).toContain("default-src 'self'");
    expect(policy).toContain("script-src 'self';");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toMatch(/script-src[^;]*unsafe/);
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('x-powered-by')).toBeNull();
  });

  it('serves the client: hashed files for a year, the page at every other address, never in place of a missing file', async () => {
    const get = (path: string) => server.stranger().get(path);
    const hashed = await get('/_expo/entry-0123456789abcdef0123456789abcdef.js');
    expect([hashed.status, hashed.headers.get('cache-control')]).toEqual([200, 'public, max-age=31536000, immutable']);
    for (const path of ['/', '/bench', '/bench/0190d3c0-0000-7000-8000-000000000000', '/records/x']) {
      const page = await get(path);
      expect([page.status, page.headers.get('cache-control'), page.text], path).toEqual([200, 'no-cache', '<!doctype html><title>Lampstep</title>']);
    }
    expect((await get('/favicon.ico')).headers.get('cache-control')).toBe('no-cache');
    for (const path of ['/_expo/missing.js', '/../package.json', '/%2e%2e/package.json', '/.env']) expect((await get(path)).status, path).toBe(404);
    expect((await get('/api/nothing')).headers.get('content-type')).toMatch(/problem\+json/);
  });

  it('keeps answers out of every cache', async () => {
    expect((await server.stranger().get('/healthz')).headers.get('cache-control')).toBe('no-store');
  });

  it('says that it runs, and that it cannot work while the database is away', async () => {
    expect((await server.stranger().get('/healthz')).body).toEqual({ ok: true });
    expect((await server.stranger().get('/readyz')).body).toEqual({ ok: true });
    const broken = await openServer();
    const url = broken.database.serverUrl.replace(/:\d+\//, ':9/');
    await broken.parts.db.destroy();
    (broken.parts as { db: unknown }).db = createDb(url);
    const { status, body } = await broken.stranger().get('/readyz');
    expect([status, body['code']]).toEqual([503, 'not-ready']);
    expect((await broken.stranger().get('/healthz')).status).toBe(200);
    const signIn = await broken.stranger().post('/api/session', { mail: 'a@example.org', password });
    expect([signIn.status, signIn.body]).toEqual([503, { code: 'not-ready', say: 'The server is not ready. Try again in a moment.' }]);
    await broken.stop();
  });
});

describe('the log', () => {
  it('holds no password, no token and no cookie', async () => {
    const database = await freshDatabase();
    let written = '';
    const log = pino({ level: 'trace' }, new Writable({ write: (chunk: Buffer, _encoding, done) => ((written += chunk.toString()), done()) }));
    const { restorer } = await makeWorkshop(database.ownerUrl);
    const server = await startServer(readConfig({ NODE_ENV: 'test', DATABASE_URL: database.serverUrl, PORT: '0', BCRYPT_COST: '4', SESSION_SECRET: 'a secret of thirty-two letters!!' }), log);
    const client = new HttpClient(`http://127.0.0.1:${String(server.port)}`);
    await client.post('/api/session', { mail: restorer.mail, password });
    await client.post('/api/session', { mail: restorer.mail, password: 'a wrong one' });
    await client.get('/api/me');
    await client.get('/api/runs/x');
    await server.stop();
    await database.drop();
    expect(written).toContain('/api/session');
    for (const secret of [password, 'a wrong one', 'a secret of thirty-two', ...client.cookies.values()]) expect(written).not.toContain(secret);
  });
});

describe('the server as a process', () => {
  const main = fileURLToPath(new URL('../../../server/main.ts', import.meta.url));
  const run = (env: Record<string, string>) => {
    const child = spawn(process.execPath, ['--import', 'tsx', main], { env: { PATH: process.env['PATH'] ?? '', ...env }, stdio: ['ignore', 'pipe', 'pipe'] });
    let output = '';
    child.stdout.on('data', (chunk: Buffer) => (output += chunk.toString()));
    child.stderr.on('data', (chunk: Buffer) => (output += chunk.toString()));
    return { child, output: () => output, ended: new Promise<number | null>((resolve) => child.once('close', resolve)) };
  };

  it('refuses to start in production without its secrets, and names each', async () => {
    const { ended, output } = run({ NODE_ENV: 'production', DATABASE_URL: 'postgres://nobody@127.0.0.1:9/x' });
    expect(await ended).toBe(1);
    expect(output()).toBe('The server cannot start: PUBLIC_URL is missing; SESSION_SECRET is missing; SIGNING_KEY is missing; SMTP_URL is missing; MAIL_FROM is missing; S3_BUCKET is missing.\n');
  });

  it('listens, and stops cleanly on SIGTERM', async () => {
    const database = await freshDatabase();
    const { child, ended, output } = run({ NODE_ENV: 'test', DATABASE_URL: database.serverUrl, PORT: '0', BCRYPT_COST: '4' });
    await new Promise<void>((resolve, reject) => {
      child.stdout.on('data', () => output().includes('"listening"') && resolve());
      child.once('close', () => reject(new Error(output())));
    });
    const port = Number(/"port":(\d+)/.exec(output())?.[1]);
    expect((await new HttpClient(`http://127.0.0.1:${String(port)}`).get(routes.ready.path)).status).toBe(200);
    child.kill('SIGTERM');
    expect(await ended).toBe(0);
    await database.drop();
  });
});
