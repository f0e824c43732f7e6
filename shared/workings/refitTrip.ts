/** Refit trip: where to set the current limit before the next board, and what the total says once it is in. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Plot } from '@/shared/workings/plot';
import { decide } from '@/shared/workings/readingLimit';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { defineSheet, numberField } from '@/shared/workings/sheet';

/** A board that reads less than this share of its twin, dead, is not like it. Common practice, no source. */
export const TWIN_SHARE = 0.7;

const output = z.strictObject({
  /** The total with this board in, as expected. */
  expectedAmps: z.number(),
  /** Least and most that are as expected, the doubt of the meter left out. */
  lowAmps: z.number(),
  highAmps: z.number(),
  /** Where to set the limit; never above what the rail is rated for. */
  limitAmps: z.number(),
  /** Whether rail and supply carry what the board may draw. */
  fits: z.boolean(),
  /** Whether the meter can tell this board from none at all. */
  tells: z.boolean(),
  /** The weakest fault beside the board that the limit still catches; null when it catches none. */
  caughtOhms: z.number().nullable(),
  /** Most that a fault of this board can burn at that limit. */
  faultWatts: z.number(),
  /** The same at the supply's own limit; null when that is not given. */
  ownLimitWatts: z.number().nullable(),
  /** What the board would draw if its dead reading were a plain resistor; null without a reading. */
  deadAmps: z.number().nullable(),
  dead: z.enum(['fits', 'below-twin', 'would-trip']).nullable(),
  reading: z.enum(['as-expected', 'close', 'too-little', 'too-much']).nullable(),
});

/** Result of the sheet; nothing rounded, volts by size. */
export type RefitTripResult = z.output<typeof output>;

const maybe = (field: z.ZodNumber) => field.nullable().default(null);

const inputs = z.strictObject({
  nominalVolts: numberField({ title: 'Nominal volts', description: 'Of the rail, with its sign', unit: 'V', min: -400, max: 400 }),
  lastAmps: numberField({
    title: 'Total so far',
    description: 'Read on this rail with the boards that are in; 0 with none',
    unit: 'A',
    min: 0,
    max: 1000,
  }),
  boardAmps: numberField({
    title: 'Next board',
    description: 'Its signature: what it drew before, what its twin draws, or the sum of its parts',
    unit: 'A',
    min: 0.001,
    max: 1000,
  }),
  spreadPercent: numberField({
    title: 'Spread',
    description: 'How far the board may be off that, either way; 25 % where a twin was read, 50 % from data sheets',
    unit: '%',
    min: 0,
    max: 200,
  }).default(25),
  meterAmps: numberField({
    title: 'Doubt of the reading',
    description: 'Uncertainty of the ammeter at the total',
    unit: 'A',
    min: 0,
    max: 100,
  }).default(0),
  railAmps: maybe(
    numberField({ title: 'Rail rated', description: 'Most amps of the rail; empty when not known', unit: 'A', min: 0.001, max: 1000 }),
  ),
  ownLimitAmps: maybe(
    numberField({
      title: 'Supply’s own limit',
      description: 'Where the machine’s supply limits by itself; often far above its rating',
      unit: 'A',
      min: 0.001,
      max: 1000,
    }),
  ),
  boardOhms: maybe(
    numberField({
      title: 'Board, dead',
      description: 'Feed to return at its connector, dead; empty when not read',
      unit: 'Ω',
      min: 0,
      max: 1e7,
    }),
  ),
  twinOhms: maybe(
    numberField({ title: 'Twin, dead', description: 'The same on a good one, same meter and range', unit: 'Ω', min: 0, max: 1e7 }),
  ),
  newAmps: maybe(numberField({ title: 'Total now', description: 'Read with the board in; empty before', unit: 'A', min: 0, max: 1000 })),
});

type Inputs = z.output<typeof inputs>;

const law = [
  'expected = total so far + board',
  'as expected from total + board × (1 − spread) to total + board × (1 + spread)',
  'limit = total + board × (1 + spread) + doubt of the meter, at most what the rail is rated for',
  'weakest fault caught: V ÷ (limit − expected); most that a fault burns: V × (limit − total so far)',
  'dead: V ÷ ohms must not be more than limit − total so far, and not less than 0.7 of its twin',
];
const validity =
  'Steady d.c. amps after the first second; capacitors draw more while they fill, and a supply in limit then comes up slowly. Boards that wait for a clock or a program draw another current: read the twin in the same state. A dead reading is taken on semiconductors: a low one accuses, a high one acquits nothing. The limit guards amps alone: over-voltage has its trip, reversal its returns.';
