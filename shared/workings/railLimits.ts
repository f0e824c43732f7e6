/** Rail limits: between which readings a supply rail is good, by size, so that −12 V is judged like +12 V. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Decision } from '@/shared/workings/readingLimit';
import { decide } from '@/shared/workings/readingLimit';
import type { Plot } from '@/shared/workings/plot';
import { sampleCurve } from '@/shared/workings/plot';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { defineSheet, numberField } from '@/shared/workings/sheet';

/** What a reading on a rail says: low and high go by size, and a wrong sign is its own answer. */
export type RailReading = Decision | 'reversed';

/** Limits of one rail in volts, signed as the meter shows them; `low` is the one nearer to zero. */
export interface RailLimits {
  readonly lowVolts: number;
  readonly highVolts: number;
}

/**
 * Limits of a rail by size.
 * @param nominalVolts signed, not zero
 * @param tolerancePercent of the nominal size
 */
export function railLimits(nominalVolts: number, tolerancePercent: number): RailLimits {
  const band = (nominalVolts * tolerancePercent) / 100;
  return { lowVolts: nominalVolts - band, highVolts: nominalVolts + band };
}

/**
 * Volts of wrong sign that still count as nothing: the meter's doubt, or 1 % of nominal up to 0.1 V, well below the drop of
 * any diode through which one rail can pull another over. Common practice, no source.
 */
function reversedAboveVolts(nominalVolts: number, guardVolts: number): number {
  return Math.max(guardVolts, Math.min(0.1, Math.abs(nominalVolts) / 100));
}

/**
 * Judges a reading against rail limits by size.
 * @param readingVolts as the meter shows it, signed; ±Infinity for over range
 * @param guardVolts uncertainty of the reading, zero or more
 */
export function classifyRail(readingVolts: number, limits: RailLimits, guardVolts: number): RailReading {
  const sign = limits.highVolts < 0 ? -1 : 1;
  const size = sign * readingVolts;
  const nominal = (limits.lowVolts + limits.highVolts) / 2;
  if (size < -reversedAboveVolts(nominal, guardVolts)) return 'reversed';
  return decide(size, { low: sign * limits.lowVolts, high: sign * limits.highVolts }, guardVolts);
}

const output = z.strictObject({
  lowVolts: z.number(),
  highVolts: z.number(),
  /** Between these the rail is good beyond doubt; null when the guard band is wider than the tolerance. */
  acceptLowVolts: z.number().nullable(),
  acceptHighVolts: z.number().nullable(),
  reading: z.enum(['in', 'close-in', 'close-out', 'low', 'high', 'reversed']).nullable(),
});

/** Result of the sheet, in volts. */
export type RailLimitsResult = z.output<typeof output>;

const WORDS: Readonly<Record<RailReading, string>> = {
  in: 'in',
  'close-in': 'in, but close',
  'close-out': 'out, but close',
  low: 'low',
  high: 'high',
  reversed: 'reversed: the sign is wrong. Take the power off at once',
};

const inputs = z.strictObject({
  nominalVolts: numberField({ title: 'Nominal volts', description: 'Of the rail, with its sign', unit: 'V', min: -10_000, max: 10_000 }),
  tolerancePercent: numberField({ title: 'Tolerance', description: 'Allowed either way, of the nominal', unit: '%', min: 0, max: 50 }),
  guardVolts: numberField({
    title: 'Guard band',
    description: 'Uncertainty of the meter at this reading',
    unit: 'V',
    min: 0,
    max: 1000,
  }).default(0),
  readingVolts: numberField({
    title: 'Reading',
    description: 'As the meter shows it, with its sign; empty for the limits alone',
    unit: 'V',
    min: -20_000,
    max: 20_000,
  })
    .nullable()
    .default(null),
});

