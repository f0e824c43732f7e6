/** Reading against a limit: is it in, out, or too close to say with this instrument. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { QUANTITIES, QUANTITY_IDS } from '@/shared/quantity/quantities';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField } from '@/shared/workings/sheet';

/** Accuracy of an instrument on one function and range, as makers print it: ±(percent of reading + counts of the last digit). */
export interface AccuracySpec {
  /** Percent of the reading, so 0.5 for ±0.5 %. */
  readonly percent: number;
  /** Counts of the last digit. */
  readonly counts: number;
  /** Value of one count, in the SI unit of the reading. */
  readonly resolution: number;
}

/** Limits in the SI unit of the reading, low ≤ high, as signed numbers; null where there is none. */
export interface Limits {
  readonly low: number | null;
  readonly high: number | null;
}

/** The four-way decision, with the side named where the reading is clear of the band. */
export type Decision = 'in' | 'close-in' | 'close-out' | 'low' | 'high';

/**
 * The most that the reading can be off when the instrument holds its specification.
 * @returns half width of the band, in the SI unit of the reading
 */
export function errorLimitOf(spec: AccuracySpec, reading: number): number {
  return (Math.abs(reading) * spec.percent) / 100 + spec.counts * spec.resolution;
}

/**
 * Expanded uncertainty U (k = 2) of a reading: the error limit a taken as a rectangular distribution, u = a/√3
 * (JCGM 100:2008, 4.3.7), U = 2u. Over range (±Infinity) has none to speak of and gives 0.
 * @param reading in the SI unit, as shown
 * @returns U in the same unit, zero or more
 */
export function uncertaintyOf(spec: AccuracySpec, reading: number): number {
  return Number.isFinite(reading) ? (2 * errorLimitOf(spec, reading)) / Math.sqrt(3) : 0;
}

type Grade = 'in' | 'close-in' | 'close-out' | 'out';
const ORDER: readonly Grade[] = ['in', 'close-in', 'close-out', 'out'];

/** Grades a value against an upper limit. */
function gradeAgainst(value: number, limit: number, guard: number): Grade {
  if (!Number.isFinite(value)) return value > 0 ? 'out' : 'in';
  // Limits are often computed (5 V − 5 %): a reading on the limit must not fall out by the last bit of a double.
  const slack = 1e-12 * Math.max(Math.abs(limit), guard);
  if (value <= limit - guard + slack) return 'in';
  if (value <= limit + slack) return 'close-in';
  return value <= limit + guard + slack ? 'close-out' : 'out';
}

/**
 * The non-binary decision rule with guard bands of ILAC-G8:09/2019, 4.2.3, guard band w = U: clear of the limit inside,
 * inside the band, outside the band, clear of it outside. A reading on the limit is in.
 * @param value in the SI unit; ±Infinity for over range, which is out wherever there is a limit on that side
 * @param uncertainty U, zero or more
 * @throws RangeError on NaN, a negative uncertainty, or low above high: those are faults of the caller and never readings
 */
export function decide(value: number, limits: Limits, uncertainty: number): Decision {
  const { low, high } = limits;
  if (Number.isNaN(value) || !(uncertainty >= 0) || uncertainty === Infinity)
    throw new RangeError('decide: value and uncertainty must be numbers');
  if (Number.isNaN(low) || Number.isNaN(high) || (low !== null && high !== null && low > high))
    throw new RangeError('decide: low must not be above high');
  const atHigh: Grade = high === null ? 'in' : gradeAgainst(value, high, uncertainty);
  // Mirrored, so that both limits go through the very same arithmetic.
  const atLow: Grade = low === null ? 'in' : gradeAgainst(-value, -low, uncertainty);
  const worst = ORDER.indexOf(atHigh) >= ORDER.indexOf(atLow) ? atHigh : atLow;
  if (worst !== 'out') return worst;
  return atHigh === 'out' ? 'high' : 'low';
}