const source = 'Ohm’s law. Spread of 25 %, 0.7 of a twin, and setting the limit just above what is expected: common practice, no source.';
const caution =
  'Boards go in and out dead: sources out, proved dead, one board at a time, and only after the supply is proven, its trips and returns too. When the limit is reached, power off at once; do not turn it up to see. Local codes, the maker’s data and licensed practice come first.';

const v = (value: number): string => formatQuantity(value, 'V', { digits: 4 });
const a = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const w = (value: number): string => formatQuantity(value, 'W', { digits: 3 });
const r = (value: number): string => formatQuantity(value, 'Ω', { digits: 3 });

function deadOf({ boardOhms, twinOhms, lastAmps }: Inputs, volts: number, limitAmps: number): Pick<RefitTripResult, 'dead' | 'deadAmps'> {
  if (boardOhms === null) return { dead: null, deadAmps: null };
  // Nothing at all would be an endless current: the meter's last digit stands for it.
  const deadAmps = volts / Math.max(boardOhms, 0.001);
  if (deadAmps > limitAmps - lastAmps) return { dead: 'would-trip', deadAmps };
  return { dead: twinOhms !== null && boardOhms < TWIN_SHARE * twinOhms ? 'below-twin' : 'fits', deadAmps };
}

function judge({ newAmps, meterAmps }: Inputs, low: number, high: number): RefitTripResult['reading'] {
  if (newAmps === null) return null;
  const decision = decide(newAmps, { low, high }, meterAmps);
  if (decision === 'low') return 'too-little';
  if (decision === 'high') return 'too-much';
  return decision === 'in' ? 'as-expected' : 'close';
}

function headlineOf(given: Inputs, result: RefitTripResult): string {
  const { reading, dead } = result;
  const between = `${a(result.lowAmps)} to ${a(result.highAmps)}`;
  if (reading !== null && given.newAmps !== null) {
    const read = a(given.newAmps);
    switch (reading) {
      case 'as-expected':
        return `${read} is as expected (${between}). It is the total for the next board.`;
      case 'close':
        return `${read} is too close to ${between} to say with this meter. Take a better one before the next board.`;
      case 'too-little':
        return `${read} is too little (${between}): the board does not draw. Power off; look at its feed, its return and its seat.`;
      case 'too-much':
        return `${read} is too much (${between}): power off at once, prove dead, take this board out again.`;
    }
  }
  if (!result.fits)
    return `Do not fit: with this board the rail may have to give ${a(result.highAmps)}, it is rated ${a(Math.min(given.railAmps ?? Infinity, given.ownLimitAmps ?? Infinity))}.`;
  if (dead === 'would-trip')
    return `Do not fit: ${r(given.boardOhms ?? 0)} read dead would draw ${a(result.deadAmps ?? 0)}. Find the short on the board first.`;
  const twin =
    dead === 'below-twin' ? ` Its dead reading is less than ${formatNumber(TWIN_SHARE)} of its twin: look why before you fit it.` : '';
  const blind = result.tells ? '' : ' The meter cannot tell this board from none: take a better one.';
  return `Set the limit to ${a(result.limitAmps)}: ${a(given.lastAmps)} so far, ${a(given.boardAmps)} for this board.${twin}${blind}`;
}

function formulaOf(given: Inputs, result: RefitTripResult, volts: number): readonly string[] {
  const spread = `${formatNumber(given.spreadPercent)} %`;
  const lines = [
    `expected = ${a(given.lastAmps)} + ${a(given.boardAmps)} = ${a(result.expectedAmps)}`,
    `from ${a(given.lastAmps)} + ${a(given.boardAmps)} × (1 − ${spread}) = ${a(result.lowAmps)} to ${a(given.lastAmps)} + ${a(given.boardAmps)} × (1 + ${spread}) = ${a(result.highAmps)}`,
    `limit = ${a(result.highAmps)} + ${a(given.meterAmps)}${given.railAmps === null ? '' : `, at most ${a(given.railAmps)}`} = ${a(result.limitAmps)}`,
    result.caughtOhms === null
      ? 'the limit lies at what is expected: it may be reached by the good board'
      : `catches a fault of ${v(volts)} ÷ (${a(result.limitAmps)} − ${a(result.expectedAmps)}) = ${r(result.caughtOhms)} or less beside the board`,
    `a fault burns at most ${v(volts)} × (${a(result.limitAmps)} − ${a(given.lastAmps)}) = ${w(result.faultWatts)}${result.ownLimitWatts === null ? '' : `; without the limit ${w(result.ownLimitWatts)}`}`,
  ];
  if (result.deadAmps !== null)
    lines.push(
      `dead: ${v(volts)} ÷ ${r(given.boardOhms ?? 0)} = ${a(result.deadAmps)} if it were a plain resistor${given.twinOhms === null ? '' : `; its twin reads ${r(given.twinOhms)}`}`,
    );
  return lines;
}

