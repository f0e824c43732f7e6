/** What a tree document can get wrong beyond its shape: every fault at once, each with step and key. */
import { DEAD_QUANTITIES, QUANTITIES } from './ids';
import { ACT_KINDS, DEFAULT_VERDICT, OUTCOMES_OF } from './outcomes';
import type { Outcome } from './outcomes';
import type { Exit, FittedThing, Step } from './steps';
import type { Tree } from './tree';

export interface TreeFault {
  path: (string | number)[];
  message: string;
}

/** Each check is a list of faults of one kind; together they are all that `parseTree` reports after the shape. */
export function treeFaults(tree: Tree): TreeFault[] {
  const known = names(tree);
  return [...duplicateIds(tree), ...headFaults(tree), ...tree.steps.flatMap((step, i) => stepFaults(known, step, i)), ...reentryFaults(tree)];
}

interface Names {
  steps: Map<string, Step>;
  suspects: Set<string>;
  tools: Set<string>;
  fitted: Map<string, FittedThing>;
}

function names(tree: Tree): Names {
  return {
    steps: new Map(tree.steps.map((s) => [s.id, s])),
    suspects: new Set(tree.suspects.map((s) => s.id)),
    tools: new Set([...tree.opening.tools, ...tree.opening.instruments, ...tree.opening.parts].map((t) => t.id)),
    fitted: new Map(tree.steps.flatMap((s) => (s.kind === 'do' ? (s.fits ?? []).map((f): [string, FittedThing] => [f.id, f]) : []))),
  };
}

function duplicateIds(tree: Tree): TreeFault[] {
  const faults: TreeFault[] = [];
  const once = (ids: string[], path: (i: number) => (string | number)[]) => {
    const seen = new Set<string>();
    ids.forEach((id, i) => {
      if (seen.has(id)) faults.push({ path: path(i), message: `"${id}" is there twice` });
      seen.add(id);
    });
  };
  once(tree.steps.map((s) => s.id), (i) => ['steps', i, 'id']);
  once(tree.suspects.map((s) => s.id), (i) => ['suspects', i, 'id']);
  const listed = [...tree.opening.tools, ...tree.opening.instruments, ...tree.opening.parts, ...tree.opening.conditions];
  once(listed.map((t) => t.id), (i) => ['opening', i]);
  tree.steps.forEach((s, i) => once(s.exits.map((e: Exit) => e.id), (j) => ['steps', i, 'exits', j, 'id']));
  return faults;
}

function headFaults(tree: Tree): TreeFault[] {
  const faults: TreeFault[] = [];
  const suspects = new Set(tree.suspects.map((s) => s.id));
  tree.suspects.forEach((s, i) =>
    s.killedBy.forEach((k, j) => {
      if (!suspects.has(k) || k === s.id) faults.push({ path: ['suspects', i, 'killedBy', j], message: k === s.id ? 'a suspect does not kill itself' : `no suspect "${k}"` });
    }),
  );
  if (tree.steps[0]?.kind === 'end') faults.push({ path: ['steps', 0, 'kind'], message: 'a tree does not begin with an end' });
  if (tree.appliesTo.fewestRails > tree.appliesTo.mostRails) faults.push({ path: ['appliesTo', 'fewestRails'], message: 'more than mostRails' });
  return faults;
}

