/** H11, H16, H18, H19: what speaks of whole paths and not of one place. Each is a finding with the place that shows it. */
import { DEAD_QUANTITIES } from '../document/ids';
import { verdictOf } from '../facts/effects';
import type { RuleId } from '../facts/needs';
import type { Layout } from '../machine/program';
import type { Edge, Graph, PlaceNode } from './graph';

export interface PathFinding {
  rule: Extract<RuleId, 'H11' | 'H16' | 'H18' | 'H19'>;
  key: string | null;
  say: string;
}

/** H16: every step can be reached and can reach an end; every loop is counted and leads out of energy, then to a senior. */
export function reachFindings(graph: Graph): PathFinding[] {
  const reached = forward(graph, graph.starts.map((s) => s.key), () => true);
  const ends = [...graph.nodes.values()].filter((n) => n.edges.length === 0).map((n) => n.key);
  const ending = backward(graph, ends);
  const found: PathFinding[] = [];
  // a retry has the workshop's limit; a passing answer that comes back is a walk over rows, as long as its author counts
  const { retries } = graph.layout.settings;
  for (const node of graph.nodes.values()) {
    if (!reached.has(node.key)) found.push({ rule: 'H16', key: node.key, say: 'no way leads to this step' });
    else if (!ending.has(node.key)) found.push({ rule: 'H16', key: node.key, say: 'no way leads from this step to an end' });
    const tooOften = node.edges.find((e) => (e.exit.atMost ?? 0) > retries && verdictOf(e.exit, e.exit.on.includes('answer') ? 'answer' : e.outcome) !== 'pass');
    if (tooOften !== undefined) found.push({ rule: 'H16', key: node.key, say: `“${tooOften.exit.label ?? tooOften.exit.id}” may be tried ${tooOften.exit.atMost ?? 0} times; a retry is taken at most ${retries} times` });
    for (const edge of node.edges) {
      if (edge.spent && !leadsOut(graph, edge.to)) found.push({ rule: 'H16', key: node.key, say: `when “${edge.exit.label ?? edge.exit.id}” has been taken too often, it must lead to isolation, a hold or an end` });
    }
  }
  for (const key of cycle([...graph.nodes.values()], (edge) => edge.exit.atMost === undefined || edge.spent)) found.push({ rule: 'H16', key, say: 'this step stands in a loop that no counted exit ends' });
  return found;
}

/** Where a spent counter may lead: a hold, an end, or isolation first. */
function leadsOut(graph: Graph, key: string): boolean {
  const kind = graph.nodes.get(key)?.placed.step.kind;
  return kind === 'hold' || kind === 'end' || kind === 'isolate';
}

/**
 * H11: from every energise, each way reaches isolation within its stated minutes; nothing waits for a person while live, no end is reached live, no
 * loop there is uncounted. Minutes of a counted loop count as often as it can be taken. Isolation counts from the moment at which its step is shown.
 */
export function liveFindings(graph: Graph): PathFinding[] {
  const found: PathFinding[] = [];
  for (const node of graph.nodes.values()) {
    const { step } = node.placed;
    if (step.kind !== 'energise') continue;
    const region = untilIsolation(graph, node.key);
    const inside = [...region].flatMap((key) => graph.nodes.get(key) ?? []);
    const ended = inside.find((n) => n.placed.step.kind === 'end' && n.placed.step.says !== 'in-service');
    if (ended !== undefined) found.push({ rule: 'H11', key: ended.key, say: `this end can be reached while “${step.title}” is still on` });
    const walk = (edge: Edge) => region.has(edge.to) && !isIsolate(graph, edge.from);
    const uncounted = cycle(inside, (edge) => walk(edge) && (edge.exit.atMost === undefined || edge.spent));
    if (uncounted.length > 0) {
      found.push({ rule: 'H11', key: uncounted[0] ?? null, say: `while “${step.title}” is on, a loop has no end` });
      continue;
    }
    const again = inside.flatMap((n) => n.edges.filter((e) => walk(e) && !e.spent && e.exit.atMost !== undefined)).reduce((sum, e) => sum + (e.exit.atMost ?? 0), 0);
    const minutes = (1 + again) * longest(graph, node.key, (edge) => walk(edge) && (edge.exit.atMost === undefined || edge.spent), region);
    const most = Math.min(step.longestMinutes, ...inside.flatMap((n) => (n.placed.step.kind === 'raise' ? [n.placed.step.longestMinutes] : [])));
    if (minutes > most) found.push({ rule: 'H11', key: node.key, say: `isolation can come ${minutes} min after “${step.title}”, which is stated for ${most} min` });
  }
  return found;
}

