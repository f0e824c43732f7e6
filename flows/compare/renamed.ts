/** Steps that changed only their id: one that is gone from the older version and one that is new in the other, alike in all else. */
import type { Exit, Step } from '../document/steps';
import type { Tree } from '../document/tree';

/** New id by old id, for steps that were renamed. Where several are alike, the one whose exits lead to the same places is taken, then the first. */
export function renamedSteps(older: Tree, newer: Tree): Map<string, string> {
  const before = new Set(older.steps.map((s) => s.id));
  const after = new Set(newer.steps.map((s) => s.id));
  const gone = older.steps.filter((s) => !after.has(s.id));
  const fresh = newer.steps.filter((s) => !before.has(s.id));
  const renamed = new Map<string, string>();
  const taken = new Set<string>();
  // twice: what was matched by its content in the first round names the targets of the second
  for (const strict of [true, false]) {
    for (const step of gone) {
      if (renamed.has(step.id)) continue;
      const alike = fresh.filter((f) => !taken.has(f.id) && contentOf(f) === contentOf(step));
      const match = alike.find((f) => sameTargets(step, f, renamed)) ?? (strict ? undefined : alike[0]);
      if (match === undefined) continue;
      renamed.set(step.id, match.id);
      taken.add(match.id);
    }
  }
  return renamed;
}

/** The older version with the ids of the newer one, so that what is left to tell is what has really changed. */
export function withNewIds(tree: Tree, renamed: ReadonlyMap<string, string>): Tree {
  if (renamed.size === 0) return tree;
  const now = (id: string) => renamed.get(id) ?? id;
  const steps = tree.steps.map((step) => {
    const named = { ...step, id: now(step.id), exits: step.exits.map((e: Exit) => ({ ...e, to: now(e.to), ...(e.then === undefined ? {} : { then: now(e.then) }) })) };
    if (named.kind === 'energise' || named.kind === 'raise') return { ...named, abort: now(named.abort) };
    if (named.kind === 'work' && named.for !== undefined) return { ...named, for: named.for.map(now) };
    if (named.kind === 'hold' && named.names !== undefined) return { ...named, names: named.names.map(now) };
    return named;
  }) as Step[];
  return { ...tree, steps, reentries: tree.reentries.map((r) => ({ ...r, step: now(r.step) })) };
}

function contentOf(step: Step): string {
  return JSON.stringify({ ...step, id: '', abort: '', for: [], names: [], exits: step.exits.map((e: Exit) => ({ ...e, to: '', then: '' })) });
}

function sameTargets(older: Step, newer: Step, renamed: ReadonlyMap<string, string>): boolean {
  const targets = (step: Step, now: (id: string) => string) => step.exits.map((e: Exit) => `${now(e.to)} ${e.then === undefined ? '' : now(e.then)}`).join();
  return targets(older, (id) => renamed.get(id) ?? id) === targets(newer, (id) => id);
}
