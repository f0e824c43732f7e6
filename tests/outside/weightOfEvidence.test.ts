import { describe, expect, it } from 'vitest';

import type { Suspect } from '@/flows/document/tree';
import { evidenceDecibels, sharesOf } from '@/flows/evidence/logWeights';
import { posterior } from '@/flows/evidence/posterior';

const suspect = (id: string, prior: number): Suspect => ({ id, part: id, mode: 'open', prior, killedBy: [] });

// E. T. Jaynes, Probability Theory: The Logic of Science, chapter 4 (after I. J. Good, 1950): evidence is 10 log10 of the odds.
describe('evidence in decibels', () => {
  it.each([
    [10, 'points-to', 0.91],
    [20, 'all-but-proves', 0.99],
  ] as const)('%d dB on even odds is the share of the table (10 dB 91 %%, 20 dB 99 %%)', (decibels, says, share) => {
    const ranked = posterior([suspect('a', 1), suspect('b', 1)], [{ check: 'c', evidence: [{ suspect: 'a', says }] }]);
    expect(ranked[0]?.share).toBeCloseTo(share, 2);
    expect(evidenceDecibels([Math.log(ranked[0]?.share ?? 0), Math.log(ranked[1]?.share ?? 0)])[0]).toBeCloseTo(decibels, 9);
  });

  it('30 dB is 99.9 %: one check that all but proves and one that points to it', () => {
    const ranked = posterior([suspect('a', 1), suspect('b', 1)], [
      { check: 'c', evidence: [{ suspect: 'a', says: 'all-but-proves' }] },
      { check: 'd', evidence: [{ suspect: 'a', says: 'points-to' }] },
    ]);
    expect(ranked[0]?.share).toBeCloseTo(0.999, 3);
  });
});

// Jaynes, 4.2–4.4: eleven machines, one of which (A) makes 1/3 of its widgets bad, the other ten (B) 1/6; a third hypothesis C of 99 % bad at odds of
// one in a million. After m bad widgets in a row; the chapter prints the turning points (+10 dB for A at m = 7, then falling; C passes zero between
// m = 10 and 11). The other figures are worked out from the same numbers.
describe('three hypotheses, bad widgets in a row', () => {
  const after = (m: number) => evidenceDecibels([Math.log(1 / 11) + m * Math.log(1 / 3), Math.log(10 / 11) + m * Math.log(1 / 6), Math.log(1e-6) + m * Math.log(0.99)]);

  it.each([
    [0, -10, 10, -60],
    [1, -6.99, 6.99, -52.64],
    [3, -0.97, 0.97, -38.93],
    [4, 2.04, -2.04, -32.78],
    [7, 9.98, -11.17, -16.82],
    [8, 9.76, -14.36, -11.93],
    [10, 2.24, -22.11, -2.35],
    [11, -2.43, -27.5, 2.4],
    [12, -7.15, -34.03, 7.13],
  ])('m = %d', (m, a, b, c) => {
    const evidence = after(m);
    [a, b, c].forEach((decibels, i) => expect(evidence[i]).toBeCloseTo(decibels, 1));
  });

  it('with two hypotheses each bad widget adds 3 dB and each good one takes 0.97 dB (printed as +3 and −1); 5 bad of 12 leave A at 0.402 (0.387 with the rounded steps)', () => {
    const two = (bad: number, good: number) => [Math.log(1 / 11) + bad * Math.log(1 / 3) + good * Math.log(2 / 3), Math.log(10 / 11) + bad * Math.log(1 / 6) + good * Math.log(5 / 6)];
    expect((evidenceDecibels(two(1, 0))[0] ?? 0) - (evidenceDecibels(two(0, 0))[0] ?? 0)).toBeCloseTo(3.01, 2);
    expect((evidenceDecibels(two(0, 1))[0] ?? 0) - (evidenceDecibels(two(0, 0))[0] ?? 0)).toBeCloseTo(-0.97, 2);
    expect(sharesOf(two(5, 7))[0]).toBeCloseTo(0.402, 3);
  });
});
