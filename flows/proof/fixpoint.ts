/**
 * The verdict: for every place, what may be 0 and what may be 1 over all ways to it, and which needs that breaks.
 * Preconditions: a graph whose targets exist. Postconditions: the states are the meet over all paths, exactly, for every fact that is a bit
 * (each effect is a set, a clear or a copy of one bit). Linear in edges times words, for each bit changes at most once at each place.
 */
import type { Claim } from '../document/steps';
import { claimAtoms } from '../facts/claims';
import type { Facts } from '../facts/facts';
import type { Need, RuleId } from '../facts/needs';
import { toTakeOut } from '../machine/arrive';
import { fitVoids } from '../facts/voids';
import type { Op } from '../facts/ops';
import { hasBit, join, putBit, through } from './bits';
import type { MayState } from './bits';
import { encodingOf } from './encode';
import type { Encoding } from './encode';
import type { Graph, PlaceNode } from './graph';

/** A need that some way to a place does not meet. */
export interface Broken {
  rule: RuleId;
  key: string;
  need: Need;
}

export interface Fixpoint {
  encoding: Encoding;
  /** state at arrival, by place; a place that nothing leads to is not there */
  at: ReadonlyMap<string, MayState>;
  broken: Broken[];
}

/** Runs to the fixpoint from every start. */
export function fixpointOf(graph: Graph, start: Facts): Fixpoint {
  const encoding = encodingOf(graph, start);
  const at = new Map<string, MayState>();
  const queue: string[] = [];
  const queued = new Set<string>();
  const arrive = (key: string, state: MayState) => {
    const known = at.get(key);
    const grew = known === undefined ? true : join(known, state);
    if (known === undefined) at.set(key, { may0: state.may0.slice(), may1: state.may1.slice() });
    if (grew && !queued.has(key)) {
      queued.add(key);
      queue.push(key);
    }
  };
  for (const s of graph.starts) arrive(s.key, s.reentry ? reentryState(graph, encoding, s.key) : encoding.state(start));

  const effects = new Map<string, { entered: ReturnType<Encoding['effect']>; edges: { to: string; effect: ReturnType<Encoding['effect']>; claims: readonly Need[] }[] }>();
  const effectsOf = (node: PlaceNode) => {
    const known = effects.get(node.key);
    if (known !== undefined) return known;
    const made = { entered: encoding.effect(node.entered), edges: node.edges.map((e) => ({ to: e.to, effect: encoding.effect(e.ops), claims: e.claims })) };
    effects.set(node.key, made);
    return made;
  };
  for (let head = 0; head < queue.length; head += 1) {
    const key = queue[head] ?? '';
    queued.delete(key);
    const node = graph.nodes.get(key);
    const state = at.get(key);
    if (node === undefined || state === undefined) continue;
    const own = effectsOf(node);
    const acting = through(state, own.entered);
    for (const edge of own.edges) arrive(edge.to, through(acting, edge.effect));
    for (const { to } of graph.aborts.get(key) ?? []) arrive(to, acting);
  }
  const asked = (claims: readonly Need[], to: string, state: MayState) => unmet(encoding, claims, state).map((need): Broken => ({ rule: need.rule, key: to, need }));
  const claimed = [...graph.nodes.values()].flatMap((node): Broken[] => {
    const state = at.get(node.key);
    const aborts = (graph.aborts.get(node.key) ?? []).filter((a) => a.claims.length > 0);
    if (state === undefined || (aborts.length === 0 && node.edges.every((e) => e.claims.length === 0))) return [];
    const own = effectsOf(node);
    const acting = through(state, own.entered);
    return [...own.edges.flatMap((e) => asked(e.claims, e.to, through(acting, e.effect))), ...aborts.flatMap((a) => asked(a.claims, a.to, acting))];
  });
  claimed.push(...graph.starts.flatMap((s) => asked(s.claims, s.key, s.reentry ? reentryState(graph, encoding, s.key) : encoding.state(start))));
  return { encoding, at, broken: [...[...graph.nodes.values()].flatMap((node) => brokenAt(encoding, node, at.get(node.key))), ...claimed] };
}

