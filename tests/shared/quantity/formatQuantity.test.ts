import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { formatDuration, formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { speakQuantity } from '@/shared/quantity/speakQuantity';
import { UNITS } from '@/shared/quantity/units';
import type { Unit } from '@/shared/quantity/units';

describe('formatQuantity', () => {
  it.each([
    [4.97, 'V', 4, '4.97 V'],
    [-12.1, 'V', 4, '\u221212.1 V'],
    [470e-6, 'F', 4, '470 \u03bcF'],
    [4700, 'Ω', 4, '4.7 k\u03a9'],
    [999.96, 'V', 4, '1 kV'],
    [0.00099996, 'V', 4, '1 mV'],
    [0, 'V', 4, '0 V'],
    [-0, 'V', 4, '0 V'],
    [1e-30, 'F', 3, '0.000000000000000001 pF'],
    [1e15, 'V', 3, '1000000000000 kV'],
    [1e-7, 'Ω', 3, '0.1 \u03bcΩ'],
    [0.1 + 0.2, 'V', 4, '300 mV'],
    [5400, 's', 4, '5400 s'],
    [6.6, '', 4, '6.6'],
    [Number.NaN, 'V', 4, 'no value'],
    [Number.POSITIVE_INFINITY, 'Ω', 4, 'over range'],
  ] as const)('prints %d %s at %d figures as %s', (value, unit, digits, text) => {
    expect(formatQuantity(value, unit, { digits })).toBe(text);
  });

  it('keeps the zeros of a typed reading when asked to', () => {
    expect(formatQuantity(4.97, 'V', { digits: 4, keepZeros: true })).toBe('4.970 V');
  });

  it('prints no exponent, no NaN, no hyphen and no micro sign U+00B5 for any number', () => {
    const units = fc.constantFrom(...(Object.keys(UNITS) as Unit[]));
    fc.assert(
      fc.property(fc.double(), units, fc.integer({ min: 1, max: 15 }), (value, unit, digits) => {
        expect(formatQuantity(value, unit, { digits })).not.toMatch(/\de|NaN|-|\u00b5|\u2126|Infinity/);
      }),
    );
  });

  it('is off by no more than half a unit of the last figure', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-12, max: 1e9, noNaN: true }), (value) => {
        const [figures = '', unit = ''] = formatQuantity(value, 'Ω', { digits: 4 }).split(' ');
        const factor = { μΩ: 1e-6, mΩ: 1e-3, Ω: 1, kΩ: 1e3, MΩ: 1e6, GΩ: 1e9 }[unit] ?? Number.NaN;
        expect(Math.abs(Number(figures) * factor - value)).toBeLessThanOrEqual(value * 5.01e-4);
      }),
    );
  });
});

describe('formatNumber', () => {
  it('prints a ratio without exponent', () => {
    expect([formatNumber(1e-9), formatNumber(-0.55), formatNumber(1e21), formatNumber(Number.NaN)]).toEqual([
      '0.000000001',
      '\u22120.55',
      '1000000000000000000000',
      'no value',
    ]);
  });
});

describe('formatDuration', () => {
  it.each([
    [0, '0 s'],
    [0.9771, '977 ms'],
    [9.5, '9.5 s'],
    [59.2, '1 min'],
    [72, '1 min 12 s'],
    [125.1, '2 min 6 s'],
    [3599.5, '1 h'],
    [4200, '1 h 10 min'],
    [4 * 86_400, '4 days'],
    [Number.POSITIVE_INFINITY, 'without end'],
  ])('prints %d seconds as %s', (seconds, text) => {
    expect(formatDuration(seconds)).toBe(text);
  });
});

describe('speakQuantity', () => {
  it.each([
    [5.04, 'V', 'five point oh four volts'],
    [-12.1, 'V', 'minus twelve point one volts'],
    [1, 'V', 'one volt'],
    [4700, 'Ω', 'four point seven kilohms'],
    [2.2e6, 'Ω', 'two point two megohms'],
    [0.35, 'Ω', 'three hundred and fifty milliohms'],
    [470e-6, 'F', 'four hundred and seventy microfarads'],
    [21, '°C', 'twenty-one degrees Celsius'],
    [21, '', 'twenty-one'],
    [5400, 's', 'five thousand four hundred seconds'],
    [Number.POSITIVE_INFINITY, 'Ω', 'over range'],
  ] as const)('says %d %s as %s', (value, unit, words) => {
    expect(speakQuantity(value, unit)).toBe(words);
  });
});
