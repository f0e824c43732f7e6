import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';

import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { demoPeople, DEMO_PASSWORD } from '@/db/seeds/demoPeople';
import { findFreePort } from '@/server/cli/freePort';
import { inProject, projectRoot } from '@/server/cli/projectFiles';
import { makeSigningKey } from '@/server/config';
import { freshDatabase, type FreshDatabase } from '@/tests/setup/database';

/** Runs `start` with nothing of this process's environment but the path. */
function start(env: Record<string, string>): { child: ChildProcess; lines: string[]; says: (part: string) => Promise<void> } {
  const child = spawn(process.execPath, ['server/cli/bootstrap.mjs', 'start'], { cwd: projectRoot, env: { PATH: process.env['PATH'], ...env }, stdio: ['ignore', 'pipe', 'pipe'] });
  const lines: string[] = [];
  const out = createInterface({ input: child.stdout });
  out.on('line', (line) => lines.push(line));
  createInterface({ input: child.stderr }).on('line', (line) => lines.push(line));
  const says = async (part: string) => {
    while (!lines.some((line) => line.includes(part))) {
      await Promise.race([once(out, 'line'), once(child, 'close').then(() => Promise.reject(new Error(lines.join('\n'))))]);
    }
  };
  return { child, lines, says };
}

// Each start is a whole process of its own, on a machine that may be busy.
describe('npm start with NODE_ENV=production', { timeout: 90_000 }, () => {
  let database: FreshDatabase;
  let production: Record<string, string>;

  beforeAll(async () => {
    database = await freshDatabase({ migrated: false });
    production = {
      NODE_ENV: 'production',
      DATABASE_URL: database.serverUrl,
      DATABASE_OWNER_URL: database.ownerUrl,
      HOST: '127.0.0.1',
      PORT: String(await findFreePort(0)),
      PUBLIC_URL: 'https://bench.example.org',
      SESSION_SECRET: 'x'.repeat(40),
      SIGNING_KEY: JSON.stringify(makeSigningKey()),
      // Nothing is sent in this test, and nobody listens there.
      SMTP_URL: 'smtp://127.0.0.1:9',
      MAIL_FROM: 'lampstep@example.org',
      S3_BUCKET: 'lampstep',
      WEB_ROOT: inProject('public'),
      LOG_LEVEL: 'silent',
    };
  });

  afterAll(() => database.drop());

  it('names every setting that is missing and makes up none', async () => {
    const { child, lines } = start({ NODE_ENV: 'production' });
    const [code] = (await once(child, 'close')) as [number];
    expect(code).toBe(1);
    expect(lines).toEqual([
      'With NODE_ENV=production nothing is made up: set DATABASE_URL, DATABASE_OWNER_URL, PUBLIC_URL, SESSION_SECRET, SIGNING_KEY, SMTP_URL, MAIL_FROM, S3_BUCKET (see .env.example).',
    ]);
  });

  it('migrates and serves without a demo account or a fake, keeps to its port, and stops cleanly', async () => {
    const { child, lines, says } = start(production);
    await says('Ctrl-C stops it.');
    expect(lines.join('\n')).not.toMatch(/demo|fake/i);

    const owner = new Client({ connectionString: database.ownerUrl });
    await owner.connect();
    expect((await owner.query('SELECT count(*)::int AS n FROM people')).rows).toEqual([{ n: 0 }]);
    await owner.end();
    for (const { mail } of Object.values(demoPeople)) {
      const answer = await fetch(`http://127.0.0.1:${production['PORT'] ?? ''}/api/session`, {
        method: 'POST',
        headers: { 'content-type': 'application/json', origin: 'https://bench.example.org' },
        body: JSON.stringify({ mail, password: DEMO_PASSWORD }),
      });
      expect(answer.status).toBe(401);
    }

    // Whoever stands in front of it expects this port: a second one must not move on to another.
    const second = start(production);
    expect(((await once(second.child, 'close')) as [number])[0]).toBe(1);
    expect(second.lines.at(-1)).toBe(`Port ${production['PORT'] ?? ''} on 127.0.0.1 is taken by another program.`);

    child.kill('SIGTERM');
    const [code] = (await once(child, 'close')) as [number];
    expect(code).toBe(0);
  });
});