function isIsolate(graph: Graph, key: string): boolean {
  return graph.nodes.get(key)?.placed.step.kind === 'isolate';
}

/** Places from an energise to the isolate steps that its ways come to; what follows a failed isolation is isolation still. */
function untilIsolation(graph: Graph, energise: string): Set<string> {
  return forward(graph, [energise], (edge) => !isIsolate(graph, edge.from), false);
}

function minutesOf({ placed: { step } }: PlaceNode): number {
  return step.kind === 'soak' ? Math.max(step.minutes, step.holdMinutes) : step.minutes;
}

/** Minutes of the longest way inside a region that has no loop left. */
function longest(graph: Graph, from: string, take: (edge: Edge) => boolean, region: ReadonlySet<string>): number {
  const known = new Map<string, number>();
  const stack: string[] = [from];
  while (stack.length > 0) {
    const key = stack.at(-1) ?? '';
    const node = graph.nodes.get(key);
    const next = node === undefined ? [] : node.edges.filter((e) => take(e) && region.has(e.to)).map((e) => e.to);
    const open = next.find((to) => !known.has(to));
    if (open !== undefined) {
      stack.push(open);
      continue;
    }
    known.set(key, (node === undefined ? 0 : minutesOf(node)) + Math.max(0, ...next.map((to) => known.get(to) ?? 0)));
    stack.pop();
  }
  return known.get(from) ?? 0;
}

/** H18: tools, instruments and conditions used are those on the opening list, none missing, none idle. */
export function listFindings(layout: Layout): PathFinding[] {
  const { opening } = layout.tree;
  const own = [...layout.steps.values()].filter((p) => !p.builtIn && p.caller === null);
  const used = new Set(own.flatMap((p) => p.step.tools));
  const read = new Set(own.flatMap((p) => (p.step.kind === 'measure' || p.step.kind === 'soak' ? [p.step.quantity] : p.rows.flatMap((r) => (r.ask === 'reading' ? [r.quantity] : [])))));
  const idle = [...opening.tools, ...opening.parts].filter((t) => !used.has(t.id));
  const idleMeters = opening.instruments.filter((i) => !used.has(i.id) && !i.reads.some((q) => read.has(q)));
  const missing = own.flatMap((p): PathFinding[] => {
    const { step } = p;
    if (step.kind !== 'measure' && step.kind !== 'soak') return [];
    const has = opening.instruments.some((i) => i.reads.includes(step.quantity));
    return has ? [] : [{ rule: 'H18', key: p.key, say: `no instrument on the opening list reads ${DEAD_QUANTITIES.includes(step.quantity) ? 'this dead' : 'this'} (${step.quantity})` }];
  });
  return [...missing, ...[...idle, ...idleMeters].map((t): PathFinding => ({ rule: 'H18', key: null, say: `“${t.name}” is on the opening list and no step uses it` }))];
}

/** H19: a source that is out at a call is out at the return; a call pins its version at issue. */
export function callFindings(graph: Graph): PathFinding[] {
  const found: PathFinding[] = [];
  for (const call of graph.layout.calleeFirst.keys()) {
    const callStep = graph.layout.steps.get(call)?.step;
    if (callStep?.kind === 'call' && callStep.version === null) found.push({ rule: 'H19', key: call, say: 'the called tree has no pinned version' });
    const raised = raisedFromOutside(graph, call);
    if (raised !== null) found.push({ rule: 'H19', key: raised, say: 'a called tree only reads a source that was in at its call, and this raises it' });
    // follow "out" alone through the called tree: it may be lost inside, but not at a way back
    const lost = new Set<string>();
    const stack: { key: string; out: boolean }[] = [{ key: graph.land(call), out: true }];
    const seen = new Set<string>();
    for (let here = stack.pop(); here !== undefined; here = stack.pop()) {
      const node = graph.nodes.get(here.key);
      if (node === undefined || seen.has(`${here.key}|${here.out}`)) continue;
      seen.add(`${here.key}|${here.out}`);
      const own = here.key.startsWith(`${call}/`);
      if (!own) {
        if (!here.out) lost.add(here.key);
        continue;
      }
      for (const edge of node.edges) {
        const after = [...node.entered, ...edge.ops].reduce((out, op) => (op.op === 'sources' ? op.to === 'out' : op.op === 'source' ? false : out), here.out);
        stack.push({ key: edge.to, out: after });
      }
    }
    for (const key of lost) found.push({ rule: 'H19', key: call, say: `a source that was out at the call may be in when it comes back to “${graph.nodes.get(key)?.placed.step.title ?? key}”` });
  }
  return found;
}

