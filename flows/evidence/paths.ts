/** The steps of a tree as a graph of their exits, counted ones taken and spent. */
import type { Exit, Step } from '../document/steps';
import type { Tree } from '../document/tree';

export interface Leg {
  from: string;
  exit: Exit;
  to: string;
}

/** Every way out of a step: `to` of each exit, and `then` of a counted one. */
export function legsOf(step: Step): Leg[] {
  return step.exits.flatMap((exit: Exit) =>
    [exit.to, ...(exit.then === undefined ? [] : [exit.then])].map((to) => ({ from: step.id, exit, to })),
  );
}

/** The first leg on a shortest way to each step that can be reached from the tree's start or a re-entry; null at those places themselves. */
export function reachedFrom(tree: Tree, starts: readonly string[] = startsOf(tree)): Map<string, Leg | null> {
  const steps = new Map(tree.steps.map((s) => [s.id, s]));
  const reached = new Map<string, Leg | null>(starts.map((id) => [id, null]));
  const queue = [...starts];
  for (let i = 0; i < queue.length; i += 1) {
    const step = steps.get(queue[i] ?? '');
    if (step === undefined) continue;
    for (const leg of legsOf(step)) {
      if (reached.has(leg.to)) continue;
      reached.set(leg.to, leg);
      queue.push(leg.to);
    }
  }
  return reached;
}

/** Where a run of the tree can begin, or go on after Stop. */
export function startsOf(tree: Tree): string[] {
  const first = tree.steps[0]?.id;
  return [
    ...new Set([
      ...(first === undefined ? [] : [first]),
      ...tree.reentries.map((r) => r.step),
      ...tree.steps.flatMap((s) => (s.kind === 'energise' || s.kind === 'raise' ? [s.abort] : [])),
    ]),
  ];
}

/** The legs of a shortest way from a start to a step, in order; null when it cannot be reached. */
export function wayTo(reached: ReadonlyMap<string, Leg | null>, id: string): Leg[] | null {
  const way: Leg[] = [];
  let leg = reached.get(id);
  if (leg === undefined) return null;
  while (leg !== null && leg !== undefined) {
    way.unshift(leg);
    leg = reached.get(leg.from);
  }
  return way;
}
