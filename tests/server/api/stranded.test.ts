import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { answeredHoldSchema, holdsSchema } from '@/shared/contract/holds';
import { dossierSchema } from '@/shared/contract/machines';
import { recordSchema } from '@/shared/contract/records';
import { runBundleSchema } from '@/shared/contract/runs';
import { CLOSES } from '@/shared/contract/strandedRun';
import { verifyChain } from '@/shared/record/chain';
import { BenchDevice } from '@/tests/setup/BenchDevice';
import { addTree, makeWorkshop, password } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import type { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';
import { dead, fit, hands, look, treeOf } from '@/tests/flows/support/steps';

const CLIP = { id: 'own-clip', name: 'clip on C1', class: 'clip', area: 'clip', point: 'raw' };

describe('a run of an engine that the server no longer runs', () => {
  let server: TestServer;
  let workshop: TestWorkshop;
  let restorer: HttpClient;
  let senior: HttpClient;
  let device: BenchDevice;

  beforeAll(async () => {
    server = await openServer();
  });
  beforeEach(async () => {
    workshop = await makeWorkshop(server.database.ownerUrl);
    await addTree(server.database.ownerUrl, workshop, treeOf([look('d1'), dead('d1', 'clip'), fit('clip', CLIP, 'touch'), hands('touch', 'done')], { id: 'clip-tree' }));
    restorer = await server.as(workshop.restorer);
    senior = await server.as(workshop.senior);
    device = await BenchDevice.start(restorer, server, { machine: workshop.machine, tree: 'clip-tree' }, workshop.instruments.tester);
    await device.pass().answer('good').dead().answer('done').send();
    await server.query(`update runs set engine = 'lampstep-engine-0' where id = $1`, [device.run]);
  });
  afterAll(() => server.stop());

  const close = (client = senior, change: object = {}) => client.post(`/api/runs/${device.run}/close`, { id: uuidv7(), seq: device.seq + 1, reason: 'The rules have changed since.', password, ...change });
  const asBefore = async (work: () => Promise<void>) => {
    const rows = await server.rows();
    await work();
    expect({ ...(await server.rows()), sessions: 0 }).toEqual({ ...rows, sessions: 0 });
  };

  it('is said to be so, and can be read', async () => {
    const bundle = runBundleSchema.parse((await restorer.get(`/api/runs/${device.run}`)).body);
    expect(bundle).toMatchObject({ run: { state: 'open', stranded: true }, pins: { engine: 'lampstep-engine-0' } });
    expect(bundle.entries).toHaveLength(device.seq);
  });

  it('takes no step, no hand-over and no second person, and says what to do', async () => {
    await asBefore(async () => {
      for (const { status, body } of [
        await device.do({ type: 'WARNING_READ', step: 'touch' }).flush(),
        await restorer.post(`/api/runs/${device.run}/hand-over`, { id: uuidv7(), seq: device.seq, to: workshop.restorer2.id, password }),
        await restorer.post(`/api/runs/${device.run}/second-person`, { id: uuidv7(), seq: device.seq, person: workshop.senior.id, password }),
      ]) {
        expect([status, body['code']]).toEqual([409, 'other-engine']);
        expect(body['say']).toMatch(/Make the bench safe; a senior has to close the run/);
      }
    });
  });

  it('does not keep the other hold points from the seniors when it waits at one', async () => {
    await server.query(`update run_heads set hold_entry = (select id from entries where run = $1 and seq = 1) where run = $1`, [device.run]);
    expect(holdsSchema.parse((await senior.get('/api/holds')).body)).toEqual({ holds: [] });
    await asBefore(async () => expect((await senior.post(`/api/runs/${device.run}/holds`, { id: uuidv7(), seq: device.seq + 1, answer: 'given', password })).body).toMatchObject({ code: 'other-engine' }));
  });

  it('is closed as stopped by a senior who says why and signs; what was fitted stays named on the machine', async () => {
    const answer = await close();
    expect(answer.status).toBe(201);
    const { entry } = answeredHoldSchema.parse(answer.body);
    expect(entry).toMatchObject({ kind: 'closed', actor: workshop.senior.id, body: { reason: 'The rules have changed since.', meaning: CLOSES, engine: 'lampstep-engine-0' } });
    const record = recordSchema.parse((await restorer.get(`/api/records/${device.run}`)).body);
    expect(record.run).toMatchObject({ state: 'closed', ended: 'stopped', stranded: false, step: null, band: 'unknown' });
    expect(verifyChain(record.entries, { head: record.head.hash, count: record.head.seq })).toMatchObject({ ok: true });
    expect(record.may.submit).toBe(true);
    const { staysFitted } = dossierSchema.parse((await senior.get(`/api/machines/${workshop.machine}`)).body);
    expect(staysFitted).toMatchObject([{ is: 'fitted', thing: { id: 'own-clip' } }]);
    // the machine is free again
    const wish = { id: uuidv7(), machine: workshop.machine, tree: 'lamp', version: 1, monotonic: 0 };
    expect((await restorer.post('/api/runs', wish)).status).toBe(201);
  });

  it('goes through review, but not by the one who closed it', async () => {
    await server.query(`update members set roles = '{senior,reviewer}' where person = $1`, [workshop.senior.id]);
    await close();
    expect((await restorer.post(`/api/runs/${device.run}/submit`, { id: uuidv7() })).status).toBe(201);
    const accept = (client: HttpClient, release = false) => client.post(`/api/records/${device.run}/accept`, { id: uuidv7(), meaning: 'Read.', release, password });
    expect((await accept(senior)).body).toMatchObject({ code: 'countersigned-run' });
    const reviewer = await server.as(workshop.reviewer);
    expect((await accept(reviewer, true)).body).toMatchObject({ code: 'bad-input' });
    expect((await accept(reviewer)).status).toBe(201);
  });

  it('is closed by nobody else, not without a reason, not with a wrong password', async () => {
    await asBefore(async () => {
      for (const person of [workshop.restorer, workshop.restorer2, workshop.reviewer, workshop.keeper]) expect((await close(await server.as(person))).body).toMatchObject({ code: 'role-missing' });
      expect((await close(senior, { reason: ' ' })).body).toMatchObject({ code: 'bad-input' });
      expect((await close(senior, { password: 'a guess' })).body).toMatchObject({ code: 'wrong-password' });
      expect((await close(senior, { seq: device.seq })).body).toMatchObject({ code: 'out-of-sequence' });
    });
  });

  it('is closed once; the same request again is answered as the first time', async () => {
    const sent = { id: uuidv7() };
    const first = await close(senior, sent);
    expect(await close(senior, sent)).toMatchObject({ status: 201, body: first.body });
    expect((await close(senior, { seq: device.seq + 2 })).body).toMatchObject({ code: 'wrong-state' });
  });

  it('that the server does run is ended by its own restorer', async () => {
    const other = await makeWorkshop(server.database.ownerUrl);
    const own = await BenchDevice.start(await server.as(other.restorer), server, { machine: other.machine }, other.instruments.tester);
    const answer = await (await server.as(other.senior)).post(`/api/runs/${own.run}/close`, { id: uuidv7(), seq: own.seq + 1, reason: 'x', password });
    expect(answer.body).toMatchObject({ code: 'wrong-state', say: 'This run can be led on: its restorer ends it at the bench, with Stop where nothing else will do.' });
  });
});
