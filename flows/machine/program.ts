/** A tree with its callees, laid out for one profile: every step under its key, with its rows, hazards and where its exits lead. */
import { FIRST_CAUTION } from '../document/hazards';
import type { HazardKind } from '../document/hazards';
import type { DocumentFault } from '../document/parseTree';
import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import type { Claim, Exit, FittedThing, Step, StepOf } from '../document/steps';
import type { Tree } from '../document/tree';
import { hazardsOf } from '../facts/derivedHazards';
import type { StepScope } from '../facts/effects';
import { builtInSteps } from './builtIn';
import { dischargeTool, tooSmallFor } from './dischargeTool';
import { forClass } from './noEarth';
import { openingRows, rowsOf } from './rows';
import type { Row, WordRow } from './rows';

/** One step of a run. `key` is its id, `call/id` in a called tree, `~id` for the machine's own. */
export interface ProgramStep {
  key: string;
  step: Step;
  scope: StepScope;
  rows: Row[];
  hazards: HazardKind[];
  /** the call that this step stands under, or null */
  caller: string | null;
  /** stud label: its place in the tree, a letter more below a call */
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

/** Lays a tree out for a profile. Faults are those that only the pair can show: a callee that is missing, rows that the profile lacks. */
export function layOut(input: { tree: Tree; callees: readonly Tree[]; profile: Profile; settings: Settings }): { layout: Layout; faults: DocumentFault[] } {
  const { tree, callees, profile, settings } = input;
  const steps = new Map<string, ProgramStep>();
  const calleeFirst = new Map<string, string>();
  const calleeNeeds = new Map<string, readonly Claim[]>();
  const faults: DocumentFault[] = [];
  const add = (own: Tree, caller: string | null, studOf: (i: number) => string) => {
    const prefix = caller === null ? '' : `${caller}/`;
    const scope = scopeOf(own, prefix, profile, settings);
    own.steps.forEach((written, i) => {
      const step = forClass(written, profile);
      const key = `${prefix}${step.id}`;
      const placed: ProgramStep = { key, step, scope, rows: rowsOf(step, scope), hazards: hazardsOf(step, scope), caller, stud: studOf(i), builtIn: false };
      steps.set(key, placed);
      faults.push(...placeFaults(placed));
      if (step.kind !== 'call') return;
      const callee = callees.find((t) => t.id === step.tree);
      if (caller !== null) faults.push({ step: step.id, key: 'tree', message: 'a called tree calls no further tree' });
      else if (callee === undefined) faults.push({ step: step.id, key: 'tree', message: `no issued tree "${step.tree}"` });
      else {
        faults.push(...callFaults(step, callee));
        calleeFirst.set(key, `${key}/${callee.steps[0]?.id ?? ''}`);
        calleeNeeds.set(key, callee.needsAtStart);
        add(callee, step.id, (j) => `${i + 1}${letter(j)}`);
      }
    });
  };
  add(tree, null, (i) => String(i + 1));
  const own = scopeOf(tree, '', profile, settings);
  for (const step of builtInSteps(profile, settings)) {
    const placed: ProgramStep = { key: step.id, step, scope: own, rows: rowsOf(step, own), hazards: hazardsOf(step, own), caller: null, stud: '!', builtIn: true };
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
  through: { call: string; exit: Exit }[];
}

/** Follows a target: into a called tree at its first step, out of one by the exit of the call that names the end. */
export function follow(layout: Layout, target: string, counted: (key: string, exit: Exit) => boolean, through: Landing['through'] = []): Landing {
  const placed = layout.steps.get(target);
  if (placed === undefined || through.length > 100) return { key: target, through };
  const { step } = placed;
  if (step.kind === 'call') {
    return { key: layout.calleeFirst.get(target) ?? target, through };
  }
  if (step.kind === 'end' && placed.caller !== null && step.says !== 'stopped' && step.says !== 'in-service') {
    const call = layout.steps.get(placed.caller);
    const exit = call?.step.exits.find((e: Exit) => e.on.includes(step.id));
    if (call === undefined || exit === undefined) return { key: target, through };
    const to = exit.then !== undefined && counted(call.key, exit) ? exit.then : exit.to;
    return follow(layout, to, counted, [...through, { call: call.key, exit }]);
  }
  return { key: target, through };
}

function scopeOf(tree: Tree, prefix: string, profile: Profile, settings: Settings): StepScope {
  const things = new Map<string, FittedThing>(tree.steps.flatMap((s) => (s.kind === 'do' ? (s.fits ?? []).map((f): [string, FittedThing] => [f.id, f]) : [])));
  return { profile, settings, suspects: tree.suspects, things, check: (id) => `${prefix}${id}` };
}

function letter(i: number): string {
  return String.fromCharCode(97 + (i % 26));
}

const NEEDS_ROWS: readonly Step['kind'][] = ['prove-returns', 'prove-trip', 'prove-rails', 'measure', 'soak'];

function placeFaults({ step, rows, scope }: ProgramStep): DocumentFault[] {
  if (step.kind === 'discharge') {
    const tool = dischargeTool(step, scope.profile, scope.settings);
    return tooSmallFor(tool, scope.profile, scope.settings).map((part) => ({ step: step.id, key: 'toolWatts', message: `H3: the resistor of ${tool.ohms} Ω, ${tool.watts} W is too small for ${part.name}` }));
  }
  if (rows.length > 0) return rows.flatMap((row) => (row.ask === 'reading' && row.twin === undefined && row.low === null && row.high === null ? [{ step: step.id, key: 'limit', message: `the profile gives no limit for ${row.label}` }] : []));
  const wants = NEEDS_ROWS.includes(step.kind) || ('each' in step && step.each !== undefined);
  return wants ? [{ step: step.id, key: 'each' in step && step.each !== undefined ? 'each' : 'kind', message: 'the profile has no row for this step' }] : [];
}

function callFaults(step: StepOf<'call'>, callee: Tree): DocumentFault[] {
  const ends = callee.steps.flatMap((s) => (s.kind === 'end' && s.says !== 'stopped' && s.says !== 'in-service' ? [s.id] : []));
  const taken = step.exits.flatMap((e: Exit) => e.on as string[]);
  return [
    ...ends.filter((id) => !taken.includes(id)).map((id) => ({ step: step.id, key: 'exits', message: `H13: no exit for the end "${id}" of the called tree` })),
    ...taken.filter((id) => !ends.includes(id)).map((id) => ({ step: step.id, key: 'exits', message: `the called tree has no end "${id}"` })),
    ...taken.filter((id, i) => taken.indexOf(id) !== i).map((id) => ({ step: step.id, key: 'exits', message: `H13: two exits for the end "${id}"` })),
  ];
}
