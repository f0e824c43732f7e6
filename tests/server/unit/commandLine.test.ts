import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { advance, startRun } from '@/flows/machine/advance';
import type { MachineEvent } from '@/flows/machine/events';
import { nextEvent } from '@/flows/rehearsal/drive';
import { BadInput } from '@/server/cli/commands/args';
import type { Command } from '@/server/cli/commands/args';
import { compare } from '@/server/cli/commands/compare';
import { draft } from '@/server/cli/commands/draft';
import { readProgram } from '@/server/cli/commands/readProgram';
import { rehearse } from '@/server/cli/commands/rehearse';
import { replay } from '@/server/cli/commands/replay';
import { FORM_NAMES, jsonSchemaOf, schema } from '@/server/cli/commands/schema';

const MAKE_DEAD = 'flows/library/make-dead.json';
const FIRST_POWER = 'flows/library/first-power.json';
const PROFILE = 'db/seeds/demo/profiles/corvane-12.json';
const TABLE = 'docs/examples/low-rail.table.json';

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'lampstep-commands-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

const read = async (file: string) => JSON.parse(await readFile(file, 'utf8')) as Record<string, unknown>;
async function write(name: string, json: unknown): Promise<string> {
  const file = join(folder, name);
  await writeFile(file, typeof json === 'string' ? json : JSON.stringify(json));
  return file;
}

/** What a command says to bad input; a good one fails the test. */
async function complaint(command: Command, ...argv: string[]): Promise<string> {
  const answer = await command.run(argv).catch((error: unknown) => error);
  if (!(answer instanceof BadInput)) throw new Error(`taken: ${JSON.stringify(answer)}`);
  return answer.message;
}

/** A run of a tree in which all goes well. */
async function goodRun(tree: string): Promise<MachineEvent[]> {
  const program = await readProgram(tree, { profile: PROFILE });
  let state = startRun(program, { restorer: 'restorer', restorerIsSenior: false, at: 1_000_000_000_000, release: false, fitted: [], killers: [] });
  const events: MachineEvent[] = [];
  for (let event = nextEvent(program, state, null); event !== null; event = nextEvent(program, state, null)) {
    const taken = advance(program, state, event);
    if (!taken.ok) throw new Error(taken.refusal.say);
    state = taken.state;
    events.push(event);
  }
  return events;
}

describe('rehearse', () => {
  it('plays one suspect of the library, or all of them', async () => {
    const one = await rehearse.run([FIRST_POWER, '--profile', PROFILE, '--suspect', 'bridge-open']);
    expect(one).toMatchObject({ good: true, output: { coverage: { verdict: 1 }, suspects: [{ suspect: 'bridge-open', reached: 'verdict', end: { key: 'end-bridge-open' } }] } });
    const all = await rehearse.run([FIRST_POWER, '--profile', PROFILE]);
    expect((all.output as { suspects: unknown[] }).suspects.length).toBeGreaterThan(15);
  });

  it('says which suspects there are, and what is missing', async () => {
    expect(await complaint(rehearse, FIRST_POWER, '--profile', PROFILE, '--suspect', 'gremlin')).toMatch(/no suspect "gremlin".*bridge-open/);
    expect(await complaint(rehearse, FIRST_POWER)).toMatch(/Usage: rehearse/);
  });
});

describe('draft', () => {
  it('orders the example of the documentation, and reports the gap', async () => {
    const { good, output } = await draft.run([TABLE]);
    expect(good).toBe(true);
    expect(output).toMatchObject({ root: { check: 'pass-junctions' }, report: { gap: 0, gapTo: 'optimum', groups: [] } });
  });

  it('prints the draft as a tree, under an id that a tree may have', async () => {
    expect(await draft.run([TABLE, '--tree', 'low-rail'])).toMatchObject({ good: true, output: { format: 1, id: 'low-rail', steps: expect.arrayContaining([expect.objectContaining({ id: 'pass-junctions', kind: 'observe' })]) as unknown } });
    expect(await complaint(draft, TABLE, '--tree', '10')).toMatch(/head, id: an id is made of/);
  });

  it('finds suspects that no check tells apart', async () => {
    const table = await read(TABLE);
    const file = await write('alike.json', { ...table, checks: (table['checks'] as unknown[]).slice(0, 1), cells: (table['cells'] as string[][]).map((row) => row.slice(0, 1)) });
    expect(await draft.run([file])).toMatchObject({ good: false, output: { report: { groups: [['reservoir-dry', 'pass-open', 'driver-dead', 'freewheel-open', 'divider-drift']] } } });
  });

  it.each([
    ['a prior of 0', { prior: 0 }, /a prior must be more than 0/],
    ['a negative prior', { prior: -1 }, /a prior must be more than 0/],
    ['a prior that is no number', { prior: 'much' }, /a prior must be a number/],
    ['an id that looks like a number', { id: '10' }, /suspects\[0\]\.id/],
    ['an id with a dot', { id: 'a.b' }, /an id is made of/],
    ['an id that every object owns', { id: 'constructor' }, /reserved/],
    ['a key that is not known', { weight: 3 }, /weight/],
  ])('refuses %s', async (_, change, says) => {
    const table = await read(TABLE);
    const [first, ...rest] = table['suspects'] as Record<string, unknown>[];
    expect(await complaint(draft, await write('bad.json', { ...table, suspects: [{ ...first, ...change }, ...rest] }))).toMatch(says);
  });

  it('refuses cells that do not fit, each by its place', async () => {
    const table = await read(TABLE);
    const cells = (table['cells'] as string[][]).map((row, i) => (i === 1 ? row.slice(1) : i === 2 ? ['maybe', ...row.slice(1)] : row));
    const said = await complaint(draft, await write('cells.json', { ...table, cells }));
    expect(said).toMatch(/4 cells for 5 checks/);
    expect(said).toMatch(/the check "return-ohms" has no answer "maybe"/);
    expect(said).toMatch(/cells\[2\]\[0\]/);
  });

  it('refuses keys that would reach into every object, and a megabyte of nesting, at once', async () => {
    expect(await complaint(draft, await write('proto.json', '{"format":1,"title":"x","__proto__":{"admin":true},"suspects":[],"checks":[],"cells":[]}'))).toMatch(/__proto__|suspects/);
    expect(({} as { admin?: boolean }).admin).toBeUndefined();
    const deep = `${'['.repeat(500_000)}${']'.repeat(500_000)}`;
    expect(await complaint(draft, await write('deep.json', deep))).toMatch(/deep\.json/);
  });
});

