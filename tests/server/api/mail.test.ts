import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { Client } from 'pg';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, inject, it, vi } from 'vitest';

import { startMailFake } from '@/server/adapters/fakes/mailFake';
import type { MailFake } from '@/server/adapters/fakes/mailFake';
import { readConfig } from '@/server/config';
import { startServer } from '@/server/main';
import { BenchDevice } from '@/tests/setup/BenchDevice';
import { freshDatabase } from '@/tests/setup/database';
import type { FreshDatabase } from '@/tests/setup/database';
import { makeWorkshop, password } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import { HttpClient } from '@/tests/setup/HttpClient';

const patience = { timeout: 15_000, interval: 50 };

describe('the letter “countersign wanted”', () => {
  let database: FreshDatabase;
  let mail: MailFake;
  let dir: string;
  let workshop: TestWorkshop;
  let server: Awaited<ReturnType<typeof startServer>>;
  const config = (smtpUrl: string) =>
    readConfig({ NODE_ENV: 'test', DATABASE_URL: database.serverUrl, PORT: '0', BCRYPT_COST: '4', SIGN_IN_TRIES: '1000', LOG_LEVEL: 'silent', SMTP_URL: smtpUrl, MAIL_FROM: 'Lampstep <bench@example.org>', PUBLIC_URL: 'https://bench.example.org' });

  beforeAll(async () => {
    database = await freshDatabase();
    dir = mkdtempSync(join(tmpdir(), 'lampstep-letters-'));
    mail = await startMailFake({ dir });
    server = await startServer(config(mail.smtpUrl));
    workshop = await makeWorkshop(database.ownerUrl);
  });
  afterAll(async () => {
    await server.stop();
    await mail.stop();
    await database.drop();
    rmSync(dir, { recursive: true });
  });

  const signIn = async (mailAddress: string, port = server.port) => {
    const client = new HttpClient(`http://127.0.0.1:${String(port)}`);
    await client.post('/api/session', { mail: mailAddress, password });
    return client;
  };
  const toHold = async (port = server.port) => {
    const device = await BenchDevice.start(await signIn(workshop.restorer.mail, port), { time: { now: Date.now() } }, { machine: workshop.machine }, workshop.instruments.tester);
    device.pass().answer('sound').dead().pass().pass().dead();
    return device.do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' });
  };
  const close = (device: BenchDevice) => device.do({ type: 'STOP' }).dead().do({ type: 'CLOSE' }).do({ type: 'CLOSE' }).send();

  it('reaches every senior of the workshop, says where and what, and is sent once', async () => {
    const device = await toHold();
    const sent = [...device.outbox];
    await device.send();
    await device.client.post(`/api/runs/${device.run}/entries`, { entries: sent.slice(-3) });
    await vi.waitFor(() => expect(mail.letters()).toHaveLength(2), patience);
    expect(mail.letters().flatMap(({ to }) => to).sort()).toEqual([workshop.senior.mail, workshop.senior2.mail].sort());
    const letter = mail.letters().find(({ to }) => to.includes(workshop.senior.mail));
    expect(letter).toMatchObject({ from: 'Lampstep <bench@example.org>', subject: 'Countersign wanted: Test supply, Through the lamp' });
    expect(letter?.text).toContain(`https://bench.example.org/bench/${device.run}`);
    expect(letter?.text).toMatch(/Machine: Test supply, serial [0-9a-f]{8}\nTree: First lamp\nStep: Through the lamp/);
    expect(letter?.text).toContain('Local electrical codes, the maker’s data and licensed practice come first.');
    expect(letter?.html).toContain(`<a href="https://bench.example.org/bench/${device.run}">`);
    await close(device);
  });

  it('is not written when the request for it is refused', async () => {
    const before = mail.letters().length;
    const device = await toHold();
    const entries = [...device.outbox, { id: uuidv7(), seq: device.seq + 1, event: device.stamp({ type: 'GUARD_HELD', step: 'lamp', heldMs: 5000 }) }];
    expect((await device.client.post(`/api/runs/${device.run}/entries`, { entries })).status).toBe(422);
    const admin = new Client({ connectionString: database.ownerUrl });
    await admin.connect();
    expect((await admin.query('select count(*)::int as n from graphile_worker._private_jobs')).rows).toEqual([{ n: 0 }]);
    await admin.end();
    expect(mail.letters()).toHaveLength(before);
    await close(device);
  });

  it('is sent though every connection to the database has broken in between', async () => {
    const before = mail.letters().length;
    const device = await toHold();
    const admin = new Client({ connectionString: inject('clusterAdminUrl').replace(/\/postgres$/, `/${database.name}`) });
    await admin.connect();
    const broken = await admin.query(`select pg_terminate_backend(pid) from pg_stat_activity where datname = $1 and usename = 'lampstep_server'`, [database.name]);
    expect(broken.rowCount).toBeGreaterThan(1);
    await admin.end();
    await vi.waitFor(async () => expect((await device.client.get('/readyz')).status).toBe(200), patience);
    await device.send();
    await vi.waitFor(() => expect(mail.letters()).toHaveLength(before + 2), patience);
    await close(device);
  });

  it('waits in the queue while the mail server is away, and the request is answered all the same', async () => {
    const away = await startServer({ ...config('smtp://127.0.0.1:9'), port: 0 });
    await server.stop();
    const before = mail.letters().length;
    const device = await toHold(away.port);
    await device.send();
    const owner = new Client({ connectionString: database.ownerUrl });
    await owner.connect();
    try {
      await vi.waitFor(async () => {
        const { rows } = await owner.query<{ n: number }>('select count(*)::int as n from graphile_worker._private_jobs where attempts >= 1 and last_error is not null');
        expect(rows[0]?.n).toBe(2);
      }, patience);
      await away.stop();
      // The next try is minutes away: bring it forward, as the clock would.
      await owner.query('update graphile_worker._private_jobs set run_at = now()');
    } finally {
      await owner.end();
    }
    server = await startServer(config(mail.smtpUrl));
    await vi.waitFor(() => expect(mail.letters()).toHaveLength(before + 2), patience);
  });
});