function stepFaults(known: Names, step: Step, at: number): TreeFault[] {
  const faults: TreeFault[] = [];
  const add = (key: (string | number)[], message: string) => faults.push({ path: ['steps', at, ...key], message });
  step.exits.forEach((exit: Exit, j) => {
    if (!known.steps.has(exit.to)) add(['exits', j, 'to'], `leads to "${exit.to}", which is no step`);
    if (exit.then !== undefined && !known.steps.has(exit.then)) add(['exits', j, 'then'], `leads to "${exit.then}", which is no step`);
    exit.evidence?.forEach((e, k) => {
      if (!known.suspects.has(e.suspect)) add(['exits', j, 'evidence', k, 'suspect'], `no suspect "${e.suspect}"`);
    });
  });
  const boardsIn = step.workings?.boardsIn;
  if (boardsIn !== undefined && known.steps.get(boardsIn.step)?.exits.find((e: Exit) => e.id === boardsIn.exit)?.atMost === undefined)
    add(['workings', 'boardsIn'], `"${boardsIn.exit}" of "${boardsIn.step}" is no counted exit`);
  for (const message of partitionFaults(step)) add(['exits'], message);
  step.exits.forEach((exit: Exit, j) => {
    for (const message of shownFaults(step, exit)) add(['exits', j, 'shows'], message);
  });
  for (const fault of conditionFaults(step)) add(...fault);
  step.tools.forEach((t, j) => {
    if (!known.tools.has(t)) add(['tools', j], `"${t}" is not on the opening list`);
  });
  switch (step.kind) {
    case 'do':
      step.removes?.forEach((id, j) => {
        if (!known.fitted.has(id)) add(['removes', j], `nothing fits "${id}"`);
      });
      step.fits?.forEach((f, j) => {
        if (!sameThing(f, known.fitted.get(f.id))) add(['fits', j, 'id'], `"${f.id}" is also fitted as something else: one name, one thing`);
        if (f.earthed === true && (f.area === 'primary' || f.area === 'earth')) add(['fits', j, 'area'], 'an earthed instrument is never clipped to the primary');
        if (f.class === 'clip' && f.point === undefined) add(['fits', j, 'point'], 'a clip names its point');
      });
      if ((step.fits?.length || step.removes?.length) && step.contact !== 'hands') add(['contact'], 'fitting and taking out are work of the hands');
      if (step.trims !== undefined && step.contact !== 'probe') add(['contact'], 'trimming is done with one insulated tool: contact `probe`');
      break;
    case 'measure':
    case 'soak':
      if (step.unit !== undefined && step.unit !== QUANTITIES[step.quantity]) add(['unit'], `a limit of ${step.quantity} is in ${QUANTITIES[step.quantity]}, not in ${step.unit}`);
      if (step.probe === 'clipped' && step.contact !== 'none') add(['contact'], 'a clipped reading needs no contact');
      if (step.probe === 'hand' && step.contact === 'none') add(['contact'], 'a probe held by hand is contact `probe`');
      if (DEAD_QUANTITIES.includes(step.quantity) && step.power === 'live') add(['power'], 'this quantity is only read dead');
      if (step.limit.is === 'nominal' && (step.limit.of === 'row' || step.limit.tolerance === 'row') && step.each !== 'rails') add(['limit'], 'only a step over rails has a nominal and tolerance for its row');
      if (step.each === 'rails' && step.quantity !== 'volts-dc' && step.limit.is === 'nominal') add(['limit'], 'the nominal of a rail is in volts');
      if (step.limit.is === 'twin') for (const fault of twinFaults(step)) add(...fault);
      else if (step.points?.twin !== undefined) add(['points', 'twin'], 'only a reading that is held against its twin has one');
      if (step.kind === 'soak' && step.everyMinutes > step.holdMinutes) add(['everyMinutes'], 'longer than the soak itself');
      break;
    case 'observe':
      for (const fault of openingFaults(known, step)) add(...fault);
      break;
    case 'discharge':
      if ((step.toolOhms === undefined) !== (step.toolWatts === undefined)) add(['toolWatts'], 'a tool has ohms and watts, or neither');
      break;
    case 'prove-trip':
      if (!known.fitted.has(step.series)) add(['series'], `nothing fits "${step.series}"`);
      else if (known.fitted.get(step.series)?.class !== 'series') add(['series'], `"${step.series}" is no series part`);
      break;
    case 'energise':
    case 'raise':
      powerFaults(known, step, add);
      break;
    case 'work':
      step.for?.forEach((c, j) => {
        if (!known.steps.has(c)) add(['for', j], `no step "${c}"`);
      });
      [...(step.replaces ?? []), ...(step.suspects ?? [])].forEach((s) => {
        if (!known.suspects.has(s)) add(['replaces'], `no suspect "${s}"`);
      });
      break;
    case 'hold':
      step.names?.forEach((c, j) => {
        if (!known.steps.has(c)) add(['names', j], `no step "${c}"`);
      });
      break;
    case 'end':
      if (step.says === 'fault-found' && step.suspect === undefined) add(['suspect'], 'a found fault names its suspect');
      if (step.says === 'fault-found' && step.retest === undefined) add(['retest'], 'a found fault says what to re-test');
      if (step.suspect !== undefined && !known.suspects.has(step.suspect)) add(['suspect'], `no suspect "${step.suspect}"`);
      break;
    default:
      break;
  }
  return faults;
}

