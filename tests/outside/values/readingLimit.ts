/** Published values of meter accuracy and of decisions against a limit. */
import { normalShareBelow } from '@/shared/workings/normal';
import type { OutsideValue, SheetValue } from '@/tests/outside/outsideValue';

interface Accuracy {
  readonly percent: number;
  readonly counts: number;
  readonly resolution: number;
  readonly rangePercent?: number;
  readonly fullScale?: number;
}

const row = (
  what: string,
  source: string,
  given: Accuracy & { readonly reading: number; readonly low?: number; readonly high?: number },
  read: string,
  expected: number | string,
  within = 1e-9,
): SheetValue => ({
  sheet: 'reading-limit',
  what,
  source,
  given: { ...(given.low === undefined && { high: 1e6 }), ...given },
  read,
  expected,
  within,
});

const at = (reading: number, percent: number, counts: number, resolution: number) => ({ reading, percent, counts, resolution });
const ilac = 'ILAC-G8:09/2019, 4.2.3, non-binary rule with guard band; limit 10 and w = 0.5 chosen here';
/** Accuracy whose guard band is exactly half a unit, whatever is read: a = w × √3 ÷ 2. */
const half = { percent: 0, counts: 1, resolution: Math.sqrt(3) / 4 };
const fourWay = (reading: number, decision: string): SheetValue =>
  row(`${String(reading)} against 10 with w = 0.5`, ilac, { ...half, reading, high: 10 }, 'decision', decision);
const ttl = { ...at(4.77, 0.5, 3, 0.001), low: 4.75, high: 5.25 };
const table = 'Standard normal distribution table, any handbook';

export const values: readonly OutsideValue[] = [
  row(
    '100.0 V, ±(1 % + 2 counts)',
    'Note after a meter maker’s guide (gvda-instrument.com): 98.8 to 101.2 V',
    at(100, 1, 2, 0.1),
    'errorLimit',
    1.2,
  ),
  row(
    '2.000 V, ±(0.08 % + 2 digits)',
    'Sanwa PC510a, worked in a dealer’s note (victorruoshui.com): 1.9964 to 2.0036 V',
    at(2, 0.08, 2, 0.001),
    'errorLimit',
    0.0036,
  ),
  row(
    '2 V, ±(0.5 % + 3 counts)',
    'Note on meter accuracy (gvda-instrument.com): 1.987 to 2.013 V',
    at(2, 0.5, 3, 0.001),
    'errorLimit',
    0.013,
  ),
  row('120 V a.c., ±(1 % + 3 counts), 6000 counts', 'Fluke support article KA-03135: ±1.5 V', at(120, 1, 3, 0.1), 'errorLimit', 1.5),
  row(
    '1.755 V, ±(0.5 % + 1 count)',
    'Dealer’s note on three and a half digits (babataher-shop.com): 1.745 to 1.765 V',
    at(1.755, 0.5, 1, 0.001),
    'errorLimit',
    0.01,
    0.0005,
  ),
  row(
    '100.0 V, ±(0.8 % + 2)',
    'Note on calculating accuracy (gvda-instrument.com): 99.0 to 101.0 V',
    at(100, 0.8, 2, 0.1),
    'errorLimit',
    1,
  ),
  row(
    '1.4869 A, ±(0.5 % + 1 digit)',
    'Physics department page on error formulas (csbsju.edu); worked out',
    at(1.4869, 0.5, 1, 0.0001),
    'errorLimit',
    0.0075345,
  ),
  row(
    '166.51 mV, ±(0.1 % + 4 digits)',
    'Physics department page on error formulas (csbsju.edu); worked out',
    at(0.16651, 0.1, 4, 1e-5),
    'errorLimit',
    0.00020651,
  ),
  row(
    'analogue meter, ±3 % of 10 V full scale, at 2 V',
    'Note after a meter maker’s guide (gvda-instrument.com): analogue accuracy counts from full scale, ±2 or ±3 %; worked out',
    { reading: 2, percent: 0, counts: 0, resolution: 0.1, rangePercent: 3, fullScale: 10 },
    'errorLimit',
    0.3,
  ),
  row(
    'a = 0.4 as a rectangular distribution, U',
    'JCGM 100:2008, example 4.4.5: u = 0.23 (from memory)',
    at(1, 0, 4, 0.1),
    'uncertainty',
    0.46,
    0.005,
  ),
  row(
    '5 V logic rail read 4.77 V',
    'Fairchild DM74LS08, recommended VCC 4.75 to 5.25 V; guard band worked out by hand: 0.031 V',
    ttl,
    'uncertainty',
    0.031,
    0.00005,
  ),
  row('5 V logic rail at 4.77 V is close', 'Fairchild DM74LS08; ILAC-G8:09/2019, 4.2.3', ttl, 'decision', 'close-in'),
  row(
    '4.4 V on a 5 V logic rail',
    'Published repair log (loomcom.com, blog 0035); Fairchild DM74LS08',
    { ...ttl, reading: 4.4 },
    'decision',
    'low',
  ),
  fourWay(9.49, 'in'),
  fourWay(9.51, 'close-in'),
  fourWay(10, 'close-in'),
  fourWay(10.01, 'close-out'),
  fourWay(10.49, 'close-out'),
  fourWay(10.51, 'high'),
  row(
    'Zener at −5.47 V, u = 0.05 V, limit −5.40 V: chance that it conforms',
    'JCGM 106:2012, 7.3.3, example 1: 0.92 (numbers from memory)',
    { ...at(-5.47, 0, 1, 0.05 * Math.sqrt(3)), high: -5.4 },
    'chanceIn',
    0.92,
    0.005,
  ),
  row(
    'at the edge of the guard band the risk of passing wrongly is',
    'ILAC-G8:09/2019: less than 2.5 % for w = U; one-sided normal, 2.275 %',
    { ...half, reading: 9.5, high: 10 },
    'chanceWrong',
    0.02275,
    0.00001,
  ),
  row(
    'on the limit the risk is',
    'ILAC-G8:09/2019: up to 50 % for simple acceptance',
    { ...half, reading: 10, high: 10 },
    'chanceWrong',
    0.5,
    1e-12,
  ),
  ...(
    [
      [1, 0.84134],
      [1.645, 0.95002],
      [1.96, 0.975],
      [3, 0.99865],
    ] as const
  ).map(([x, expected]) => ({
    sheet: 'reading-limit',
    what: `share below ${String(x)} standard deviations`,
    source: table,
    expected,
    within: 0.00001,
    gives: () => normalShareBelow(x),
  })),
];
