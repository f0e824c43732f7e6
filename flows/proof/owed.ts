/**
 * H13 and H14 by regions: from every unsure or failing answer forward, not through what lifts it, to the first place that bars power.
 * Preconditions: the graph of a layout. Postconditions: a finding for each check from which some way leads to barred power with the check still owed.
 * A walk goes only where some way still leads to power, so that in a tree that holds regions end inside dead segments. What takes more steps than
 * `MOST_VISITS` is a finding that it could not be decided, never a pass.
 */
import { answeredLive } from '../facts/effects';
import type { Op } from '../facts/ops';
import type { RuleId } from '../facts/needs';
import type { Edge, Graph, PlaceNode } from './graph';

export interface Owing {
  rule: Extract<RuleId, 'H13' | 'H14'>;
  /** the check, by its key */
  check: string;
  /** the answer that owes */
  edge: Edge;
  /** the place that bars */
  at: string;
  say: string;
}

type Debt = 'doubt' | 'open' | 'fixed';
const DEBTS: readonly Debt[] = ['doubt', 'open', 'fixed'];
const OWING: ReadonlySet<Op['op']> = new Set(['doubt', 'lift-doubt', 'fail', 'fix', 'pass']);

/** Most visits of places over all walks. */
export const MOST_VISITS = 4_000_000;
/** Findings of one rule that are told; the rest is work without news. */
const MOST_TOLD = 50;

interface Place {
  node: PlaceNode;
  bars: readonly PlaceNode['needs'][number][];
  ways: { to: number; edge: Edge | null; ops: readonly Op[] }[];
}

/** Every check whose doubt or failure can reach power. */
export function owedFindings(graph: Graph): Owing[] {
  const places = placesOf(graph);
  const powered = leadingToPower(places);
  const walker = walkerOf(places, powered);
  const found: Owing[] = [];
  const told = { H13: 0, H14: 0 };
  for (const place of places) {
    for (const { to, edge, ops } of place.ways) {
      if (edge === null || powered[to] !== 1) continue;
      for (const op of ops) {
        if (op.op !== 'doubt' && op.op !== 'fail') continue;
        const first = op.op === 'doubt' ? 'doubt' : 'open';
        if (told[first === 'doubt' ? 'H13' : 'H14'] >= MOST_TOLD) continue;
        const barred = walker(to, op.check, first, answeredLive(place.node.placed.step));
        if (barred === null) continue;
        const rule = barred.debt === 'doubt' ? 'H13' : 'H14';
        told[rule] += 1;
        found.push({ rule, check: op.check, edge, at: barred.at, say: barred.say });
        if (barred.undecided) return found;
      }
    }
  }
  return found;
}

function placesOf(graph: Graph): Place[] {
  const nodes = [...graph.nodes.values()];
  const numbers = new Map(nodes.map((node, i) => [node.key, i]));
  const at = (key: string) => numbers.get(key) ?? -1;
  return nodes.map((node) => ({
    node,
    bars: node.needs.filter(({ atom }) => atom.fact === 'no-doubt' || atom.fact === 'no-open-fail' || atom.fact === 'no-fail-waiting-for-limited-power'),
    ways: [
      ...node.edges.map((edge) => ({ to: at(edge.to), edge, ops: edge.ops.filter((op) => OWING.has(op.op)) })),
      ...(graph.aborts.get(node.key) ?? []).map((abort) => ({ to: at(abort.to), edge: null, ops: [] })),
    ].filter((way) => way.to >= 0),
  }));
}

/** Places that bar power, or from which some way leads to one that does. */
function leadingToPower(places: readonly Place[]): Uint8Array {
  const from: number[][] = places.map(() => []);
  places.forEach((place, i) => place.ways.forEach((way) => from[way.to]?.push(i)));
  const powered = new Uint8Array(places.length);
  const stack = places.flatMap((place, i) => (place.bars.length > 0 ? [i] : []));
  for (let i = stack.pop(); i !== undefined; i = stack.pop()) {
    if (powered[i] === 1) continue;
    powered[i] = 1;
    stack.push(...(from[i] ?? []));
  }
  return powered;
}

type Barred = { at: string; say: string; debt: Debt; undecided: boolean } | null;

/** Walks forward with one debt at a time; what has been seen is marked by the number of the walk. */
function walkerOf(places: readonly Place[], powered: Uint8Array): (from: number, check: string, debt: Debt, live: boolean) => Barred {
  const seen = DEBTS.map(() => new Int32Array(places.length));
  let walk = 0;
  let visits = 0;
  return (from, check, debt, live) => {
    walk += 1;
    const stack: { i: number; debt: Debt }[] = [{ i: from, debt }];
    for (let here = stack.pop(); here !== undefined; here = stack.pop()) {
      const marks = seen[DEBTS.indexOf(here.debt)];
      const place = places[here.i];
      if (place === undefined || marks === undefined || powered[here.i] !== 1 || marks[here.i] === walk) continue;
      marks[here.i] = walk;
      visits += 1;
      if (visits > MOST_VISITS) return { at: place.node.key, say: 'there are too many ways to decide what is owed here', debt, undecided: true };
      const say = barredBy(place, here.debt, live);
      if (say !== null) return { at: place.node.key, say, debt: here.debt, undecided: false };
      for (const way of place.ways) {
        let left: Debt | null = here.debt;
        for (const op of way.ops) left = left === null ? null : afterOp(left, check, op);
        if (left !== null) stack.push({ i: way.to, debt: left });
      }
    }
    return null;
  };
}

/** The debt after one operation; null once it is gone. */
function afterOp(debt: Debt, check: string, op: Op): Debt | null {
  switch (op.op) {
    case 'pass':
      return op.check === check ? null : debt;
    case 'lift-doubt':
      return debt === 'doubt' && op.check === check ? null : debt;
    case 'fix':
      return debt === 'open' && op.check === check ? 'fixed' : debt;
    case 'fail':
      return op.check === check && debt === 'fixed' ? 'open' : debt;
    default:
      return debt;
  }
}

function barredBy(place: Place, debt: Debt, live: boolean): string | null {
  for (const { atom, say } of place.bars) {
    if (atom.fact === 'no-doubt' && debt === 'doubt') return say;
    if (atom.fact === 'no-open-fail' && debt === 'open') return say;
    if (atom.fact === 'no-fail-waiting-for-limited-power' && debt === 'fixed' && (atom.deadToo || !live)) return say;
  }
  return null;
}
