/** What changed between two versions of a tree, in an author's words, and how far it reaches. */
import type { Step } from '../document/steps';
import type { Tree } from '../document/tree';
import { same, shown, worstRisk } from './change';
import type { Change, Risk } from './change';
import { newWaysToLive } from './newWays';
import type { NewWay } from './newWays';
import { renamedSteps, withNewIds } from './renamed';
import { stepChanges } from './stepChanges';

export interface Comparison {
  /** text < limit < order < energy; none where nothing has changed */
  risk: Risk;
  changes: Change[];
  newWaysToLive: NewWay[];
}

/** Kinds that put power in, take it out, or stand between hands and power. */
const GUARDING: readonly Step['kind'][] = ['isolate', 'discharge', 'prove-dead', 'prove-earth', 'prove-insulation', 'prove-returns', 'prove-trip', 'prove-rails', 'connect-load', 'energise', 'raise', 'hold', 'call', 'work'];

/**
 * Compares by id: the order in which steps are written does not count, but for the first, which is the start. A step that was renamed and nothing else is told as that.
 * `powered` names trees whose call puts power in.
 */
export function compareTrees(older: Tree, newer: Tree, powered: ReadonlySet<string> = new Set()): Comparison {
  const renamed = renamedSteps(older, newer);
  const before = withNewIds(older, renamed);
  const live = (step: Step) => step.kind === 'energise' || step.kind === 'raise' || (step.kind === 'call' && powered.has(step.tree));
  const ways = newWaysToLive(before, newer, live);
  const changes = [
    ...headChanges(before, newer),
    ...[...renamed].map(([from, to]): Change => ({ what: 'renamed', step: to, risk: 'text', say: `“${titleOf(newer, to)}” is now called ${to}, it was ${from}.` })),
    ...stepListChanges(before, newer),
  ];
  return { risk: worstRisk([...changes.map((c) => c.risk), ...(ways.length > 0 ? ['energy' as const] : [])]), changes, newWaysToLive: ways };
}

function stepListChanges(before: Tree, newer: Tree): Change[] {
  const was = new Map(before.steps.map((s) => [s.id, s]));
  const is = new Set(newer.steps.map((s) => s.id));
  const risk = (step: Step): Risk => (GUARDING.includes(step.kind) || step.contact !== 'none' ? 'energy' : 'order');
  const start = before.steps[0]?.id === newer.steps[0]?.id ? [] : [{ what: 'start', step: newer.steps[0]?.id ?? null, risk: 'energy', say: `The tree now begins at “${newer.steps[0]?.title ?? ''}”, it began at “${before.steps[0]?.title ?? ''}”.` } satisfies Change];
  return [
    ...start,
    ...before.steps.filter((s) => !is.has(s.id)).map((s): Change => ({ what: 'removed', step: s.id, risk: risk(s), say: `“${s.title}” (${s.kind}) is gone.` })),
    ...newer.steps.flatMap((s) => {
      const old = was.get(s.id);
      return old === undefined ? [{ what: 'added', step: s.id, risk: risk(s), say: `“${s.title}” (${s.kind}) is new.` } satisfies Change] : stepChanges(old, s);
    }),
  ];
}

function headChanges(before: Tree, newer: Tree): Change[] {
  const changes: Change[] = [];
  const add = (what: Change['what'], risk: Risk, say: string) => changes.push({ what, step: null, risk, say });
  for (const key of ['title', 'symptom', 'about', 'purpose'] as const) if (before[key] !== newer[key]) add('reworded', 'text', `The ${key} is now ${shown(newer[key])}, it was ${shown(before[key])}.`);
  if (!same(before.appliesTo, newer.appliesTo)) add('start', 'energy', `It now applies to: ${shown(newer.appliesTo)}; before: ${shown(before.appliesTo)}.`);
  if (!same([...before.needsAtStart].sort(), [...newer.needsAtStart].sort())) add('start', 'energy', `It now needs at its start: ${shown(newer.needsAtStart)}; before: ${shown(before.needsAtStart)}.`);
  changes.push(...listChanges(before.suspects, newer.suspects, 'suspect', 'order', (s) => `The suspect ${s.id} (${s.part}, ${s.mode})`));
  for (const list of ['tools', 'instruments', 'parts', 'conditions'] as const) {
    changes.push(...listChanges<{ id: string; name: string }>(before.opening[list], newer.opening[list], 'opening', 'limit', (item) => `On the opening list, “${item.name}”`));
  }
  const places = (tree: Tree) => tree.reentries.map((r) => ({ id: r.step, needs: [...r.needs].sort() }));
  changes.push(...listChanges(places(before), places(newer), 'start', 'energy', (r) => `Going on at ${r.id} after Stop`));
  return changes;
}

function listChanges<T extends { id: string }>(before: readonly T[], after: readonly T[], what: Change['what'], risk: Risk, name: (item: T) => string): Change[] {
  const was = new Map(before.map((item) => [item.id, item]));
  const is = new Set(after.map((item) => item.id));
  return [
    ...before.filter((item) => !is.has(item.id)).map((item): Change => ({ what, step: null, risk, say: `${name(item)} is gone.` })),
    ...after.flatMap((item): Change[] => {
      const old = was.get(item.id);
      if (old === undefined) return [{ what, step: null, risk, say: `${name(item)} is new.` }];
      return same(old, item) ? [] : [{ what, step: null, risk, say: `${name(item)} has changed: ${differences(old, item)}.` }];
    }),
  ];
}

function differences(old: object, item: object): string {
  const [was, is] = [old as Record<string, unknown>, item as Record<string, unknown>];
  return [...new Set([...Object.keys(was), ...Object.keys(is)])].filter((k) => !same(was[k], is[k])).map((k) => `${k} is now ${shown(is[k])}, it was ${shown(was[k])}`).join('; ');
}

function titleOf(tree: Tree, id: string): string {
  return tree.steps.find((s) => s.id === id)?.title ?? id;
}
