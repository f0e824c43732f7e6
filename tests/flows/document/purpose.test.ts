import { readdirSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { purposeOf } from '@/flows/document/purpose';
import { groupedByPurpose } from '@/shared/ui/screens/trees/groupedByPurpose';
import { libraryTree } from '../library/walk';
import { end, lamp, look, treeOf } from '../support/steps';

const library = readdirSync('flows/library').filter((f) => f.endsWith('.json')).map((f) => libraryTree(f.replace('.json', '')));

describe('what a tree is for', () => {
  it('follows from what it does, unless its author says it', () => {
    const checks = treeOf([look('done')]);
    const power = treeOf([look('lamp'), lamp('lamp', 'done')]);
    const proves = treeOf([look('lamp'), lamp('lamp', 'proven'), end('proven', 'supply-proven')]);
    expect([checks, power, proves, { ...power, purpose: 'bring-up' as const }].map(purposeOf)).toEqual(['checks', 'fault-finding', 'bring-up', 'bring-up']);
  });

  it('parts the library into groups that can be read at a glance, each tree in one', () => {
    const groups = groupedByPurpose(library.map((t) => ({ title: t.title, purpose: purposeOf(t) })));
    expect(groups.map((g) => g.name)).toEqual(['Checks without power', 'Bringing it up', 'Finding a fault']);
    expect(groups.flatMap((g) => g.trees).length).toBe(library.length);
    for (const { trees } of groups) expect(trees.length).toBeLessThanOrEqual(12);
    const at = (title: string) => groups.find((g) => g.trees.some((t) => t.title === title))?.purpose;
    expect(['Look-over without power', 'Cold checks by meter, junction by junction', 'Rails to full load', 'Refit to the machine, board by board', 'Rail low or soft under load'].map(at)).toEqual(['checks', 'checks', 'bring-up', 'bring-up', 'fault-finding']);
  });
});
