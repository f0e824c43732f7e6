import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { entriesSchema, postedEntriesSchema } from '@/shared/contract/entries';
import { GENESIS, verifyChain } from '@/shared/record/chain';
import { recordEntrySchema } from '@/shared/record/recordEntry';
import { BenchDevice } from '@/tests/setup/BenchDevice';
import { makeWorkshop } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import type { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

describe('posting entries', () => {
  let server: TestServer;
  let workshop: TestWorkshop;
  let restorer: HttpClient;
  let device: BenchDevice;

  beforeAll(async () => {
    server = await openServer();
  });
  beforeEach(async () => {
    workshop = await makeWorkshop(server.database.ownerUrl);
    restorer = await server.as(workshop.restorer);
    device = await BenchDevice.start(restorer, server, { machine: workshop.machine }, workshop.instruments.tester);
  });
  afterAll(() => server.stop());

  const stored = async () => entriesSchema.parse((await restorer.get(`/api/runs/${device.run}/entries`)).body);
  const post = (entries: unknown, client = restorer) => client.post(`/api/runs/${device.run}/entries`, { entries });
  const asBefore = async (work: () => Promise<void>) => {
    const before = await stored();
    const rows = await server.rows();
    await work();
    expect(await stored()).toEqual(before);
    expect(await server.rows()).toEqual(rows);
  };

  it('adds what the engine takes, sealed in a chain, and moves the run on', async () => {
    device.pass().answer('sound');
    const answer = await device.flush();
    const { entries, head } = postedEntriesSchema.parse(answer.body);
    expect(entries.map(({ kind }) => kind)).toEqual(device.program.layout.opening.map(() => 'answer').concat('answer'));
    const all = await stored();
    expect(all.head).toEqual(head);
    expect(verifyChain(all.entries, { head: head.hash, count: head.seq })).toMatchObject({ ok: true });
    expect(all.entries[0]?.prev).toBe(GENESIS);
    expect(entries.at(-1)?.body).toMatchObject({ step: 'look', title: 'Look it over', outcome: { outcome: 'sound' }, band: 'unknown' });
    const list = (await restorer.get('/api/runs?open=1')).body['runs'];
    expect(list).toMatchObject([{ id: device.run, head, step: { key: device.view.key, title: device.view.title, stud: device.view.stud } }]);
  });

  it('answers what was sent before as the first time, alone or with more behind it', async () => {
    device.pass();
    const sent = [...device.outbox];
    const first = postedEntriesSchema.parse((await post(sent)).body);
    expect(postedEntriesSchema.parse((await post(sent)).body)).toEqual(first);
    device.answer('sound');
    const more = postedEntriesSchema.parse((await post(device.outbox)).body);
    expect(more.entries.slice(0, sent.length)).toEqual(first.entries);
    expect(more.entries).toHaveLength(sent.length + 1);
  });

  it('refuses other content under an id that is taken', async () => {
    device.pass();
    const sent = [...device.outbox];
    await device.send();
    const [entry] = sent;
    await asBefore(async () => {
      const { status, body } = await post([{ ...entry, event: { ...entry?.event, at: (entry?.event.at ?? 0) + 1 } }]);
      expect([status, body['code'], body['say']]).toEqual([409, 'id-taken', 'The id of entry 2 was used for another entry before.']);
    });
  });

  it('refuses a gap, and says what it has', async () => {
    device.pass().answer('sound');
    const sent = device.outbox;
    await post(sent.slice(0, 1));
    await asBefore(async () => {
      const { status, body } = await post(sent.slice(2));
      expect([status, body['code'], body['say']]).toEqual([409, 'out-of-sequence', 'Entry 4 cannot be added: the record has 2 so far, something in between is missing.']);
      expect(body['head']).toEqual((await stored()).head);
      expect(body['missing']).toEqual([]);
    });
  });

  it('refuses a stale sequence, and gives the entries that the device lacks', async () => {
    const rival = new BenchDevice(restorer, server, (await restorer.get(`/api/runs/${device.run}`)).body as never, workshop.instruments.tester);
    device.pass();
    rival.pass();
    await device.send();
    await asBefore(async () => {
      const { status, body } = await rival.flush();
      expect([status, body['code']]).toEqual([409, 'out-of-sequence']);
      expect(body['say']).toMatch(/^Place 2 of the record is taken/);
      expect(recordEntrySchema.array().parse(body['missing'])).toEqual((await stored()).entries.slice(1));
    });
  });

  it('takes one of two that come at the same moment for the same place', async () => {
    const rival = new BenchDevice(restorer, server, (await restorer.get(`/api/runs/${device.run}`)).body as never, workshop.instruments.tester);
    device.pass();
    rival.pass();
    const answers = await Promise.all([device.flush(), rival.flush()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const { entries, head } = await stored();
    expect(verifyChain(entries, { head: head.hash, count: head.seq })).toMatchObject({ ok: true });
  });

  it('takes the same batch sent twice at the same moment once', async () => {
    device.pass();
    const sent = [...device.outbox];
    const answers = await Promise.all([post(sent), post(sent), post(sent)]);
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200]);
    expect(answers[1]?.body).toEqual(answers[0]?.body);
    expect((await stored()).entries).toHaveLength(1 + sent.length);
  });

  it('refuses an answer to a step that is not current, and leaves the run as it was', async () => {
    device.pass();
    await device.send();
    const event = device.stamp({ type: 'ANSWER', step: 'see', answer: 'dim' });
    await asBefore(async () => {
      const { status, body } = await post([{ id: uuidv7(), seq: device.seq + 1, event }]);
      expect([status, body['code'], body['refusal'], body['say']]).toEqual([422, 'refused', 'not-now', 'That step is not the current one; the run has gone on.']);
    });
  });

  it('refuses what a house rule forbids, with the rule, and drops the whole batch', async () => {
    device.pass().answer('sound').dead().pass().pass().dead();
    expect(device.view.key).toBe('lamp');
    device.do({ type: 'WARNING_READ', step: 'lamp' });
    const event = device.stamp({ type: 'GUARD_HELD', step: 'lamp', heldMs: 2100 });
    const id = uuidv7();
    await asBefore(async () => {
      const { status, body } = await post([...device.outbox.slice(0, 150), { id, seq: device.seq + 1, event }]);
      expect([status, body['code'], body['entry']]).toEqual([422, 'refused', id]);
      expect(body['say']).toMatch(/\.$/);
    });
    expect((await device.flush()).status).toBe(200);
  });

  it('takes no countersign and no second person from the restorer’s device', async () => {
    device.pass();
    await device.send();
    for (const event of [
      { type: 'HOLD_GIVEN', step: 'lamp', by: workshop.senior.id },
      { type: 'HOLD_REFUSED', step: 'lamp', by: workshop.senior.id, reason: 'no' },
      { type: 'SECOND_PRESENT', by: workshop.senior.id },
    ] as const) {
      await asBefore(async () => {
        const { status, body } = await post([{ id: uuidv7(), seq: device.seq + 1, event: device.stamp(event) }]);
        expect([status, body['code']]).toEqual([422, 'bad-input']);
        expect(body['say']).toContain('is signed by its person');
      });
    }
  });

  it('belongs to the restorer of the run alone', async () => {
    device.pass();
    for (const person of [workshop.restorer2, workshop.senior]) {
      const other = await server.as(person);
      await asBefore(async () => {
        const { status, body } = await post(device.outbox, other);
        expect([status, body['code'], body['say']]).toEqual([403, 'not-your-run', 'Only the restorer of this run can do this.']);
      });
    }
  });

  it('ends with the run', async () => {
    device.do({ type: 'STOP' }).dead().do({ type: 'CLOSE' }).do({ type: 'CLOSE' });
    await device.send();
    const record = await restorer.get(`/api/records/${device.run}`);
    expect(record.body).toMatchObject({ run: { state: 'closed', ended: 'stopped', step: null } });
    const { status, body } = await post([{ id: uuidv7(), seq: device.seq + 1, event: device.stamp({ type: 'TICK' }) }]);
    expect([status, body['code']]).toEqual([409, 'wrong-state']);
    expect((await BenchDevice.start(restorer, server, { machine: workshop.machine }, workshop.instruments.tester)).run).not.toBe(device.run);
  });

  it('takes noted workings from another page of the restorer’s as an entry that moves nothing, and keeps them in the record', async () => {
    device.pass();
    await device.send();
    const before = device.view.key;
    const event = { ...device.stamp({ type: 'NOTE', sheet: 'rail-limits', inputs: { nominalVolts: 5, tolerancePercent: 5 }, headline: '4.75 V to 5.25 V.' }), boot: 'another-tab' };
    const { entries } = postedEntriesSchema.parse((await post([{ id: uuidv7(), seq: device.seq + 1, event }])).body);
    expect(entries[0]).toMatchObject({ kind: 'addendum', body: { event, step: before, then: before } });
    await device.fetch();
    device.answer('sound').do({ type: 'STOP' }).dead().do({ type: 'CLOSE' }).do({ type: 'CLOSE' });
    await device.send();
    const record = await restorer.get(`/api/records/${device.run}`);
    expect(JSON.stringify(record.body['entries'])).toContain('4.75 V to 5.25 V.');
  });

  it('goes on from the entries alone when the kept snapshot is gone or belongs to something else', async () => {
    device.pass();
    await device.send();
    await server.query(`update snapshots set program = 'something else' where run = $1`, [device.run]);
    device.answer('sound');
    await device.send();
    await server.query('delete from snapshots where run = $1', [device.run]);
    device.pass();
    await device.send();
    const [kept] = await server.query<{ state: unknown }>('select state from snapshots where run = $1', [device.run]);
    expect(kept?.state).toEqual(JSON.parse(JSON.stringify(device.state)));
  });

  describe('with an instrument', () => {
    const reading = (change: object) => device.stamp({ type: 'READING', step: device.view.key, row: device.view.current?.row.id ?? '', value: 0.04, typed: '0.04', instrument: { id: workshop.instruments.tester, twoPole: true, uncertainty: 0.001 }, ...change });

    beforeEach(async () => {
      device.pass().answer('sound').dead();
      expect(device.view.key).toBe('earth');
      device.do({ type: 'WARNING_READ', step: 'earth' });
      await device.send();
    });

    it.each([
      ['that is out of date', () => ({ instrument: { id: workshop.instruments.old, twoPole: true, uncertainty: 0.001 } }), 'M2 (Old tester) is out of date: its calibration ended on 2024-12-31. Take another instrument.'],
      ['that the workshop does not have', () => ({ instrument: { id: crypto.randomUUID(), twoPole: true, uncertainty: 0.001 } }), 'This workshop has no such instrument.'],
      ['that does not read this', () => ({ instrument: { id: workshop.instruments.meter, twoPole: false, uncertainty: 1 } }), 'M1 (Multimeter) does not read this quantity.'],
      ['said to be what it is not', () => ({ instrument: { id: workshop.instruments.meter, twoPole: true, uncertainty: 1 } }), 'M1 (Multimeter) is no two-pole tester.'],
      ['said to be more exact than it is', () => ({ instrument: { id: workshop.instruments.tester, twoPole: true, uncertainty: 0.00001 } }), 'T1 (Two-pole tester) is not as exact as this reading says.'],
      ['beyond its largest range', () => ({ value: 1e11, typed: '100G' }), 'This reading lies beyond the largest range of T1 (Two-pole tester). Enter over range, or take another instrument.'],
    ])('refuses one %s', async (_, change, say) => {
      await asBefore(async () => {
        const { status, body } = await post([{ id: uuidv7(), seq: device.seq + 1, event: reading(change()) }]);
        expect([status, body['code'], body['say']]).toEqual([422, 'instrument', say]);
      });
    });

    it('refuses one of the other workshop', async () => {
      const other = await makeWorkshop(server.database.ownerUrl);
      await asBefore(async () => {
        const { status, body } = await post([{ id: uuidv7(), seq: device.seq + 1, event: reading({ instrument: { id: other.instruments.tester, twoPole: true, uncertainty: 0.001 } }) }]);
        expect([status, body['say']]).toEqual([422, 'This workshop has no such instrument.']);
      });
    });

    it('takes over range, which has no uncertainty', async () => {
      const { status, body } = await post([{ id: uuidv7(), seq: device.seq + 1, event: reading({ value: 'over', typed: 'OL', instrument: { id: workshop.instruments.tester, twoPole: true, uncertainty: 0 } }) }]);
      expect([status, body['say']]).toEqual([200, undefined]);
    });

    it('refuses a reading that is not a number, at its place', async () => {
      await asBefore(async () => {
        for (const value of ['4.97', null, undefined, 'NaN', {}]) {
          const { status, body } = await post([{ id: uuidv7(), seq: device.seq + 1, event: { ...reading({}), value } }]);
          expect([status, body['code']], String(value)).toEqual([422, 'bad-input']);
          expect(JSON.stringify(body['faults'])).toContain('"entries.0.event.value"');
        }
      });
    });
  });

  describe('with a bad body', () => {
    it.each([
      ['no JSON', '{"entries": [', 400, 'bad-json'],
      ['no object', '[]', 422, 'bad-input'],
      ['no entry', '{"entries": []}', 422, 'bad-input'],
      ['an unknown key', '{"entries": [], "now": 1}', 422, 'bad-input'],
      ['a text that cannot be stored', '{"entries": ["a\\u0000b"]}', 422, 'bad-input'],
      ['half a character', '{"entries": ["\\ud800"]}', 422, 'bad-input'],
      ['far too much', `{"entries": ["${'x'.repeat(1_000_001)}"]}`, 413, 'too-large'],
      ['endless nesting', `{"entries": ${'['.repeat(5000)}${']'.repeat(5000)}}`, 422, 'bad-input'],
      ['a member named like a prototype', '{"entries": [{"__proto__": {"seq": 2}}]}', 422, 'bad-input'],
    ])('refuses %s', async (_, raw, status, code) => {
      await asBefore(async () => {
        const answer = await restorer.post(`/api/runs/${device.run}/entries`, undefined, { raw });
        expect([answer.status, answer.body['code']]).toEqual([status, code]);
        expect(answer.body['say']).toMatch(/^[A-Z].*\.$/s);
      });
    });

    it.each([
      ['a time before the epoch', { at: -1 }],
      ['a time in the year 300000', { at: 9e15 }],
      ['a fraction of a millisecond', { at: 1.5 }],
      ['no clock', { monotonic: undefined }],
      ['an endless clock', { monotonic: 1e300 }],
      ['an unknown event', { type: 'JUMP' }],
      ['an unknown key', { energy: 'on' }],
    ])('refuses an event with %s', async (_, change) => {
      await asBefore(async () => {
        const event = { ...device.stamp({ type: 'TICK' }), ...change };
        const { status, body } = await post([{ id: uuidv7(), seq: device.seq + 1, event }]);
        expect([status, body['code']]).toEqual([422, 'bad-input']);
      });
    });

    it('refuses an id that is no UUID of version 7', async () => {
      const event = device.stamp({ type: 'TICK' });
      for (const id of ['1', crypto.randomUUID(), uuidv7().toUpperCase(), 7]) {
        const { status } = await post([{ id, seq: device.seq + 1, event }]);
        expect(status, String(id)).toBe(422);
      }
    });

    it('refuses what is not sent as JSON', async () => {
      const { status, body } = await restorer.post(`/api/runs/${device.run}/entries`, undefined, { raw: 'entries=1', headers: { 'content-type': 'application/x-www-form-urlencoded' } });
      expect([status, body['code']]).toEqual([400, 'not-json']);
    });
  });
});
