/** A small machine and two small trees for tests of the engine, and a person who answers them. */
import { parseProfile, parseTree } from '@/flows/document/parseTree';
import type { Profile } from '@/flows/document/profile';
import type { FittedThing } from '@/flows/document/steps';
import { defaultSettings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { advance, startRun } from '@/flows/machine/advance';
import type { Advanced, RunState } from '@/flows/machine/advance';
import { compile } from '@/flows/machine/compile';
import type { Program } from '@/flows/machine/compile';
import type { MachineEvent } from '@/flows/machine/events';
import { view } from '@/flows/machine/view';
import type { RunView } from '@/flows/machine/view';

/** One rail, one return, one capacitor above the limits. */
export const benchProfile: Profile = must(
  parseProfile({
    format: 1,
    title: 'Test supply',
    machineClass: 'Test',
    supplyKind: 'linear',
    mains: { volts: 230, hertz: 50, voltAmps: 120, protectiveClass: 'I', inlet: 'lead at the back', fuse: { amps: 1, kind: 'slow' }, protection: 'rcd', earthLeadOhms: 0.05, insulationTestVolts: 250 },
    raw: { name: 'raw +10.5 V', volts: 10.5, ratedAmps: 12, point: 'raw' },
    sources: [],
    rails: [{ id: 'p5', name: '+5 V', nominal: 5, tolerance: 0.05, maxAmps: 12, limitAmps: 15, trip: { lowVolts: 5.8, highVolts: 6.6 }, sense: 'terminals', takes: false }],
    conductors: [{ id: 'r1', name: 'return 1', kind: 'return', from: '0 V bar', to: 'cage', squareMillimetres: 4, metres: 0.4, connector: 'J1', pin: '2', maxOhms: 0.01, rails: ['p5'] }],
    stores: [{ id: 'c1', name: 'C1 reservoir', farads: 0.068, voltsWorked: 20, voltsRated: 25, bleederOhms: null, rebounds: true, reboundWaitSeconds: 60, point: 'raw' }],
    devices: [],
    boards: { removable: true, fitted: [] },
    heatsinks: [],
    points: [
      { id: 'raw', name: 'C1 +', connector: 'C1', pin: '+', rail: null, mark: null, neighbours: [] },
      { id: 't5', name: '+5 V terminal', connector: 'TB1', pin: '3', rail: 'p5', mark: null, neighbours: ['0 V'] },
      { id: 't0', name: '0 V terminal', connector: 'TB1', pin: '4', rail: null, mark: null, neighbours: [] },
    ],
    zeroPoint: 't0',
    minimumLoad: [],
    hazards: [],
    ownerLimits: [],
    outOfMachine: true,
  }),
);

const base = { tools: [], minutes: 1, hazards: [] };
const unsure = (to: string) => ({ id: 'unsure', on: ['not-sure', 'cannot'], to });

/** Isolate, discharge, prove dead: called by the other tree. */
export const makeDeadTree: Tree = must(
  parseTree({
    format: 1,
    id: 'make-dead',
    title: 'Make dead',
    symptom: 'Any',
    appliesTo: { protectiveClasses: ['I', 'II'], supplyKinds: ['linear', 'switched-from-raw', 'switch-mode'], fewestRails: 1, mostRails: 16 },
    needsAtStart: [],
    opening: { tools: [], instruments: [], parts: [], conditions: [] },
    suspects: [],
    steps: [
      { ...base, id: 'isolate', kind: 'isolate', title: 'Pull the plug', lines: ['Pull the plug.'], contact: 'none', exits: [{ id: 'out', on: ['out'], to: 'discharge' }, { id: 'again', on: ['not-out', 'not-sure'], to: 'isolate', atMost: 3, then: 'give-up' }] },
      { ...base, id: 'discharge', kind: 'discharge', title: 'Discharge', lines: ['Clip the tool on.'], contact: 'probe', toolOhms: 100, toolWatts: 10, exits: [{ id: 'low', on: ['in'], to: 'prove' }, { id: 'high', on: ['high', 'not-sure', 'cannot'], to: 'isolate', atMost: 3, then: 'give-up' }] },
      { ...base, id: 'prove', kind: 'prove-dead', title: 'Prove dead', lines: ['Prove, test, prove.'], contact: 'probe', exits: [{ id: 'dead', on: ['in'], to: 'dead' }, { id: 'falling', on: ['falling'], to: 'discharge', atMost: 3, then: 'give-up' }, { id: 'live', on: ['high', 'not-sure', 'cannot'], to: 'isolate', atMost: 3, then: 'give-up' }] },
      { ...base, id: 'dead', kind: 'end', title: 'Proved dead', lines: ['Go on.'], contact: 'none', says: 'cleared', exits: [] },
      { ...base, id: 'give-up', kind: 'end', title: 'Not made dead', lines: ['Call a senior.'], contact: 'none', says: 'stopped', exits: [] },
    ],
    reentries: [],
  }),
);

const call = (id: string, to: string) => ({ ...base, id, kind: 'call', title: 'Make dead', lines: ['Make dead.'], contact: 'none', tree: 'make-dead', version: 1, exits: [{ id: 'dead', on: ['dead'], to }] });

/** Look-over, dead, earth, insulation, lamp, look, dead, end. */
export const lampTreeJson = {
  format: 1,
  id: 'lamp',
  title: 'First lamp',
  symptom: 'Long dormant',
  appliesTo: { protectiveClasses: ['I'], supplyKinds: ['linear'], fewestRails: 1, mostRails: 6 },
  needsAtStart: [],
  opening: { tools: [], instruments: [{ id: 'meter', name: 'Meter', kind: 'multimeter', reads: ['volts-dc', 'ohms'] }], parts: [], conditions: [] },
  suspects: [
    { id: 'short', part: 'C1', mode: 'short', prior: 1, killedBy: [] },
    { id: 'bridge', part: 'Bridge', mode: 'short', prior: 1, killedBy: ['short'] },
  ],
  steps: [
    { ...base, id: 'look', kind: 'observe', title: 'Look it over', lines: ['Look.'], contact: 'none', asks: 'Is it sound?', lookOver: true, exits: [{ id: 'sound', label: 'Sound', on: ['answer'], to: 'dead1' }, { id: 'damaged', label: 'Damaged', on: ['answer'], to: 'refer', verdict: 'fail' }, unsure('refer')] },
    call('dead1', 'earth'),
    { ...base, id: 'earth', kind: 'prove-earth', title: 'Earth', lines: ['Read the earth.'], contact: 'hands', exits: [{ id: 'good', on: ['in'], to: 'insulation' }, { id: 'bad', on: ['high', 'close', 'not-sure', 'cannot'], to: 'refer' }] },
    { ...base, id: 'insulation', kind: 'prove-insulation', title: 'Insulation', lines: ['Read the insulation.'], contact: 'hands', exits: [{ id: 'good', on: ['in'], to: 'dead2' }, { id: 'bad', on: ['low', 'close', 'not-sure', 'cannot'], to: 'refer' }] },
    call('dead2', 'lamp'),
    { ...base, id: 'lamp', kind: 'energise', title: 'Through the lamp', lines: ['Switch on.'], contact: 'none', source: 'mains', through: 'lamp', node: 'inlet', load: 'none', mostVolts: 230, mostAmps: 0.5, longestMinutes: 10, lampWatts: 60, abort: 'dead3', exits: [{ id: 'on', on: ['on'], to: 'see' }, { id: 'not', on: ['cannot'], to: 'dead3' }] },
    { ...base, id: 'see', kind: 'observe', title: 'Look at the lamp', lines: ['Look.'], contact: 'none', power: 'live', asks: 'How is the lamp?', exits: [{ id: 'dim', label: 'Dim', on: ['answer'], to: 'dead3' }, { id: 'bright', label: 'Bright', on: ['answer'], to: 'dead3', verdict: 'fail', evidence: [{ suspect: 'short', says: 'points-to' }] }, unsure('dead3')] },
    call('dead3', 'done'),
    { ...base, id: 'done', kind: 'end', title: 'Cleared', lines: ['Done.'], contact: 'none', says: 'cleared', exits: [] },
    { ...base, id: 'refer', kind: 'end', title: 'Ask a senior', lines: ['Ask.'], contact: 'none', says: 'referred', exits: [] },
  ],
  reentries: [{ step: 'earth', needs: ['dead', 'looked', 'load-none'] }],
};

export const lampTree: Tree = must(parseTree(lampTreeJson));

/** Unwraps a parse, or fails the test with all faults. */
export function must<T>(parsed: { ok: true; value: T } | { ok: false; faults: unknown }): T {
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults, null, 1));
  return parsed.value;
}

