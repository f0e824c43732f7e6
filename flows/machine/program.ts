/** A tree with its callees, laid out for one profile: every step under its key, with its rows, hazards and where its exits lead. */
import { misfits } from '../document/admits';
import { FIRST_CAUTION } from '../document/hazards';
import type { HazardKind } from '../document/hazards';
import type { DocumentFault } from '../document/parseTree';
import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import type { Claim, Exit, FittedThing, Step, StepOf } from '../document/steps';
import type { Tree } from '../document/tree';
import { sameThing } from '../document/treeFaults';
import { hazardsOf } from '../facts/derivedHazards';
import type { StepScope } from '../facts/effects';
import { insteadOf } from '../facts/opening';
import { builtInSteps } from './builtIn';
import { dischargeTool, tooSmallFor } from './dischargeTool';
import { forClass } from './noEarth';
import { openingRows, rowsOf } from './rows';
import type { Row, WordRow } from './rows';

/** One step of a run. `key` is its id, `call/id` in a called tree, `call/call/id` in one called from there, `~id` for the machine's own. */
export interface ProgramStep {
  key: string;
  step: Step;
  scope: StepScope;
  rows: Row[];
  hazards: HazardKind[];
  /** key of the call that this step stands under, or null */
  caller: string | null;
  /** key of the step of the run's own tree that it belongs to: itself, or the outermost call above it */
  top: string;
  /** stud label: its place in the tree, a letter or a number more below each call */
  stud: string;
  builtIn: boolean;
}

export interface Layout {
  tree: Tree;
  profile: Profile;
  settings: Settings;
  steps: ReadonlyMap<string, ProgramStep>;
  /** first step of the tree called by a call, by the call's key */
  calleeFirst: ReadonlyMap<string, string>;
  /** what the called tree needs at its start, by the call's key */
  calleeNeeds: ReadonlyMap<string, readonly Claim[]>;
  opening: WordRow[];
  first: string;
  /** numbered steps of the tree, for "14 of 31" */
  total: number;
}

/** The keys of the machine's own make-safe steps, in order. */
export const SAFE = { opening: '~opening', isolate: '~isolate', discharge: '~discharge', prove: '~prove', putBack: '~put-back', takeOut: '~take-out', readBack: '~read-back', choose: '~choose', ended: '~ended' } as const;

/** Most calls one below another; a key of the deepest step is still short enough for an entry. */
export const MOST_DEPTH = 8;
/** Most steps that a tree comes to with every call laid out. What is larger is neither proved nor run: it is a finding. */
export const MOST_STEPS = 40_000;

interface Placing {
  /** the call that the tree stands under, or null for the run's own tree */
  call: ProgramStep | null;
  /** ids of the trees on the way down to this one, itself included */
  chain: readonly string[];
}

/**
 * Lays a tree out for a profile, each call with the steps of the tree that it calls, however deep.
 * Faults are those that only the whole can show: a callee that is missing, calls that go round, rows that the profile lacks. A layout with faults is not to be used.
 */
