import { describe, expect, it } from 'vitest';

import { classifyReading, worstOf } from '@/flows/machine/classify';
import type { ReadingRow } from '@/flows/machine/rows';

const row = (o: Partial<ReadingRow>): ReadingRow => ({ id: 'r', label: 'r', ask: 'reading', wait: null, quantity: 'volts-dc', low: null, high: null, nominal: null, bySize: false, plain: false, mayFall: false, red: null, black: null, ...o });
const plus5 = row({ low: 4.75, high: 5.25, nominal: 5 });
const minus12 = row({ low: -12.6, high: -11.4, nominal: -12 });

describe('classifyReading', () => {
  it.each([
    [5.02, 0.04, 'in'], [4.77, 0.04, 'close'], [4.73, 0.04, 'close'], [4.6, 0.04, 'low'], [5.4, 0.04, 'high'], [5.27, 0.04, 'close'], [0, 0.04, 'low'], [-4.97, 0.04, 'reversed'], [-0.02, 0.04, 'low'],
  ])('+5 V read as %d ± %d is %s', (value, u, result) => {
    expect(classifyReading(plus5, value, u, false)).toBe(result);
  });
  it.each([
    [-12.1, 'in'], [-11, 'low'], [-13, 'high'], [12.1, 'reversed'], [-11.42, 'close'], [0, 'low'],
  ])('−12 V read as %d is %s: low is nearer to 0 V', (value, result) => {
    expect(classifyReading(minus12, value, 0.05, false)).toBe(result);
  });
  it('takes over range for high where there is an upper limit, and for good where there is none', () => {
    expect(classifyReading(plus5, 'over', 0, false)).toBe('high');
    expect(classifyReading(row({ low: 1e6, quantity: 'ohms' }), 'over', 0, false)).toBe('in');
  });
  it('reads dead plainly, by size, and hears of a charge that falls', () => {
    const dead = row({ high: 5, bySize: true, plain: true, mayFall: true });
    expect(classifyReading(dead, -4.9, 1, false)).toBe('in');
    expect(classifyReading(dead, -5.1, 1, false)).toBe('high');
    expect(classifyReading(dead, 31, 1, true)).toBe('falling');
    expect(classifyReading(dead, 1, 1, true)).toBe('falling');
  });
});

describe('worstOf', () => {
  it('ranks cannot, not sure, reversed, high, low, close, in', () => {
    const order = ['cannot', 'not-sure', 'reversed', 'high', 'low', 'close', 'in'];
    order.forEach((word, i) => expect(worstOf(order.slice(i).reverse())).toBe(word));
  });
});
