/** Bench facts, operations and needs as bits. Exact: each fact after a step looks at that fact alone. */
import type { FittedThing } from '../document/steps';
import type { Atom } from '../facts/atoms';
import type { Facts } from '../facts/facts';
import type { Need } from '../facts/needs';
import type { Op } from '../facts/ops';
import { BitNames, NO_EFFECT, putBit } from './bits';
import type { Effect, MayState } from './bits';
import type { Graph } from './graph';

/** A bit that must be 1 (`must`) or must not be 1. */
export interface Literal {
  bit: number;
  must: boolean;
}

/** Needs that are not bits: `owed` is walked by regions, `never` cannot be met. */
export type NeedForm = { as: 'bits'; literals: Literal[] } | { as: 'owed'; what: 'doubt' | 'open' | 'fixed' | 'fixed-dead' } | { as: 'never' } | { as: 'always' };

export interface Encoding {
  names: BitNames;
  /** everything that can be fitted or lifted */
  things: readonly FittedThing[];
  effect(ops: readonly Op[]): Effect;
  need(need: Need): NeedForm;
  state(facts: Facts): MayState;
  /** everything may be either way */
  free(): MayState;
}

/** Operations that no bit stands for: what is owed is walked by regions, what has been powered only asks for a hold. */
const OWED_OPS: ReadonlySet<Op['op']> = new Set(['doubt', 'lift-doubt', 'fail', 'fix', 'pass', 'powered', 'powered-void']);

const LOADS = ['boards', 'none', 'light', 'full'];

/** Names every bit that the graph can touch, then encodes. */
export function encodingOf(graph: Graph, start: Facts): Encoding {
  const names = new BitNames();
  const { layout } = graph;
  const things = new Map<string, FittedThing>();
  const put = (thing: FittedThing) => things.set(thing.id, thing);
  start.fitted.forEach(put);
  for (const placed of layout.steps.values()) if (placed.step.kind === 'do') placed.step.fits?.forEach(put);

  for (const bit of ['out', 'live', 'discharged', 'proved', 'looked', 'earth', 'insulation', 'returns', 'regulator', 'limited', 'full', 'release', 'opened']) names.of(bit);
  for (const load of LOADS) names.of(`load:${load}`);
  for (const trip of start.trips) names.of(`trip:${trip.rail}`);
  for (const s of start.sources) for (const state of ['full', 'limited']) names.of(`src:${s.id}:${state}`);
  for (const thing of things.values()) {
    names.of(`fitted:${thing.id}`);
    if (thing.class === 'clip') names.of(`clip:${thing.point ?? ''}`);
  }
  for (const node of graph.nodes.values()) {
    for (const op of [...node.entered, ...node.edges.flatMap((e) => e.ops)]) nameOp(names, op);
    for (const need of node.needs) nameAtom(names, need.atom);
  }
  for (const k of start.owed.killers) names.of(`killer:${k.part}:${k.killer}`);

  const fittedBits = (pick: (t: FittedThing) => boolean): Literal[] => [...things.values()].filter(pick).map((t) => ({ bit: names.of(`fitted:${t.id}`), must: false }));
  const must = (name: string): NeedForm => ({ as: 'bits', literals: [{ bit: names.of(name), must: true }] });
  const none = (literals: Literal[]): NeedForm => ({ as: 'bits', literals });
  const empty = () => new Uint32Array(names.words);

  const literals = (atom: Atom): NeedForm => {
    switch (atom.fact) {
      case 'all-out':
        return must('out');
      case 'live':
        return must('live');
      case 'source':
        return atom.state === 'out' ? must('out') : must(`src:${atom.id}:${atom.state}`);
      case 'feeds':
        return must(`feeds:${atom.id}:${atom.node}`);
      case 'stored':
        return must(atom.least);
      case 'looked':
      case 'earth':
      case 'insulation':
      case 'returns':
      case 'release':
      case 'opened':
        return must(atom.fact);
      case 'load':
        return must(`load:${atom.is}`);
      case 'load-not':
        return none([{ bit: names.of(`load:${atom.is}`), must: false }]);
      case 'trip':
        return must(`trip:${atom.rail}`);
      case 'proving':
        return must(atom.least);
      case 'fitted':
        return must(`fitted:${atom.id}`);
      case 'clip-on':
        return must(`clip:${atom.point}`);
      case 'none-fitted':
        return none(fittedBits(() => true));
      case 'none-of-class':
        return none(fittedBits((t) => t.class === atom.class));
      case 'none-in-area':
        return none(fittedBits((t) => t.area === atom.area));
      case 'no-earthed-clip-on-primary':
        return none(fittedBits((t) => t.earthed === true && (t.area === 'primary' || t.area === 'earth')));
      case 'no-killer':
        return none(names.startingWith('killer:').map((bit) => ({ bit, must: false })));
      case 'no-doubt':
        return { as: 'owed', what: 'doubt' };
      case 'no-open-fail':
        return { as: 'owed', what: 'open' };
      case 'no-fail-waiting-for-limited-power':
        return { as: 'owed', what: atom.deadToo ? 'fixed' : 'fixed-dead' };
      case 'condition':
        return must(`condition:${atom.id}`);
      case 'photo':
        return must(`photo:${atom.step}`);
      case 'settled':
        return atom.holds ? { as: 'always' } : { as: 'never' };
    }
  };

  // what hardly a tree asks for has a bit only where this one does
  const unasked = (op: Op) => (op.op === 'condition' || op.op === 'photo') && rareBits(op, names).length === 0;

  const effect = (ops: readonly Op[]): Effect => {
    if (ops.every((op) => OWED_OPS.has(op.op) || unasked(op))) return NO_EFFECT;
    const gen = empty();
    const kill = empty();
    const copies: { raise: number; where0: number }[] = [];
    const set = (name: string) => {
      putBit(gen, names.of(name));
      unset(kill, names.of(name));
    };
    const clear = (bit: number) => {
      putBit(kill, bit);
      unset(gen, bit);
    };
    for (const op of ops) if (!unasked(op)) applyBits(op, names, set, clear, copies);
    return { gen, kill, copies };
  };

  const state = (facts: Facts): MayState => {
    const may1 = empty();
    for (const name of bitsOfFacts(facts)) putBit(may1, names.of(name));
    for (const name of [...facts.conditions.map((id) => `condition:${id}`), ...facts.photos.map((step) => `photo:${step}`)]) {
      const bit = names.known(name);
      if (bit !== undefined) putBit(may1, bit);
    }
    return { may0: Uint32Array.from(may1, (word) => ~word), may1 };
  };
  const free = (): MayState => ({ may0: empty().fill(0xffffffff), may1: empty().fill(0xffffffff) });
  return { names, things: [...things.values()], effect, need: (need) => literals(need.atom), state, free };
}

