import { describe, expect, it } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';
import { draft } from '@/flows/draft/draft';
import { draftTree } from '@/flows/draft/draftTree';
import { rehearse } from '@/flows/rehearsal/rehearse';

import { must, program } from '../support/bench';
import { randomTable, tableOf } from './tables';

const head = { id: 'drafted', symptom: 'A rail is low' };

describe('draftTree', () => {
  it('makes a tree without a fault in which every suspect comes to its own end, in the minutes of the draft', () => {
    for (const seed of [1, 2, 3]) {
      const table = randomTable(seed, 6, 6);
      const drafted = draft(table);
      const tree = must(parseTree(draftTree(table, drafted, head)));
      const { coverage, minutes } = rehearse(program(tree));
      const alone = table.suspects.filter((s) => !drafted.report.groups.flat().includes(s.id)).reduce((sum, s) => sum + s.prior, 0) / table.suspects.reduce((sum, s) => sum + s.prior, 0);
      expect(coverage.verdict).toBeCloseTo(alone, 9);
      expect(coverage.missed).toBe(0);
      // opening, close-out and their waits come on top
      expect(minutes.expected).toBeGreaterThan(drafted.report.expectedMinutes);
    }
  });

  it('gives a check that is asked at two places two steps, and suspects that stay together one end', () => {
    const table = tableOf([[0, 0, 0], [0, 0, 1], [1, 0, 0], [1, 0, 1], [1, 1, 1], [1, 1, 1]], [1, 1, 1, 1, 1, 1]);
    const tree = must(parseTree(draftTree(table, draft(table), head)));
    expect(new Set(tree.steps.map((s) => s.id)).size).toBe(tree.steps.length);
    expect(tree.steps.filter((s) => s.kind === 'observe').length).toBeGreaterThan(3);
    expect(tree.steps.find((s) => s.id === 'one-of-several')).toMatchObject({ says: 'referred', lines: [expect.stringContaining('Part 4, open; Part 5, open')] });
  });

  it('takes the largest table', () => {
    const table = randomTable(5, 120, 60);
    expect(parseTree(draftTree(table, draft(table), head)).ok).toBe(true);
  }, 20_000);
});
