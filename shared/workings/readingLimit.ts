/** Reading against a limit: is it in, out, or too close to say with this instrument. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { QUANTITIES, QUANTITY_IDS } from '@/shared/quantity/quantities';
import { normalShareBelow } from '@/shared/workings/normal';
import type { Plot, PlotBand } from '@/shared/workings/plot';
import { sampleCurve } from '@/shared/workings/plot';
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
  /** Percent of full scale, as makers of analogue meters print it; none unless given. */
  readonly rangePercent?: number;
  /** Full scale of the range; counts only with `rangePercent`. */
  readonly fullScale?: number | null;
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
  const ofRange = ((spec.rangePercent ?? 0) * (spec.fullScale ?? 0)) / 100;
  return (Math.abs(reading) * spec.percent) / 100 + spec.counts * spec.resolution + ofRange;
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

/**
 * Chance that the true value lies within the limits: Φ((high − y) ÷ u) − Φ((low − y) ÷ u) with u = U ÷ 2 (JCGM 106:2012, 7.3).
 * @param value in the SI unit, finite
 * @param uncertainty U (k = 2), zero or more; with none the reading is the truth
 * @returns 0 to 1
 */
export function chanceWithin(value: number, limits: Limits, uncertainty: number): number {
  const { low, high } = limits;
  const u = uncertainty / 2;
  if (u === 0) return (low === null || value >= low) && (high === null || value <= high) ? 1 : 0;
  const below = low === null ? 0 : normalShareBelow((low - value) / u);
  const above = high === null ? 0 : normalShareBelow((value - high) / u);
  return Math.max(0, 1 - below - above);
}

/**
 * The reading from which on it is clear of a limit: the one that keeps its own guard band from it.
 * @param side 1 for a low limit (clear above it), −1 for a high one
 */
export function clearOf(spec: AccuracySpec, limit: number, side: 1 | -1): number {
  // The band is less than 0.58 of a reading, so each round comes closer by that.
  let reading = limit;
  for (let round = 0; round < 100; round += 1) reading = limit + side * uncertaintyOf(spec, reading);
  return reading;
}

const output = z.strictObject({
  /** Most that the reading can be off; at the limit that is nearer when nothing is read yet. */
  errorLimit: z.number(),
  uncertainty: z.number(),
  guardBand: z.number(),
  acceptLow: z.number().nullable(),
  acceptHigh: z.number().nullable(),
  /** Null when nothing is read yet, as are the two chances. */
  decision: z.enum(['in', 'close-in', 'close-out', 'low', 'high']).nullable(),
  /** Chance that the true value lies within the limits, 0 to 1. */
  chanceIn: z.number().nullable(),
  /** Chance that a plain yes or no by the limit itself, without guard band, is wrong. */
  chanceWrong: z.number().nullable(),
});

/** Result of the sheet; all in the unit of the reading. */
export type ReadingLimitResult = z.output<typeof output>;

const inputs = z.strictObject({
  quantity: choiceField('Quantity', 'What is read', QUANTITY_IDS).default('volts-dc'),
  reading: numberField({
    title: 'Reading',
    description: 'As the instrument shows it; empty for the limits alone',
    unit: null,
    min: -1e12,
    max: 1e12,
  })
    .nullable()
    .default(null),
  low: numberField({ title: 'Low limit', description: 'Lowest allowed value, or empty for none', unit: null, min: -1e12, max: 1e12 })
    .nullable()
    .default(null),
  high: numberField({ title: 'High limit', description: 'Highest allowed value, or empty for none', unit: null, min: -1e12, max: 1e12 })
    .nullable()
    .default(null),
  percent: numberField({
    title: 'Percent of reading',
    description: 'The instrument’s ± percent of reading on this range; 0 for an analogue meter',
    unit: '%',
    min: 0,
    max: 50,
  }),
  counts: numberField({
    title: 'Counts',
    description: 'The instrument’s ± counts of the last digit; 0 for an analogue meter',
    unit: null,
    min: 0,
    max: 1000,
  }),
  resolution: numberField({
    title: 'Resolution',
    description: 'Value of one count on this range; of an analogue meter the least that you can tell apart',
    unit: null,
    min: 0,
    max: 1e9,
    aboveMin: true,
  }),
  rangePercent: numberField({
    title: 'Percent of full scale',
    description: 'The class of an analogue meter, such as 2.5; 0 for a digital one',
    unit: '%',
    min: 0,
    max: 50,
  }).default(0),
  fullScale: numberField({
    title: 'Full scale',
    description: 'Of the range in use; needed for percent of full scale',
    unit: null,
    min: 0,
    max: 1e12,
    aboveMin: true,
  })
    .nullable()
    .default(null),
});

type Inputs = z.output<typeof inputs>;

const WORDS: Readonly<Record<Decision, string>> = {
  in: 'In',
  'close-in': 'In, but close: this instrument cannot be sure',
  'close-out': 'Out, but close: this instrument cannot be sure',
  low: 'Out, low',
  high: 'Out, high',
};