const inputs = z.strictObject({
  quantity: choiceField('Quantity', 'What is read', QUANTITY_IDS).default('volts-dc'),
  reading: numberField({ title: 'Reading', description: 'The reading as the instrument shows it', unit: null, min: -1e12, max: 1e12 }),
  low: numberField({ title: 'Low limit', description: 'Lowest allowed value, or empty for none', unit: null, min: -1e12, max: 1e12 })
    .nullable()
    .default(null),
  high: numberField({ title: 'High limit', description: 'Highest allowed value, or empty for none', unit: null, min: -1e12, max: 1e12 })
    .nullable()
    .default(null),
  percent: numberField({
    title: 'Percent of reading',
    description: 'The instrument’s ± percent of reading on this range',
    unit: '%',
    min: 0,
    max: 50,
  }),
  counts: numberField({ title: 'Counts', description: 'The instrument’s ± counts of the last digit', unit: null, min: 0, max: 1000 }),
  resolution: numberField({
    title: 'Resolution',
    description: 'Value of one count on this range',
    unit: null,
    min: 0,
    max: 1e9,
    aboveMin: true,
  }),
});

/** Result of the sheet; all in the unit of the reading. */
export interface ReadingLimitResult {
  readonly errorLimit: number;
  readonly uncertainty: number;
  readonly guardBand: number;
  readonly acceptLow: number | null;
  readonly acceptHigh: number | null;
  readonly decision: Decision;
}

const WORDS: Readonly<Record<Decision, string>> = {
  in: 'In',
  'close-in': 'In, but close: this instrument cannot be sure',
  'close-out': 'Out, but close: this instrument cannot be sure',
  low: 'Low',
  high: 'High',
};

const law = [
  'a = |reading| × percent ÷ 100 + counts × resolution',
  'U = 2 × a ÷ √3   (k = 2; guard band w = U)',
  'in: low + w … high − w · in but close: up to the limit · out but close: up to w beyond it · low or high: farther out',
];
const validity =
  'Holds while the instrument is within its calibration date and its own temperature range (usually 18 to 28 °C), on the function and range that the accuracy was printed for. The accuracy is taken as the whole uncertainty: leads, noise and a drifting rail come on top. With w = U the risk of passing a value that is out is below 2.5 %.';
const source = 'ILAC-G8:09/2019, 4.2.3; JCGM 100:2008, 4.3.7 (rectangular distribution).';

/** Reading against a limit. */
export const sheet = defineSheet({
  id: 'reading-limit',
  title: 'Reading against a limit',
  question: 'Is this reading in, out, or too close to say with this instrument?',
  inputs,
  law,
  validity,
  source,
  caution: '',
  checks: [
    'Decision rule and risk: ILAC-G8:09/2019',
    'Error limits: worked examples printed by meter makers',
    '5 V TTL limits 4.75 to 5.25 V: 74-series data sheets',
  ],
  example: { quantity: 'volts-dc', reading: 4.77, low: 4.75, high: 5.25, percent: 0.5, counts: 3, resolution: 0.001 },
  compute(given): SheetAnswer<ReadingLimitResult> | SheetRefusal {
    const { quantity, reading, low, high } = given;
    if (low === null && high === null) return { ok: false, field: 'low', say: 'Give a low limit, a high limit, or both.' };
    if (low !== null && high !== null && low > high)
      return { ok: false, field: 'high', say: 'The high limit must not be below the low limit.' };
    const { unit } = QUANTITIES[quantity];
    const print = (value: number): string => formatQuantity(value, unit, { digits: 5 });
    const errorLimit = errorLimitOf(given, reading);
    const uncertainty = uncertaintyOf(given, reading);
    const decision = decide(reading, { low, high }, uncertainty);
    const acceptLow = low === null ? null : low + uncertainty;
    const acceptHigh = high === null ? null : high - uncertainty;
    const formula = [
      `a = ${print(Math.abs(reading))} × ${formatNumber(given.percent)} % + ${formatNumber(given.counts)} × ${print(given.resolution)} = ${print(errorLimit)}`,
      `U = w = 2 × ${print(errorLimit)} ÷ √3 = ${print(uncertainty)}`,
    ];
    if (low !== null && acceptLow !== null) formula.push(`in from ${print(low)} + ${print(uncertainty)} = ${print(acceptLow)}`);
    if (high !== null && acceptHigh !== null) formula.push(`in up to ${print(high)} − ${print(uncertainty)} = ${print(acceptHigh)}`);
    if (acceptLow !== null && acceptHigh !== null && acceptLow > acceptHigh) {
      formula.push('The two guard bands overlap: with this instrument no reading can be clearly in.');
    }
    return {
      ok: true,
      result: { errorLimit, uncertainty, guardBand: uncertainty, acceptLow, acceptHigh, decision },
      headline: `${WORDS[decision]}: ${print(reading)} ± ${print(uncertainty)}.`,
      formula,
      validity,
      source,
    };
  },
});
