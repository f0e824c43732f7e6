/** Random trees: each parses, most are unsafe, some hold. */
import * as fc from 'fast-check';

import { bench, clip, connect, dead, earth, hands, insulation, lamp, look, mains, observe, rails, remove, returns, step, treeOf, work } from './steps';
import type { Tree } from '@/flows/document/tree';

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
    .map(({ kinds, astray }) => {
      const ids = kinds.map((_, i) => `s${i}`);
      const at = (i: number) => ids[i] ?? 'done';
      const needsClip = kinds.some((k) => k === 19) && !kinds.includes(18);
      const steps = kinds.map((k, i) => {
        const off = astray.find(([from]) => from % kinds.length === i);
        const make = MAKERS[needsClip && k === 19 ? 8 : k] ?? MAKERS[0];
        return make?.(at(i), at(i + 1), off === undefined ? 'refer' : at(off[1] % (kinds.length + 1))) ?? {};
      });
      return treeOf([...steps], {});
    });
}
