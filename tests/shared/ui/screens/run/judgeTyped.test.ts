import { describe, expect, it } from 'vitest';

import type { ReadingRow } from '@/flows/machine/rows';
import type { Instrument } from '@/shared/contract/instruments';
import { judgeTyped, limitWords, over } from '@/shared/ui/screens/run/judgeTyped';

const range = (quantity: Instrument['ranges'][number]['quantity'], fullScale: number, resolution: number) => ({
  quantity,
  fullScale,
  resolution,
  percent: 0.5,
  counts: 3,
});
const meter: Instrument = {
  id: '0198c0de-0000-4000-8000-000000000001',
  tag: 'M1',
  name: 'Meter',
  kind: 'multimeter',
  serial: '1',
  category: 'CAT III 600 V',
  twoPole: false,
  calibratedUntil: '2027-03-31',
  outOfDate: false,
  ranges: [
    range('volts-dc', 6, 0.001),
    range('volts-dc', 60, 0.01),
    range('volts-dc', 600, 0.1),
    range('ohms', 600, 0.1),
    range('ohms', 6e7, 1e4),
  ],
};
const row = (of: Partial<ReadingRow>): ReadingRow => ({
  id: 'r',
  label: '+5 V',
  wait: null,
  ask: 'reading',
  quantity: 'volts-dc',
  low: 4.75,
  high: 5.25,
  nominal: 5,
  bySize: false,
  plain: false,
  mayFall: false,
  red: null,
  black: null,
  ...of,
});
const rail = row({});
const minus = row({ low: -12.6, high: -11.4, nominal: -12 });
const dead = row({ low: null, high: 5, nominal: null, bySize: true, plain: true, mayFall: true });
const ohms = row({ quantity: 'ohms', low: 1e6, high: null, nominal: null });

describe('judgeTyped', () => {
  // typed, row, value, verdict: U = 2 (0.5 % + 3 counts) / √3 by ILAC-G8 and JCGM 100, as the sheet "reading against a limit" works it
  it.each([
    ['4.97', rail, 4.97, 'In'],
    ['4,97', rail, 4.97, 'In'],
    ['5', rail, 5, 'In'],
    [' 5.02 V ', rail, 5.02, 'In'],
    ['4970m', rail, 4.97, 'In'],
    ['4.76', rail, 4.76, 'In, but close'],
    ['4.74', rail, 4.74, 'Out, but close'],
    ['4.2', rail, 4.2, 'Low'],
    ['470m', rail, 0.47, 'Low'],
    ['6.1', rail, 6.1, 'High'],
    ['-4.97', rail, -4.97, 'Reversed'],
    ['−12.02', minus, -12.02, 'In'],
    ['-11.0', minus, -11, 'Low'],
    ['12.02', minus, 12.02, 'Reversed'],
    ['0.3', dead, 0.3, 'Dead'],
    ['-4.9', dead, -4.9, 'Dead'],
    ['17.8', dead, 17.8, 'Not dead'],
    ['4M7', ohms, 4.7e6, 'In'],
    ['4k7', ohms, 4700, 'Low'],
    ['50 MΩ', ohms, 5e7, 'In'],
  ] as const)('%s is read and named', (text, of, value, word) => {
    const typed = judgeTyped(of, text, meter, false);
    expect(typed.fault).toBeNull();
    expect(typed.value).toBeCloseTo(value, 9);
    expect(typed.verdict?.word).toBe(word);
  });

  it.each([
    ['abc', rail, /not a number/],
    ['4.97 A', rail, /amps/],
    ['4k7 Ω', rail, /ohms/],
    ['1,234', rail, /1.234 or 1234/],
    ['-3', ohms, /minus/],
    ['900', rail, /beyond the largest range/],
  ] as const)('%s is asked back', (text, of, say) => {
    const typed = judgeTyped(of, text, meter, false);
    expect(typed.value).toBeNull();
    expect(typed.fault).toMatch(say);
  });

  it('offers the readings that an ambiguous entry could mean', () => {
    expect(judgeTyped(rail, '1,234', meter, false).choices.map((c) => c.echo)).toEqual(['1.234 V', '1.234 kV']);
  });

  it('says nothing while nothing is typed', () => {
    expect(judgeTyped(rail, '  ', meter, false)).toMatchObject({ value: null, fault: null, verdict: null });
  });

  it('asks for the instrument first', () => {
    expect(judgeTyped(rail, '4.97', null, false).fault).toMatch(/instrument/);
  });

  it.each([
    ['OL', rail, 'High'],
    ['OL', ohms, 'In'],
    ['∞', ohms, 'In'],
  ] as const)('%s is over range', (text, of, word) => {
    expect(judgeTyped(of, text, meter, false)).toMatchObject({ value: 'over', verdict: { word } });
    expect(over(of).verdict?.word).toBe(word);
  });

  it('takes the most exact range, and its uncertainty', () => {
    const typed = judgeTyped(rail, '5', meter, false);
    expect(typed.range?.fullScale).toBe(6);
    // a = 5 × 0.5 % + 3 × 1 mV = 28 mV; U = 2 a / √3
    expect(typed.uncertainty).toBeCloseTo((2 * 0.028) / Math.sqrt(3), 9);
  });

  it('asks once about exactly 0 on a live bench, and about a reading far beyond its limit', () => {
    expect(judgeTyped(rail, '0', meter, true).doubt).toMatch(/probes/);
    expect(judgeTyped(rail, '0', meter, false).doubt).toBeNull();
    expect(judgeTyped(rail, '230', meter, true).doubt).toMatch(/20 times/);
    expect(judgeTyped(rail, '6', meter, true).doubt).toBeNull();
  });
});

describe('limitWords', () => {
  it.each([
    [rail, '4.75 V to 5.25 V'],
    [minus, '−11.4 V to −12.6 V'],
    [dead, 'at most 5 V'],
    [ohms, 'at least 1 MΩ'],
    [row({ low: null, high: null }), 'no limit'],
  ])('prints the limit', (of, words) => {
    expect(limitWords(of)).toBe(words);
  });
});