/** Compiles, or fails the test with all faults. */
export function program(tree: Tree, profile: Profile = benchProfile, callees: Tree[] = [makeDeadTree]): Program {
  const compiled = compile({ tree, callees, profile, settings: defaultSettings });
  if (!compiled.ok) throw new Error(JSON.stringify(compiled.faults, null, 1));
  return compiled.program;
}

type Bare<E> = E extends MachineEvent ? Omit<E, 'at' | 'monotonic' | 'boot'> : never;
export type BareEvent = Bare<MachineEvent>;

/** A person at the bench whose clock goes on by a second with each answer. */
export class Bench {
  state: RunState;
  at = Date.UTC(2026, 0, 5, 9, 0, 0);
  boot = 'boot-1';
  /** how far the wall clock has been put forward against the steady one, in ms */
  skewMs = 0;
  readonly program: Program;

  constructor(program: Program, senior = false, carried: { release?: boolean; fitted?: FittedThing[] } = {}) {
    this.program = program;
    this.state = startRun(program, { restorer: 'ann', restorerIsSenior: senior, at: this.at, release: carried.release ?? false, fitted: carried.fitted ?? [], killers: [] });
  }

  get view(): RunView {
    return view(this.program, this.state);
  }

  stamp(event: BareEvent): MachineEvent {
    return { ...event, at: this.at + this.skewMs, monotonic: this.at, boot: this.boot } as MachineEvent;
  }

