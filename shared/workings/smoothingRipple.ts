/** Smoothing ripple: the simple formula and the stepped circuit side by side, and what a ripple's frequency and size accuse. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Plot, PlotPair } from '@/shared/workings/plot';
import type { ReservoirCircuit, ReservoirState } from '@/shared/workings/reservoir';
import { pulseSeconds, settledReservoir } from '@/shared/workings/reservoir';
import { accusedByFrequency, accusedBySize, rippleFrom } from '@/shared/workings/rippleAccuses';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField } from '@/shared/workings/sheet';

const simple = z.strictObject({ highVolts: z.number(), rippleVolts: z.number(), lowVolts: z.number(), meanVolts: z.number() });

/** The formula of the books. */
export type SimpleRipple = z.output<typeof simple>;

const output = z.strictObject({
  rippleHertz: z.number(),
  simple,
  exact: z.strictObject({
    lowVolts: z.number(),
    highVolts: z.number(),
    rippleVolts: z.number(),
    meanVolts: z.number(),
    meanAmps: z.number(),
    peakDiodeAmps: z.number(),
    /** Charging current as r.m.s., over the whole period. */
    diodeRmsAmps: z.number(),
    capacitorRmsAmps: z.number(),
    /** Share of a pulse's period in which the diodes conduct. */
    conductionShare: z.number(),
  }),
  /** Peak to peak with one half of a full-wave rectifier gone; null for a half-wave one. */
  oneHalfRippleVolts: z.number().nullable(),
  /** Lowest volts less what the regulator needs; null without a need. */
  headroomVolts: z.number().nullable(),
  from: z.enum(['both-halves', 'one-half', 'three-phase', 'slower', 'faster', 'between']).nullable(),
});

/** Result of the sheet; SI, nothing rounded. */
export type SmoothingRippleResult = z.output<typeof output>;

const inputs = z.strictObject({
  secondaryVolts: numberField({
    title: 'Secondary volts',
    description: 'R.m.s. without load; of one half for a centre tap',
    unit: 'V',
    min: 0.1,
    max: 10_000,
  }),
  mainsHertz: numberField({ title: 'Mains frequency', description: 'Of the mains', unit: 'Hz', min: 10, max: 1000 }),
  rectifier: choiceField('Rectifier', 'A bridge has two diodes in the way, the others one', ['bridge', 'centre-tap', 'half-wave']),
  diodeVolts: numberField({ title: 'Diode drop', description: 'Of one diode at its peak current', unit: 'V', min: 0, max: 50 }).default(
    0.9,
  ),
  sourceOhms: numberField({
    title: 'Source ohms',
    description: 'Windings and leads in the way of the charging current: volts lost ÷ amps, as seen at the secondary',
    unit: 'Ω',
    min: 1e-3,
    max: 100e3,
  }).default(0.1),
  farads: numberField({ title: 'Capacitance', description: 'Of the reservoir', unit: 'F', min: 1e-9, max: 10 }),
  load: choiceField('Load', 'A regulator takes steady amps, a resistor amps that follow the volts', ['steady', 'resistor']),
  amps: numberField({ title: 'Load amps', description: 'For a steady load', unit: 'A', min: 1e-6, max: 1000 }).nullable().default(null),
  loadOhms: numberField({ title: 'Load ohms', description: 'For a resistor', unit: 'Ω', min: 1e-3, max: 1e9 }).nullable().default(null),
  needVolts: numberField({
    title: 'Needed volts',
    description: 'Least volts at which the regulator behind still regulates',
    unit: 'V',
    min: 0,
    max: 10_000,
  })
    .nullable()
    .default(null),
  readRippleVolts: numberField({
    title: 'Read: ripple',
    description: 'Peak to peak on the reservoir, with a scope',
    unit: 'V',
    min: 1e-6,
    max: 10_000,
  })
    .nullable()
    .default(null),
  readHertz: numberField({ title: 'Read: frequency', description: 'Of that ripple', unit: 'Hz', min: 0.01, max: 100e6 })
    .nullable()
    .default(null),
});

type Inputs = z.output<typeof inputs>;

const law = [
  'V peak = √2 × V secondary − diodes in the way × drop',
  'simple: ripple = I ÷ (f × C) peak to peak, f twice the mains for full wave; lowest = V peak − ripple',
  'exact: C × dv/dt = (|√2 × V × sin 2πft| − drops − v) ÷ R source while that is more than zero, less the load; stepped until it repeats',
  'frequency: the mains itself accuses one half of the rectifier, twice the mains is right for full wave, kilohertz accuse the switching regulator',
];
const validity =
  'A sine, a resistive source, diodes with a fixed drop, a capacitor without ESR, settled. The simple formula overstates the ripple, the more so the larger it is: it takes the capacitor as feeding the load all the time and the source as stiff. A worn capacitor’s ESR shows as steps at the charging pulse that are not in it. Mains volts, and so everything, may be 10 % off.';
