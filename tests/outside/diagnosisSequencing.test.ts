import { describe, expect, it } from 'vitest';

import { draft } from '@/flows/draft/draft';
import { gainBits, everything, matrixOf, split } from '@/flows/draft/matrix';
import { huffmanLength } from '@/flows/draft/bounds';
import { lookAheadCheck, rankChecks, greedyMinutes } from '@/flows/draft/lookAhead';
import { solveExactly } from '@/flows/draft/exact';
import { entropyBits } from '@/flows/evidence/entropy';

import { tableOf } from '../flows/draft/tables';

const ids = (node: ReturnType<typeof draft>['root']): string => ('check' in node ? node.check : node.suspects.map((s) => s.id).join('+'));

// Six states, five tests, unit costs: K. R. Pattipati and M. G. Alexandridis, "Application of heuristic search and information theory to sequential fault
// diagnosis", IEEE Trans. SMC 20(4):872–887, 1990; matrix, priors and the published optimum of 2.18 from memory. The further figures follow from the matrix.
describe('the six-state example of test sequencing', () => {
  const table = tableOf(
    [[0, 0, 0, 0, 0], [0, 1, 0, 0, 1], [0, 0, 1, 1, 0], [1, 0, 0, 1, 1], [1, 1, 0, 0, 0], [1, 1, 1, 1, 0]],
    [0.7, 0.01, 0.02, 0.1, 0.05, 0.12],
  );
  const matrix = matrixOf(table);
  const all = everything(matrix);

  it('has the optimum 2.18, by the exact solver and by looking ahead alone', () => {
    expect(draft(table).report.optimumMinutes).toBeCloseTo(2.18, 9);
    expect(draft(table, { exact: false }).report.expectedMinutes).toBeCloseTo(2.18, 9);
    expect(['t2', 't4']).toContain(ids(draft(table).root));
  });

  it.each([[1, 2.86], [2, 2.18], [3, 2.82], [4, 2.18], [5, 2.89]])('costs with test %d first %d at best', (test, cost) => {
    const solve = solveExactly(matrix, all);
    const after = split(matrix, all, test - 1).reduce((sum, branch) => sum + (branch === null || solve === null ? 0 : (solveExactly(matrix, branch)?.(branch).minutes ?? 0)), 1);
    expect(after).toBeCloseTo(cost, 9);
  });

  it('is one where the greediest first test is not the best: 0.8415 bit and 2.86 against 0.6801 bit and 2.18', () => {
    const bits = [1, 2, 4].map((test) => gainBits(matrix, all, test - 1, new Float64Array(16)));
    expect(bits[0]).toBeCloseTo(0.8415, 4);
    expect(bits[1]).toBeCloseTo(0.6801, 4);
    expect(bits[2]).toBeCloseTo(0.795, 4);
    expect(rankChecks(matrix, all)[0]?.check).toBe(0);
    expect(greedyMinutes(matrix, all)).toBeCloseTo(2.86, 9);
    expect(lookAheadCheck(matrix, all)).not.toBe(0);
  });

  it('lies above its bounds: entropy 1.45487 bit, Huffman 1.59', () => {
    const { report } = draft(table);
    expect(report.entropyBits).toBeCloseTo(1.45487, 5);
    expect(report.bounds.huffmanChecks).toBeCloseTo(1.59, 9);
  });
});

