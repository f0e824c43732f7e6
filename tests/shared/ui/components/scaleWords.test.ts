import { describe, expect, it } from 'vitest';

import { plainNumber, scalePlace, scaleWords } from '@/shared/ui/components/scaleWords';

const five = { low: 4.75, high: 5.25, guard: 0.03 };

describe('scalePlace', () => {
  it.each([
    [5, 'inside the limits'],
    [4.77, 'inside, but close to the low limit'],
    [4.73, 'outside, but close to the low limit'],
    [4.6, 'below the low limit'],
    [5.24, 'inside, but close to the high limit'],
    [5.4, 'above the high limit'],
    [Infinity, 'above the high limit'],
  ])('%s V is %s', (value, place) => {
    expect(scalePlace({ ...five, value })).toBe(place);
  });

  it('has nothing to say without a reading or a limit', () => {
    expect(scalePlace({ ...five, value: null })).toBeNull();
    expect(scalePlace({ value: 1, low: null, high: null, guard: 0 })).toBeNull();
  });

  it('asks only the side that has a limit', () => {
    expect(scalePlace({ value: -3, low: null, high: 0.1, guard: 0.01 })).toBe('inside the limits');
    expect(scalePlace({ value: 0.5, low: 1, high: null, guard: 0.1 })).toBe('below the low limit');
  });
});

describe('scaleWords', () => {
  it('says reading, limits, guard band and place', () => {
    expect(scaleWords({ ...five, value: 5.02 }, 'V')).toBe('5.02 V; limits 4.75 to 5.25 V; guard band ±0.03 V; inside the limits');
    expect(scaleWords({ value: null, low: null, high: 0.1, guard: 0 }, 'Ω')).toBe('No reading yet; at most 0.1 Ω');
    expect(scaleWords({ value: 37, low: null, high: null, guard: 0 }, 'mV')).toBe('37 mV; no limit');
  });
});

describe('plainNumber', () => {
  it('uses the true minus sign and never prints minus nought', () => {
    expect(plainNumber(-12.11)).toBe('−12.11');
    expect(plainNumber(-0.001, 1)).toBe('0.0');
    expect(plainNumber(Infinity)).toBe('over range');
  });
});
