/** Over-voltage trip: whether it lies between the rail and what the parts stand, and what firing costs it. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Plot } from '@/shared/workings/plot';
import { decide } from '@/shared/workings/readingLimit';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField } from '@/shared/workings/sheet';

/** Volts that stay across a thyristor that has fired (a bench supply's manual: about 1 V). */
export const ON_STATE_VOLTS = 1;

const output = z.strictObject({
  /** Most that the rail may have, by size, peaks included. */
  railHighVolts: z.number(),
  tripLowVolts: z.number(),
  tripVolts: z.number(),
  tripHighVolts: z.number(),
  /** Between the rail's most and the trip's least; below zero when the trip may fire in use. */
  marginBelowVolts: z.number(),
  /** Between the trip's most and what the parts stand; null when that is not given. */
  marginAboveVolts: z.number().nullable(),
  says: z.enum(['in-order', 'fires-in-use', 'too-late', 'no-room']),
  fault: z
    .strictObject({
      joules: z.number(),
      peakAmps: z.number(),
      ampSquaredSeconds: z.number(),
      /** Whether the thyristor stands the discharge; null when its data are not given. */
      thyristorStands: z.boolean().nullable(),
    })
    .nullable(),
  /** Whether the fuse opens before the thyristor dies; null when one of the two is not given. */
  fuseFirst: z.boolean().nullable(),
  /** What the thyristor burns while the supply goes on in limit; null when that is not given. */
  heldWatts: z.number().nullable(),
  reading: z.enum(['in', 'close', 'too-low', 'too-high']).nullable(),
});

/** Result of the sheet; nothing rounded, volts by size. */
export type OverVoltageTripResult = z.output<typeof output>;

const maybe = (field: z.ZodNumber) => field.nullable().default(null);

const inputs = z.strictObject({
  nominalVolts: numberField({ title: 'Nominal volts', description: 'Of the rail, with its sign', unit: 'V', min: -400, max: 400 }),
  tolerancePercent: numberField({ title: 'Tolerance', description: 'Of the rail, either way', unit: '%', min: 0, max: 50 }).default(5),
  peakVolts: numberField({
    title: 'Peaks',
    description: 'Ripple and spikes above the reading of a meter, by scope',
    unit: 'V',
    min: 0,
    max: 100,
  }).default(0),
  mostVolts: maybe(
    numberField({
      title: 'Parts stand',
      description: 'Absolute maximum of the parts on the rail; 7 V for 54 and 74 series logic; empty when not known',
      unit: 'V',
      min: 0.5,
      max: 2000,
    }),
  ),
  kind: choiceField('Kind of trip', 'A Zener into the gate of the thyristor, a divider against a reference, or a trip point as stated', [
    'zener-gate',
    'divider',
    'set-point',
  ]).default('zener-gate'),
  tripVolts: maybe(
    numberField({
      title: 'Trip volts',
      description: 'Zener volts, reference volts, or the stated trip point, by the kind of trip',
      unit: 'V',
      min: 0.1,
      max: 1000,
    }),
  ),
  tripTolerancePercent: numberField({
    title: 'Trip tolerance',
    description: 'Of that, either way; 5 % for a Zener unless marked',
    unit: '%',
    min: 0,
    max: 50,
  }).default(5),
  gateLeastVolts: numberField({
    title: 'Gate volts, least',
    description: 'At which the gate may fire, warm',
    unit: 'V',
    min: 0,
    max: 5,
  }).default(0.6),
  gateMostVolts: numberField({ title: 'Gate volts, most', description: 'That the gate may need, cold', unit: 'V', min: 0, max: 5 }).default(
    0.8,
  ),
  upperOhms: maybe(numberField({ title: 'Upper resistor', description: 'Of a divider, from rail to tap', unit: 'Ω', min: 0, max: 1e8 })),
  lowerOhms: maybe(numberField({ title: 'Lower resistor', description: 'Of a divider, from tap to 0 V', unit: 'Ω', min: 1, max: 1e8 })),
  farads: maybe(
    numberField({ title: 'Capacitance', description: 'That the thyristor shorts; empty when not known', unit: 'F', min: 1e-9, max: 10 }),
  ),
  seriesOhms: numberField({
    title: 'Ohms in the way',
    description: 'Wires, ESR and thyristor together',
    unit: 'Ω',
    min: 0.0001,
    max: 1000,
  }).default(0.02),
  surgeAmps: maybe(
    numberField({
      title: 'Thyristor surge',
      description: 'Its single surge current (ITSM) by data sheet',
      unit: 'A',
      min: 0.1,
      max: 100_000,
    }),
  ),
  thyristorI2t: maybe(numberField({ title: 'Thyristor I²t', description: 'By data sheet, for fusing', unit: 'A²s', min: 1e-4, max: 1e7 })),
  fuseI2t: maybe(
    numberField({ title: 'Fuse I²t', description: 'Total clearing value of the fuse before it', unit: 'A²s', min: 1e-4, max: 1e7 }),
  ),
  limitAmps: maybe(
    numberField({
      title: 'Current limit',
      description: 'What the supply goes on giving into the fired trip',
      unit: 'A',
      min: 0,
      max: 1000,
    }),
  ),
  readVolts: maybe(
    numberField({
      title: 'Reading',
      description: 'Volts at which it fired in the trip test, with its sign',
      unit: 'V',
      min: -2000,
      max: 2000,
    }),
  ),
  meterVolts: numberField({
    title: 'Doubt of the reading',
    description: 'Uncertainty of the meter, and the step of the supply',
    unit: 'V',
    min: 0,
    max: 100,
  }).default(0),
});

