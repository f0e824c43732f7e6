import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { EVIDENCE_WORDS } from '@/flows/document/outcomes';
import type { Suspect } from '@/flows/document/tree';
import { posterior, shareInWords } from '@/flows/evidence/posterior';

const suspect = (id: string, prior: number): Suspect => ({ id, part: id, mode: 'short', prior, killedBy: [] });
const shares = (ranked: ReturnType<typeof posterior>) => Object.fromEntries(ranked.map((r) => [r.suspect.id, r.share]));

describe('posterior', () => {
  it('gives the priors before any check', () => {
    expect(shares(posterior([suspect('a', 1), suspect('b', 3)], []))).toEqual({ b: expect.closeTo(0.75, 12), a: expect.closeTo(0.25, 12) });
  });

  // Bayes' rule in odds form, after a worked example of a diagnostic test: prior odds 1 to 9, likelihood ratio 10, posterior odds 10 to 9,
  // so a probability of 10/19 (textbook form, as in Sackett et al., Evidence-Based Medicine; figures from memory).
  it('turns prior odds and a likelihood ratio into posterior odds', () => {
    const ranked = posterior([suspect('a', 1), suspect('rest', 9)], [{ check: 'c', evidence: [{ suspect: 'a', says: 'points-to' }] }]);
    expect(ranked[0]?.suspect.id).toBe('a');
    expect(ranked[0]?.share).toBeCloseTo(10 / 19, 12);
  });

  it('lets the last answer of a check stand alone', () => {
    const again = posterior(
      [suspect('a', 1), suspect('b', 1)],
      [
        { check: 'c', evidence: [{ suspect: 'a', says: 'all-but-proves' }] },
        { check: 'c', evidence: [{ suspect: 'a', says: 'points-away' }] },
      ],
    );
    expect(shares(again)['a']).toBeCloseTo(0.1 / 1.1, 12);
  });

  it('forgets what was found out about a part that has been worked on', () => {
    const ranked = posterior(
      [suspect('a', 1), suspect('b', 1)],
      [
        {
          check: 'c',
          evidence: [
            { suspect: 'a', says: 'all-but-proves' },
            { suspect: 'b', says: 'points-away' },
          ],
        },
        { check: 'w', evidence: [], worked: ['a'] },
      ],
    );
    expect(shares(ranked)['a']).toBeCloseTo(1 / 1.1, 12);
  });

  it('keeps the order of the tree among equals', () => {
    expect(posterior([suspect('b', 1), suspect('a', 1)], []).map((r) => r.suspect.id)).toEqual(['b', 'a']);
  });

  it('sums to one and makes nothing impossible, whatever is said', () => {
    const words = fc.array(fc.tuple(fc.constantFrom('a', 'b', 'c'), fc.constantFrom(...EVIDENCE_WORDS)), { maxLength: 60 });
    fc.assert(
      fc.property(words, (said) => {
        const ranked = posterior(
          [suspect('a', 1), suspect('b', 5), suspect('c', 0.2)],
          said.map(([id, says], i) => ({ check: `c${i}`, evidence: [{ suspect: id, says }] })),
        );
        expect(ranked.reduce((sum, r) => sum + r.share, 0)).toBeCloseTo(1, 9);
        expect(ranked.every((r) => r.share >= 0 && Number.isFinite(r.share))).toBe(true);
        expect([...ranked].sort((x, y) => y.share - x.share)).toEqual(ranked);
      }),
    );
  });

  it('stays within the numbers after hundreds of checks', () => {
    const many = Array.from({ length: 500 }, (_, i) => ({
      check: `c${i}`,
      evidence: [
        { suspect: 'a', says: 'rules-out' as const },
        { suspect: 'b', says: 'rules-out' as const },
      ],
    }));
    expect(shares(posterior([suspect('a', 1), suspect('b', 3)], many))).toEqual({ b: expect.closeTo(0.75, 9), a: expect.closeTo(0.25, 9) });
  });
});

describe('shareInWords', () => {
  it.each([
    [0.95, 'all but certain'],
    [0.6, 'likely'],
    [0.2, 'possible'],
    [0.05, 'unlikely'],
    [0.001, 'all but ruled out'],
  ])('calls %d %s', (share, words) => {
    expect(shareInWords(share)).toBe(words);
  });
});