function unset(set: Uint32Array, bit: number): void {
  set[bit >>> 5] = (set[bit >>> 5] ?? 0) & ~(1 << (bit & 31));
}

function nameOp(names: BitNames, op: Op): void {
  if (op.op === 'source') names.of(`feeds:${op.id}:${op.node ?? ''}`);
  if (op.op === 'clear') names.of(`cleared:${op.suspect}`);
  if (op.op === 'owe-killer') {
    names.of(`killer:${op.part}:${op.killer}`);
    names.of(`cleared:${op.killer}`);
  }
}

function nameAtom(names: BitNames, atom: Atom): void {
  if (atom.fact === 'feeds') names.of(`feeds:${atom.id}:${atom.node}`);
  if (atom.fact === 'fitted') names.of(`fitted:${atom.id}`);
  if (atom.fact === 'clip-on') names.of(`clip:${atom.point}`);
  if (atom.fact === 'condition') names.of(`condition:${atom.id}`);
  if (atom.fact === 'photo') names.of(`photo:${atom.step}`);
  if (atom.fact === 'trip') names.of(`trip:${atom.rail}`);
}

function rareBits(op: Extract<Op, { op: 'condition' | 'photo' }>, names: BitNames): readonly number[] {
  if (op.op === 'photo' && op.step === 'all') return names.startingWith('photo:');
  const bit = names.known(op.op === 'condition' ? `condition:${op.id}` : `photo:${op.step}`);
  return bit === undefined ? [] : [bit];
}

