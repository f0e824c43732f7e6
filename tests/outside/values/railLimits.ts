/** Published tolerances of supply rails. */
import type { OutsideValue } from '@/tests/outside/outsideValue';

const rails: readonly (readonly [
  what: string,
  source: string,
  nominalVolts: number,
  tolerancePercent: number,
  low: number,
  high: number,
])[] = [
  ['74 series, 5 V', 'Fairchild DM74LS08 and DM93S62 data sheets: recommended VCC 4.75 to 5.25 V', 5, 5, 4.75, 5.25],
  ['54 series, 5 V', '54 series data sheets: recommended VCC 4.5 to 5.5 V (from memory)', 5, 10, 4.5, 5.5],
  ['ATX +12 V', 'ATX power supply design guide, table of d.c. output regulation (from memory)', 12, 5, 11.4, 12.6],
  ['ATX −12 V', 'ATX power supply design guide, table of d.c. output regulation (from memory)', -12, 10, -10.8, -13.2],
  ['ATX −5 V', 'ATX power supply design guide, table of d.c. output regulation (from memory)', -5, 10, -4.5, -5.5],
];

export const values: readonly OutsideValue[] = rails.flatMap(([what, source, nominalVolts, tolerancePercent, low, high]) => [
  {
    sheet: 'rail-limits',
    what: `${what}, low`,
    source,
    expected: low,
    within: 1e-9,
    given: { nominalVolts, tolerancePercent },
    read: 'lowVolts',
  },
  {
    sheet: 'rail-limits',
    what: `${what}, high`,
    source,
    expected: high,
    within: 1e-9,
    given: { nominalVolts, tolerancePercent },
    read: 'highVolts',
  },
]);