/** How far a reading is off nominal, with the limits, the guard bands and the side where the sign is wrong. */
function plotOf(nominalVolts: number, guardVolts: number, result: RailLimitsResult, readingVolts: number | null): Plot {
  const { lowVolts, highVolts, acceptLowVolts, acceptHighVolts } = result;
  const sign = Math.sign(nominalVolts);
  const size = Math.abs(nominalVolts);
  const far = Math.max(1.3 * size, 1.1 * Math.abs(highVolts), readingVolts === null ? 0 : sign * readingVolts);
  const near = Math.min(-0.2 * size, readingVolts === null ? 0 : sign * readingVolts);
  const [from, to] = sign > 0 ? [near, far] : [-far, -near];
  const off = (volts: number): number => (100 * Math.abs(volts - nominalVolts)) / size;
  const between = (a: number, b: number) => ({ axis: 'x' as const, from: Math.min(a, b), to: Math.max(a, b) });
  const wrongSide = -sign * reversedAboveVolts(nominalVolts, guardVolts);
  return {
    title: 'Where the rail may be',
    x: { title: 'Reading', unit: 'V', scale: 'linear', from, to },
    y: { title: 'Off nominal', unit: '%', scale: 'linear', from: 0 },
    curves: [{ label: 'off nominal', points: sampleCurve(off, from, to), role: 'main' }],
    points: [
      { label: 'nominal', x: nominalVolts, y: 0, role: 'answer' },
      ...(readingVolts === null ? [] : [{ label: 'reading', x: readingVolts, y: off(readingVolts), role: 'reading' as const }]),
    ],
    bands: [
      ...(acceptLowVolts === null || acceptHighVolts === null
        ? [{ label: 'not beyond doubt', ...between(lowVolts, highVolts), role: 'close' as const }]
        : [{ label: 'good beyond doubt', ...between(acceptLowVolts, acceptHighVolts), role: 'good' as const }]),
      { label: 'reversed', axis: 'x', from: sign > 0 ? null : wrongSide, to: sign > 0 ? wrongSide : null, role: 'bad' },
    ],
    limits: [
      { label: 'low', axis: 'x', at: lowVolts },
      { label: 'high', axis: 'x', at: highVolts },
    ],
    words: `The rail may lie from ${formatQuantity(lowVolts, 'V', { digits: 4 })} to ${formatQuantity(highVolts, 'V', { digits: 4 })}; on the other side of zero it is reversed.${result.reading === null || readingVolts === null ? '' : ` ${formatQuantity(readingVolts, 'V', { digits: 4 })} is ${WORDS[result.reading]}.`}`,
  };
}

const law = [
  'low = nominal × (1 − tolerance),  high = nominal × (1 + tolerance); by size, so that low is the one nearer to zero',
  'good beyond doubt: low + guard … high − guard, by size',
  'reversed: wrong sign by more than the guard band, at least 1 % of nominal or 0.1 V, whichever is less',
];
const validity =
  'D.c. at the point where it is read, steady while it is read. Ripple and spikes are not in it, nor the drop between the supply and the board. The maker’s own limits come first.';
const source =
  'Tolerance as the maker gives it; 74-series logic wants 4.75 to 5.25 V (data sheets, recommended conditions) and is damaged above 7 V (absolute maximum). Guard band: ILAC-G8:09/2019. Threshold for a wrong sign: common practice, no source.';

/** Rail limits. */
export const sheet = defineSheet({
  id: 'rail-limits',
  title: 'Rail limits',
  question: 'Between which readings is this rail good?',
  inputs,
  output,
  law,
  validity,
  source,
  caution:
    'Reading a live rail: one insulated probe, one hand, or clipped on while dead. Local codes, the maker’s data and licensed practice come first.',
  checks: ['5 V ± 5 %: recommended VCC of the 74 series (data sheets)', '±12 V, ±5 V rails: ATX power supply design guide (from memory)'],
  example: { nominalVolts: -12, tolerancePercent: 10, guardVolts: 0.08, readingVolts: -11.6 },
  compute(given): SheetAnswer<RailLimitsResult> | SheetRefusal {
    const { nominalVolts, tolerancePercent, guardVolts, readingVolts } = given;
    if (Math.abs(nominalVolts) < 0.1) return { ok: false, field: 'nominalVolts', say: 'Nominal volts must be 0.1 V or more, either sign.' };
    const limits = railLimits(nominalVolts, tolerancePercent);
    const { lowVolts, highVolts } = limits;
    const guard = Math.sign(nominalVolts) * guardVolts;
    const roomy = Math.abs(highVolts - lowVolts) >= 2 * guardVolts;
    const reading = readingVolts === null ? null : classifyRail(readingVolts, limits, guardVolts);
    const print = (value: number): string => formatQuantity(value, 'V', { digits: 4 });
    const formula = [
      `low = ${print(nominalVolts)} × (1 − ${formatNumber(tolerancePercent)} %) = ${print(lowVolts)}`,
      `high = ${print(nominalVolts)} × (1 + ${formatNumber(tolerancePercent)} %) = ${print(highVolts)}`,
      roomy
        ? `good beyond doubt: ${print(lowVolts + guard)} … ${print(highVolts - guard)} with a guard band of ${print(guardVolts)}`
        : `The guard band of ${print(guardVolts)} is wider than the tolerance: no reading with this meter is beyond doubt.`,
    ];
    const verdict = reading === null || readingVolts === null ? '' : `; ${print(readingVolts)} is ${WORDS[reading]}`;
    const result: RailLimitsResult = {
      lowVolts,
      highVolts,
      acceptLowVolts: roomy ? lowVolts + guard : null,
      acceptHighVolts: roomy ? highVolts - guard : null,
      reading,
    };
    return {
      ok: true,
      result,
      plot: plotOf(nominalVolts, guardVolts, result, readingVolts),
      headline: `${print(lowVolts)} to ${print(highVolts)}${verdict}.`,
      formula,
      ...(reading === 'reversed' && {
        caution: 'A reversed rail destroys parts within moments, and the cause is often a lifted return. Isolate, then look for it dead.',
      }),
      validity,
      source,
    };
  },
});