describe('compare', () => {
  it('says what changed, and holds a change back that reaches energy', async () => {
    expect(await compare.run([FIRST_POWER, FIRST_POWER])).toEqual({ good: true, output: { risk: 'none', changes: [], newWaysToLive: [] } });
    const tree = await read(FIRST_POWER);
    const steps = tree['steps'] as Record<string, unknown>[];
    const file = await write('shortcut.json', { ...tree, steps: steps.map((s) => (s['id'] === 'earth' ? { ...s, exits: (s['exits'] as Record<string, unknown>[]).map((e) => (e['id'] === 'good' ? { ...e, to: 'lamp' } : e)) } : s)) });
    const { good, output } = await compare.run([FIRST_POWER, file]);
    expect(good).toBe(false);
    expect(output).toMatchObject({ risk: 'energy', changes: [{ step: 'earth', what: 'exit' }], newWaysToLive: [{ to: 'lamp', leg: { from: 'earth', to: 'lamp' } }] });
  });

  it('wants two trees', async () => {
    expect(await complaint(compare, FIRST_POWER)).toMatch(/Usage: compare/);
    expect(await complaint(compare, FIRST_POWER, PROFILE)).toMatch(/corvane-12\.json:\n {2}head/);
  });
});

describe('replay', () => {
  it('plays a run on its own tree and on a changed one', async () => {
    const run = await write('run.json', await goodRun(FIRST_POWER));
    expect(await replay.run([FIRST_POWER, '--profile', PROFILE, '--run', run])).toMatchObject({ good: true, output: { same: true, end: { says: 'supply-proven' } } });
    const tree = await read(FIRST_POWER);
    const steps = tree['steps'] as Record<string, unknown>[];
    const other = await write('other.json', { ...tree, steps: steps.map((s) => (s['id'] === 'look-outside' ? { ...s, exits: (s['exits'] as Record<string, unknown>[]).map((e) => (e['id'] === 'sound' ? { ...e, to: 'look-inside' } : e)) } : s)) });
    expect(await replay.run([other, '--profile', PROFILE, '--run', run])).toMatchObject({ good: false, output: { same: false, divergences: [{ is: 'elsewhere', was: 'put-back', now: 'look-inside' }] } });
  });

  it('plays the examples of the documentation, on the machine that a record carries', async () => {
    expect(await replay.run(['flows/library/look-over.json', '--run', 'docs/examples/RECORD.json'])).toMatchObject({ good: true, output: { same: true, end: { says: expect.any(String) as string } } });
    expect(await replay.run([MAKE_DEAD, '--profile', PROFILE, '--run', 'docs/examples/make-dead.events.json'])).toMatchObject({ good: true, output: { end: { says: 'cleared' } } });
  });

  it('says what is wrong with a run', async () => {
    expect(await complaint(replay, MAKE_DEAD, '--profile', PROFILE, '--run', await write('object.json', { answers: [] }))).toMatch(/neither an array of machine events nor an exported record/);
    expect(await complaint(replay, MAKE_DEAD, '--profile', PROFILE, '--run', await write('event.json', [{ type: 'ROW', step: 'isolate' }]))).toMatch(/event 1/);
    expect(await complaint(replay, MAKE_DEAD, '--run', 'docs/examples/make-dead.events.json')).toMatch(/does not carry the profile/);
    expect(await complaint(replay, MAKE_DEAD, '--profile', PROFILE, '--run', await write('text.json', 'not JSON'))).toMatch(/is not JSON/);
  });
});

describe('schema', () => {
  it.each(['tree', 'profile'] as const)('of the %s is the one that is kept in the documentation', async (name) => {
    expect(await read(`docs/schema/${name}.json`), `npm run -s lampstep -- schema ${name} > docs/schema/${name}.json`).toEqual(jsonSchemaOf(name));
  });

  it.each(FORM_NAMES)('of %s is printed', async (name) => {
    const { output } = await schema.run([name]);
    expect(output).toMatchObject({ $schema: 'https://json-schema.org/draft/2020-12/schema' });
  });

  it('says which forms there are', async () => {
    expect(await complaint(schema, 'poem')).toMatch(/no form "poem"[\s\S]*tree \| profile/);
  });
});