/** A twin is one reading at one point, taken with the probe in the hand: a clip stays where it is. */
function twinFaults(step: Extract<Step, { kind: 'measure' | 'soak' }>): [(string | number)[], string][] {
  return [
    ...(step.kind === 'soak' ? [[['limit'], 'a soak is not held against a twin: only a measure step reads both'] satisfies [string[], string]] : []),
    ...(step.each !== undefined ? [[['each'], 'one point is held against its twin, not a row each'] satisfies [string[], string]] : []),
    ...(step.probe === 'clipped' ? [[['probe'], 'a clip stays where it is: the twin is read with the probe by hand, or without contact'] satisfies [string[], string]] : []),
  ];
}

/** What an answer shows belongs to a look, and speaks for a suspect. */
function shownFaults(step: Step, exit: Exit): string[] {
  if (exit.shows === undefined) return [];
  if (step.kind !== 'observe' || !exit.on.includes('answer')) return ['only an answer of an observation shows something of a part'];
  if (exit.shows === 'large-over-current' && step.opens === undefined) return ['only a part that is opened shows this: the step says what it `opens`'];
  const words = (exit.evidence ?? []).map((e) => e.says);
  if (exit.shows === 'not-original' && words.includes('all-but-proves')) return ['a part that is not original is a reason to suspect it and no proof: `points-to`'];
  return words.includes('points-to') || words.includes('all-but-proves') ? [] : ['it shows something of a part and raises no suspect'];
}

/** A part is opened by hand, after a photo step of this tree, and something else stands in its place where none is opened. */
function openingFaults(known: Names, step: Extract<Step, { kind: 'observe' }>): [string[], string][] {
  const { opens } = step;
  if (opens === undefined) return [];
  const faults: [string[], string][] = [];
  const instead = opens.instead === undefined ? undefined : known.steps.get(opens.instead);
  if (step.contact !== 'hands') faults.push([['contact'], 'a part is opened with the hands']);
  if (!known.suspects.has(opens.suspect)) faults.push([['opens', 'suspect'], `no suspect "${opens.suspect}"`]);
  if (known.steps.get(opens.photo)?.kind !== 'photo') faults.push([['opens', 'photo'], `"${opens.photo}" is no photo step`]);
  if (opens.instead !== undefined && instead === undefined) faults.push([['opens', 'instead'], `no step "${opens.instead}"`]);
  if (instead?.kind === 'observe' && instead.opens !== undefined) faults.push([['opens', 'instead'], 'this one opens a part too']);
  return faults;
}

/** A probe in the hand inside the machine is a cover that is off. */
function conditionFaults(step: Step): [string[], string][] {
  const stated = 'asInService' in step ? (step.asInService ?? []) : [];
  return step.contact !== 'none' && stated.includes('cover-on') ? [[['asInService'], 'with the cover on there is no contact: clip on before, or read without']] : [];
}