const source =
  'Ripple = I ÷ (f × C): any textbook; worked examples as named in the checks. Exact: the circuit’s own equation, stepped; held against ngspice. What a frequency accuses: common practice, no source.';
const caution =
  'The reservoir is live while you read and stays charged afterwards; the clip of an earthed scope belongs on earthed metal alone. Clip on dead. Local codes, the maker’s data and licensed practice come first.';

const v = (value: number): string => formatQuantity(value, 'V', { digits: 3 });
const a = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const f = (value: number): string => formatQuantity(value, 'F', { digits: 3 });
const hz = (value: number): string => formatQuantity(value, 'Hz', { digits: 3 });

/** Peak volts less drops, and the ripple of the simple formula. */
export function simpleRipple(highVolts: number, amps: number, rippleHertz: number, farads: number): SimpleRipple {
  const rippleVolts = amps / (rippleHertz * farads);
  return { highVolts, rippleVolts, lowVolts: highVolts - rippleVolts, meanVolts: highVolts - rippleVolts / 2 };
}

function circuitOf(given: Inputs): ReservoirCircuit | SheetRefusal {
  if (given.load === 'steady' && given.amps === null) return { ok: false, field: 'amps', say: 'Load amps are missing.' };
  if (given.load === 'resistor' && given.loadOhms === null) return { ok: false, field: 'loadOhms', say: 'Load ohms are missing.' };
  return {
    peakVolts: given.secondaryVolts * Math.SQRT2,
    mainsHertz: given.mainsHertz,
    fullWave: given.rectifier !== 'half-wave',
    dropVolts: given.diodeVolts * (given.rectifier === 'bridge' ? 2 : 1),
    sourceOhms: given.sourceOhms,
    farads: given.farads,
    loadAmps: given.load === 'steady' ? (given.amps ?? 0) : 0,
    loadSiemens: given.load === 'resistor' && given.loadOhms !== null ? 1 / given.loadOhms : 0,
  };
}

function formulaOf(given: Inputs, circuit: ReservoirCircuit, result: SmoothingRippleResult): readonly string[] {
  const { simple, exact } = result;
  const amps = circuit.loadAmps + circuit.loadSiemens * simple.highVolts;
  const lines = [
    `V peak = √2 × ${v(given.secondaryVolts)} − ${v(circuit.dropVolts)} = ${v(simple.highVolts)}`,
    `simple: ${a(amps)} ÷ (${hz(result.rippleHertz)} × ${f(given.farads)}) = ${v(simple.rippleVolts)} peak to peak${simple.rippleVolts > simple.highVolts * 0.2 ? '; more than 20 % of the peak, where the simple formula no longer holds' : ''}`,
    `exact: ${v(exact.rippleVolts)} peak to peak, ${v(exact.lowVolts)} to ${v(exact.highVolts)}, mean ${v(exact.meanVolts)}`,
    `charging: peak ${a(exact.peakDiodeAmps)} for ${formatNumber(exact.conductionShare * 100, 2)} % of the time; ${a(exact.diodeRmsAmps)} r.m.s. in the winding, ${a(exact.capacitorRmsAmps)} r.m.s. in the capacitor`,
  ];
  if (result.oneHalfRippleVolts !== null)
    lines.push(`with one half of the rectifier gone: ${v(result.oneHalfRippleVolts)} peak to peak at ${hz(given.mainsHertz)}`);
  if (result.headroomVolts !== null && given.needVolts !== null)
    lines.push(
      `lowest ${v(exact.lowVolts)} less the ${v(given.needVolts)} needed: ${v(result.headroomVolts)}${result.headroomVolts < 0 ? '; the ripple comes through the regulator' : ''}`,
    );
  if (result.from !== null) lines.push(accusedByFrequency(result.from, circuit.fullWave, given.mainsHertz));
  if (given.readRippleVolts !== null && (result.from === null || result.from === 'one-half' || result.from === 'both-halves')) {
    const expected = result.from === 'one-half' ? (result.oneHalfRippleVolts ?? exact.rippleVolts) : exact.rippleVolts;
    // A load that is never fed leaves no ripple to compare with.
    if (expected > 0) lines.push(accusedBySize(given.readRippleVolts, expected, given.farads));
  }
  return lines;
}