const law = [
  'a = |reading| × percent ÷ 100 + counts × resolution + full scale × percent of full scale ÷ 100',
  'U = 2 × a ÷ √3   (k = 2; guard band w = U)',
  'in: low + w … high − w · in but close: up to the limit · out but close: up to w beyond it · out: farther',
  'chance that it is in truth within: Φ((high − reading) ÷ u) − Φ((low − reading) ÷ u),  u = U ÷ 2',
];
const validity =
  'Holds while the instrument is within its calibration date and its own temperature range (usually 18 to 28 °C), on the function and range that the accuracy was printed for. The accuracy is taken as the whole uncertainty: leads, noise and a drifting rail come on top. With w = U the risk of passing a value that is out is below 2.5 %. The chance supposes that nothing is known of the rail but this reading.';
const source =
  'ILAC-G8:09/2019, 4.2.3 (four-way decision) and its risk for w = U; JCGM 100:2008, 4.3.7 (rectangular distribution); JCGM 106:2012, 7.3 (chance of conformity).';

interface Worked {
  readonly given: Inputs;
  readonly result: ReadingLimitResult;
  readonly print: (value: number) => string;
}

function formulaOf({ given, result, print }: Worked): readonly string[] {
  const { low, high, reading } = given;
  const { errorLimit, uncertainty, acceptLow, acceptHigh, chanceIn, chanceWrong } = result;
  const at = reading ?? nearer(given);
  const ofRange = given.rangePercent === 0 ? '' : ` + ${formatNumber(given.rangePercent)} % × ${print(given.fullScale ?? 0)}`;
  const lines = [
    `a = ${print(Math.abs(at))} × ${formatNumber(given.percent)} % + ${formatNumber(given.counts)} × ${print(given.resolution)}${ofRange} = ${print(errorLimit)}${reading === null ? ', at the limit' : ''}`,
    `U = w = 2 × ${print(errorLimit)} ÷ √3 = ${print(uncertainty)}`,
  ];
  if (low !== null && acceptLow !== null) lines.push(`in from ${print(low)} + w = ${print(acceptLow)}`);
  if (high !== null && acceptHigh !== null) lines.push(`in up to ${print(high)} − w = ${print(acceptHigh)}`);
  if (acceptLow !== null && acceptHigh !== null && acceptLow > acceptHigh)
    lines.push('The two guard bands overlap: with this instrument no reading can be clearly in.');
  if (chanceIn !== null && chanceWrong !== null)
    lines.push(
      `chance that it is within the limits in truth: ${percentWords(chanceIn)}; that a plain yes or no by the limit is wrong: ${percentWords(chanceWrong)}`,
    );
  return lines;
}

/** The limit that is nearer to zero: the accuracy is shown there while nothing is read. */
function nearer({ low, high }: Inputs): number {
  if (low === null || high === null) return low ?? high ?? 0;
  return Math.abs(low) <= Math.abs(high) ? low : high;
}

/** A chance in percent; a very small one is not printed as nothing, a very large one not as certain. */
function percentWords(chance: number): string {
  if (chance > 0 && chance < 0.0005) return 'less than 0.05 %';
  if (chance < 1 && chance > 0.9995) return 'more than 99.95 %';
  return `${formatNumber(chance * 100, 2)} %`;
}

function headlineOf({ given, result, print }: Worked): string {
  const { reading } = given;
  const { decision, chanceWrong, acceptLow, acceptHigh } = result;
  if (decision === null || reading === null || chanceWrong === null) {
    if (acceptLow !== null && acceptHigh !== null)
      return acceptLow > acceptHigh
        ? 'Too coarse: with this instrument no reading can be clearly in.'
        : `Clearly in from ${print(acceptLow)} to ${print(acceptHigh)} with this instrument.`;
    return acceptLow !== null
      ? `Clearly in from ${print(acceptLow)} on with this instrument.`
      : `Clearly in up to ${print(acceptHigh ?? 0)} with this instrument.`;
  }
  const shown = `${print(reading)} ± ${formatQuantity(result.uncertainty, QUANTITIES[given.quantity].unit, { digits: 2 })}`;
  if (decision !== 'close-in' && decision !== 'close-out') return `${WORDS[decision]}: ${shown}.`;
  return `${WORDS[decision]}. ${shown}; the chance that it is the other way round is ${percentWords(chanceWrong)}.`;
}

function bandsOf(
  { low, high }: Inputs,
  result: ReadingLimitResult,
  width: { readonly low: number; readonly high: number },
): readonly PlotBand[] {
  const bands: PlotBand[] = [];
  const { acceptLow, acceptHigh } = result;
  if (acceptLow === null || acceptHigh === null || acceptLow <= acceptHigh)
    bands.push({ label: 'in', axis: 'x', from: acceptLow, to: acceptHigh, role: 'good' });
  if (low !== null)
    bands.push({
      label: 'close to low',
      axis: 'x',
      from: low - width.low,
      to: Math.min(acceptLow ?? low, high ?? Infinity),
      role: 'close',
    });
  if (high !== null)
    bands.push({
      label: 'close to high',
      axis: 'x',
      from: Math.max(acceptHigh ?? high, low ?? -Infinity),
      to: high + width.high,
      role: 'close',
    });
  return bands;
}

