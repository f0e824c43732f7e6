import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { answeredHoldSchema, holdsSchema } from '@/shared/contract/holds';
import { entriesSchema } from '@/shared/contract/entries';
import { verifyChain } from '@/shared/record/chain';
import { BenchDevice } from '@/tests/setup/BenchDevice';
import { makeWorkshop, password } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import type { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

describe('a hold point', () => {
  let server: TestServer;
  let workshop: TestWorkshop;
  let restorer: HttpClient;
  let senior: HttpClient;
  let device: BenchDevice;

  beforeAll(async () => {
    server = await openServer({ signInTries: 4 });
  });
  beforeEach(async () => {
    workshop = await makeWorkshop(server.database.ownerUrl);
    restorer = await server.as(workshop.restorer);
    senior = await server.as(workshop.senior);
    device = await BenchDevice.start(restorer, server, { machine: workshop.machine }, workshop.instruments.tester);
    device.pass().answer('sound').dead().pass().pass().dead();
    device.do({ type: 'WARNING_READ', step: 'lamp' }).do({ type: 'HOLD_ASKED', step: 'lamp' });
    await device.send();
  });
  afterAll(() => server.stop());

  const answer = (client: HttpClient, change: object = {}) =>
    client.post(`/api/runs/${device.run}/holds`, { id: uuidv7(), seq: device.seq + 1, answer: 'given', password, ...change });
  const held = async () => {
    const run = ((await restorer.get('/api/runs?open=1')).body['runs'] as { id: string; awaitsHold: boolean }[]).find(({ id }) => id === device.run);
    return run?.awaitsHold;
  };
  const asBefore = async (work: () => Promise<void>) => {
    const rows = await server.rows();
    await work();
    expect({ ...(await server.rows()), sessions: 0 }).toEqual({ ...rows, sessions: 0 });
    expect(await held()).toBe(true);
  };

  it('is shown to seniors with step, reason, facts and the last readings', async () => {
    const { holds } = holdsSchema.parse((await senior.get('/api/holds')).body);
    expect(holds).toHaveLength(1);
    expect(holds[0]).toMatchObject({
      run: { id: device.run, awaitsHold: true },
      nextSeq: device.seq + 1,
      step: { key: 'lamp', title: 'Through the lamp', asks: 'Switch on.' },
      reason: 'Your countersign opens the first limited mains power.',
      askedBy: workshop.restorer.id,
      band: 'proved-dead',
      mayAnswer: true,
    });
    const facts = Object.fromEntries((holds[0]?.facts ?? []).map(({ name, value }) => [name, value]));
    expect(facts).toMatchObject({ 'Source mains': 'out', 'Stored charge': 'proved dead', Earth: 'proved', Insulation: 'proved', Proving: 'none yet', Fitted: 'nothing' });
    expect(holds[0]?.readings[0]?.body).toMatchObject({ event: { type: 'READING' } });
    expect(holds[0]?.readings.length).toBeLessThanOrEqual(10);
  });

  it('given by a senior lets the run go on, on the restorer’s device too', async () => {
    const given = await answer(senior);
    expect(given.status).toBe(201);
    const { entry, head } = answeredHoldSchema.parse(given.body);
    expect(entry).toMatchObject({ kind: 'hold-given', actor: workshop.senior.id, seq: device.seq + 1 });
    expect((await device.fetch()).map(({ id }) => id)).toEqual([entry.id]);
    expect(device.view.phase).toBe('guard');
    await device.do({ type: 'GUARD_HELD', step: 'lamp', heldMs: 2100 }).send();
    expect(device.view.band).toBe('lamp');
    expect(await held()).toBe(false);
    expect(holdsSchema.parse((await senior.get('/api/holds')).body).holds).toEqual([]);
    const { entries } = entriesSchema.parse((await restorer.get(`/api/runs/${device.run}/entries?after=${String(head.seq)}`)).body);
    expect(entries.map(({ kind }) => kind)).toEqual(['energised']);
    const all = entriesSchema.parse((await restorer.get(`/api/runs/${device.run}/entries`)).body);
    expect(verifyChain(all.entries, { head: all.head.hash, count: all.head.seq })).toMatchObject({ ok: true });
  });

  it('refused by a senior leads to make-safe, with the reason in the record', async () => {
    const refused = await answer(senior, { answer: 'refused', reason: 'The earth reading looks wrong.' });
    expect(answeredHoldSchema.parse(refused.body).entry).toMatchObject({ kind: 'hold-refused', body: { event: { reason: 'The earth reading looks wrong.' } } });
    await device.fetch();
    expect(device.view.purpose).toEqual({ is: 'stop' });
  });

  it('is refused only with a reason', async () => {
    await asBefore(async () => {
      const { status, body } = await answer(senior, { answer: 'refused' });
      expect([status, body['faults']]).toEqual([422, [{ path: 'reason', message: 'say why you refuse' }]]);
    });
  });

  it('is never countersigned by a restorer or a reviewer', async () => {
    for (const person of [workshop.restorer, workshop.restorer2, workshop.reviewer, workshop.keeper]) {
      const client = await server.as(person);
      await asBefore(async () => {
        const { status, body } = await answer(client);
        expect([status, body['code']]).toEqual([403, 'role-missing']);
      });
    }
  });

  it('is never countersigned by the one whose run it is, senior or not', async () => {
    // A restorer who is made a senior while the run goes on.
    await server.query(`update members set roles = '{senior}' where person = $1`, [workshop.restorer.id]);
    expect(holdsSchema.parse((await restorer.get('/api/holds')).body).holds).toMatchObject([{ mayAnswer: false }]);
    await asBefore(async () => {
      const { status, body } = await answer(restorer);
      expect([status, body['code'], body['say']]).toEqual([403, 'own-run', 'This is your own run: another senior has to countersign it.']);
    });
  });

  it('is signed with the senior’s password, asked again, and not endlessly', async () => {
    await asBefore(async () => {
      for (let i = 0; i < 4; i += 1) {
        const { status, body } = await answer(senior, { password: `guess ${String(i)}` });
        expect([status, body['code'], body['say']]).toEqual([422, 'wrong-password', 'The password is not right. Nothing was signed.']);
      }
      const { status, body } = await answer(senior);
      expect([status, body['code']]).toEqual([429, 'too-many']);
    });
    server.time.now += 16 * 60_000;
    const again = await server.as(workshop.senior);
    expect((await answer(again)).status).toBe(201);
  });

  it('answered twice by the same request is answered as the first time', async () => {
    const sent = { id: uuidv7(), seq: device.seq + 1 };
    const first = await answer(senior, sent);
    const second = await answer(senior, sent);
    expect([second.status, second.body]).toEqual([first.status, first.body]);
    const other = await answer(senior, { ...sent, answer: 'refused', reason: 'no' });
    expect([other.status, other.body['code']]).toEqual([409, 'id-taken']);
  });

  it('is answered once, by one of two seniors', async () => {
    const other = await server.as(workshop.senior2);
    const answers = await Promise.all([answer(senior), answer(other)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
    expect(answers.find(({ status }) => status === 409)?.body['code']).toBe('no-hold');
  });

  it('is bound to the run as the senior saw it', async () => {
    await asBefore(async () => {
      const { status, body } = await answer(senior, { seq: device.seq });
      expect([status, body['code']]).toEqual([409, 'out-of-sequence']);
    });
  });

  it('is gone when the run was stopped', async () => {
    await device.do({ type: 'STOP' }).send();
    const { status, body } = await answer(senior);
    expect([status, body['code'], body['say']]).toEqual([409, 'no-hold', 'No countersign is awaited here any more: the run has gone on or was stopped.']);
  });

  it('is not there for a senior of another workshop', async () => {
    const other = await server.as((await makeWorkshop(server.database.ownerUrl)).senior);
    expect(holdsSchema.parse((await other.get('/api/holds')).body).holds).toEqual([]);
    await asBefore(async () => {
      const { status, body } = await answer(other);
      expect([status, body['code']]).toEqual([404, 'not-found']);
    });
  });

  describe('with a second person present', () => {
    const present = (client: HttpClient, change: object = {}) => client.post(`/api/runs/${device.run}/second-person`, { id: uuidv7(), seq: device.seq + 1, person: workshop.restorer2.id, password, ...change });

    it('takes that person’s own password at the restorer’s device', async () => {
      const { status, body } = await present(restorer);
      expect([status, body['entry']]).toMatchObject([201, { actor: workshop.restorer2.id, body: { event: { type: 'SECOND_PRESENT', by: workshop.restorer2.id } } }]);
      await device.fetch();
    });

    it('does not take the restorer, another’s device, a stranger or a wrong password', async () => {
      const stranger = (await makeWorkshop(server.database.ownerUrl)).restorer;
      const other = await server.as(workshop.restorer2);
      await asBefore(async () => {
        expect((await present(restorer, { person: workshop.restorer.id })).body['code']).toBe('own-run');
        expect((await present(other)).body['code']).toBe('not-your-run');
        expect((await present(restorer, { person: stranger.id, password: 'guess' })).body['say']).toBe('The second person is no member of this workshop.');
        expect((await present(restorer, { password: 'guess' })).body['code']).toBe('wrong-password');
        expect((await present(restorer, { seq: 1 })).body['code']).toBe('out-of-sequence');
      });
    });
  });
});
