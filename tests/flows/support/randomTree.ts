/** Random trees: each parses, most are unsafe, some hold. */
import * as fc from 'fast-check';

import { bench, clip, connect, dead, earth, hands, insulation, lamp, look, mains, observe, rails, remove, returns, step, treeOf, work } from './steps';
import type { Tree } from '@/flows/document/tree';

import { makeDeadTree } from './bench';

type Step = Record<string, unknown>;
type Make = (id: string, to: string, other: string) => Step;

const named = (s: Step, id: string): Step => ({ ...s, id, title: id });
const elsewhere = (s: Step, other: string): Step => ({ ...s, exits: (s['exits'] as { id: string; to: string }[]).map((e, i) => (i === 0 ? e : { ...e, to: other })) });

const MAKERS: readonly Make[] = [
  (id, to) => named(look(to), id),
  (id, to) => dead(id, to),
  (id, to) => dead(id, to),
  (id, to) => dead(id, to),
  (id, to, other) => named(earth(to, other), id),
  (id, to, other) => named(insulation(to, other), id),
  (id, to, other) => named(returns(to, other), id),
  (id, to) => hands(id, to),
  (id, to, other) => observe(id, to, {}, other),
  (id, to, other) => elsewhere(step('isolate', id, to), other),
  (id, to) => connect(id, 'light', to),
  (id, to) => connect(id, 'none', to),
  (id, to) => lamp(id, to),
  (id, to) => bench(id, to),
  (id, to) => mains(id, to),
  (id, to) => rails(id, 'limited', to),
  (id, to) => rails(id, 'regulator', to),
  (id, to) => work(id, 'regulator', to, { replaces: ['pass'] }),
  (id, to) => named(clip(to), id),
  (id, to) => remove(id, 'rail-clips', to),
];

/** The spine of a tree that holds: random trees grow from it, so that some of them hold and others break late. */
const SPINE: readonly number[] = [0, 1, 4, 5, 1, 6, 12, 8, 1];

/** A tree of up to `most` steps on a spine, with a few exits led astray. */
export function randomTree(most = 14): fc.Arbitrary<Tree> {
  return fc
    .record({
      kinds: fc.oneof<fc.MaybeWeightedArbitrary<number[]>[]>({ weight: 2, arbitrary: fc.constant([...SPINE]) }, { weight: 3, arbitrary: fc.array(fc.nat(MAKERS.length - 1), { minLength: 2, maxLength: most }) }, { weight: 3, arbitrary: fc.tuple(fc.array(fc.nat(MAKERS.length - 1), { maxLength: 4 }), fc.nat(SPINE.length)).map(([more, at]) => [...SPINE.slice(0, at), ...more, ...SPINE.slice(at)]) }),
      astray: fc.array(fc.tuple(fc.nat(20), fc.nat(20)), { maxLength: 3 }),
    })
    .map(({ kinds, astray }) => treeOf(stepsOf(kinds, astray, []), {}));
}

/** The steps of these kinds, one leading to the next; a number beyond the makers is a call of one of `callable`. */
function stepsOf(kinds: readonly number[], astray: readonly (readonly [number, number])[], callable: readonly Tree[]): Step[] {
  const ids = kinds.map((_, i) => `s${i}`);
  const at = (i: number) => ids[i] ?? 'done';
  const needsClip = kinds.some((k) => k === 19) && !kinds.includes(18);
  return kinds.map((k, i) => {
    const off = astray.find(([from]) => from % kinds.length === i);
    const other = off === undefined ? 'refer' : at(off[1] % (kinds.length + 1));
    const called = k < MAKERS.length ? undefined : callable[k % callable.length];
    if (called !== undefined) return callOf(at(i), called, at(i + 1), other, k % 3 === 0);
    const make = MAKERS[needsClip && k === 19 ? 8 : k] ?? MAKERS[0];
    return make?.(at(i), at(i + 1), other) ?? {};
  });
}

/** A call that leads on by the end `done` and elsewhere by the end `refer`, counted or not. */
function callOf(id: string, called: Tree, to: string, other: string, counted: boolean): Step {
  const ends = called.steps.filter((s) => s.kind === 'end' && s.says !== 'stopped').map((s) => s.id);
  const exits = ends.map((end) => (end === 'refer' ? { id: end, on: [end], to: other, ...(counted ? { atMost: 2, then: 'refer' } : {}) } : { id: end, on: [end], to }));
  return { ...dead(id, to), tree: called.id, exits };
}

const ANY = MAKERS.length + 6;

/** A tree that calls trees that call trees, three deep, with make-dead below all of them. */
export function randomForest(): fc.Arbitrary<{ tree: Tree; callees: Tree[] }> {
  const astray = fc.array(fc.tuple(fc.nat(20), fc.nat(20)), { maxLength: 2 });
  const part = (calls: boolean) => fc.record({ kinds: fc.array(fc.nat(calls ? ANY : MAKERS.length - 1), { minLength: 1, maxLength: 4 }), astray });
  const top = fc.tuple(fc.array(fc.nat(ANY), { maxLength: 4 }), fc.nat(SPINE.length), fc.nat(SPINE.length)).map(([more, at, call]) => [...SPINE.slice(0, at), ...more, ...SPINE.slice(at)].toSpliced(call, 0, MAKERS.length + call));
  const short = fc.array(fc.nat(ANY), { minLength: 1, maxLength: 6 });
  return fc.record({ low: part(false), mid: part(true), top: fc.record({ kinds: fc.oneof(top, short), astray }) }).map(({ low, mid, top: whole }) => {
    const lowest = treeOf(stepsOf(low.kinds, low.astray, []), { id: 'low' });
    const middle = treeOf(stepsOf(mid.kinds, mid.astray, [lowest, makeDeadTree]), { id: 'middle' });
    const tree = treeOf(stepsOf(whole.kinds, whole.astray, [middle, lowest]), {});
    return { tree, callees: [makeDeadTree, lowest, middle] };
  });
}