type Inputs = z.output<typeof inputs>;

const law = [
  'rail at most = nominal × (1 + tolerance) + peaks, by size',
  'Zener into gate: trip = Zener volts ± tolerance + gate volts, least with least and most with most',
  'divider: trip = reference × (1 + upper ÷ lower) ± tolerance',
  'in order: rail at most < trip at least, and trip at most < what the parts stand',
  'firing: E = ½ × C × V², I peak = V ÷ R, I²t = V² × C ÷ (2 × R)',
];
const validity =
  'D.c. and slow rises. A trip takes microseconds, a Zener softens near its knee, and a gate needs less when warm and more when cold: the trip test with the meter on the rail decides. The discharge is taken as a capacitor through a fixed resistance; wire inductance makes the peak lower. A battery or a second supply on the rail goes on feeding a fired trip.';
const source =
  'Logic, 54 and 74 series: recommended 4.75 to 5.25 V, absolute maximum 7 V (data sheets). Fired thyristor about 1 V: a bench supply’s manual. Gate 0.6 to 0.8 V: from memory; larger thyristors may need up to 1.5 V. I²t of an exponential: ½ × peak² × time constant.';
const caution =
  'Test the trip with the boards out, from a bench supply through its series part, and never raise a trip to have quiet: it may have been right each time. The thyristor shorts the rail: leads, tabs and resistor get hot. Local codes, the maker’s data and licensed practice come first.';

const v = (value: number): string => formatQuantity(value, 'V', { digits: 4 });
const a = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const i2t = (value: number): string => formatQuantity(value, 'A²s', { digits: 3 });
const pc = (value: number): string => `${formatNumber(value)} %`;

interface Band {
  readonly low: number;
  readonly middle: number;
  readonly high: number;
}

function bandOf(given: Inputs): Band | SheetRefusal {
  const { kind, tripVolts, upperOhms, lowerOhms, gateLeastVolts, gateMostVolts } = given;
  if (tripVolts === null)
    return { ok: false, field: 'tripVolts', say: 'Trip volts are missing: Zener volts, reference volts, or the trip point.' };
  const spread = given.tripTolerancePercent / 100;
  const around = (centre: number): Band => ({ low: centre * (1 - spread), middle: centre, high: centre * (1 + spread) });
  if (kind === 'set-point') return around(tripVolts);
  if (kind === 'divider') {
    if (upperOhms === null) return { ok: false, field: 'upperOhms', say: 'The upper resistor of the divider is missing.' };
    if (lowerOhms === null) return { ok: false, field: 'lowerOhms', say: 'The lower resistor of the divider is missing.' };
    return around(tripVolts * (1 + upperOhms / lowerOhms));
  }
  if (gateLeastVolts > gateMostVolts) return { ok: false, field: 'gateMostVolts', say: 'The most gate volts must not be below the least.' };
  const zener = around(tripVolts);
  return { low: zener.low + gateLeastVolts, middle: tripVolts + (gateLeastVolts + gateMostVolts) / 2, high: zener.high + gateMostVolts };
}

function faultOf(given: Inputs, band: Band): OverVoltageTripResult['fault'] {
  const { farads, seriesOhms, surgeAmps, thyristorI2t } = given;
  if (farads === null) return null;
  const peakAmps = band.high / seriesOhms;
  const ampSquaredSeconds = (band.high * band.high * farads) / (2 * seriesOhms);
  const stands =
    surgeAmps === null && thyristorI2t === null
      ? null
      : (surgeAmps === null || peakAmps <= surgeAmps) && (thyristorI2t === null || ampSquaredSeconds <= thyristorI2t);
  return { joules: (farads * band.high * band.high) / 2, peakAmps, ampSquaredSeconds, thyristorStands: stands };
}