// A. Balakrishnan and T. Semmelbauer, "Circuit diagnosis support system for electronics assembly operations", Decision Support Systems, 1999,
// doi 10.1016/S0167-9236(99)00015-9, tables 1–3. The expected 2.4 tests are worked out from table 1 with equal priors.
describe('five defects and four tests of an electronics line', () => {
  const one = tableOf([[0, 0, 0, 0], [0, 0, 0, 1], [0, 0, 1, 1], [0, 1, 1, 1], [1, 1, 1, 1]], [1, 1, 1, 1, 1]);
  const isolate = (table: typeof one, order: number[], outcomes: number[]) => {
    const matrix = matrixOf(table);
    let left = everything(matrix);
    let made = 0;
    for (const test of order) {
      if (left.members.length === 1) break;
      const next = split(matrix, left, test - 1)[outcomes[test - 1] ?? 0];
      if (next == null) throw new Error(`test ${test} leaves nobody`);
      left = next;
      made += 1;
    }
    return { made, left: Array.from(left.members, (m) => m + 1) };
  };

  it('isolates defect 3 in 3 tests in the order of the table, in 2 when test 2 comes first', () => {
    expect(isolate(one, [1, 2, 3, 4], [0, 0, 1, 1])).toEqual({ made: 3, left: [3] });
    expect(isolate(one, [2, 3, 1, 4], [0, 0, 1, 1])).toEqual({ made: 2, left: [3] });
  });

  it('needs 4 tests in that order when answers are unknown (table 3)', () => {
    const three = tableOf([[null, null, null, 0], [null, null, 0, 1], [null, 0, 1, 1], [0, 1, 1, 1], [1, 1, 1, 1]], [1, 1, 1, 1, 1]);
    expect(isolate(three, [1, 2, 3, 4], [0, 0, 1, 1])).toEqual({ made: 4, left: [3] });
  });

  it('takes 2.4 tests at best when all are equally likely, beginning in the middle', () => {
    const { root, report } = draft(one);
    expect(report.optimumMinutes).toBeCloseTo(2.4, 9);
    expect(['t2', 't3']).toContain(ids(root));
  });

  it('with a test for each defect alone and equal costs takes them by falling probability (section 4.1)', () => {
    const { root } = draft(tableOf([[1, 0, 0, 0], [0, 1, 0, 0], [0, 0, 1, 0], [0, 0, 0, 1]], [0.1, 0.4, 0.2, 0.3]));
    const order: string[] = [];
    for (let node = root; 'check' in node; ) {
      order.push(node.check);
      const next = node.answers.find((a) => a.answer === 'a0')?.next;
      if (next === undefined) break;
      node = next;
    }
    expect(order.slice(0, 2)).toEqual(['t2', 't4']);
  });
});

describe('the Huffman bound', () => {
  it.each([
    // T. Cover and J. Thomas, Elements of Information Theory, example 5.6.1 (from memory).
    [[0.25, 0.25, 0.2, 0.15, 0.15], 2.3, 2.2855],
    // T. Cormen and others, Introduction to Algorithms, the six-letter file (from memory): 224,000 bits for 100,000 letters.
    [[0.45, 0.13, 0.12, 0.16, 0.09, 0.05], 2.24, 2.2199],
    // Half-splitting of equal units: 8 need 3 tests, 5 need 2.4 (arithmetic).
    [[1, 1, 1, 1, 1, 1, 1, 1].map((w) => w / 8), 3, 3],
    [[1, 1, 1, 1, 1].map((w) => w / 5), 2.4, 2.3219],
  ])('of %j is %d, its entropy %d', (weights, length, entropy) => {
    expect(huffmanLength(weights)).toBeCloseTo(length, 9);
    expect(entropyBits(weights)).toBeCloseTo(entropy, 4);
  });
});

// The fourteen days of J. R. Quinlan, "Induction of Decision Trees", Machine Learning 1, 1986, as in T. Mitchell, Machine Learning, table 3.2; textbooks print the gains
// as 0.246 (or 0.247), 0.151 (or 0.152), 0.048 and 0.029.
describe('information gain on the tennis days', () => {
  const days = ['SHHW-', 'SHHS-', 'OHHW+', 'RMHW+', 'RCNW+', 'RCNS-', 'OCNS+', 'SMHW-', 'SCNW+', 'RMNW+', 'SMNS+', 'OMHS+', 'OHNW+', 'RMHS-'];
  const gain = (column: number) => {
    const of = (some: string[]) => entropyBits(['+', '-'].map((c) => some.filter((d) => d.endsWith(c)).length));
    const values = [...new Set(days.map((d) => d[column]))];
    return of(days) - values.reduce((sum, v) => sum + (days.filter((d) => d[column] === v).length / days.length) * of(days.filter((d) => d[column] === v)), 0);
  };

  it('starts from 0.940 bit', () => {
    expect(entropyBits([9, 5])).toBeCloseTo(0.940286, 6);
  });

  it.each([['Outlook', 0, 0.24675], ['Temperature', 1, 0.02922], ['Humidity', 2, 0.15184], ['Wind', 3, 0.04813]] as const)('%s tells what is printed', (_, column, bits) => {
    expect(gain(column)).toBeCloseTo(bits, 5);
  });
});
