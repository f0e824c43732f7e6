/**
 * Stories: breadth-first over places and whole bench facts, with the very functions that the machine uses. Shortest first, ties in document
 * order. A place that a need refuses is not walked past, so that every earlier step of a story is really allowed.
 */
import { holds } from '../facts/atoms';
import { claimAtoms } from '../facts/claims';
import type { Facts } from '../facts/facts';
import { worstFacts } from '../facts/facts';
import type { Need, RuleId } from '../facts/needs';
import { applyOps } from '../facts/ops';
import type { Op } from '../facts/ops';
import { fitVoids } from '../facts/voids';
import { toTakeOut } from '../machine/arrive';
import type { Edge, Graph, PlaceNode, Start } from './graph';

/** One answer on the way; `edge` is null where the time was up or the power was broken off. */
export interface Leg {
  key: string;
  edge: Edge | null;
  /** calls that are entered by it */
  entered: readonly string[];
  /** the energises of which one must be in force for the power to be broken off; empty for an answer */
  by: readonly string[];
}

export interface Story {
  rule: RuleId;
  start: Start;
  legs: Leg[];
  /** the place that may not be entered */
  at: string;
  needs: Need[];
}

export interface SearchResult {
  /** first story of each rule */
  stories: Map<RuleId, Story>;
  states: number;
  /** the limit was met: what was not found may still be there */
  limited: boolean;
}

interface Standing {
  key: string;
  facts: Facts;
  counters: Readonly<Record<string, number>> | null;
  from: Standing | null;
  edge: Edge | null;
  entered: readonly string[];
  by: readonly string[];
  /** the energise in force, kept beside the counters */
  live: string | null;
  /** what the way here asks besides the needs of the place */
  claims: readonly Need[];
  start: Start;
}

export interface SearchOptions {
  /** most states to look at */
  limit: number;
  /** most characters that all of them may come to as text: facts with much owed are large */
  text?: number;
  /** keep counters of counted exits and the energise in force in the state, so that only ways a run can take are walked */
  counters: boolean;
  /** stop once these rules each have a story; null looks at everything */
  wanted: ReadonlySet<RuleId> | null;
}

/** Walks the graph from its starts with whole facts. */
export function search(graph: Graph, start: Facts, options: SearchOptions): SearchResult {
  const stories = new Map<RuleId, Story>();
  const seen = new Set<string>();
  const queue: Standing[] = [];
  let limited = false;
  let text = 0;

  const arrive = (next: Standing) => {
    const node = graph.nodes.get(next.key);
    if (node === undefined) return;
    const { step } = node.placed;
    const asked = step.kind === 'end' && step.says !== 'in-service' ? closedOut(next.facts) : next.facts;
    const unmet = [...node.needs.filter((need) => !holds(asked, need.atom)), ...next.claims.filter((need) => !holds(next.facts, need.atom))];
    if (unmet.length > 0) {
      for (const rule of new Set(unmet.map((n) => n.rule))) {
        if (!stories.has(rule)) stories.set(rule, { rule, start: next.start, legs: legsTo(next), at: next.key, needs: unmet.filter((n) => n.rule === rule) });
      }
      return;
    }
    const name = `${next.key}|${JSON.stringify(next.facts)}|${next.counters === null ? '' : JSON.stringify([next.counters, next.live])}`;
    if (seen.has(name)) return;
    text += name.length;
    if (seen.size >= options.limit || text > (options.text ?? Infinity)) {
      limited = true;
      return;
    }
    seen.add(name);
    queue.push(next);
  };

  for (const s of graph.starts) for (const facts of s.reentry ? reentryFacts(graph, s, start) : [start]) arrive({ key: s.key, facts, counters: options.counters ? {} : null, from: null, edge: null, entered: [], by: [], live: null, claims: s.claims, start: s });
  for (let head = 0; head < queue.length && !limited; head += 1) {
    if (options.wanted !== null && [...options.wanted].every((rule) => stories.has(rule))) break;
    const here = queue[head];
    const node = here === undefined ? undefined : graph.nodes.get(here.key);
    if (here === undefined || node === undefined) continue;
    const acting = applyOps(here.facts, node.entered);
    const live = liveAt(node, here.live);
    for (const edge of node.edges) {
      const counters = here.counters === null ? null : counted(here.counters, edge);
      if (here.counters !== null && counters === null) continue;
      arrive({ key: edge.to, facts: applyOps(acting, edge.ops), counters, from: here, edge, entered: edge.entered, by: [], live: liveAfter(edge, live), claims: edge.claims, start: here.start });
    }
    for (const { to, by, entered, claims } of graph.aborts.get(here.key) ?? []) {
      if (here.counters !== null && (live === null || !by.includes(live))) continue;
      arrive({ key: to, facts: acting, counters: here.counters === null ? null : activated(here.counters, entered), from: here, edge: null, entered, by, live, claims, start: here.start });
    }
  }
  return { stories, states: seen.size, limited };
}