function plotOf(circuit: ReservoirCircuit, simple: SimpleRipple, state: ReservoirState, needVolts: number | null): Plot {
  const period = pulseSeconds(circuit);
  const twice = (pairs: readonly PlotPair[]): readonly PlotPair[] => [...pairs, ...pairs.map(([x, y]): PlotPair => [x + period, y])];
  const sine = (seconds: number): number =>
    Math.max(0, circuit.peakVolts * Math.sin(2 * Math.PI * circuit.mainsHertz * seconds) - circuit.dropVolts);
  return {
    title: 'Volts on the reservoir',
    x: { title: 'Time', unit: 's', scale: 'linear', from: 0, to: 2 * period },
    y: { title: 'Volts', unit: 'V', scale: 'linear', from: 0 },
    curves: [
      { label: 'reservoir', role: 'main', points: twice(state.instants.map(({ seconds, volts }) => [seconds, volts])) },
      { label: 'rectifier', role: 'other', points: twice(state.instants.map(({ seconds }) => [seconds, sine(seconds)])) },
    ],
    points: [],
    bands: [],
    limits: [
      { label: 'lowest by the simple formula', axis: 'y', at: Math.max(0, simple.lowVolts) },
      ...(needVolts === null ? [] : [{ label: 'needed', axis: 'y' as const, at: needVolts }]),
    ],
    words: `The reservoir is charged to ${v(state.highVolts)} at each pulse and falls to ${v(state.lowVolts)} before the next. The simple formula puts the lowest at ${v(simple.lowVolts)}.`,
  };
}

/** Smoothing ripple. */
export const sheet = defineSheet({
  id: 'smoothing-ripple',
  title: 'Smoothing ripple',
  question: 'How much ripple stands on this reservoir, and what does the ripple that I see accuse?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    '1283 μF for 1 V at 12 V, two 0.8 V diodes, 100 Ω, 60 Hz: published worked example',
    '83.3 μF, 2 V, 0.2 rad, 638 mA at 100 V peak, 10 kΩ, 60 Hz: Sedra & Smith, Microelectronic Circuits (from memory)',
    'Transients of bridge, centre-tap and half-wave circuits in ngspice, within 1 %',
  ],
  example: {
    secondaryVolts: 28,
    mainsHertz: 60,
    rectifier: 'bridge',
    sourceOhms: 0.15,
    farads: 22e-3,
    load: 'steady',
    amps: 3.5,
    needVolts: 30,
    readRippleVolts: 1.4,
    readHertz: 120,
  },
  compute(given): SheetAnswer<SmoothingRippleResult> | SheetRefusal {
    const circuit = circuitOf(given);
    if ('ok' in circuit) return circuit;
    const state = settledReservoir(circuit);
    if (state === null) {
      return {
        ok: false,
        field: 'secondaryVolts',
        say: `The peak of ${v(circuit.peakVolts)} must be more than the drop of the diodes, ${v(circuit.dropVolts)}.`,
      };
    }
    const half = circuit.fullWave ? settledReservoir({ ...circuit, fullWave: false }) : null;
    const rippleHertz = 1 / pulseSeconds(circuit);
    const high = circuit.peakVolts - circuit.dropVolts;
    const { instants: _, ...exact } = state;
    const result: SmoothingRippleResult = {
      rippleHertz,
      simple: simpleRipple(high, circuit.loadAmps + circuit.loadSiemens * high, rippleHertz, given.farads),
      exact,
      oneHalfRippleVolts: half?.rippleVolts ?? null,
      headroomVolts: given.needVolts === null ? null : exact.lowVolts - given.needVolts,
      from: given.readHertz === null ? null : rippleFrom(given.readHertz, given.mainsHertz),
    };
    const short = circuit.loadAmps > 0 && exact.lowVolts <= 0 ? ' The load takes more than this source can give.' : '';
    const low = result.headroomVolts !== null && result.headroomVolts < 0 ? ` ${v(-result.headroomVolts)} too low for the regulator.` : '';
    return {
      ok: true,
      result,
      headline: `Ripple ${v(exact.rippleVolts)} peak to peak at ${hz(rippleHertz)}, ${v(exact.lowVolts)} to ${v(exact.highVolts)} (simple formula ${v(result.simple.rippleVolts)}).${low}${short}`,
      formula: formulaOf(given, circuit, result),
      caution,
      validity,
      source,
      plot: plotOf(circuit, result.simple, state, given.needVolts),
    };
  },
});
