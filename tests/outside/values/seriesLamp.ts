/** Published values of lamps. */
import type { Lamp } from '@/shared/workings/lamp';
import { coldOhms, hotOhms, lampAmps } from '@/shared/workings/lamp';
import type { OutsideValue } from '@/tests/outside/outsideValue';

const hundred: Lamp = { ratedVolts: 120, ratedWatts: 100, coldRatio: 15 };
/** 10.8 V, 6.02 A, 65 W. Its exponent of current on volts is 1 ÷ 1.9 = 0.526; ours is 0.55. */
const field: Lamp = { ratedVolts: 10.8, ratedWatts: 65, coldRatio: 15 };
const small: Lamp = { ratedVolts: 3.003, ratedWatts: 3.003 * 0.252, coldRatio: 6.6 };

const law =
  'Fink & Beaty, Standard Handbook for Electrical Engineers, 11th ed., p. 22-8, as quoted: I = I₀ (V/V₀)^0.55; ratios worked out from the exponent';
const spie = 'SPIE Field Guide to Illumination, p. 21: a 10.8 V, 6.02 A, 65 W lamp at 105 % of its current';
const measured = 'New Physics: Sae Mulli 74 (3), 311, table 2: 3.0 V, 0.25 A lamp';
const forum = 'Public forum (overunityresearch.com), arithmetic standard: 100 W, 120 V lamp, 144 Ω lit, about 9.5 Ω cold';
const solved = 'Solved by hand from the published law: 100 W, 120 V lamp on 120 V';

const sheet = 'series-lamp';
const lamp = { supplyVolts: 120, lampVolts: 120, lampWatts: 100 };
const resistance = (loadOhms: number) => ({ ...lamp, load: 'resistance', loadOhms });

export const values: readonly OutsideValue[] = [
  ...(
    [
      [0.25, 0.46652],
      [0.5, 0.68302],
      [0.75, 0.85366],
      [0.9, 0.9437],
      [1.05, 1.0272],
      [1.1, 1.05382],
    ] as const
  ).map(([ratio, expected]) => ({
    sheet,
    what: `current at ${String(ratio)} of rated volts, over rated`,
    source: law,
    expected,
    within: 0.000005,
    gives: () => lampAmps(hundred, 120 * ratio) / (100 / 120),
  })),
  { sheet, what: 'amps at 11.8 V', source: spie, expected: 6.32, within: 0.05, gives: () => lampAmps(field, 11.8) },
  { sheet, what: 'watts at 11.8 V', source: spie, expected: 75, within: 0.5, gives: () => 11.8 * lampAmps(field, 11.8) },
  { sheet, what: 'hot ohms at 3.003 V', source: measured, expected: 11.92, within: 0.005, gives: () => hotOhms(small) },
  { sheet, what: 'cold ohms', source: measured, expected: 1.8, within: 0.05, gives: () => coldOhms(small) },
  { sheet, what: 'hot ohms of 100 W at 120 V', source: forum, expected: 144, within: 1e-9, given: resistance(10), read: 'hotOhms' },
  { sheet, what: 'cold ohms of 100 W at 120 V', source: forum, expected: 9.5, within: 0.2, given: resistance(10), read: 'coldOhms' },
  {
    sheet,
    what: 'first moment of a dead short, at the mains peak',
    source: `${forum}; 169.7 V ÷ 9.5 Ω = 17.9 A`,
    expected: 17.9,
    within: 0.3,
    given: { ...lamp, load: 'short' },
    read: 'coldPeakAmps',
  },
  {
    sheet,
    what: 'dead short, settled amps',
    source: solved,
    expected: 0.8333,
    within: 0.00005,
    given: { ...lamp, load: 'short' },
    read: 'deadShort.amps',
  },
  { sheet, what: '10 Ω, lamp volts', source: solved, expected: 111.98, within: 0.005, given: resistance(10), read: 'points.0.lampVolts' },
  { sheet, what: '10 Ω, amps', source: solved, expected: 0.8022, within: 0.00005, given: resistance(10), read: 'points.0.amps' },
  { sheet, what: '144 Ω, lamp volts', source: solved, expected: 47.73, within: 0.005, given: resistance(144), read: 'points.0.lampVolts' },
  { sheet, what: '144 Ω, amps', source: solved, expected: 0.5019, within: 0.00005, given: resistance(144), read: 'points.0.amps' },
  {
    sheet,
    what: 'most watts for a load that holds its watts',
    source: 'Worked out from the published law: 0.55^0.55 ÷ 1.55^1.55 of the lamp’s rated watts',
    expected: 36.5,
    within: 0.05,
    given: { ...lamp, load: 'switch-mode', loadWatts: 20 },
    read: 'mostLoadWatts',
  },
  {
    sheet,
    what: 'a lamp for a 75 W transformer supply, watts',
    source: '1 to 2 times the plate: common practice, no source',
    expected: 75,
    within: 0,
    given: { ...lamp, load: 'rectifier', loadWatts: 75 },
    read: 'recommended.totalWatts',
  },
  {
    sheet,
    what: 'a lamp for a 60 W switch-mode supply, watts',
    source: '3 times the plate or more: common practice, no source',
    expected: 200,
    within: 0,
    given: { ...lamp, load: 'switch-mode', loadWatts: 60 },
    read: 'recommended.totalWatts',
  },
  {
    sheet,
    what: 'a dead short lights the lamp',
    source: 'common practice, no source',
    expected: 'full, or nearly',
    given: { ...lamp, load: 'short' },
    read: 'settled.brightness',
  },
];