/** A re-entry stands on exactly what it declares, and the machine also asks its step's needs, nothing owed, nothing fitted. */
function reentryState(graph: Graph, encoding: Encoding, key: string): MayState {
  const state = encoding.free();
  const { layout } = graph;
  const declared: Claim[] = layout.tree.reentries.filter((r) => graph.land(r.step) === key).flatMap((r) => r.needs);
  const needs: Need[] = [...declared.flatMap((c) => claimAtoms(c, layout.profile)).map((atom): Need => ({ rule: 'H21', atom, say: '' })), ...(graph.nodes.get(key)?.needs ?? []), { rule: 'H21', atom: { fact: 'none-fitted' }, say: '' }, { rule: 'H21', atom: { fact: 'no-killer' }, say: '' }];
  for (const need of needs) {
    const form = encoding.need(need);
    if (form.as !== 'bits') continue;
    for (const { bit, must } of form.literals) clearBit(must ? state.may0 : state.may1, bit);
    // one load at a time: what is declared shuts the others out
    if (need.atom.fact === 'load') for (const bit of encoding.names.startingWith('load:')) if (bit !== encoding.names.of(`load:${need.atom.is}`)) clearBit(state.may1, bit);
  }
  // after make-safe the bench is proved dead
  for (const name of ['out', 'discharged', 'proved', 'opened']) {
    clearBit(state.may0, encoding.names.of(name));
    putBit(state.may1, encoding.names.of(name));
  }
  for (const bit of [encoding.names.of('live'), ...encoding.names.startingWith('src:'), ...encoding.names.startingWith('feeds:'), ...encoding.names.startingWith('clip:'), ...encoding.names.startingWith('condition:')]) {
    clearBit(state.may1, bit);
    putBit(state.may0, bit);
  }
  return state;
}

function clearBit(set: Uint32Array, bit: number): void {
  set[bit >>> 5] = (set[bit >>> 5] ?? 0) & ~(1 << (bit & 31));
}

function brokenAt(encoding: Encoding, node: PlaceNode, arrived: MayState | undefined): Broken[] {
  if (arrived === undefined) return [];
  const { step } = node.placed;
  const state = step.kind === 'end' && step.says !== 'in-service' ? closedOut(encoding, arrived) : arrived;
  return unmet(encoding, node.needs, state).map((need) => ({ rule: need.rule, key: node.key, need }));
}

function unmet(encoding: Encoding, needs: readonly Need[], state: MayState): Need[] {
  return needs.filter((need) => {
    const form = encoding.need(need);
    if (form.as === 'never') return true;
    return form.as === 'bits' && form.literals.some(({ bit, must }) => hasBit(must ? state.may0 : state.may1, bit));
  });
}

/** Close-out as the machine does it: dead, temporary things out, and what taking them out may void. */
function closedOut(encoding: Encoding, state: MayState): MayState {
  let closed = through(state, encoding.effect([{ op: 'sources', to: 'out' }, { op: 'stored', to: 'proved' }]));
  for (const thing of encoding.things) {
    if (toTakeOut([thing]).length === 0 || !hasBit(closed.may1, encoding.names.of(`fitted:${thing.id}`))) continue;
    const out: Op[] = [...fitVoids(thing.area), { op: 'unfit', id: thing.id }];
    const taken = through(closed, encoding.effect(out));
    const always = !hasBit(closed.may0, encoding.names.of(`fitted:${thing.id}`));
    if (!always) join(taken, { may0: closed.may0, may1: withoutBit(closed.may1, encoding.names.of(`fitted:${thing.id}`)) });
    closed = taken;
  }
  return closed;
}

function withoutBit(set: Uint32Array, bit: number): Uint32Array {
  const copy = set.slice();
  clearBit(copy, bit);
  return copy;
}
