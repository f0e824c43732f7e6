/** What the screen says of a reading that is held against its twin. */
import { describe, expect, it } from 'vitest';

import { likeTwin } from '@/flows/machine/rows';
import type { ReadingRow } from '@/flows/machine/rows';
import type { Instrument } from '@/shared/contract/instruments';
import { judgeTyped, limitWords } from '@/shared/ui/screens/run/judgeTyped';
import { scaleShown } from '@/shared/ui/screens/run/scaleShown';

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
  ranges: [{ quantity: 'ohms', fullScale: 6000, resolution: 0.1, percent: 0.5, counts: 3 }],
};
const row = (twin: NonNullable<ReadingRow['twin']>): ReadingRow => ({
  id: 'r',
  label: 'Driver',
  wait: null,
  ask: 'reading',
  quantity: 'ohms',
  low: null,
  high: null,
  nominal: null,
  bySize: false,
  plain: false,
  mayFall: false,
  red: null,
  black: null,
  twin,
});
const like = (value: number | 'over', uncertainty = 0) => likeTwin(row({ is: 'like', row: 'twin', within: 0.1, uncertainty: 0 }), { value, uncertainty }) as ReadingRow;
const words = (of: ReadingRow, text: string) => {
  const { verdict } = judgeTyped(of, text, meter, false);
  return `${verdict?.word ?? ''}: ${verdict?.note ?? ''}`;
};

describe('a twin at the bench', () => {
  it('is taken down and not judged', () => {
    const twin = row({ is: 'twin' });
    expect(limitWords(twin)).toBe('none: it is what the next one is held against');
    expect(words(twin, '470')).toBe('Read: the other one is held against it');
    expect(words(twin, 'OL')).toBe('Read: the other one is held against it');
  });

  it('gives the other its limits, with the guard of both meters', () => {
    expect(limitWords(like(1000))).toBe('900 Ω to 1.1 kΩ');
    expect(words(like(1000), '1000')).toMatch(/^In: /);
    expect(words(like(1000), '850')).toBe('Low: 50 Ω beyond the limit');
    expect(words(like(1000, 200), '1000')).toMatch(/^In, but close: /);
    expect(scaleShown(like(1000, 100), 1000, 0).guard).toBeCloseTo(0.11, 9);
  });

  it('that is over range has only over range like it', () => {
    expect(limitWords(like('over'))).toBe('over range, as its twin');
    expect(words(like('over'), 'OL')).toBe('In: over range, as its twin is');
    expect(words(like('over'), '470')).toBe('Low: its twin is over range');
    expect(scaleShown(like('over'), 470, 1)).toMatchObject({ low: null, high: null });
  });

  it('that reads nothing can be told from nothing', () => {
    expect(words(like(0), '0.0')).toBe('Cannot tell: the twin reads nothing, so there is no share of it');
  });
});
