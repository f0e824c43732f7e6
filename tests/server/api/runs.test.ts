import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { defaultSettings } from '@/flows/document/settings';
import { runBundleSchema, runsSchema } from '@/shared/contract/runs';
import { verifyChain } from '@/shared/record/chain';
import { benchProfile, lampTree, lampTreeJson, makeDeadTree, must } from '@/tests/flows/support/bench';
import { parseTree } from '@/flows/document/parseTree';
import { BenchDevice } from '@/tests/setup/BenchDevice';
import { addMachine, addTree, makeWorkshop, setSettings } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import type { HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

describe('starting a run', () => {
  let server: TestServer;
  let workshop: TestWorkshop;
  let restorer: HttpClient;

  beforeAll(async () => {
    server = await openServer();
  });
  beforeEach(async () => {
    workshop = await makeWorkshop(server.database.ownerUrl);
    restorer = await server.as(workshop.restorer);
  });
  afterAll(() => server.stop());

  const wish = (change: object = {}) => ({ id: uuidv7(), machine: workshop.machine, tree: 'lamp', version: 1, monotonic: 1234, ...change });
  const nothingWritten = async (work: () => Promise<void>) => {
    const before = await server.rows();
    await work();
    expect(await server.rows()).toEqual({ ...before, sessions: (await server.rows())['sessions'] });
  };

  it('gives the device all that it needs to go on alone, and writes down what it is pinned to', async () => {
    const sent = wish();
    const { status, body } = await restorer.post('/api/runs', sent);
    expect(status).toBe(201);
    const bundle = runBundleSchema.parse(body);
    expect(bundle.run).toMatchObject({ id: sent.id, state: 'open', restorer: workshop.restorer.id, band: 'unknown', awaitsHold: false });
    expect(bundle.tree).toEqual(lampTree);
    expect(bundle.callees).toEqual([makeDeadTree]);
    expect(bundle.profile).toEqual(benchProfile);
    expect(bundle.settings).toEqual(defaultSettings);
    expect(bundle.instruments.map(({ tag, outOfDate }) => [tag, outOfDate])).toEqual([['M1', false], ['M2', true], ['T1', false]]);
    expect(bundle.entries).toHaveLength(1);
    expect(bundle.entries[0]).toMatchObject({ seq: 1, kind: 'opened', actor: workshop.restorer.id, monotonic: 1234 });
    expect(bundle.entries[0]?.body).toMatchObject({ pins: { treeHash: bundle.pins.treeHash, profileHash: bundle.pins.profileHash, settingsHash: bundle.pins.settingsHash, engine: bundle.pins.engine }, roles: ['restorer'] });
    expect(verifyChain(bundle.entries, { head: bundle.head.hash, count: bundle.head.seq })).toMatchObject({ ok: true });
    expect((await restorer.get(`/api/runs/${sent.id}`)).body).toEqual(body);
    expect(runsSchema.parse((await restorer.get('/api/runs?mine=1&open=1')).body).runs.map(({ id }) => id)).toEqual([sent.id]);
    expect(runsSchema.parse((await (await server.as(workshop.restorer2)).get('/api/runs?mine=1')).body).runs).toEqual([]);
  });

  it('sent twice, even at the same moment, is one run', async () => {
    const sent = wish();
    const [one, two] = await Promise.all([restorer.post('/api/runs', sent), restorer.post('/api/runs', sent)]);
    expect([one.status, two.status]).toEqual([201, 201]);
    expect(two.body).toEqual(one.body);
    expect(await server.query('select 1 from runs where machine = $1', [workshop.machine])).toHaveLength(1);
  });

  it('refuses an id that another run has', async () => {
    const sent = wish();
    await restorer.post('/api/runs', sent);
    const machine = await addMachine(server.database.ownerUrl, workshop);
    const other = await restorer.post('/api/runs', { ...sent, machine });
    expect([other.status, other.body]).toEqual([409, { code: 'id-taken', say: 'This run id is taken by another run.' }]);
  });

  it('allows one open run on a machine', async () => {
    const sent = wish();
    await restorer.post('/api/runs', sent);
    await nothingWritten(async () => {
      const second = await (await server.as(workshop.restorer2)).post('/api/runs', wish());
      expect([second.status, second.body['code'], second.body['run']]).toEqual([409, 'machine-busy', sent.id]);
      expect(second.body['say']).toBe('A run is open on Test supply. One run at a time works on a machine: close that one first.');
    });
  });

  it('allows one open run on a machine when two ask at the same moment', async () => {
    const other = await server.as(workshop.restorer2);
    const answers = await Promise.all([restorer.post('/api/runs', wish()), other.post('/api/runs', wish())]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
  });

  it.each(['draft', 'in-check', 'withdrawn'] as const)('refuses a version that is %s', async (state) => {
    await addTree(server.database.ownerUrl, workshop, lampTree, { version: 2, state });
    await nothingWritten(async () => {
      const { status, body } = await restorer.post('/api/runs', wish({ version: 2 }));
      expect([status, body]).toEqual([422, { code: 'not-startable', say: `Version 2 of “First lamp” is ${state}; a run needs an issued one.` }]);
    });
  });

  it('refuses a call of a version that has been withdrawn, with step and key, however deep it stands', async () => {
    await addTree(server.database.ownerUrl, workshop, makeDeadTree, { version: 2, state: 'withdrawn' });
    const pins = (id: string, tree: string, version: number) => must(parseTree({ ...lampTreeJson, id, steps: lampTreeJson.steps.map((step) => (step.kind === 'call' ? { ...step, tree, version, ...(tree === 'old' ? { exits: [{ id: 'dead', on: ['done', 'refer'], to: step.exits[0]?.to }] } : {}) } : step)) }));
    await addTree(server.database.ownerUrl, workshop, pins('old', 'make-dead', 2));
    await addTree(server.database.ownerUrl, workshop, pins('above', 'old', 1));
    const refused = async (tree: string) => {
      const { status, body } = await restorer.post('/api/runs', wish({ tree }));
      expect([status, body['code']]).toEqual([422, 'not-startable']);
      return body['faults'];
    };
    expect(await refused('old')).toEqual([{ path: 'dead1.version', message: 'version 2 of “Make dead” has been withdrawn' }]);
    expect(await refused('above')).toEqual([{ path: 'old/dead1.version', message: 'version 2 of “Make dead” has been withdrawn' }]);
  });

  it('refuses a machine and a version that are not there, or that belong to another workshop', async () => {
    const other = await makeWorkshop(server.database.ownerUrl);
    for (const change of [{ machine: other.machine }, { machine: crypto.randomUUID() }, { tree: 'nothing' }, { version: 9 }]) {
      const { status, body } = await restorer.post('/api/runs', wish(change));
      expect([status, body['code']], JSON.stringify(change)).toEqual([404, 'not-found']);
    }
  });

  it('refuses a tree that does not apply to the machine, and says why', async () => {
    const machine = await addMachine(server.database.ownerUrl, workshop, { profile: { ...benchProfile, mains: { ...benchProfile.mains, protectiveClass: 'II' } } });
    const { status, body } = await restorer.post('/api/runs', wish({ machine }));
    expect([status, body['say']]).toEqual([422, '“First lamp” does not apply to Test supply: it is for protective class I.']);
  });

  it('refuses a tree for which the profile has no rows, with the step', async () => {
    const tree = must(parseTree({ ...lampTreeJson, id: 'returns', steps: lampTreeJson.steps.map((step) => (step.id === 'insulation' ? { ...step, kind: 'prove-returns', exits: [{ id: 'good', on: ['in'], to: 'dead2' }, { id: 'bad', on: ['high', 'close', 'not-sure', 'cannot'], to: 'refer' }] } : step)) }));
    await addTree(server.database.ownerUrl, workshop, tree);
    const machine = await addMachine(server.database.ownerUrl, workshop, { profile: { ...benchProfile, conductors: [] } });
    const { status, body } = await restorer.post('/api/runs', wish({ machine, tree: 'returns' }));
    expect([status, body['code'], body['faults']]).toEqual([422, 'not-startable', [{ path: 'insulation.kind', message: 'the profile has no row for this step' }]]);
  });

  it('refuses a tree that needs a release which the machine does not have', async () => {
    await addTree(server.database.ownerUrl, workshop, must(parseTree({ ...lampTreeJson, id: 'refit', needsAtStart: ['release'] })));
    await nothingWritten(async () => {
      const { status, body } = await restorer.post('/api/runs', wish({ tree: 'refit' }));
      expect([status, body['code']]).toEqual([422, 'not-startable']);
      expect(body['say']).toMatch(/^This tree needs at its start: .*release/);
    });
  });

  it('pins the settings of that day: a later change of them moves no run under way', async () => {
    const sent = wish();
    await restorer.post('/api/runs', sent);
    await setSettings(server.database.ownerUrl, workshop, { ...defaultSettings, deadVolts: 2 });
    expect(runBundleSchema.parse((await restorer.get(`/api/runs/${sent.id}`)).body).settings.deadVolts).toBe(5);
    const machine = await addMachine(server.database.ownerUrl, workshop);
    expect(runBundleSchema.parse((await restorer.post('/api/runs', wish({ machine }))).body).settings.deadVolts).toBe(2);
  });

  it('is not led on by a tree that was changed behind its back', async () => {
    const sent = wish();
    await restorer.post('/api/runs', sent);
    // As a superuser with the guard taken off, since nobody else can.
    await server.query('alter table tree_versions disable trigger tree_versions_are_frozen');
    await server.query(`update tree_versions set hash = repeat('0', 64) where workshop = $1 and tree = 'lamp'`, [workshop.id]);
    await server.query('alter table tree_versions enable trigger tree_versions_are_frozen');
    expect((await restorer.get(`/api/runs/${sent.id}`)).status).toBe(500);
  });

  it('starts with what the last run has left on the machine', async () => {
    const first = await BenchDevice.start(restorer, server, wish(), workshop.instruments.tester);
    first.pass();
    first.do({ type: 'STOP' });
    await first.send();
    await server.query('update runs set state = $2, ended = $3, closed_at = now() where id = $1', [first.run, 'closed', 'stopped']);
    const thing = { id: 'strap', name: 'Earth strap', class: 'lifted', area: 'earth' };
    const tag = (is: string, body: unknown) => server.query(`insert into machine_tags (workshop, machine, run, "is", body, since) values ($1, $2, $3, $4, $5, now())`, [workshop.id, workshop.machine, first.run, is, JSON.stringify(body)]);
    await tag('fitted', thing);
    const second = runBundleSchema.parse((await restorer.post('/api/runs', wish())).body);
    expect(second.start).toMatchObject({ release: false, fitted: [thing], killers: [] });
    await server.query('update runs set state = $2, ended = $3, closed_at = now() where id = $1', [second.run.id, 'closed', 'stopped']);
    await tag('killer', { part: 'bridge', killer: 'short' });
    // no path of this tree rules that killer out, so power would come on a part that dies again
    const third = await restorer.post('/api/runs', wish());
    expect([third.status, third.body['code'], third.body['rule']]).toEqual([422, 'not-startable', 'H15']);
    const dossier = (await restorer.get(`/api/machines/${workshop.machine}`)).body;
    expect(dossier['staysFitted']).toMatchObject([{ is: 'fitted', thing }, { is: 'killer', part: 'bridge', killer: 'short' }]);
  });
});
