import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { entriesSchema } from '@/shared/contract/entries';
import { GIVES, TAKES } from '@/shared/contract/handOver';
import { answeredHoldSchema, holdsSchema } from '@/shared/contract/holds';
import { jwksSchema, recordSchema, signedRecordSchema } from '@/shared/contract/records';
import type { RunSummary } from '@/shared/contract/runSummary';
import { runBundleSchema, runsSchema } from '@/shared/contract/runs';
import { verifyExport } from '@/shared/record/verifyExport';
import { BenchDevice } from '@/tests/setup/BenchDevice';
import { makeWorkshop, password } from '@/tests/setup/factory';
import type { TestPerson, TestWorkshop } from '@/tests/setup/factory';
import type { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

describe('handing a run over', () => {
  let server: TestServer;
  let workshop: TestWorkshop;
  let giver: HttpClient;
  let taker: HttpClient;
  let device: BenchDevice;

  beforeAll(async () => {
    server = await openServer();
  });
  beforeEach(async () => {
    workshop = await makeWorkshop(server.database.ownerUrl);
    giver = await server.as(workshop.restorer);
    taker = await server.as(workshop.restorer2);
    device = await BenchDevice.start(giver, server, { machine: workshop.machine }, workshop.instruments.tester);
    await device.pass().answer('sound').dead().send();
  });
  afterAll(() => server.stop());

  const offer = (client = giver, change: object = {}) => client.post(`/api/runs/${device.run}/hand-over`, { id: uuidv7(), seq: device.seq + 1, to: workshop.restorer2.id, password, ...change });
  const take = (client = taker, change: object = {}) => client.post(`/api/runs/${device.run}/take-over`, { id: uuidv7(), seq: device.seq + 2, password, ...change });
  const summary = async (client = giver): Promise<RunSummary> => runBundleSchema.parse((await client.get(`/api/runs/${device.run}`)).body).run;
  const wholeRecord = async () => entriesSchema.parse((await giver.get(`/api/runs/${device.run}/entries`)).body).entries;
  /** The device of the one who has taken it: another page, with a boot of its own. */
  const nextDevice = async (client: HttpClient): Promise<BenchDevice> => {
    const next = new BenchDevice(client, server, runBundleSchema.parse((await client.get(`/api/runs/${device.run}`)).body), workshop.instruments.tester);
    next.boot = 'another-device';
    return next;
  };
  const handOver = async (): Promise<BenchDevice> => {
    expect((await offer()).status).toBe(201);
    expect((await take()).status).toBe(201);
    return nextDevice(taker);
  };
  const asBefore = async (work: () => Promise<void>) => {
    const [rows, run] = [await server.rows(), await summary()];
    await work();
    expect({ ...(await server.rows()), sessions: 0 }).toEqual({ ...rows, sessions: 0 });
    expect(await summary()).toEqual(run);
  };

  it('is signed by the one who gives, is shown to the one who is asked, and changes nobody’s right yet', async () => {
    const answer = await offer(giver, { note: 'C1 reads a little low.' });
    expect(answer.status).toBe(201);
    const { entry } = answeredHoldSchema.parse(answer.body);
    expect(entry).toMatchObject({ kind: 'handed-over', actor: workshop.restorer.id, seq: device.seq + 1, body: { event: { by: workshop.restorer.id, to: workshop.restorer2.id, meaning: GIVES, note: 'C1 reads a little low.' } } });
    expect(await summary()).toMatchObject({ restorer: workshop.restorer.id, former: [], offeredTo: workshop.restorer2.id, band: 'unknown' });
    const mine = async (client: HttpClient) => runsSchema.parse((await client.get('/api/runs?mine=1&open=1')).body).runs.map(({ id, offeredTo }) => ({ id, offeredTo }));
    expect(await mine(taker)).toEqual([{ id: device.run, offeredTo: workshop.restorer2.id }]);
    expect(await mine(await server.as(workshop.senior))).toEqual([]);
    expect((await (await nextDevice(taker)).do({ type: 'STOP' }).flush()).body).toMatchObject({ code: 'not-your-run' });
  });

  it('is taken with the other’s own password: the run, its rights and its roles are theirs from then on', async () => {
    await offer();
    const { entry } = answeredHoldSchema.parse((await take()).body);
    expect(entry).toMatchObject({ kind: 'taken-over', actor: workshop.restorer2.id, body: { event: { by: workshop.restorer2.id, senior: false, meaning: TAKES } } });
    expect(await summary()).toMatchObject({ restorer: workshop.restorer2.id, former: [workshop.restorer.id], offeredTo: null });
    const [row] = await server.query<{ restorer_roles: string[] }>('select restorer_roles from runs where id = $1', [device.run]);
    expect(row?.restorer_roles).toEqual(['restorer']);
    const next = await nextDevice(taker);
    expect(next.view).toMatchObject({ phase: 'opening', restorer: workshop.restorer2.id });
    await next.pass().dead().send();
    expect(next.view.key).toBe('~read-back');
    await next.pass().send();
    expect(next.view.key).toBe('earth');
    expect(await summary()).toMatchObject({ band: 'proved-dead', step: { key: 'earth' } });
  });

  it('leaves the old device no answer, not even a Stop, and says why', async () => {
    await handOver();
    await asBefore(async () => {
      for (const event of [{ type: 'STOP' }, { type: 'PAUSE' }, { type: 'RESTART' }] as const) {
        const { status, body } = await giver.post(`/api/runs/${device.run}/entries`, { entries: [{ id: uuidv7(), seq: device.seq + 3, event: device.stamp(event) }] });
        expect([status, body['code']]).toEqual([403, 'handed-over']);
        expect(body['say']).toBe('You have handed this run over. Only its restorer of now can do this.');
      }
      expect((await offer(giver, { seq: device.seq + 3 })).body).toMatchObject({ code: 'handed-over' });
      const second = await giver.post(`/api/runs/${device.run}/second-person`, { id: uuidv7(), seq: device.seq + 3, person: workshop.senior.id, password });
      expect(second.body).toMatchObject({ code: 'handed-over' });
    });
    // it may still read where the run stands
    expect((await giver.get(`/api/runs/${device.run}`)).status).toBe(200);
  });

  it('is offered by the restorer alone', async () => {
    await asBefore(async () => {
      for (const person of [workshop.restorer2, workshop.senior]) expect((await offer(await server.as(person), { to: workshop.senior2.id })).body).toMatchObject({ code: 'not-your-run' });
      for (const person of [workshop.reviewer, workshop.keeper]) expect((await offer(await server.as(person))).body).toMatchObject({ code: 'role-missing' });
    });
  });

  it('is offered to restorers and seniors of this workshop only, and not to oneself', async () => {
    const other = await makeWorkshop(server.database.ownerUrl);
    await asBefore(async () => {
      for (const to of [workshop.reviewer, workshop.keeper]) {
        const { status, body } = await offer(giver, { to: to.id });
        expect([status, body['say']]).toEqual([422, 'A run can only be handed to a restorer or a senior: nobody else leads one.']);
      }
      expect((await offer(giver, { to: other.restorer.id })).body).toMatchObject({ code: 'bad-input', faults: [{ path: 'to', message: 'is no member of this workshop' }] });
      expect((await offer(giver, { to: workshop.restorer.id })).body).toMatchObject({ code: 'refused', say: 'A run is handed over to somebody else.' });
    });
    await server.query('update members set left_at = now() where person = $1', [workshop.restorer2.id]);
    await asBefore(async () => expect((await offer()).body).toMatchObject({ code: 'bad-input' }));
  });

  it('is taken by the one who was asked alone, and only while it is offered', async () => {
    await asBefore(async () => expect((await take(taker, { seq: device.seq + 1 })).body).toMatchObject({ code: 'not-offered' }));
    await offer();
    await asBefore(async () => {
      for (const person of [workshop.senior, workshop.senior2]) expect((await take(await server.as(person))).body).toMatchObject({ code: 'not-offered' });
      expect((await take(await server.as(workshop.keeper))).body).toMatchObject({ code: 'role-missing' });
    });
    const entries = [{ id: uuidv7(), seq: device.seq + 2, event: device.stamp({ type: 'RESUME' }) }];
    expect((await giver.post(`/api/runs/${device.run}/entries`, { entries })).status).toBe(200);
    expect(await summary()).toMatchObject({ offeredTo: null, restorer: workshop.restorer.id });
    await asBefore(async () => expect((await take(taker, { seq: device.seq + 3 })).body).toMatchObject({ code: 'not-offered' }));
  });

  it('counts nothing that a device makes up: offers and takings are signed on the server', async () => {
    await asBefore(async () => {
      for (const event of [{ type: 'HANDED_OVER', by: workshop.restorer.id, to: workshop.restorer2.id, meaning: GIVES }, { type: 'TAKEN_OVER', by: workshop.restorer.id, senior: true, meaning: TAKES }] as const) {
        const { status, body } = await giver.post(`/api/runs/${device.run}/entries`, { entries: [{ id: uuidv7(), seq: device.seq + 1, event: device.stamp(event) }] });
        expect([status, body['code']]).toEqual([422, 'bad-input']);
      }
    });
  });

  it('wants both passwords', async () => {
    await asBefore(async () => expect((await offer(giver, { password: 'a guess' })).body).toMatchObject({ code: 'wrong-password' }));
    await offer();
    await asBefore(async () => expect((await take(taker, { password: 'a guess' })).body).toMatchObject({ code: 'wrong-password' }));
  });

  it('is refused while the bench is live', async () => {
    await device.pass().pass().dead().do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' }).send();
    await (await server.as(workshop.senior)).post(`/api/runs/${device.run}/holds`, { id: uuidv7(), seq: device.seq + 1, answer: 'given', password });
    await device.fetch();
    await device.do({ type: 'GUARD_HELD', step: 'lamp', heldMs: 2100 }).send();
    await asBefore(async () => {
      const { status, body } = await offer();
      expect([status, body['code'], body['rule'], body['say']]).toEqual([422, 'refused', 'H11', 'The bench is live: press Stop and make it safe first. Nobody takes over a live bench.']);
    });
  });

  it('sent twice is answered as the first time; what came in between refuses it', async () => {
    const sent = { id: uuidv7(), seq: device.seq + 1 };
    const first = await offer(giver, sent);
    expect(await offer(giver, sent)).toMatchObject({ status: 201, body: first.body });
    const taking = { id: uuidv7(), seq: device.seq + 2 };
    const taken = await take(taker, taking);
    expect(await take(taker, taking)).toMatchObject({ status: 201, body: taken.body });
    expect((await take(taker, { id: sent.id })).body).toMatchObject({ code: 'id-taken' });
  });

  it('refuses an offer that is based on an older record', async () => {
    await asBefore(async () => expect((await offer(giver, { seq: device.seq })).body).toMatchObject({ code: 'out-of-sequence' }));
  });

  it('keeps everybody who ever led the run from countersigning and from reviewing it', async () => {
    // the giver is a senior and a reviewer too by the time that it matters
    const next = await handOver();
    await server.query(`update members set roles = '{restorer,senior,reviewer}' where person = $1`, [workshop.restorer.id]);
    next.pass().dead().pass().pass().pass().dead();
    next.do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' });
    await next.send();
    expect(holdsSchema.parse((await giver.get('/api/holds')).body).holds).toMatchObject([{ mayAnswer: false }]);
    const answer = (client: HttpClient) => client.post(`/api/runs/${device.run}/holds`, { id: uuidv7(), seq: next.seq + 1, answer: 'given', password });
    await asBefore(async () => expect((await answer(giver)).body).toMatchObject({ code: 'own-run' }));
    const letters = await server.query<{ payload: { to: string } }>(`select payload from graphile_worker._private_jobs`);
    expect(letters.map(({ payload }) => payload.to)).not.toContain(workshop.restorer.id);
    expect((await answer(await server.as(workshop.senior))).status).toBe(201);
    await next.fetch();

    await next.do({ type: 'STOP' }).dead().do({ type: 'CLOSE' }).do({ type: 'CLOSE' }).send();
    const act = (client: HttpClient, path: string, body: object) => client.post(`/api/${path}`, { id: uuidv7(), ...body });
    expect((await act(giver, `runs/${device.run}/submit`, {})).body).toMatchObject({ code: 'handed-over' });
    expect((await act(taker, `runs/${device.run}/submit`, {})).status).toBe(201);
    const [first] = await wholeRecord();
    for (const [path, body] of [['findings', { entry: first?.id, grade: 'note', text: 'x' }], ['return', { questions: ['x?'] }], ['accept', { meaning: 'x', release: false, password }]] as const) {
      expect((await act(giver, `records/${device.run}/${path}`, body)).body).toMatchObject({ code: 'own-run' });
    }
    const seen = recordSchema.parse((await giver.get(`/api/records/${device.run}`)).body);
    expect(seen.may).toEqual({ submit: false, find: false, return: false, reply: false, accept: false, release: false });
    expect((await act(await server.as(workshop.reviewer), `records/${device.run}/accept`, { meaning: 'Read and accepted.', release: false, password })).status).toBe(201);
  });

  it('shows the record to both who led it, and to no other restorer', async () => {
    const next = await handOver();
    await next.do({ type: 'STOP' }).dead().pass().do({ type: 'CLOSE' }).do({ type: 'CLOSE' }).send();
    for (const client of [giver, taker]) expect((await client.get(`/api/records/${device.run}`)).status).toBe(200);
    const third: TestPerson = workshop.reviewer2;
    await server.query(`update members set roles = '{restorer}' where person = $1`, [third.id]);
    expect((await (await server.as(third)).get(`/api/records/${device.run}`)).status).toBe(404);
  });

  it('stands in the chain, in the signed export, and is verified with the published keys', async () => {
    const next = await handOver();
    await next.do({ type: 'STOP' }).dead().pass().do({ type: 'CLOSE' }).do({ type: 'CLOSE' }).send();
    const file = signedRecordSchema.parse((await taker.get(`/api/records/${device.run}/export`)).body);
    const verified = await verifyExport(JSON.stringify(file), jwksSchema.parse((await taker.get('/.well-known/jwks.json')).body) as Parameters<typeof verifyExport>[1]);
    if (!verified.ok) throw new Error(verified.say);
    expect(verified.trusted).toBe(true);
    const signs = verified.entries.filter(({ kind }) => kind === 'handed-over' || kind === 'taken-over').map(({ kind, actor }) => [kind, actor]);
    expect(signs).toEqual([['handed-over', workshop.restorer.id], ['taken-over', workshop.restorer2.id]]);
  });

  it('is kept by the database too: nobody who led a run drops out of it, and a closed run changes no hands', async () => {
    await handOver();
    const change = (set: string) => server.query(`update runs set ${set} where id = $1`, [device.run]);
    await expect(change(`former = '{}'`)).rejects.toThrow(/keeps everybody who led it/);
    await expect(change(`restorer = '${workshop.senior.id}'`)).rejects.toThrow(/keeps who led it/);
    await expect(change(`former = former || restorer`)).rejects.toThrow(/runs_former_is_not_now/);
  });
});
