import { createLocalJWKSet, flattenedVerify } from 'jose';
import type { JSONWebKeySet } from 'jose';
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';
import { dossierSchema } from '@/shared/contract/machines';
import { recordSchema, recordsSchema, reviewedSchema } from '@/shared/contract/records';
import { runBundleSchema } from '@/shared/contract/runs';
import { verifyChain } from '@/shared/record/chain';
import { exportedRecordSchema, exportFileSchema } from '@/shared/record/exportFormat';
import { verifyExport } from '@/shared/record/verifyExport';
import { lampTreeJson, must } from '@/tests/flows/support/bench';
import { BenchDevice } from '@/tests/setup/BenchDevice';
import { addTree, makeWorkshop, password } from '@/tests/setup/factory';
import type { TestPerson, TestWorkshop } from '@/tests/setup/factory';
import type { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

const MEANING = 'I have read the whole record and take it as it is.';

describe('a record', () => {
  let server: TestServer;
  let workshop: TestWorkshop;
  let restorer: HttpClient;
  let senior: HttpClient;
  let reviewer: HttpClient;
  let device: BenchDevice;

  beforeAll(async () => {
    server = await openServer();
  });
  beforeEach(async () => {
    workshop = await makeWorkshop(server.database.ownerUrl);
    [restorer, senior, reviewer] = await Promise.all([server.as(workshop.restorer), server.as(workshop.senior2), server.as(workshop.reviewer)]);
    device = await BenchDevice.start(restorer, server, { machine: workshop.machine }, workshop.instruments.tester);
    device.pass().answer('sound').dead().pass().pass().dead();
    await device.do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' }).send();
    await senior.post(`/api/runs/${device.run}/holds`, { id: uuidv7(), seq: device.seq + 1, answer: 'given', password });
    await device.fetch();
    device.do({ type: 'GUARD_HELD', step: 'lamp', heldMs: 2100 }).do({ type: 'ANSWER', step: 'lamp', answer: 'on' }).answer('dim').dead();
    while (device.view.phase !== 'ended') device.pass();
    await device.do({ type: 'CLOSE' }).send();
  });
  afterAll(() => server.stop());

  const at = (act: string) => (act === 'submit' ? `/api/runs/${device.run}/submit` : `/api/records/${device.run}/${act}`);
  const act = (client: HttpClient, name: string, body: object = {}) => client.post(at(name), { id: uuidv7(), ...body });
  const read = async (client = restorer) => recordSchema.parse((await client.get(`/api/records/${device.run}`)).body);
  const accept = (client: HttpClient, body: object = {}) => act(client, 'accept', { password, meaning: MEANING, ...body });
  const asBefore = async (work: () => Promise<void>) => {
    const before = await read();
    await work();
    expect(await read()).toEqual(before);
  };
  const supplyProven = () => server.query(`update runs set ended = 'supply-proven' where id = $1`, [device.run]);

  it('goes from closed over submitted, returned and answered to accepted, each step an entry of its own', async () => {
    expect(await read()).toMatchObject({ run: { state: 'closed', ended: 'cleared' }, may: { submit: true, find: false, accept: false } });
    expect((await act(restorer, 'submit', { remark: 'Lamp stayed dim.' })).status).toBe(201);
    expect((await read(reviewer)).may).toEqual({ submit: false, find: true, return: true, reply: false, accept: true, release: false });
    const about = (await read()).entries.find(({ kind }) => kind === 'reading')?.id;
    expect((await act(reviewer, 'findings', { entry: about, grade: 'minor', text: 'Say which lead was used.' })).status).toBe(201);
    expect((await act(reviewer, 'return', { questions: ['Which lead?'] })).status).toBe(201);
    expect((await read()).may).toMatchObject({ reply: true });
    expect((await act(restorer, 'reply', { text: 'The red one.' })).status).toBe(201);
    const accepted = reviewedSchema.parse((await accept(reviewer)).body);
    expect(accepted).toMatchObject({ run: { state: 'accepted' }, entry: { kind: 'accepted', actor: workshop.reviewer.id, body: { meaning: MEANING } } });
    const record = await read(reviewer);
    expect(record.entries.slice(-6).map(({ kind, actor }) => [kind, actor])).toEqual([
      ['closed', workshop.restorer.id], ['submitted', workshop.restorer.id], ['finding', workshop.reviewer.id], ['returned', workshop.reviewer.id], ['reply', workshop.restorer.id], ['accepted', workshop.reviewer.id],
    ]);
    expect(record.findings).toMatchObject([{ entry: about, grade: 'minor', text: 'Say which lead was used.', by: workshop.reviewer.id }]);
    expect(record.may).toEqual({ submit: false, find: false, return: false, reply: false, accept: false, release: false });
    expect(verifyChain(record.entries, { head: record.head.hash, count: record.head.seq })).toMatchObject({ ok: true });
  });

  it('is listed by state; a restorer sees the own ones only', async () => {
    const ids = async (client: HttpClient, query = '') => recordsSchema.parse((await client.get(`/api/records${query}`)).body).records.map(({ id }) => id);
    expect(await ids(restorer)).toEqual([device.run]);
    expect(await ids(reviewer, '?state=closed')).toEqual([device.run]);
    expect(await ids(reviewer, '?state=submitted')).toEqual([]);
    expect(await ids(await server.as(workshop.keeper))).toEqual([device.run]);
    const other = await server.as(workshop.restorer2);
    expect(await ids(other)).toEqual([]);
    for (const path of [`/api/records/${device.run}`, `/api/records/${device.run}/export`]) expect((await other.get(path)).status).toBe(404);
    expect((await reviewer.get('/api/records?state=open')).status).toBe(422);
  });

  it('cannot be read as a record while its run is open', async () => {
    const open = await BenchDevice.start(restorer, server, { machine: workshop.machine }, workshop.instruments.tester);
    const { status, body } = await reviewer.get(`/api/records/${open.run}`);
    expect([status, body['say']]).toEqual([404, 'This run is still open. Its record can be read once it is closed.']);
    expect((await act(restorer, 'submit')).status).toBe(201);
  });

  it('is submitted by its restorer alone, once', async () => {
    const reviewingRestorer = await server.as(workshop.reviewer2);
    await asBefore(async () => {
      expect((await act(reviewingRestorer, 'submit')).body['code']).toBe('not-your-run');
      expect((await act(reviewer, 'submit')).body['code']).toBe('role-missing');
    });
    const id = uuidv7();
    const first = await act(restorer, 'submit', { id });
    expect((await act(restorer, 'submit', { id })).body).toEqual(first.body);
    await asBefore(async () => {
      const again = await act(restorer, 'submit');
      expect([again.status, again.body['code'], again.body['say']]).toEqual([409, 'wrong-state', 'Only a run that has just been closed can be submitted.']);
      expect((await act(restorer, 'submit', { id, remark: 'More.' })).body['code']).toBe('id-taken');
    });
  });

  it('is reviewed by a reviewer who is not its restorer', async () => {
    await act(restorer, 'submit');
    await server.query(`update members set roles = '{restorer,reviewer}' where person = $1`, [workshop.restorer.id]);
    const about = (await read()).entries[1]?.id;
    const bodies: [string, object][] = [['findings', { entry: about, grade: 'note', text: 'Well done.' }], ['return', { questions: ['Why?'] }], ['accept', { password, meaning: MEANING }]];
    await asBefore(async () => {
      for (const [name, body] of bodies) {
        const own = await act(restorer, name, body);
        expect([own.status, own.body['code'], own.body['say']], name).toEqual([403, 'own-run', 'This is your own run: another reviewer has to review it.']);
      }
    });
    for (const person of [workshop.restorer2, workshop.senior, workshop.keeper] satisfies TestPerson[]) {
      const client = await server.as(person);
      await asBefore(async () => {
        for (const [name, body] of bodies) expect((await act(client, name, body)).body['code'], name).toBe('role-missing');
      });
    }
    const stranger = await server.as((await makeWorkshop(server.database.ownerUrl)).reviewer);
    await asBefore(async () => {
      for (const [name, body] of bodies) expect((await act(stranger, name, body)).status, name).toBe(404);
    });
  });

  it('is not accepted by the one who countersigned in it', async () => {
    await act(restorer, 'submit');
    expect((await read(senior)).may).toMatchObject({ find: true, accept: false });
    await asBefore(async () => {
      const { status, body } = await accept(senior);
      expect([status, body['code'], body['say']]).toEqual([403, 'countersigned-run', 'You countersigned in this run, so another reviewer has to decide on it.']);
    });
  });

  it('is accepted once, with the password', async () => {
    await act(restorer, 'submit');
    await asBefore(async () => {
      expect((await accept(reviewer, { password: 'guess' })).body['code']).toBe('wrong-password');
      expect((await accept(reviewer, { meaning: '  ' })).body['faults']).toEqual([{ path: 'meaning', message: 'write something here' }]);
    });
    const other = await server.as(workshop.reviewer2);
    const answers = await Promise.all([accept(reviewer), accept(other)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
    await asBefore(async () => {
      for (const client of [reviewer, other]) expect((await accept(client)).body['code']).toBe('wrong-state');
      expect((await act(reviewer, 'return', { questions: ['Once more?'] })).body['code']).toBe('wrong-state');
      expect((await act(restorer, 'reply', { text: 'No.' })).body['code']).toBe('wrong-state');
    });
  });

  it('takes no review before it is submitted, and no finding on what is not in it', async () => {
    const other = (await read()).entries[1]?.id;
    await asBefore(async () => {
      expect((await act(reviewer, 'findings', { entry: other, grade: 'note', text: 'Early.' })).body['code']).toBe('wrong-state');
      expect((await accept(reviewer)).body['code']).toBe('wrong-state');
    });
    await act(restorer, 'submit');
    await asBefore(async () => {
      const stray = await act(reviewer, 'findings', { entry: uuidv7(), grade: 'note', text: 'Where?' });
      expect([stray.status, stray.body['faults']]).toEqual([422, [{ path: 'entry', message: 'is not in this record' }]]);
      expect((await act(reviewer, 'findings', { entry: other, grade: 'huge', text: 'x' })).status).toBe(422);
      expect((await act(reviewer, 'return', { questions: [] })).status).toBe(422);
    });
  });

  it('is exported signed over its exact bytes, and anyone can check it with the published key', async () => {
    const file = exportFileSchema.parse((await reviewer.get(`/api/records/${device.run}/export`)).body);
    const jwks = (await server.stranger().get('/.well-known/jwks.json')).body as unknown as JSONWebKeySet;
    expect(jwks.keys[0]).not.toHaveProperty('d');
    // With the library alone, as an outsider would.
    const { payload } = await flattenedVerify(file, createLocalJWKSet(jwks), { algorithms: ['EdDSA'] });
    const exported = exportedRecordSchema.parse(JSON.parse(new TextDecoder().decode(payload)));
    expect(exported.entries).toEqual((await read()).entries);
    expect(await verifyExport(JSON.stringify(file), jwks)).toMatchObject({ ok: true, trusted: true, signature: { state: 'good' } });
    const forged = { ...file, payload: file.payload.replace(/.$/, (last) => (last === 'A' ? 'B' : 'A')) };
    expect(await verifyExport(JSON.stringify(forged), jwks)).not.toMatchObject({ trusted: true });
  });

  describe('with a release', () => {
    const refit = must(
      parseTree({
        ...lampTreeJson,
        id: 'refit',
        needsAtStart: ['release'],
        opening: { tools: [], instruments: [], parts: [], conditions: [] },
        reentries: [],
        suspects: [],
        steps: [
          lampTreeJson.steps.find(({ id }) => id === 'dead1'),
          { id: 'earth', kind: 'work', title: 'Change the fuse holder', lines: ['Change it.'], contact: 'hands', area: 'raw', tools: [], minutes: 5, hazards: [], exits: [{ id: 'done', on: ['done'], to: 'refer' }, { id: 'not', on: ['not-sure', 'cannot'], to: 'refer' }] },
          lampTreeJson.steps.find(({ id }) => id === 'refer'),
        ],
      }),
    );

    it('is given for a run that ended with the supply proven, and only for that', async () => {
      await act(restorer, 'submit');
      await asBefore(async () => {
        const { status, body } = await accept(reviewer, { release: true });
        expect([status, body['faults']]).toEqual([422, [{ path: 'release', message: 'this run did not end with the supply proven' }]]);
      });
      await supplyProven();
      expect((await read(reviewer)).may).toMatchObject({ release: true });
      expect((await accept(reviewer, { release: true })).status).toBe(201);
      expect((await read()).entries.at(-1)).toMatchObject({ kind: 'released', body: { machine: workshop.machine } });
      const { releases, machine } = dossierSchema.parse((await restorer.get(`/api/machines/${workshop.machine}`)).body);
      expect(releases).toMatchObject([{ run: device.run, givenBy: workshop.reviewer.id, valid: true, voidedAt: null }]);
      expect(machine.release).toEqual(releases[0]);
    });

    it('is not given when the machine was worked on since', async () => {
      await act(restorer, 'submit');
      await supplyProven();
      await BenchDevice.start(restorer, server, { machine: workshop.machine }, workshop.instruments.tester);
      const { status, body } = await accept(reviewer, { release: true });
      expect([status, body['say']]).toEqual([409, 'There was another run on this machine since. The supply has to be proven again before it is released.']);
    });

    it('is void after work on the supply, and both records say so', async () => {
      await addTree(server.database.ownerUrl, workshop, refit);
      await act(restorer, 'submit');
      await supplyProven();
      await accept(reviewer, { release: true });
      const next = await BenchDevice.start(restorer, server, { machine: workshop.machine, tree: 'refit' }, workshop.instruments.tester);
      expect(next.view.facts.release).toBe('valid');
      next.pass().dead();
      while (next.view.phase === 'warning') next.do({ type: 'WARNING_READ', step: next.view.key });
      await next.send();
      expect(next.view.facts.release).toBe('none');
      const { releases } = dossierSchema.parse((await restorer.get(`/api/machines/${workshop.machine}`)).body);
      expect(releases).toMatchObject([{ valid: false, voidedByRun: next.run, voidReason: 'work on the supply after the release' }]);
      const record = await read(reviewer);
      expect(record.entries.at(-1)).toMatchObject({ kind: 'void', body: { release: releases[0]?.id, byRun: next.run } });
      expect(verifyChain(record.entries, { head: record.head.hash, count: record.head.seq })).toMatchObject({ ok: true });
      await next.do({ type: 'STOP' }).dead().do({ type: 'CLOSE' }).do({ type: 'CLOSE' }).send();
      const late = await restorer.post('/api/runs', { id: uuidv7(), machine: workshop.machine, tree: 'refit', version: 1, monotonic: 0 });
      expect([late.status, late.body['code']]).toEqual([422, 'not-startable']);
    });

    it('gives nothing once it is older than the workshop allows', async () => {
      await addTree(server.database.ownerUrl, workshop, refit);
      await act(restorer, 'submit');
      await supplyProven();
      await accept(reviewer, { release: true });
      const back = server.time.now;
      server.time.now += 91 * 24 * 3_600_000;
      const again = await server.as(workshop.restorer);
      expect(dossierSchema.parse((await again.get(`/api/machines/${workshop.machine}`)).body).releases).toMatchObject([{ valid: false, voidedAt: null }]);
      const late = await again.post('/api/runs', { id: uuidv7(), machine: workshop.machine, tree: 'refit', version: 1, monotonic: 0 });
      expect(late.status).toBe(422);
      server.time.now = back;
      const started = await restorer.post('/api/runs', { id: uuidv7(), machine: workshop.machine, tree: 'refit', version: 1, monotonic: 0 });
      expect(runBundleSchema.parse(started.body).start.release).toBe(true);
    });
  });
});
