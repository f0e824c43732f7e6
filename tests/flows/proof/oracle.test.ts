/** The explicit search with whole facts is the oracle of the fixpoint over bits. */
import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { defaultSettings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { layOut } from '@/flows/machine/program';
import { fixpointOf } from '@/flows/proof/fixpoint';
import { graphOf } from '@/flows/proof/graph';
import { owedFindings } from '@/flows/proof/owed';
import { startFacts } from '@/flows/proof/prove';
import { search } from '@/flows/proof/search';

import { benchProfile, makeDeadTree } from '../support/bench';
import { randomForest, randomTree } from '../support/randomTree';

const runs = Number(process.env['PROOF_CASES'] ?? 300);

interface Forest {
  tree: Tree;
  callees: readonly Tree[];
}

/** Whether the verdict of the passes is that of the explicit search; true where the tree holds. */
function agree({ tree, callees }: Forest): boolean {
  const { layout, faults } = layOut({ tree, callees, profile: benchProfile, settings: defaultSettings });
  expect(faults).toEqual([]);
  const graph = graphOf(layout);
  for (const node of graph.nodes.values()) for (const edge of node.edges) expect(graph.nodes.has(edge.to)).toBe(true);
  const start = startFacts(layout);
  const bits = fixpointOf(graph, start);
  const verdict = new Set([...bits.broken.map((b) => b.rule), ...owedFindings(graph).map((o) => o.rule)]);
  const explicit = search(graph, start, { limit: 100_000, counters: false, wanted: null });
  expect(explicit.limited).toBe(false);
  // every story's rule is in the verdict, and a verdict is never empty-handed
  for (const rule of explicit.stories.keys()) expect(verdict).toContain(rule);
  expect(verdict.size > 0).toBe(explicit.stories.size > 0);
  return verdict.size === 0;
}

describe('the fixpoint', () => {
  it.each<[string, fc.Arbitrary<Forest>]>([
    ['one tree', randomTree().map((tree) => ({ tree, callees: [makeDeadTree] }))],
    ['trees that call trees, three deep', randomForest()],
  ])('finds it broken exactly when the explicit search reaches a step that it may not enter: %s', { timeout: 120_000 + runs * 400 }, (_, forests) => {
    let holding = 0;
    let breaking = 0;
    fc.assert(
      fc.property(forests, (forest) => {
        if (agree(forest)) holding += 1;
        else breaking += 1;
      }),
      { numRuns: runs },
    );
    // both kinds were seen, so the equality says something
    expect(holding).toBeGreaterThan(5);
    expect(breaking).toBeGreaterThan(5);
  });
});
