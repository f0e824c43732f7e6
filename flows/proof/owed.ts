/**
 * H13 and H14 by regions: from every unsure or failing answer forward, not through what lifts it, to the first place that bars power.
 * Preconditions: the graph of a layout. Postconditions: a finding for each check from which some way leads to barred power with the check still owed.
 * In a tree that holds, regions end inside dead segments, so the whole is linear.
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

/** Every check whose doubt or failure can reach power. */
export function owedFindings(graph: Graph): Owing[] {
  const found: Owing[] = [];
  for (const node of graph.nodes.values()) {
    for (const edge of node.edges) {
      for (const op of edge.ops) {
        if (op.op === 'doubt') found.push(...walk(graph, node, edge, op.check, 'doubt'));
        if (op.op === 'fail') found.push(...walk(graph, node, edge, op.check, 'open'));
      }
    }
  }
  return found;
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

function walk(graph: Graph, from: PlaceNode, by: Edge, check: string, debt: Debt): Owing[] {
  const live = answeredLive(from.placed.step);
  const seen = new Set<string>();
  const stack: { key: string; debt: Debt }[] = [{ key: by.to, debt }];
  for (let here = stack.pop(); here !== undefined; here = stack.pop()) {
    const name = `${here.key}|${here.debt}`;
    const node = graph.nodes.get(here.key);
    if (node === undefined || seen.has(name)) continue;
    seen.add(name);
    const barred = barredBy(node, here.debt, live);
    if (barred !== null) return [{ rule: here.debt === 'doubt' ? 'H13' : 'H14', check, edge: by, at: here.key, say: barred }];
    for (const edge of node.edges) {
      const left = edge.ops.reduce<Debt | null>((d, op) => (d === null ? null : afterOp(d, check, op)), here.debt);
      if (left !== null) stack.push({ key: edge.to, debt: left });
    }
    for (const to of graph.aborts.get(here.key) ?? []) stack.push({ key: to, debt: here.debt });
  }
  return [];
}

function barredBy(node: PlaceNode, debt: Debt, live: boolean): string | null {
  for (const { atom, say } of node.needs) {
    if (atom.fact === 'no-doubt' && debt === 'doubt') return say;
    if (atom.fact === 'no-open-fail' && debt === 'open') return say;
    if (atom.fact === 'no-fail-waiting-for-limited-power' && debt === 'fixed' && (atom.deadToo || !live)) return say;
  }
  return null;
}