function judge(given: Inputs, railHighVolts: number): OverVoltageTripResult['reading'] {
  if (given.readVolts === null) return null;
  const size = Math.sign(given.nominalVolts) * given.readVolts;
  const most = given.mostVolts === null ? null : Math.max(given.mostVolts, railHighVolts);
  const decision = decide(size, { low: railHighVolts, high: most }, given.meterVolts);
  if (decision === 'low') return 'too-low';
  if (decision === 'high') return 'too-high';
  return decision === 'in' ? 'in' : 'close';
}

const READ: Readonly<Record<NonNullable<OverVoltageTripResult['reading']>, string>> = {
  in: 'it fires between rail and parts',
  close: 'too close to say with this meter',
  'too-low': 'it fires where the rail may stand: in use it will shut down for nothing',
  'too-high': 'it fires too late: do not fit the boards',
};

function headlineOf(given: Inputs, result: OverVoltageTripResult): string {
  const band = `${v(result.tripLowVolts)} to ${v(result.tripHighVolts)}`;
  const parts = given.mostVolts === null ? 'what the parts stand is not given' : `parts stand ${v(given.mostVolts)}`;
  const rail = `rail at most ${v(result.railHighVolts)}`;
  const words: Readonly<Record<OverVoltageTripResult['says'], string>> = {
    'in-order': `${given.mostVolts === null ? 'Above the rail' : 'In order'}: ${rail}, trip ${band}, ${parts}.`,
    'fires-in-use': `May fire in use: trip ${band}, ${rail}.`,
    'too-late': `Too late: the trip may need ${v(result.tripHighVolts)}, ${parts}.`,
    'no-room': `No room: trip ${band} reaches from the rail (${v(result.railHighVolts)}) to past what the parts stand (${v(given.mostVolts ?? 0)}).`,
  };
  const fault = result.fault?.thyristorStands === false ? ' The thyristor does not stand the discharge.' : '';
  const fuse = result.fuseFirst === false ? ' The thyristor dies before the fuse opens.' : '';
  if (result.reading !== null && given.readVolts !== null)
    return `Fired at ${v(given.readVolts)}: ${READ[result.reading]}. ${words[result.says]}`;
  return `${words[result.says]}${fault}${fuse}`;
}

function formulaOf(given: Inputs, result: OverVoltageTripResult): readonly string[] {
  const size = Math.abs(given.nominalVolts);
  const trip = given.tripVolts ?? 0;
  const lines = [
    `rail at most = ${v(size)} × (1 + ${pc(given.tolerancePercent)})${given.peakVolts === 0 ? '' : ` + ${v(given.peakVolts)}`} = ${v(result.railHighVolts)}`,
  ];
  const spread = pc(given.tripTolerancePercent);
  if (given.kind === 'zener-gate')
    lines.push(
      `trip at least = ${v(trip)} × (1 − ${spread}) + ${v(given.gateLeastVolts)} = ${v(result.tripLowVolts)}`,
      `trip at most = ${v(trip)} × (1 + ${spread}) + ${v(given.gateMostVolts)} = ${v(result.tripHighVolts)}; the gate comes on top of the Zener`,
    );
  else if (given.kind === 'divider')
    lines.push(
      `trip = ${v(trip)} × (1 + ${formatQuantity(given.upperOhms ?? 0, 'Ω')} ÷ ${formatQuantity(given.lowerOhms ?? 1, 'Ω')}) = ${v(result.tripVolts)} ± ${spread}: ${v(result.tripLowVolts)} to ${v(result.tripHighVolts)}`,
    );
  else lines.push(`trip = ${v(trip)} ± ${spread}: ${v(result.tripLowVolts)} to ${v(result.tripHighVolts)}`);
  lines.push(`below: ${v(result.tripLowVolts)} − ${v(result.railHighVolts)} = ${v(result.marginBelowVolts)}`);
  if (result.marginAboveVolts !== null)
    lines.push(`above: ${v(given.mostVolts ?? 0)} − ${v(result.tripHighVolts)} = ${v(result.marginAboveVolts)}`);
  const { fault } = result;
  if (fault !== null)
    lines.push(
      `E = ½ × ${formatQuantity(given.farads ?? 0, 'F')} × (${v(result.tripHighVolts)})² = ${formatQuantity(fault.joules, 'J', { digits: 3 })}`,
      `I peak = ${v(result.tripHighVolts)} ÷ ${formatQuantity(given.seriesOhms, 'Ω')} = ${a(fault.peakAmps)}${given.surgeAmps === null ? '' : ` against ${a(given.surgeAmps)}`}`,
      `I²t = ${i2t(fault.ampSquaredSeconds)}${given.thyristorI2t === null ? '' : ` against ${i2t(given.thyristorI2t)}`}`,
    );
  if (result.fuseFirst !== null)
    lines.push(
      `fuse ${i2t(given.fuseI2t ?? 0)} against thyristor ${i2t(given.thyristorI2t ?? 0)}: ${result.fuseFirst ? 'the fuse opens first' : 'the thyristor dies first'}`,
    );
  if (result.heldWatts !== null)
    lines.push(
      `fired and held: ${v(ON_STATE_VOLTS)} × ${a(given.limitAmps ?? 0)} = ${formatQuantity(result.heldWatts, 'W', { digits: 3 })} in the thyristor until the supply is off`,
    );
  return lines;
}

