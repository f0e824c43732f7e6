/** Every route of the table against everyone who could come: no session, each role, another workshop, and bodies that do not fit. */
import { v7 as uuidv7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import type { RouteDef } from '@/shared/contract/defineRoute';
import { ROLES } from '@/shared/contract/people';
import { problemSchema } from '@/shared/contract/problems';
import { ROUTE_NAMES, routes } from '@/shared/contract/routes';
import type { RouteName } from '@/shared/contract/routes';
import { BenchDevice } from '@/tests/setup/BenchDevice';
import { makeWorkshop, password } from '@/tests/setup/factory';
import type { TestWorkshop } from '@/tests/setup/factory';
import { openObjectStore } from '@/tests/setup/objectStore';
import type { Answer, HttpClient } from '@/tests/setup/HttpClient';
import { openServer } from '@/tests/setup/testServer';
import type { TestServer } from '@/tests/setup/testServer';

const withSession = ROUTE_NAMES.filter((name) => (routes[name] as RouteDef).who !== 'anyone');
const withBody = ROUTE_NAMES.filter((name) => (routes[name] as RouteDef).body !== undefined);
/** They take a form in place of a JSON body. */
const withUpload = ROUTE_NAMES.filter((name) => (routes[name] as RouteDef).upload === true);
const withParams = ROUTE_NAMES.filter((name) => (routes[name] as RouteDef).params !== undefined);
/** Routes with parameters that a member of another workshop could try. */
const ofWorkshop = withParams;

describe('every route', () => {
  let server: TestServer;
  let here: TestWorkshop;
  let there: TestWorkshop;
  let store: Awaited<ReturnType<typeof openObjectStore>>;
  let run: string;
  let paper: string;
  let closed: string;
  const clients = new Map<string, HttpClient>();
  /** one more session of each role's person, to be ended */
  const spare = new Map<string, string>();

  beforeAll(async () => {
    store = await openObjectStore();
    server = await openServer({ objectStore: store.config });
    [here, there] = [await makeWorkshop(server.database.ownerUrl), await makeWorkshop(server.database.ownerUrl)];
    for (const role of ROLES) {
      clients.set(role, await server.as(here[role]));
      clients.set(`other ${role}`, await server.as(there[role]));
      await server.as(here[role]);
      const own = (await client(role).get('/api/sessions')).body['sessions'] as { id: string; current: boolean }[];
      spare.set(role, own.find((session) => !session.current)?.id ?? '');
    }
    const restorer = client('restorer');
    const first = await BenchDevice.start(restorer, server, { machine: here.machine }, here.instruments.tester);
    await first.pass().do({ type: 'STOP' }).dead().do({ type: 'CLOSE' }).do({ type: 'CLOSE' }).send();
    closed = first.run;
    run = (await BenchDevice.start(restorer, server, { machine: here.machine }, here.instruments.tester)).run;
    paper = String((await client('keeper').upload('/api/files?as=paper', Buffer.from('%PDF-1.4\n%%EOF\n'))).body['hash']);
    // The other workshop's trees have names of their own, so that a name alone can tell them apart.
    await server.query('alter table tree_versions disable trigger all');
    await server.query(`insert into trees (workshop, id) values ($1, 'only-here')`, [here.id]);
    await server.query(`insert into tree_versions select workshop, 'only-here', version, document, hash, state, author, checker, issued_at, withdrawn_at from tree_versions where workshop = $1 and tree = 'lamp'`, [here.id]);
    await server.query('alter table tree_versions enable trigger all');
  });
  afterAll(async () => {
    await server.stop();
    await store.stop();
  });

  const client = (who: string): HttpClient => {
    const found = clients.get(who);
    if (found === undefined) throw new Error(who);
    return found;
  };
  const pathOf = (name: RouteName, change: Record<string, string> = {}) => {
    const values: Record<string, string> = { run: name === 'submit' ? closed : run, record: closed, machine: here.machine, tree: 'only-here', version: '1', hash: paper, session: spare.get('keeper') ?? '', ...change };
    return routes[name].path.replace(/:(\w+)/g, (_, key: string) => encodeURIComponent(values[key] ?? ''));
  };
  const bodies: Partial<Record<RouteName, () => object>> = {
    signIn: () => ({ mail: here.keeper.mail, password }),
    changePassword: () => ({ password, next: 'kettle plank ruby fog' }),
    startRun: () => ({ id: uuidv7(), machine: here.machine, tree: 'only-here', version: 1, monotonic: 0 }),
    postEntries: () => ({ entries: [{ id: uuidv7(), seq: 2, event: { type: 'TICK', at: 0, monotonic: 0, boot: 'b' } }] }),
    answerHold: () => ({ id: uuidv7(), seq: 2, answer: 'given', password }),
    secondPerson: () => ({ id: uuidv7(), seq: 2, person: here.senior.id, password }),
    handOver: () => ({ id: uuidv7(), seq: 2, to: here.reviewer2.id, password }),
    takeOver: () => ({ id: uuidv7(), seq: 2, password }),
    closeStranded: () => ({ id: uuidv7(), seq: 2, reason: 'x', password }),
    submit: () => ({ id: uuidv7() }),
    addFinding: () => ({ id: uuidv7(), entry: uuidv7(), grade: 'note', text: 'x' }),
    returnRecord: () => ({ id: uuidv7(), questions: ['x?'] }),
    reply: () => ({ id: uuidv7(), text: 'x' }),
    accept: () => ({ id: uuidv7(), password, meaning: 'x', release: false }),
  };
  const send = (who: HttpClient, name: RouteName, path: string, body: unknown = bodies[name]?.()): Promise<Answer> => who.send(routes[name].method.toUpperCase(), path, body, {});
  const refused = (answer: Answer, status: number, code?: string) => {
    const problem = problemSchema.parse(answer.body);
    expect([answer.status, problem.code]).toEqual([status, code ?? problem.code]);
    expect(problem.say).toMatch(/^[“A-Z].{10,}[.)]$/su);
    expect(answer.headers.get('content-type')).toMatch(/^application\/problem\+json/);
  };
  /** Sessions come and go by signing in; nothing else may change. */
  const nothingWritten = async (work: () => Promise<void>) => {
    const before = await server.rows();
    await work();
    expect({ ...(await server.rows()), sessions: 0 }).toEqual({ ...before, sessions: 0 });
  };

  it('with a body has one here that fits its schema', () => {
    expect(Object.keys(bodies).sort()).toEqual([...withBody].sort());
    for (const name of withBody) expect((routes[name] as RouteDef).body?.safeParse(bodies[name]?.()).success, name).toBe(true);
  });

  it.each(withSession)('%s wants a session', async (name) => {
    await nothingWritten(async () => refused(await send(server.stranger(), name, pathOf(name)), 401, 'signed-out'));
  });

  it.each(withSession.flatMap((name) => ROLES.map((role) => [name, role] as const)))('%s for a %s is allowed or refused as the table says', async (name, role) => {
    const { who } = routes[name] as RouteDef;
    const allowed = who === 'member' || (Array.isArray(who) && who.includes(role));
    // A body that fits nothing: who may come in is told so, nobody writes anything.
    await nothingWritten(async () => {
      const answer = await send(client(role), name, pathOf(name, { session: spare.get(role) ?? '' }), withBody.includes(name) ? { nothing: 'fits' } : undefined);
      if (!allowed) refused(answer, 403, 'role-missing');
      else if (withBody.includes(name)) refused(answer, 422, 'bad-input');
      // who may add what is asked before the form is read: no role but these two adds to the workshop itself
      else if (withUpload.includes(name)) refused(answer, ['senior', 'keeper'].includes(role) ? 422 : 403, ['senior', 'keeper'].includes(role) ? 'bad-input' : 'role-missing');
      else expect(answer.status).toBe(200);
    });
  });

  it.each(ofWorkshop.flatMap((name) => ROLES.map((role) => [name, role] as const)))('%s shows nothing of this workshop to a %s of another', async (name, role) => {
    await nothingWritten(async () => {
      const answer = await send(client(`other ${role}`), name, pathOf(name));
      expect([403, 404]).toContain(answer.status);
      refused(answer, answer.status);
    });
  });

  it('lists nothing of this workshop to a member of another', async () => {
    for (const path of ['/api/machines', '/api/runs', '/api/records', '/api/instruments', '/api/people', '/api/trees']) {
      const { text } = await client('other keeper').get(path);
      for (const secret of [here.machine, run, closed, here.restorer.id, here.instruments.tester, 'only-here']) expect(text, path).not.toContain(secret);
    }
  });

  it.each(withParams)('%s answers 404 to a name that is not one', async (name) => {
    const { who } = routes[name] as RouteDef;
    const role = who === 'member' || who === 'anyone' ? 'keeper' : (who[0] ?? 'keeper');
    await nothingWritten(async () => {
      for (const bad of ['x', '1', '%00', "' or 1=1 --", '../../etc', '😀', '9'.repeat(400), crypto.randomUUID(), uuidv7()]) {
        refused(await send(client(role), name, pathOf(name, { run: bad, record: bad, machine: bad, tree: bad, version: bad, hash: bad, session: bad })), 404, 'not-found');
      }
      const undecodable = routes[name].path.replace(/:\w+/g, '%E0%A4%A');
      const answer = await send(client(role), name, undecodable);
      expect(answer.status).toBe(400);
      refused(answer, 400);
    });
  });

  it.each(withBody)('%s refuses a body that does not fit, and writes nothing', async (name) => {
    const { who } = routes[name] as RouteDef;
    const by = who === 'anyone' ? server.stranger() : client(who === 'member' ? 'keeper' : (who[0] ?? 'keeper'));
    const good = bodies[name]?.() ?? {};
    await nothingWritten(async () => {
      for (const bad of [[], null, 'text', 1, {}, { ...good, extra: 1 }, ...Object.keys(good).flatMap((key) => [{ ...good, [key]: null }, { ...good, [key]: {} }, { ...good, [key]: 'x\u0000' }, { ...good, [key]: -1 }, { ...good, [key]: 'x'.repeat(5000) }])]) {
        const answer = await send(by, name, pathOf(name), bad);
        // A bare null, text or number is JSON, but no body that the parser takes.
        refused(answer, typeof bad === 'object' && bad !== null ? 422 : 400);
      }
      refused(await by.send('POST', pathOf(name), undefined, { raw: '{"a":' }), 400, 'bad-json');
      refused(await by.send('POST', pathOf(name), undefined, {}), 400, 'bad-json');
      refused(await by.send('POST', pathOf(name), undefined, { raw: '<a/>', headers: { 'content-type': 'text/xml' } }), 400, 'not-json');
      refused(await by.send('POST', pathOf(name), good, { headers: { origin: 'https://elsewhere.example.org' } }), 403, 'cross-site');
    });
  });

  it('that is not in the table is answered in the same form', async () => {
    for (const path of ['/api', '/api/nothing', '/api/runs/x/y/z', '/.well-known/nothing', '/nothing']) refused(await client('keeper').get(path), 404, 'not-found');
    refused(await client('keeper').post('/api/machines', {}), 404, 'not-found');
  });

  it('of lists refuses a query that it does not know', async () => {
    for (const path of ['/api/runs?all=1', '/api/runs?mine=yes', '/api/runs?mine=1&mine=1', '/api/records?state=lost', `/api/runs/${run}/entries?after=-1`, `/api/runs/${run}/entries?after=x`]) {
      refused(await client('restorer').get(path), 422, 'bad-input');
    }
  });
});
