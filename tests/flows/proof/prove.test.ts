import { describe, expect, it } from 'vitest';

import { defaultSettings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { prove } from '@/flows/proof/prove';

import { benchProfile, lampTree, makeDeadTree } from '../support/bench';

export const proofOf = (tree: Tree, profile = benchProfile) => prove({ tree, callees: [makeDeadTree], profile, settings: defaultSettings });
export const broken = (tree: Tree, profile = benchProfile) => proofOf(tree, profile).rules.filter((r) => !r.holds);

describe('prove', () => {
  it('passes a tree that holds, rule by rule', () => {
    expect(broken(lampTree).map((r) => `${r.id}: ${r.story}`)).toEqual([]);
    expect(proofOf(lampTree).rules.map((r) => r.id)).toHaveLength(21);
  });
});