  try(event: BareEvent): Advanced {
    this.at += 1000;
    const advanced = advance(this.program, this.state, this.stamp(event));
    if (advanced.ok) this.state = advanced.state;
    return advanced;
  }

  do(event: BareEvent): this {
    const advanced = this.try(event);
    if (!advanced.ok) throw new Error(`${event.type} at ${this.view.key}/${this.view.phase}: ${advanced.refusal.rule ?? ''} ${advanced.refusal.say}`);
    return this;
  }

  /** Answers the current row with a good answer, or with `override` by row id. */
  row(override: Record<string, number | 'over' | string> = {}, meter = 'tester'): this {
    const row = this.view.current?.row;
    if (!row) throw new Error(`no row at ${this.view.key}/${this.view.phase}`);
    const opens = this.view.current?.opensAt ?? 0;
    if (opens > this.at) this.at = opens;
    const step = this.view.key;
    const given = override[row.id];
    if (row.ask === 'word') return this.do({ type: 'ROW', step, row: row.id, word: typeof given === 'string' ? given : (row.words[0]?.word ?? '') });
    if (typeof given === 'string' && given !== 'over') return this.do({ type: 'ROW', step, row: row.id, word: given });
    const good = row.nominal ?? (row.low !== null ? row.low * 1.2 : (row.high ?? 1) * 0.2);
    const value = given === 'over' ? 'over' : typeof given === 'number' ? given : good;
    return this.do({ type: 'READING', step, row: row.id, value, typed: String(value), instrument: { id: meter, twoPole: true, uncertainty: 0.001 } });
  }

  /** Acknowledges warnings, gets holds and guards over, answers rows well, until the step has changed or asks for a word. */
  pass(override: Record<string, number | 'over' | string> = {}): this {
    const at = this.view.key;
    for (let i = 0; i < 80 && this.view.key === at; i += 1) {
      const { phase, key } = this.view;
      if (phase === 'warning') this.do({ type: 'WARNING_READ', step: key });
      else if (phase === 'hold') this.do({ type: 'HOLD_ASKED', step: key });
      else if (phase === 'hold-wait') this.do({ type: 'HOLD_GIVEN', step: key, by: 'sam' });
      else if (phase === 'guard') this.do({ type: 'GUARD_HELD', step: key, heldMs: 2100 });
      else if (this.view.current) this.row(override);
      else return this;
    }
    return this;
  }

  answer(answer: string): this {
    this.pass();
    return this.do({ type: 'ANSWER', step: this.view.key, answer });
  }

  /** Walks the three steps of make dead, the machine's own or a called tree's. */
  dead(): this {
    for (let i = 0; i < 3; i += 1) this.pass();
    return this;
  }
}