export function layOut(input: { tree: Tree; callees: readonly Tree[]; profile: Profile; settings: Settings }): { layout: Layout; faults: DocumentFault[] } {
  const { tree, callees, profile, settings } = input;
  const steps = new Map<string, ProgramStep>();
  const calleeFirst = new Map<string, string>();
  const calleeNeeds = new Map<string, readonly Claim[]>();
  const faults: DocumentFault[] = [];
  const laid = new Set<string>();
  const pinned = new Map<string, { version: number; by: string }>();
  const shown = new Map<Step, Pick<ProgramStep, 'step' | 'rows' | 'hazards'>>();
  let tooMany = false;
  let tooDeep = false;
  // rows and hazards are the same at every call of a tree
  const show = (written: Step, scope: StepScope) => {
    const step = forClass(written, profile);
    const known = shown.get(written) ?? { step, rows: rowsOf(step, scope), hazards: hazardsOf(step, scope) };
    shown.set(written, known);
    return known;
  };
  const things = new Map<string, FittedThing>();
  const add = (own: Tree, { call, chain }: Placing) => {
    const prefix = call === null ? '' : `${call.key}/`;
    const scope = scopeOf(own, prefix, profile, settings);
    // what is wrong with a tree by itself is said once, not at each of its calls
    const first = !laid.has(own.id);
    laid.add(own.id);
    for (const thing of first ? scope.things.values() : []) {
      if (!sameThing(thing, things.get(thing.id))) faults.push({ step: call?.key ?? null, key: 'tree', message: `H4: “${thing.id}” is fitted as one thing here and as another elsewhere: one name, one thing` });
      things.set(thing.id, thing);
    }
    own.steps.forEach((written, i) => {
      if (tooMany) return;
      if (steps.size >= MOST_STEPS) {
        tooMany = true;
        faults.push({ step: call?.top ?? null, key: 'tree', message: `H19: with all that it calls this tree comes to more than ${MOST_STEPS} steps` });
        return;
      }
      const key = `${prefix}${written.id}`;
      const placed: ProgramStep = { key, scope, ...show(written, scope), caller: call?.key ?? null, top: call?.top ?? key, stud: studOf(call, i, chain.length), builtIn: false };
      steps.set(key, placed);
      if (first) faults.push(...placeFaults(placed));
      const { step } = placed;
      if (step.kind === 'call') enter(placed, step, chain, first);
    });
  };
  const enter = (placed: ProgramStep, step: StepOf<'call'>, chain: readonly string[], first: boolean): void => {
    const { key } = placed;
    const callee = callees.find((t) => t.id === step.tree);
    const other = pinned.get(step.tree);
    if (step.version !== null && other === undefined) pinned.set(step.tree, { version: step.version, by: key });
    const refuse = (fault: string, message: string) => {
      if (first) faults.push({ step: key, key: fault, message });
    };
    if (chain.includes(step.tree)) return refuse('tree', `H19: the calls go round: ${[...chain.slice(chain.indexOf(step.tree)), step.tree].join(' → ')}`);
    if (callee === undefined) return refuse('tree', `no issued tree "${step.tree}"`);
    if (other !== undefined && step.version !== null && step.version !== other.version) return refuse('version', `H19: calls version ${step.version} of "${step.tree}", and “${other.by}” calls version ${other.version}: a run is led by one version of it`);
    if (first) faults.push(...callFaults(placed, step, callee), ...misfits(callee, profile).map((why) => ({ step: key, key: 'tree', message: `H19: the called tree does not apply here: ${why}` })));
    if (chain.length > MOST_DEPTH) {
      if (!tooDeep) faults.push({ step: key, key: 'tree', message: `H19: calls go more than ${MOST_DEPTH} deep: ${[...chain, step.tree].join(' → ')}` });
      tooDeep = true;
      return;
    }
    calleeFirst.set(key, `${key}/${callee.steps[0]?.id ?? ''}`);
    calleeNeeds.set(key, callee.needsAtStart);
    add(callee, { call: placed, chain: [...chain, callee.id] });
  };
  add(tree, { call: null, chain: [tree.id] });
  const own = scopeOf(tree, '', profile, settings);
  for (const step of builtInSteps(profile, settings)) {
    const placed: ProgramStep = { key: step.id, scope: own, ...show(step, own), caller: null, top: step.id, stud: '!', builtIn: true };
    steps.set(step.id, placed);
    if (step.kind === 'discharge') faults.push(...placeFaults(placed));
  }
  const { opening } = tree;
  const named = (list: readonly { name: string }[]) => list.map((x) => x.name);
  const rows = openingRows({ tools: named(opening.tools), instruments: named(opening.instruments), parts: named(opening.parts), conditions: opening.conditions }, profile, FIRST_CAUTION);
  const first = tree.steps[0]?.id ?? '';
  return { layout: { tree, profile, settings, steps, calleeFirst, calleeNeeds, opening: rows, first, total: tree.steps.filter((s) => s.kind !== 'end').length }, faults };
}

/** Where an exit leads once calls are entered and ends of called trees are left: the key at which the run stands, and the exits taken on the way. */
export interface Landing {
  key: string;
  /** exits of calls passed through on the way, with the call's key: their counters and evidence count too */
  through: { call: string; exit: Exit; spent: boolean }[];
  /** calls entered on the way: each is a new activation of its tree, whose counters start at 0 (A15) */
  entered: string[];
}

/** Follows a target: into a called tree at its first step, out of one by the exit of the call that names the end. `spent` says whether a counted exit has run out. */
export function follow(layout: Layout, target: string, spent: (call: string, exit: Exit) => boolean): Landing {
  return land(layout, target, (call, exit) => [spent(call, exit)])[0] ?? { key: target, through: [], entered: [] };
}