function plotOf({ given, result, print }: Worked): Plot {
  const { low, high, reading, quantity } = given;
  const width = { low: uncertaintyOf(given, low ?? 0), high: uncertaintyOf(given, high ?? 0) };
  const ends = [low, high, reading].filter((value) => value !== null);
  const [least, most] = [Math.min(...ends), Math.max(...ends)];
  // Room enough to see the bands, also where there is one limit only or the instrument is next to perfect.
  const room = Math.max(
    3 * width.low,
    3 * width.high,
    (most - least) / 4,
    Math.max(Math.abs(least), Math.abs(most)) / 50,
    10 * given.resolution,
  );
  const [from, to] = [least - room, most + room];
  const chance = (x: number): number => 100 * chanceWithin(x, given, uncertaintyOf(given, x));
  return {
    title: 'Limits and guard bands',
    x: { title: 'Reading', unit: QUANTITIES[quantity].unit, scale: 'linear', from, to },
    y: { title: 'Chance that it is within', unit: '%', scale: 'linear', from: 0, to: 100 },
    curves: [{ label: 'chance', points: sampleCurve(chance, from, to, 'linear', 121), role: 'main' }],
    points: reading === null ? [] : [{ label: print(reading), x: reading, y: chance(reading), role: 'reading' }],
    bands: bandsOf(given, result, width),
    limits: [
      ...(low === null ? [] : [{ label: 'low limit', axis: 'x' as const, at: low }]),
      ...(high === null ? [] : [{ label: 'high limit', axis: 'x' as const, at: high }]),
    ],
    words: `The chance that the true value lies within the limits, by what is read: nearly certain between the guard bands, even at a limit, nearly none beyond.${reading === null ? '' : ` At ${print(reading)} it is ${percentWords(result.chanceIn ?? 0)}.`}`,
  };
}

function refusalOf(given: Inputs): SheetRefusal | null {
  const { reading, low, high, fullScale, rangePercent } = given;
  if (low === null && high === null) return { ok: false, field: 'low', say: 'Give a low limit, a high limit, or both.' };
  if (low !== null && high !== null && low > high)
    return { ok: false, field: 'high', say: 'The high limit must not be below the low limit.' };
  if (rangePercent > 0 && fullScale === null)
    return { ok: false, field: 'fullScale', say: 'Percent of full scale needs the full scale of the range.' };
  if (fullScale !== null && reading !== null && Math.abs(reading) > fullScale)
    return { ok: false, field: 'reading', say: 'The reading must not be more than full scale. Take a larger range.' };
  return null;
}

/** Reading against a limit. */
export const sheet = defineSheet({
  id: 'reading-limit',
  title: 'Reading against a limit',
  question: 'Is this reading in, out, or too close to say with this instrument?',
  inputs,
  output,
  law,
  validity,
  source,
  caution: '',
  checks: [
    'Decision rule and risk: ILAC-G8:09/2019',
    'Chance of conformity: JCGM 106:2012, example of a Zener diode',
    'Error limits: worked examples printed by meter makers, digital and analogue',
    '5 V TTL limits 4.75 to 5.25 V: 74-series data sheets',
  ],
  example: { quantity: 'volts-dc', reading: 4.77, low: 4.75, high: 5.25, percent: 0.5, counts: 3, resolution: 0.001 },
  compute(given): SheetAnswer<ReadingLimitResult> | SheetRefusal {
    const refusal = refusalOf(given);
    if (refusal !== null) return refusal;
    const { quantity, reading, low, high } = given;
    const { unit } = QUANTITIES[quantity];
    const errorLimit = errorLimitOf(given, reading ?? nearer(given));
    const uncertainty = uncertaintyOf(given, reading ?? nearer(given));
    const decision = reading === null ? null : decide(reading, { low, high }, uncertainty);
    const chanceIn = reading === null ? null : chanceWithin(reading, { low, high }, uncertainty);
    const within = decision === 'in' || decision === 'close-in';
    const result: ReadingLimitResult = {
      errorLimit,
      uncertainty,
      guardBand: uncertainty,
      // With a reading the band is the reading's own; without one each limit has the band of the reading that just clears it.
      acceptLow: low === null ? null : reading === null ? clearOf(given, low, 1) : low + uncertainty,
      acceptHigh: high === null ? null : reading === null ? clearOf(given, high, -1) : high - uncertainty,
      decision,
      chanceIn,
      chanceWrong: chanceIn === null ? null : within ? 1 - chanceIn : chanceIn,
    };
    const worked: Worked = { given, result, print: (value) => formatQuantity(value, unit, { digits: 5 }) };
    return { ok: true, result, headline: headlineOf(worked), formula: formulaOf(worked), validity, source, plot: plotOf(worked) };
  },
});