function plotOf(given: Inputs, result: OverVoltageTripResult): Plot {
  const size = Math.abs(given.nominalVolts);
  const read = given.readVolts === null ? null : Math.sign(given.nominalVolts) * given.readVolts;
  const to = 1.1 * Math.max(result.tripHighVolts, given.mostVolts ?? 0, result.railHighVolts, read ?? 0);
  const { tripLowVolts: low, tripHighVolts: high } = result;
  return {
    title: 'When it fires',
    x: { title: 'Rail, by size', unit: 'V', scale: 'linear', from: Math.min(0.8 * size, 0.9 * low, Math.max(0, read ?? size)), to },
    y: { title: 'Of such trips have fired', unit: '%', scale: 'linear', from: 0, to: 100 },
    curves: [
      {
        label: 'trip',
        points: [
          [Math.min(0.8 * size, 0.9 * low), 0],
          [low, 0],
          [high, 100],
          [to, 100],
        ],
        role: 'main',
      },
    ],
    points: read === null || read < 0 ? [] : [{ label: 'fired here', x: read, y: 50, role: 'reading' }],
    bands: [
      { label: 'rail', axis: 'x', from: Math.max(0, size * (1 - given.tolerancePercent / 100)), to: result.railHighVolts, role: 'good' },
      ...(given.mostVolts === null
        ? []
        : [{ label: 'parts are damaged', axis: 'x' as const, from: given.mostVolts, to: null, role: 'bad' as const }]),
    ],
    limits: [],
    words: `The rail stands up to ${v(result.railHighVolts)}, the trip fires between ${v(low)} and ${v(high)}${given.mostVolts === null ? '.' : `, and the parts stand ${v(given.mostVolts)}.`}`,
  };
}

/** Over-voltage trip. */
export const sheet = defineSheet({
  id: 'over-voltage-trip',
  title: 'Over-voltage trip',
  question: 'Does this trip fire above the rail and before the parts are damaged?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'Factory trip 6.2 V ± 0.4 V of a 5 V linear supply: Power-One data sheet MCD10016',
    'Recommended and absolute maximum VCC of the 54 and 74 series: TI SDLS025B, Fairchild DM74LS08',
    'Trip by divider: data sheets of sensing circuits with a 2.6 V and a 0.88 V reference',
  ],
  example: { nominalVolts: 5, mostVolts: 7, kind: 'zener-gate', tripVolts: 6.2, farads: 0.01, surgeAmps: 300, limitAmps: 6 },
  compute(given): SheetAnswer<OverVoltageTripResult> | SheetRefusal {
    const size = Math.abs(given.nominalVolts);
    if (size < 0.5) return { ok: false, field: 'nominalVolts', say: 'Nominal volts must be 0.5 V or more, either sign.' };
    const band = bandOf(given);
    if ('ok' in band) return band;
    const railHighVolts = size * (1 + given.tolerancePercent / 100) + given.peakVolts;
    if (given.mostVolts !== null && given.mostVolts <= railHighVolts)
      return {
        ok: false,
        field: 'mostVolts',
        say: `The parts must stand more than the rail may have, ${v(railHighVolts)}. Check the rail, its peaks and the data sheet.`,
      };
    const marginBelowVolts = band.low - railHighVolts;
    const marginAboveVolts = given.mostVolts === null ? null : given.mostVolts - band.high;
    const [early, late] = [marginBelowVolts <= 0, marginAboveVolts !== null && marginAboveVolts <= 0];
    const result: OverVoltageTripResult = {
      railHighVolts,
      tripLowVolts: band.low,
      tripVolts: band.middle,
      tripHighVolts: band.high,
      marginBelowVolts,
      marginAboveVolts,
      says: early ? (late ? 'no-room' : 'fires-in-use') : late ? 'too-late' : 'in-order',
      fault: faultOf(given, band),
      fuseFirst: given.fuseI2t === null || given.thyristorI2t === null ? null : given.fuseI2t < given.thyristorI2t,
      heldWatts: given.limitAmps === null ? null : ON_STATE_VOLTS * given.limitAmps,
      reading: judge(given, railHighVolts),
    };
    const plot = plotOf(given, result);
    return { ok: true, result, headline: headlineOf(given, result), formula: formulaOf(given, result), caution, validity, source, plot };
  },
});