function applyBits(op: Op, names: BitNames, set: (name: string) => void, clear: (bit: number) => void, copies: { raise: number; where0: number }[]): void {
  const off = (...list: string[]) => list.forEach((name) => clear(names.of(name)));
  const ladder = (steps: readonly string[], to: string) => {
    const at = steps.indexOf(to);
    steps.forEach((name, i) => (i <= at ? set(name) : off(name)));
  };
  switch (op.op) {
    case 'source':
      off(`src:${op.id}:full`, `src:${op.id}:limited`, 'out');
      names.startingWith(`feeds:${op.id}:`).forEach(clear);
      if (op.to === 'full' || op.to === 'limited') {
        set(`src:${op.id}:${op.to}`);
        set('live');
        if (op.node !== null) set(`feeds:${op.id}:${op.node}`);
      }
      return;
    case 'sources':
      [...names.startingWith('src:'), ...names.startingWith('feeds:')].forEach(clear);
      off('live', 'out');
      if (op.to === 'out') set('out');
      return;
    case 'stored':
      return ladder(['discharged', 'proved'], op.to);
    case 'stored-at-most':
      return off('proved');
    case 'stored-at-least':
      return set('discharged');
    case 'stored-lapses':
      return off('discharged', 'proved');
    case 'proof':
      return op.to === 'proved' ? set(op.fact) : off(op.fact);
    case 'load':
      off(...LOADS.map((l) => `load:${l}`));
      return set(`load:${op.to}`);
    case 'trip':
      if (op.rail !== 'all') return op.proved ? set(`trip:${op.rail}`) : off(`trip:${op.rail}`);
      return names.startingWith('trip:').forEach(clear);
    case 'proving':
      return off('regulator', 'limited', 'full');
    case 'proving-at-least':
      return ['regulator', 'limited', 'full'].slice(0, ['none', 'regulator', 'limited', 'full'].indexOf(op.to)).forEach(set);
    case 'fit':
      set(`fitted:${op.thing.id}`);
      return op.thing.class === 'clip' ? set(`clip:${op.thing.point ?? ''}`) : undefined;
    case 'unfit':
      off(`fitted:${op.id}`);
      // a clip that leaves takes its point with it, even if another one sits there: never better than true
      return names.startingWith('clip:').forEach(clear);
    case 'clear':
      set(`cleared:${op.suspect}`);
      return names.startingWith('killer:').forEach((bit) => {
        if (names.nameOf(bit).endsWith(`:${op.suspect}`)) clear(bit);
      });
    case 'unclear':
      return op.suspect === 'all' ? names.startingWith('cleared:').forEach(clear) : off(`cleared:${op.suspect}`);
    case 'owe-killer':
      copies.push({ raise: names.of(`killer:${op.part}:${op.killer}`), where0: names.of(`cleared:${op.killer}`) });
      return;
    case 'release-void':
      return off('release');
    case 'opened':
      return set('opened');
    case 'opened-lapses':
      return off('opened');
    case 'condition':
      return rareBits(op, names).forEach((bit) => (op.stands ? set(names.nameOf(bit)) : clear(bit)));
    case 'photo':
      return rareBits(op, names).forEach((bit) => (op.taken ? set(names.nameOf(bit)) : clear(bit)));
    case 'doubt':
    case 'lift-doubt':
    case 'fail':
    case 'fix':
    case 'pass':
    case 'powered':
    case 'powered-void':
      return;
  }
}

/** Names of the bits that are 1 in these facts. */
function bitsOfFacts(facts: Facts): string[] {
  const proving = ['none', 'regulator', 'limited', 'full'].indexOf(facts.proving);
  return [
    ...(facts.sources.every((s) => s.state === 'out') ? ['out'] : []),
    ...facts.sources.flatMap((s) => (s.state === 'full' || s.state === 'limited' ? [`src:${s.id}:${s.state}`, 'live', ...(s.node === null ? [] : [`feeds:${s.id}:${s.node}`])] : [])),
    ...(facts.stored === 'proved' ? ['discharged', 'proved'] : facts.stored === 'discharged' ? ['discharged'] : []),
    ...(['looked', 'earth', 'insulation', 'returns'] as const).filter((f) => facts[f] === 'proved'),
    `load:${facts.load}`,
    ...facts.trips.filter((t) => t.proved).map((t) => `trip:${t.rail}`),
    ...['regulator', 'limited', 'full'].slice(0, Math.max(0, proving)),
    ...facts.fitted.flatMap((f) => [`fitted:${f.id}`, ...(f.class === 'clip' ? [`clip:${f.point ?? ''}`] : [])]),
    ...facts.owed.killers.map((k) => `killer:${k.part}:${k.killer}`),
    ...facts.cleared.map((s) => `cleared:${s}`),
    ...(facts.release === 'valid' ? ['release'] : []),
    ...(facts.opened ? ['opened'] : []),
  ];
}
