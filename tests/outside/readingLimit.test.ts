import { describe, expect, it } from 'vitest';

import { decide, errorLimitOf, uncertaintyOf } from '@/shared/workings/readingLimit';

describe('error limits against published worked examples', () => {
  it.each([
    // Meter maker's worked example, repeated by a dealer: 100.0 V, ±(1 % + 2 counts of 0.1 V) is 98.8 to 101.2 V.
    // (A dealer's copy prints 99.8 for the lower end; the arithmetic gives 98.8.)
    ['100.0 V ±(1 % + 2)', { percent: 1, counts: 2, resolution: 0.1 }, 100, 1.2],
    // Sanwa PC510a, 5 V range, ±(0.08 % + 2 digits): 1.9964 to 2.0036 V, as worked in a dealer's note.
    ['2.000 V ±(0.08 % + 2)', { percent: 0.08, counts: 2, resolution: 0.001 }, 2, 0.0036],
    // Dealer's note on meter accuracy: 2 V, ±(0.5 % + 3 counts of 1 mV): 1.987 to 2.013 V.
    ['2 V ±(0.5 % + 3)', { percent: 0.5, counts: 3, resolution: 0.001 }, 2, 0.013],
    // Fluke support article KA-01125: 5 mV on the 600.0 mV range, ±(1 % + 2): the percent part (0.05 mV) is below one count
    // (0.1 mV), so the article prints ±0.2 mV; ours keeps the 0.05 mV.
    ['5 mV ±(1 % + 2)', { percent: 1, counts: 2, resolution: 0.0001 }, 0.005, 0.00025],
  ])('%s', (_, spec, reading, limit) => {
    expect(errorLimitOf(spec, reading)).toBeCloseTo(limit, 12);
  });
});

describe('expanded uncertainty', () => {
  it('takes a rectangular distribution as a/√3 (JCGM 100:2008, 4.3.7, example 4.4.5: a = 0.4 gives u = 0.23; from memory)', () => {
    expect(uncertaintyOf({ percent: 0, counts: 4, resolution: 0.1 }, 1) / 2).toBeCloseTo(0.2309, 4);
  });
});

describe('the non-binary rule of ILAC-G8:09/2019, 4.2.3', () => {
  // pass ≤ TL − w; conditional pass (TL − w, TL]; conditional fail (TL, TL + w]; fail > TL + w.
  it.each([
    [9.5, 'in'],
    [9.50001, 'close-in'],
    [10, 'close-in'],
    [10.00001, 'close-out'],
    [10.5, 'close-out'],
    [10.50001, 'high'],
  ] as const)('%d against 10 with w = 0.5 is %s', (value, decision) => {
    expect(decide(value, { low: null, high: 10 }, 0.5)).toBe(decision);
  });

  it('a Zener reading of −5.47 V, u = 0.05 V, limit −5.40 V conforms with 0.92 (JCGM 106:2012, 7.3.3, example 1; numbers from memory): in, but close', () => {
    expect(decide(-5.47, { low: null, high: -5.4 }, 2 * 0.05)).toBe('close-in');
  });
});

describe('a 5 V TTL rail, 4.75 to 5.25 V (recommended VCC of the 74 series, Fairchild DM74LS08 data sheet)', () => {
  const spec = { percent: 0.5, counts: 3, resolution: 0.001 };
  const rail = { low: 4.75, high: 5.25 };

  // The limits are the data sheet's; the guard band is worked out by hand: a = 0.02685 V, U = 0.03100 V.
  it('4.770 V is in but close with a meter of ±(0.5 % + 3 counts)', () => {
    expect(errorLimitOf(spec, 4.77)).toBeCloseTo(0.02685, 12);
    expect(uncertaintyOf(spec, 4.77)).toBeCloseTo(0.031, 5);
    expect(decide(4.77, rail, uncertaintyOf(spec, 4.77))).toBe('close-in');
    expect(decide(5.23, rail, uncertaintyOf(spec, 5.23))).toBe('close-in');
  });

  it('4.4 V, the reading of a published repair log (loomcom.com, blog 0035), is low', () => {
    expect(decide(4.4, rail, uncertaintyOf(spec, 4.4))).toBe('low');
  });
});
