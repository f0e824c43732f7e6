/** Suspects that a tree cannot tell apart: no exit that can be reached says one thing of the one and another of the other. */
import type { Exit } from '../document/steps';
import type { Suspect, Tree } from '../document/tree';
import { reachedFrom } from './paths';

/** Groups of two and more, in the order of the tree. */
export function groupsOf(tree: Tree): Suspect[][] {
  return classesOf(tree).filter((group) => group.length > 1);
}

/** All suspects by what can be heard of them; suspects of one group are equally likely after every path, but for their priors. */
export function classesOf(tree: Tree): Suspect[][] {
  const reached = reachedFrom(tree);
  const heard = new Map<string, string[]>(tree.suspects.map((s) => [s.id, []]));
  for (const step of tree.steps) {
    if (!reached.has(step.id)) continue;
    for (const exit of step.exits as Exit[]) {
      for (const { suspect, says } of exit.evidence ?? [])
        if (says !== 'says-nothing') heard.get(suspect)?.push(`${step.id}>${exit.id}=${says}`);
    }
  }
  const groups = new Map<string, Suspect[]>();
  for (const suspect of tree.suspects) {
    const name = [...new Set(heard.get(suspect.id) ?? [])].sort().join(' ');
    groups.set(name, [...(groups.get(name) ?? []), suspect]);
  }
  return [...groups.values()];
}