/** Whether the counted exits of a way can be taken as often as it takes them, and its power broken off where it is on. */
export function isFeasible(graph: Graph, legs: readonly Leg[]): boolean {
  let counters: Readonly<Record<string, number>> | null = {};
  let live: string | null = null;
  for (const leg of legs) {
    live = liveAt(graph.nodes.get(leg.key), live);
    if (leg.edge === null) {
      if (live === null || !leg.by.includes(live)) return false;
      counters = activated(counters, leg.entered);
    } else {
      live = liveAfter(leg.edge, live);
      counters = counted(counters, leg.edge);
    }
    if (counters === null) return false;
  }
  return true;
}

/** The energise in force while a place is acted at. */
function liveAt(node: PlaceNode | undefined, live: string | null): string | null {
  return node?.placed.step.kind === 'energise' ? node.key : live;
}

function liveAfter(edge: Edge, live: string | null): string | null {
  return edge.ops.some((op) => op.op === 'sources' && op.to === 'out') ? null : live;
}

/** The counters after an edge, or null when it cannot be taken: `to` while its count lasts, `then` once it has run out. */
function counted(counters: Readonly<Record<string, number>>, edge: Edge): Readonly<Record<string, number>> | null {
  const { exit } = edge;
  let next = counters;
  if (exit.atMost !== undefined) {
    const name = `${edge.from}>${exit.id}`;
    const n = (next[name] ?? 0) + 1;
    if (n > exit.atMost !== edge.spent) return null;
    next = { ...next, [name]: Math.min(n, exit.atMost + 1) };
  }
  for (const { call, exit: passed, spent } of edge.through) {
    if (passed.atMost === undefined) continue;
    const name = `${call}>${passed.id}`;
    const n = (next[name] ?? 0) + 1;
    if (n > passed.atMost !== spent) return null;
    next = { ...next, [name]: Math.min(n, passed.atMost + 1) };
  }
  return activated(next, edge.entered);
}

/** Counters of a called tree start at 0 with each activation of it. */
function activated(counters: Readonly<Record<string, number>>, entered: readonly string[]): Readonly<Record<string, number>> {
  return entered.length === 0 ? counters : Object.fromEntries(Object.entries(counters).filter(([name]) => !entered.some((call) => name.startsWith(`${call}/`))));
}

function legsTo(standing: Standing): Leg[] {
  const legs: Leg[] = [];
  for (let s: Standing | null = standing; s?.from != null; s = s.from) legs.unshift({ key: s.from.key, edge: s.edge, entered: s.entered, by: s.by });
  return legs;
}

function closedOut(facts: Facts): Facts {
  const out = toTakeOut(facts.fitted);
  const ops: Op[] = [{ op: 'sources', to: 'out' }, { op: 'stored', to: 'proved' }, ...out.flatMap((f) => fitVoids(f.area)), ...out.map((f): Op => ({ op: 'unfit', id: f.id }))];
  return applyOps(facts, ops);
}

/**
 * Facts at a re-entry: after make-safe, what it declares and what its own step needs; everything else at its worst, and once more at its best, for
 * every need asks for one or the other.
 */
function reentryFacts(graph: Graph, start: Start, run: Facts): Facts[] {
  const { layout } = graph;
  const declared = layout.tree.reentries.filter((r) => graph.land(r.step) === start.key).flatMap((r) => r.needs.flatMap((c) => claimAtoms(c, layout.profile)));
  const asked = [...declared, ...(graph.nodes.get(start.key)?.needs ?? []).map((n) => n.atom)];
  const safe: Op[] = [{ op: 'sources', to: 'out' }, { op: 'stored', to: 'proved' }, { op: 'opened' }];
  const worst = applyOps({ ...worstFacts(layout.profile), fitted: [], owed: { doubts: [], fails: [], killers: [] } }, safe);
  const grants: Op[] = asked.flatMap((atom): Op[] => {
    switch (atom.fact) {
      case 'looked':
      case 'earth':
      case 'insulation':
      case 'returns':
        return [{ op: 'proof', fact: atom.fact, to: 'proved' }];
      case 'trip':
        return [{ op: 'trip', rail: atom.rail, proved: true }];
      case 'proving':
        return [{ op: 'proving-at-least', to: atom.least }];
      case 'load':
        return [{ op: 'load', to: atom.is }];
      case 'load-not':
        return atom.is === 'boards' ? [{ op: 'load', to: 'none' }] : [];
      default:
        return [];
    }
  });
  const granted = applyOps(worst, grants);
  const withRelease: Facts = asked.some((a) => a.fact === 'release') ? { ...granted, release: 'valid' } : granted;
  // a load that the re-entry does not declare can be any that the run has had
  const loads = asked.some((a) => a.fact === 'load') ? [withRelease.load] : (['boards', 'none', 'light', 'full'] as const);
  return loads.filter((load) => load !== 'boards' || !asked.some((a) => a.fact === 'load-not')).map((load) => ({ ...withRelease, load, cleared: run.cleared }));
}
