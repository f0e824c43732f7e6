import { describe, expect, it } from 'vitest';

import { decide, errorLimitOf } from '@/shared/workings/readingLimit';

// Error limits, decisions and chances stand as rows in values/readingLimit.ts.
describe('reading against a limit', () => {
  it('keeps the percent part where a maker rounds it away: 5 mV on 600.0 mV, ±(1 % + 2), printed ±0.2 mV (Fluke support article KA-01125)', () => {
    expect(errorLimitOf({ percent: 1, counts: 2, resolution: 0.0001 }, 0.005)).toBeCloseTo(0.00025, 12);
  });

  // pass ≤ TL − w; conditional pass (TL − w, TL]; conditional fail (TL, TL + w]; fail > TL + w.
  it.each([
    [9.5, 'in'],
    [9.50001, 'close-in'],
    [10, 'close-in'],
    [10.00001, 'close-out'],
    [10.5, 'close-out'],
    [10.50001, 'high'],
  ] as const)('ILAC-G8:09/2019, 4.2.3: the edges belong to the better side: %d against 10 with w = 0.5 is %s', (value, decision) => {
    expect(decide(value, { low: null, high: 10 }, 0.5)).toBe(decision);
  });

  it('a Zener reading of −5.47 V, u = 0.05 V, limit −5.40 V (JCGM 106:2012, 7.3.3, example 1; numbers from memory) is in, but close', () => {
    expect(decide(-5.47, { low: null, high: -5.4 }, 2 * 0.05)).toBe('close-in');
  });
});