/** A raise in a called tree that no energise of the same tree stands before, or null. */
function raisedFromOutside(graph: Graph, call: string): string | null {
  const seen = new Set<string>();
  const stack = [graph.land(call)];
  for (let key = stack.pop(); key !== undefined; key = stack.pop()) {
    const node = graph.nodes.get(key);
    if (node === undefined || seen.has(key) || !key.startsWith(`${call}/`)) continue;
    seen.add(key);
    if (node.placed.step.kind === 'raise') return key;
    if (node.placed.step.kind !== 'energise') stack.push(...node.edges.map((edge) => edge.to));
  }
  return null;
}

function forward(graph: Graph, from: readonly string[], take: (edge: Edge) => boolean, aborting = true): Set<string> {
  const seen = new Set(from);
  const stack = [...from];
  for (let key = stack.pop(); key !== undefined; key = stack.pop()) {
    const node = graph.nodes.get(key);
    const aborts = aborting && node?.placed.step.kind === 'energise' ? [graph.land(node.placed.scope.check(node.placed.step.abort))] : [];
    for (const to of [...(node?.edges ?? []).filter(take).map((e) => e.to), ...aborts]) {
      if (seen.has(to)) continue;
      seen.add(to);
      stack.push(to);
    }
  }
  return seen;
}

function backward(graph: Graph, from: readonly string[]): Set<string> {
  const into = new Map<string, string[]>();
  for (const node of graph.nodes.values()) for (const edge of node.edges) push(into, edge.to, edge.from);
  const seen = new Set(from);
  const stack = [...from];
  for (let key = stack.pop(); key !== undefined; key = stack.pop()) {
    for (const before of into.get(key) ?? []) {
      if (seen.has(before)) continue;
      seen.add(before);
      stack.push(before);
    }
  }
  return seen;
}

/** Places left on a loop when only these edges count; empty when there is none. What has no way in, then what has no way out, is peeled off. */
function cycle(nodes: readonly PlaceNode[], take: (edge: Edge) => boolean): string[] {
  const inside = new Set(nodes.map((n) => n.key));
  const edges = nodes.flatMap((n) => n.edges.filter((e) => inside.has(e.to) && take(e)));
  const rest = peel(inside, edges.map((e) => [e.from, e.to]));
  return [...peel(rest, edges.map((e) => [e.to, e.from]))];
}

/** Keys that are left once every key without a way in has been taken away, again and again. */
function peel(keys: ReadonlySet<string>, ways: readonly (readonly [string, string])[]): Set<string> {
  const out = new Map<string, string[]>();
  const degree = new Map<string, number>();
  for (const [from, to] of ways) {
    if (!keys.has(from) || !keys.has(to)) continue;
    push(out, from, to);
    degree.set(to, (degree.get(to) ?? 0) + 1);
  }
  const left = new Set(keys);
  const queue = [...keys].filter((key) => (degree.get(key) ?? 0) === 0);
  for (let key = queue.pop(); key !== undefined; key = queue.pop()) {
    left.delete(key);
    for (const to of out.get(key) ?? []) {
      const n = (degree.get(to) ?? 0) - 1;
      degree.set(to, n);
      if (n === 0) queue.push(to);
    }
  }
  return left;
}

function push(map: Map<string, string[]>, key: string, value: string): void {
  const list = map.get(key);
  if (list === undefined) map.set(key, [value]);
  else list.push(value);
}
