import { describe, expect, it } from 'vitest';

import type { ReadingRow } from '@/flows/machine/rows';
import type { Instrument } from '@/shared/contract/instruments';
import { readingNow } from '@/shared/ui/screens/run/readingNow';

const range = (fullScale: number, resolution: number) => ({
  quantity: 'volts-dc' as const,
  fullScale,
  resolution,
  percent: 0.5,
  counts: 3,
});
const [small, large] = [range(6, 0.001), range(60, 0.01)];
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
  ranges: [small, large],
};
const row: ReadingRow = {
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
};
const accuracy = { percent: 0.5, counts: 3, resolution: 0.001 };

describe('readingNow', () => {
  it('takes the range that the limits want while nothing is typed, then the one that was read on', () => {
    expect(readingNow(row, { value: null, range: null }, meter)).toEqual({
      row: 'r',
      quantity: 'volts-dc',
      low: 4.75,
      high: 5.25,
      accuracy,
      value: null,
    });
    expect(readingNow(row, { value: 4.9, range: large }, meter)).toMatchObject({ accuracy: { ...accuracy, resolution: 0.01 }, value: 4.9 });
  });

  it('judges by size where the row does, and holds nothing of over range', () => {
    expect(readingNow({ ...row, low: null, bySize: true }, { value: -3, range: small }, meter)).toMatchObject({ low: null, value: 3 });
    expect(readingNow(row, { value: 'over', range: null }, meter)).toMatchObject({ value: null });
  });

  it('is nothing without an instrument, without a limit, or where the instrument does not reach', () => {
    expect(readingNow(row, { value: 5, range: small }, null)).toBeNull();
    expect(readingNow({ ...row, low: null, high: null }, { value: 5, range: small }, meter)).toBeNull();
    expect(readingNow({ ...row, low: 300, high: 400 }, { value: null, range: null }, meter)).toBeNull();
  });
});