function powerFaults(known: Names, step: Extract<Step, { kind: 'energise' | 'raise' }>, add: (key: (string | number)[], message: string) => void): void {
  const abort = known.steps.get(step.abort);
  if (abort === undefined) add(['abort'], `no step "${step.abort}"`);
  else if (abort.kind !== 'isolate' && abort.kind !== 'call') add(['abort'], 'the abort target is an isolate step, or the call of a tree that begins with one');
  step.throughItems?.forEach((id, j) => {
    if (!known.fitted.has(id)) add(['throughItems', j], `nothing fits "${id}"`);
  });
  if (step.node === 'rail' && step.rail === undefined) add(['rail'], 'names no rail');
  if (step.node === 'part' && (step.lead === undefined || !known.fitted.has(step.lead))) add(['lead'], 'a part is fed with its lead lifted: name that lead');
  if (step.node === 'part' && step.lead !== undefined && (known.fitted.get(step.lead)?.class ?? 'lifted') !== 'lifted') add(['lead'], `"${step.lead}" is no lifted lead: the part would not be parted from its circuit`);
  if (step.through === 'lamp' && step.lampWatts === undefined) add(['lampWatts'], 'names no lamp');
  const mains = step.through === 'lamp' || step.through === 'mains' || step.through === 'limited-ac';
  if (mains !== (step.node === 'inlet')) add(['node'], mains ? 'mains goes into the inlet' : 'a bench supply does not go into the inlet');
  if ((step.through === 'bench') !== (step.source === 'bench')) add(['source'], 'source and way do not match');
  if (step.load === 'boards' && step.node !== 'inlet') add(['load'], 'boards are powered through the inlet only');
}

/** H13: each outcome of the step leaves by exactly one exit. */
function partitionFaults(step: Step): string[] {
  if (step.kind === 'end' || step.kind === 'call') return [];
  const faults: string[] = [];
  const wanted = OUTCOMES_OF[step.kind];
  const taken = new Map<string, number>();
  for (const exit of step.exits) for (const on of exit.on) taken.set(on, (taken.get(on) ?? 0) + 1);
  for (const outcome of wanted) {
    const n = taken.get(outcome) ?? 0;
    if (n === 0) faults.push(`H13: no exit for "${outcome}"`);
    if (n > 1) faults.push(`H13: ${n} exits for "${outcome}"`);
  }
  const answers = taken.get('answer') ?? 0;
  if (step.kind === 'observe' && answers === 0) faults.push('H13: an observation has no answer');
  for (const on of taken.keys()) {
    const allowed = wanted.includes(on as Outcome) || (step.kind === 'observe' && on === 'answer');
    if (!allowed) faults.push(`"${on}" is not an outcome of ${step.kind}`);
  }
  step.exits.forEach((exit) => {
    if (step.kind === 'observe' && exit.on.includes('answer') && exit.label === undefined) faults.push(`the answer "${exit.id}" has no label`);
    if (exit.on.includes('answer') && exit.on.length > 1) faults.push(`the answer "${exit.id}" is mixed with other outcomes`);
    if (exit.verdict === 'pass' && exit.on.some((on) => DEFAULT_VERDICT[on as Outcome] === 'unsure')) faults.push(`"${exit.id}" calls an unsure answer a pass`);
    if ((exit.verdict === 'find' || (exit.verdict === 'fail' && ACT_KINDS.includes(step.kind))) && exit.on.some((on) => DEFAULT_VERDICT[on as Outcome] === 'unsure')) faults.push(`"${exit.id}" calls an unsure answer a ${exit.verdict === 'find' ? 'find' : 'failure'}`);
    if (exit.verdict === 'pass' && step.kind !== 'observe' && exit.on.some((on) => DEFAULT_VERDICT[on as Outcome] === 'fail')) faults.push(`"${exit.id}" calls a failed reading a pass`);
  });
  return faults;
}

function reentryFaults(tree: Tree): TreeFault[] {
  const ids = new Set(tree.steps.map((s) => s.id));
  return tree.reentries.flatMap((r, i) => (ids.has(r.step) ? [] : [{ path: ['reentries', i, 'step'], message: `no step "${r.step}"` }]));
}

/** Whether two fittings under one name are of the same thing; a later one would hide what the first has put in. */
export function sameThing(a: FittedThing, b: FittedThing | undefined): boolean {
  return b === undefined || (a.class === b.class && a.area === b.area && (a.earthed ?? false) === (b.earthed ?? false) && a.point === b.point);
}
