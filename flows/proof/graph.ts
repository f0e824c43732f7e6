/** The graph that a proof walks: every place a run can stand at, and every way on, with what each does to the facts. */
import { OUTCOMES_OF } from '../document/outcomes';
import type { Exit, Step } from '../document/steps';
import { after, entered } from '../facts/effects';
import { needs } from '../facts/needs';
import { insteadOf } from '../facts/opening';
import type { Need } from '../facts/needs';
import type { Op } from '../facts/ops';
import { claimAtoms } from '../facts/claims';
import { endsCalledTree, follow, landingsOf } from '../machine/program';
import type { Layout, Landing, ProgramStep } from '../machine/program';

export interface Edge {
  from: string;
  exit: Exit;
  /** the outcome, or the id of an authored answer */
  outcome: string;
  /** whether the exit's counter has run out, so that `then` is taken */
  spent: boolean;
  ops: readonly Op[];
  to: string;
  through: Landing['through'];
  entered: Landing['entered'];
  /** what a call says that it leaves, asked where it comes back, and what a called tree needs, asked where it is entered (H19) */
  claims: readonly Need[];
}

export interface PlaceNode {
  key: string;
  placed: ProgramStep;
  needs: readonly Need[];
  entered: readonly Op[];
  edges: readonly Edge[];
}

/** Where a run can begin to walk: the tree's first step, or a re-entry after Stop with exactly the facts that it declares. */
export interface Start {
  key: string;
  reentry: boolean;
  claims: readonly Need[];
}

/** Where the power is broken off to. */
export interface Abort {
  to: string;
  /** the energises whose abort this is: only while one of them is in force can it be taken */
  by: readonly string[];
  entered: readonly string[];
  claims: readonly Need[];
}

export interface Graph {
  layout: Layout;
  nodes: ReadonlyMap<string, PlaceNode>;
  starts: readonly Start[];
  /** the place that a target comes to, calls entered */
  land(key: string): string;
  /** where abort leads from each place that an energise can be in force at */
  aborts: ReadonlyMap<string, readonly Abort[]>;
}

/**
 * Builds the graph of a layout.
 * Preconditions: the layout has no faults. Postconditions: every target of an edge is a node; calls are entered and left as the machine does it;
 * both ways of a counted exit are there (more ways than a run has, never fewer). Linear in steps and exits.
 */
export function graphOf(layout: Layout): Graph {
  const nodes = new Map<string, PlaceNode>();
  for (const placed of layout.steps.values()) {
    if (placed.builtIn || placed.step.kind === 'call' || endsCalledTree(placed) || insteadOf(placed.step, layout.profile) !== null) continue;
    nodes.set(placed.key, { key: placed.key, placed, needs: needs(placed.step, placed.scope), entered: entered(placed.step, placed.scope), edges: edgesOf(layout, placed) });
  }
  const arriving = (key: string): Abort => {
    const landing = follow(layout, key, () => false);
    return { to: landing.key, by: [], entered: landing.entered, claims: calledNeeds(layout, landing) };
  };
  const start = (key: string, reentry: boolean): Start => ({ key: arriving(key).to, reentry, claims: arriving(key).claims });
  return { layout, nodes, land: (key) => arriving(key).to, aborts: abortTargets(nodes, arriving), starts: [start(layout.first, false), ...layout.tree.reentries.map((r) => start(r.step, true))] };
}

function edgesOf(layout: Layout, placed: ProgramStep): Edge[] {
  return placed.step.exits.flatMap((exit: Exit) =>
    outcomesOf(placed.step, exit).flatMap(({ outcome, word }) => {
      const own = after(placed.step, exit, word, placed.scope);
      return waysOf(exit).flatMap(({ to, spent }) =>
        landingsOf(layout, placed.scope.check(to)).map((landing): Edge => {
          const { through, entered } = landing;
          return { from: placed.key, exit, outcome, spent, ops: [...own, ...throughOps(layout, landing)], to: landing.key, through, entered, claims: [...resultClaims(layout, landing), ...calledNeeds(layout, landing)] };
        }),
      );
    }),
  );
}