function plotOf(given: Inputs, result: RefitTripResult, volts: number): Plot {
  const most = 1.25 * Math.max(result.limitAmps, result.highAmps, given.newAmps ?? 0);
  const point = (label: string, amps: number, role: 'answer' | 'reading' | 'other') => ({ label, x: amps, y: volts * amps, role });
  return {
    title: 'Watts of the rail over its total',
    x: { title: 'Total', unit: 'A', scale: 'linear', from: 0, to: most },
    y: { title: 'Rail gives', unit: 'W', scale: 'linear', from: 0, to: volts * most },
    curves: [
      {
        label: v(volts),
        points: [
          [0, 0],
          [most, volts * most],
        ],
        role: 'main',
      },
    ],
    points: [
      point('so far', given.lastAmps, 'other'),
      point('expected', result.expectedAmps, 'answer'),
      ...(given.newAmps === null ? [] : [point('now', given.newAmps, 'reading')]),
    ],
    bands: [{ label: 'as expected', axis: 'x', from: result.lowAmps, to: result.highAmps, role: 'good' }],
    limits: [{ label: 'limit', axis: 'x', at: result.limitAmps }],
    words: `The total stands at ${a(given.lastAmps)} and is to come to between ${a(result.lowAmps)} and ${a(result.highAmps)}; the limit is at ${a(result.limitAmps)}.${given.newAmps === null ? '' : ` Read are ${a(given.newAmps)}.`}`,
  };
}

/** Refit trip. */
export const sheet = defineSheet({
  id: 'refit-trip',
  title: 'Refit trip',
  question: 'Where do I set the current limit before the next board goes in, and what should the total read?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'Supply current of a 7400, typical and most: TI SDLS025B',
    'Power budget of a bus-powered hub: USB 2.0, 7.2.1.1',
    'A rail rated 5 A that limits near 20 A: common practice, no source',
  ],
  example: {
    nominalVolts: 5,
    lastAmps: 2.6,
    boardAmps: 0.65,
    meterAmps: 0.03,
    railAmps: 12,
    ownLimitAmps: 20,
    boardOhms: 46,
    twinOhms: 52,
  },
  compute(given): SheetAnswer<RefitTripResult> | SheetRefusal {
    const volts = Math.abs(given.nominalVolts);
    if (volts < 0.5) return { ok: false, field: 'nominalVolts', say: 'Nominal volts must be 0.5 V or more, either sign.' };
    if (given.railAmps !== null && given.lastAmps > given.railAmps)
      return { ok: false, field: 'lastAmps', say: `The total so far must not be more than the rail is rated for, ${a(given.railAmps)}.` };
    if (given.ownLimitAmps !== null && given.lastAmps > given.ownLimitAmps)
      return { ok: false, field: 'ownLimitAmps', say: 'The supply’s own limit must not be below the total so far.' };
    if (given.twinOhms !== null && given.boardOhms === null)
      return { ok: false, field: 'boardOhms', say: 'Give the board’s own dead reading beside that of its twin.' };
    const spread = given.spreadPercent / 100;
    const expectedAmps = given.lastAmps + given.boardAmps;
    const lowAmps = given.lastAmps + given.boardAmps * Math.max(0, 1 - spread);
    const highAmps = given.lastAmps + given.boardAmps * (1 + spread);
    const rated = Math.min(given.railAmps ?? Infinity, given.ownLimitAmps ?? Infinity);
    const limitAmps = Math.min(highAmps + given.meterAmps, rated);
    const result: RefitTripResult = {
      expectedAmps,
      lowAmps,
      highAmps,
      limitAmps,
      fits: highAmps <= rated * (1 + 1e-12),
      tells: lowAmps - given.meterAmps > given.lastAmps,
      caughtOhms: limitAmps > expectedAmps ? volts / (limitAmps - expectedAmps) : null,
      faultWatts: volts * (limitAmps - given.lastAmps),
      ownLimitWatts: given.ownLimitAmps === null ? null : volts * (given.ownLimitAmps - given.lastAmps),
      ...deadOf(given, volts, limitAmps),
      reading: judge(given, lowAmps, highAmps),
    };
    const plot = plotOf(given, result, volts);
    return {
      ok: true,
      result,
      headline: headlineOf(given, result),
      formula: formulaOf(given, result, volts),
      caution,
      validity,
      source,
      plot,
    };
  },
});
