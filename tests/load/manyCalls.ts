/** Trees that call trees: how large the whole comes to when every call is laid out. */
import type { Tree } from '@/flows/document/tree';

import { makeDeadTree } from '../flows/support/bench';
import { dead, hands, treeOf } from '../flows/support/steps';

export interface Called {
  tree: Tree;
  callees: Tree[];
}

const callOf = (id: string, tree: string, to: string) => ({ ...dead(id, to), tree, exits: [{ id: 'both', on: ['done', 'refer'], to }] });

/** A tree of `calls` calls of each tree in turn, each followed by a step of the hands. */
function calling(id: string, calls: number, trees: readonly string[]): Tree {
  const to = (i: number) => (i === calls ? 'done' : `c${i}`);
  const one = (i: number) => (trees.length === 0 ? dead(`c${i}`, `h${i}`) : callOf(`c${i}`, trees[i % trees.length] ?? '', `h${i}`));
  const body = Array.from({ length: calls }, (_, i) => [one(i), hands(`h${i}`, to(i + 1))]).flat();
  return treeOf(body, { id });
}

/** make-dead called `calls` times by each of `trees` trees, all of which the tree calls. */
export function callsByTrees(trees: number, calls: number): Called {
  const callees = Array.from({ length: trees }, (_, i) => calling(`t${i}`, calls, []));
  return { tree: calling('top', trees, callees.map((t) => t.id)), callees: [makeDeadTree, ...callees] };
}

/** `depth` levels, each calling the next `fanOut` times, and make-dead below them. */
export function chain(depth: number, fanOut: number): Called {
  const levels = Array.from({ length: depth }, (_, i) => calling(`l${i}`, fanOut, i === depth - 1 ? [] : [`l${i + 1}`]));
  const [tree, ...callees] = levels;
  if (tree === undefined) throw new Error('a chain has a level');
  return { tree, callees: [makeDeadTree, ...callees] };
}