/** What can be answered so that this exit is taken. A step's outcomes that fall together in one exit still differ in their effect. */
function outcomesOf(step: Step, exit: Exit): { outcome: string; word: string }[] {
  if (exit.on.includes('answer')) return [{ outcome: exit.id, word: 'answer' }];
  const possible: readonly string[] = OUTCOMES_OF[step.kind];
  return (exit.on as string[]).filter((on) => possible.includes(on)).map((on) => ({ outcome: on, word: on }));
}

function waysOf(exit: Exit): { to: string; spent: boolean }[] {
  return exit.then === undefined ? [{ to: exit.to, spent: false }] : [{ to: exit.to, spent: false }, { to: exit.then, spent: true }];
}

function throughOps(layout: Layout, landing: Landing): Op[] {
  return landing.through.flatMap(({ call, exit }) => {
    const scope = layout.steps.get(call)?.scope;
    return (exit.evidence ?? []).filter((e) => e.says === 'rules-out' || e.says === 'points-away').map((e): Op => ({ op: 'clear', suspect: scope?.check(e.suspect) ?? e.suspect }));
  });
}

/** The stated results of the calls that a way comes back from. */
function resultClaims(layout: Layout, landing: Landing): Need[] {
  return landing.through.flatMap(({ call }) => {
    const step = layout.steps.get(call)?.step;
    const results = step?.kind === 'call' ? (step.results ?? []) : [];
    return results.flatMap((claim) => claimAtoms(claim, layout.profile).map((atom): Need => ({ rule: 'H19', atom, say: `the called tree does not leave “${claim}”, as its call says` })));
  });
}

/** H19: what a called tree needs at its start, and what its call says it needs, is asked where it is entered. */
function calledNeeds(layout: Layout, { entered: calls }: Landing): Need[] {
  return calls.flatMap((key) => {
    const call = layout.steps.get(key)?.step;
    const own = call?.kind === 'call' ? (call.needs ?? []) : [];
    return [...own, ...(layout.calleeNeeds.get(key) ?? [])].flatMap((claim) => claimAtoms(claim, layout.profile).map((atom): Need => ({ rule: 'H19', atom, say: `the called tree needs “${claim}” at its start` })));
  });
}

/** From every place that an energise can be in force at, abort leads to that energise's target, with what the step has made worse. */
function abortTargets(nodes: ReadonlyMap<string, PlaceNode>, arriving: (key: string) => Abort): ReadonlyMap<string, readonly Abort[]> {
  const targets = new Map<string, Map<string, Abort>>();
  for (const node of nodes.values()) {
    const { step, scope } = node.placed;
    if (step.kind !== 'energise') continue;
    const abort = arriving(scope.check(step.abort));
    for (const key of liveRegion(nodes, node.key)) {
      // an end is made safe by the machine itself, or has put the supply into service
      if (nodes.get(key)?.placed.step.kind === 'end') continue;
      const known = targets.get(key) ?? new Map<string, Abort>();
      const target = abort.entered[0] ?? abort.to;
      targets.set(key, known.set(target, { ...abort, by: [...(known.get(target)?.by ?? []), node.key] }));
    }
  }
  return new Map([...targets].map(([key, set]) => [key, [...set.values()]]));
}

/**
 * Places that an energise can still be in force at: all that it leads to without a source having been taken out. A place that needs every source
 * out is not entered with power on; that it could be led to is a finding of its own.
 */
function liveRegion(nodes: ReadonlyMap<string, PlaceNode>, energise: string): Set<string> {
  const region = new Set<string>([energise]);
  const stack = [energise];
  for (let key = stack.pop(); key !== undefined; key = stack.pop()) {
    for (const edge of nodes.get(key)?.edges ?? []) {
      if (region.has(edge.to) || edge.ops.some((op) => op.op === 'sources' && op.to === 'out')) continue;
      if (nodes.get(edge.to)?.needs.some((need) => need.atom.fact === 'all-out') === true) continue;
      region.add(edge.to);
      stack.push(edge.to);
    }
  }
  return region;
}
