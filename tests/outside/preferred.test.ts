import { describe, expect, it } from 'vitest';

import { E24, nextE24 } from '@/shared/workings/preferred';

describe('E24 against IEC 60063', () => {
  // Values as listed by two public tables of IEC 60063; a third page prints 4.2 for 4.3, which is wrong.
  const published = '1.0 1.1 1.2 1.3 1.5 1.6 1.8 2.0 2.2 2.4 2.7 3.0 3.3 3.6 3.9 4.3 4.7 5.1 5.6 6.2 6.8 7.5 8.2 9.1'
    .split(' ')
    .map(Number);
  const e12 = '1.0 1.2 1.5 1.8 2.2 2.7 3.3 3.9 4.7 5.6 6.8 8.2'.split(' ').map(Number);

  it('has the 24 published values', () => {
    expect(E24).toEqual(published);
  });

  it('holds E12 as every other value', () => {
    expect(E24.filter((_, at) => at % 2 === 0)).toEqual(e12);
  });

  it('differs from rounding 10^(n/24) in eight places', () => {
    expect(E24.filter((value, n) => Math.round(10 ** (n / 24) * 10) / 10 !== value)).toEqual([2.7, 3.0, 3.3, 3.6, 3.9, 4.3, 4.7, 8.2]);
  });

  it.each(published)('takes %d kΩ as itself', (value) => {
    expect(nextE24(Number(`${value}e3`))).toBe(Number(`${value}e3`));
  });
});