/** Every landing that a target can have: a counted exit of a call may or may not have run out. */
export function landingsOf(layout: Layout, target: string): Landing[] {
  return land(layout, target, () => [false, true]);
}

function land(layout: Layout, target: string, ways: (call: string, exit: Exit) => readonly boolean[], so: Omit<Landing, 'key'> = { through: [], entered: [] }): Landing[] {
  const placed = layout.steps.get(target);
  const here = [{ key: target, ...so }];
  if (placed === undefined) return here;
  if (placed.step.kind === 'call') {
    const first = layout.calleeFirst.get(target);
    return first === undefined ? here : land(layout, first, ways, { ...so, entered: [...so.entered, target] });
  }
  const instead = insteadOf(placed.step, layout.profile);
  if (instead !== null) return land(layout, placed.scope.check(instead), ways, so);
  const call = endsCalledTree(placed) ? layout.steps.get(placed.caller ?? '') : undefined;
  const exit = call?.step.exits.find((e: Exit) => e.on.includes(placed.step.id));
  if (call === undefined || exit === undefined) return here;
  const { then } = exit;
  const go = (spent: boolean) => land(layout, call.scope.check(spent ? (then ?? exit.to) : exit.to), ways, { ...so, through: [...so.through, { call: call.key, exit, spent }] });
  return then === undefined ? go(false) : ways(call.key, exit).flatMap(go);
}

/** An end of a called tree is left by the exit of its call, except those that end the run. */
export function endsCalledTree({ step, caller }: ProgramStep): boolean {
  return step.kind === 'end' && caller !== null && step.says !== 'stopped' && step.says !== 'in-service';
}

function scopeOf(tree: Tree, prefix: string, profile: Profile, settings: Settings): StepScope {
  const things = new Map<string, FittedThing>(tree.steps.flatMap((s) => (s.kind === 'do' ? (s.fits ?? []).map((f): [string, FittedThing] => [f.id, f]) : [])));
  return { profile, settings, suspects: tree.suspects, things, check: (id) => `${prefix}${id}` };
}

/** 3, 3b, 3b.2, 3b.2c: numbers and letters in turn. */
function studOf(call: ProgramStep | null, i: number, depth: number): string {
  if (call === null) return String(i + 1);
  return depth % 2 === 0 ? `${call.stud}${String.fromCharCode(97 + (i % 26))}` : `${call.stud}.${i + 1}`;
}

const NEEDS_ROWS: readonly Step['kind'][] = ['prove-returns', 'prove-trip', 'prove-rails', 'measure', 'soak'];

function placeFaults({ key, step, rows, scope }: ProgramStep): DocumentFault[] {
  if (step.kind === 'discharge') {
    const tool = dischargeTool(step, scope.profile, scope.settings);
    return tooSmallFor(tool, scope.profile, scope.settings).map((part) => ({ step: key, key: 'toolWatts', message: `H3: the resistor of ${tool.ohms} Ω, ${tool.watts} W is too small for ${part.name}` }));
  }
  if (rows.length > 0) return rows.flatMap((row) => (row.ask === 'reading' && row.twin === undefined && row.low === null && row.high === null ? [{ step: key, key: 'limit', message: `the profile gives no limit for ${row.label}` }] : []));
  const wants = NEEDS_ROWS.includes(step.kind) || ('each' in step && step.each !== undefined);
  return wants ? [{ step: key, key: 'each' in step && step.each !== undefined ? 'each' : 'kind', message: 'the profile has no row for this step' }] : [];
}

function callFaults({ key }: ProgramStep, step: StepOf<'call'>, callee: Tree): DocumentFault[] {
  const ends = callee.steps.flatMap((s) => (s.kind === 'end' && s.says !== 'stopped' && s.says !== 'in-service' ? [s.id] : []));
  const taken = step.exits.flatMap((e: Exit) => e.on as string[]);
  return [
    ...ends.filter((id) => !taken.includes(id)).map((id) => ({ step: key, key: 'exits', message: `H13: no exit for the end "${id}" of the called tree` })),
    ...taken.filter((id) => !ends.includes(id)).map((id) => ({ step: key, key: 'exits', message: `the called tree has no end "${id}"` })),
    ...taken.filter((id, i) => taken.indexOf(id) !== i).map((id) => ({ step: key, key: 'exits', message: `H13: two exits for the end "${id}"` })),
  ];
}
