/** Switching-regulator expectations: what duty, currents, frequency and ripple a healthy step-down regulator shows, and what happens without its freewheel diode. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { buckCurrents, dutyOf, hystereticHertz, triangleRippleVolts } from '@/shared/workings/buck';
import type { Plot, PlotPair } from '@/shared/workings/plot';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField } from '@/shared/workings/sheet';

const runDownForm = z.strictObject({
  /** Energy in the choke at its peak, ½LI². */
  chokeJoules: z.number(),
  /** Time in which the diode carries the current down to nothing. */
  seconds: z.number(),
  diodeJoules: z.number(),
  /** What goes into the load and its capacitor. */
  loadJoules: z.number(),
  /** Of the falling triangle, ⅓ I² t. */
  ampsSquaredSeconds: z.number(),
});

/** What the freewheel diode has to stand when the switch stops with the choke full. */
export type RunDown = z.output<typeof runDownForm>;

const output = z.strictObject({
  /** False where the choke runs empty in each period. */
  continuous: z.boolean(),
  duty: z.number(),
  /** Share of the period in which the diode conducts. */
  diodeDuty: z.number(),
  /** Peak to peak, in the choke. */
  rippleAmps: z.number(),
  peakAmps: z.number(),
  valleyAmps: z.number(),
  switchAverageAmps: z.number(),
  diodeAverageAmps: z.number(),
  /** Load below which the choke runs empty. */
  emptyBelowAmps: z.number(),
  hertz: z.number(),
  onSeconds: z.number(),
  offSeconds: z.number(),
  diodeWatts: z.number(),
  /** Energy that rushes through switch and diode in each overlap, and its watts. */
  overlapJoules: z.number(),
  overlapWatts: z.number(),
  runDown: runDownForm,
  /** Steady; the hysteretic one has at least its window times the divider. Null where the choke runs empty: the law does not hold. */
  rippleVolts: z.number().nullable(),
  diodeReverseVolts: z.number(),
  /** Average amps divided by the rating; null without one. */
  diodeShare: z.number().nullable(),
  /** With the diode open: energy and watts that the switch must break down with. */
  withoutDiodeWatts: z.number(),
});

/** Result of the sheet; SI, nothing rounded. */
export type SwitchingRegulatorResult = z.output<typeof output>;

const volts = (title: string, description: string, min: number, max: number) => numberField({ title, description, unit: 'V', min, max });

const inputs = z.strictObject({
  inputVolts: volts('Input volts', 'Raw d.c. ahead of the switch, by size', 0.1, 10_000),
  outputVolts: volts('Output volts', 'Of the rail, by size', 0.1, 10_000),
  amps: numberField({ title: 'Output amps', description: 'Load of the rail', unit: 'A', min: 1e-3, max: 1000 }),
  henries: numberField({ title: 'Choke', description: 'Inductance at that current', unit: 'H', min: 1e-7, max: 10 }),
  farads: numberField({ title: 'Output capacitance', description: 'All of it at the output of the choke', unit: 'F', min: 1e-9, max: 10 }),
  esrOhms: numberField({ title: 'ESR', description: 'Of the output capacitance, measured', unit: 'Ω', min: 0, max: 100 }),
  control: choiceField('Control', 'Fixed frequency, or hysteretic: it swings by itself between two thresholds', ['fixed', 'hysteretic']),
  hertz: numberField({ title: 'Frequency', description: 'For a fixed one', unit: 'Hz', min: 10, max: 10e6 }).nullable().default(null),
  windowVolts: numberField({
    title: 'Window',
    description: 'Of the comparator at its own input, for a hysteretic one',
    unit: 'V',
    min: 1e-5,
    max: 10,
  })
    .nullable()
    .default(null),
  divider: numberField({
    title: 'Divider',
    description: 'Output volts divided by volts at the comparator; 1 where a capacitor feeds the ripple forward',
    unit: null,
    min: 1,
    max: 1000,
  }).default(1),
  delaySeconds: numberField({ title: 'Delay', description: 'From the comparator to the switch', unit: 's', min: 0, max: 1e-3 }).default(0),
  switchVolts: volts('Drop when on', 'Of the saturated switch', 0, 10).default(1.5),
  diodeVolts: volts('Diode drop', 'Of the freewheel diode', 0, 5).default(0.9),
  overlapSeconds: numberField({
    title: 'Overlap',
    description: 'Time in which switch and diode conduct together at switch-on: the recovery time of the diode',
    unit: 's',
    min: 0,
    max: 1e-4,
  }).default(200e-9),
  diodeAmps: numberField({ title: 'Diode rating', description: 'Average amps of the freewheel diode', unit: 'A', min: 0.01, max: 1000 })
    .nullable()
    .default(null),
});

type Inputs = z.output<typeof inputs>;

const law = [
  'D = (V out + V diode) ÷ (V in − V on + V diode);  I switch = I × D,  I diode = I × (1 − D) on average',
  'ΔI = (V in − V on − V out) × D ÷ (L × f);  peak = I + ΔI ÷ 2;  below I = ΔI ÷ 2 the choke runs empty in each period',
  'empty: D = √(2 × L × f × I × V down ÷ (V up × (V up + V down))), V up = V in − V on − V out, V down = V out + V diode',
  'hysteretic: f = V out × (V in − V out) × (ESR − t ÷ C) ÷ (V in × (window × divider × L + V in × ESR × t))',
  'ripple = largest swing of ΔI × ESR and charge ÷ C together; ΔI ÷ (8 × f × C) with no ESR, ΔI × ESR with much',
  'overlap at switch-on: E = V in × I valley × t;  switch stops: ½ × L × I peak² goes into the diode and the load as V diode to V out',
  'without the freewheel diode the ½ × L × I peak² of each period breaks the switch down',
];
const validity =
  'Settled, one switch, one diode, one choke that does not saturate. The hysteretic law needs a ripple that comes from the ESR and takes the drops as nothing; makers state ± 30 %. The energy of the overlap is that of the input volts across the valley current; leads and snubbers shape it. Ripple on a scope also has spikes of the edges, which are not in it.';
const source =
  'D and average currents: MC34063A data sheet, formula table; Maniktala, Switching Power Supplies A to Z, appendix 2; TI SLVA477. Hysteretic frequency: LM3475 data sheet, equation 4; TPS5103 data sheet, p. 22. ½LI²: any textbook. ⅓ I² t of a triangle: Littelfuse, Fuseology. Empty choke: worked out from the triangle.';
const caution =
  'A scope earths what its clip touches: the switch of such a supply often stands on the raw or even on the mains side. Clip on dead, behind an isolating transformer with this one load, or use a differential probe. Local codes, the maker’s data and licensed practice come first.';

/**
 * The choke empties through the freewheel diode after the switch has stopped, the output held up by its capacitor.
 * @param peakAmps in the choke at that moment
 */
export function runDown(henries: number, peakAmps: number, outputVolts: number, diodeVolts: number): RunDown {
  const seconds = (henries * peakAmps) / (outputVolts + diodeVolts);
  const coulombs = (peakAmps * seconds) / 2;
  return {
    chokeJoules: (henries * peakAmps * peakAmps) / 2,
    seconds,
    diodeJoules: diodeVolts * coulombs,
    loadJoules: outputVolts * coulombs,
    ampsSquaredSeconds: (peakAmps * peakAmps * seconds) / 3,
  };
}

const v = (value: number): string => formatQuantity(value, 'V', { digits: 3 });
const a = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const w = (value: number): string => formatQuantity(value, 'W', { digits: 3 });
const j = (value: number): string => formatQuantity(value, 'J', { digits: 3 });
const s = (value: number): string => formatQuantity(value, 's', { digits: 3 });
const hz = (value: number): string => formatQuantity(value, 'Hz', { digits: 3 });
const l = (value: number): string => formatQuantity(value, 'H', { digits: 3 });

function hertzOf(given: Inputs): number | SheetRefusal {
  if (given.control === 'fixed') {
    return given.hertz ?? { ok: false, field: 'hertz', say: 'Frequency is missing.' };
  }
  if (given.windowVolts === null) return { ok: false, field: 'windowVolts', say: 'Window is missing.' };
  const hertz = hystereticHertz({ ...given, windowVolts: given.windowVolts });
  if (hertz >= 0.1 && hertz <= 1e9) return hertz;
  if (hertz > 0)
    return {
      ok: false,
      field: 'windowVolts',
      say: 'Window, choke, ESR and delay must be those of one regulator: together they give a frequency that none has.',
    };
  const least = formatQuantity(given.delaySeconds / given.farads, 'Ω', { digits: 3 });
  return {
    ok: false,
    field: 'esrOhms',
    say: `ESR must be more than the delay divided by the capacitance, ${least}: below it the law of the hysteretic regulator does not hold.`,
  };
}

function workOut(given: Inputs, hertz: number): SwitchingRegulatorResult {
  const { inputVolts, outputVolts, amps, henries, farads, esrOhms, diodeVolts } = given;
  const currents = buckCurrents(given, amps, henries, hertz);
  const triangle = currents.continuous ? triangleRippleVolts(currents.rippleAmps, currents.duty, hertz, farads, esrOhms) : null;
  const window = given.control === 'hysteretic' && given.windowVolts !== null ? given.windowVolts * given.divider : 0;
  const overlapJoules = inputVolts * currents.valleyAmps * given.overlapSeconds;
  const emptied = runDown(henries, currents.peakAmps, outputVolts, diodeVolts);
  return {
    ...currents,
    hertz,
    onSeconds: currents.duty / hertz,
    offSeconds: (1 - currents.duty) / hertz,
    diodeWatts: diodeVolts * currents.diodeAverageAmps,
    overlapJoules,
    overlapWatts: overlapJoules * hertz,
    runDown: emptied,
    rippleVolts: triangle === null ? null : Math.max(triangle, window),
    diodeReverseVolts: inputVolts - given.switchVolts,
    diodeShare: given.diodeAmps === null ? null : currents.diodeAverageAmps / given.diodeAmps,
    withoutDiodeWatts: emptied.chokeJoules * hertz,
  };
}

function formulaOf(given: Inputs, result: SwitchingRegulatorResult): readonly string[] {
  const { runDown: down } = result;
  const full = dutyOf(given);
  const lines = [
    `D = (${v(given.outputVolts)} + ${v(given.diodeVolts)}) ÷ (${v(given.inputVolts)} − ${v(given.switchVolts)} + ${v(given.diodeVolts)}) = ${formatNumber(full, 3)}${result.continuous ? '' : `; the choke runs empty below ${a(result.emptyBelowAmps)}, so D = ${formatNumber(result.duty, 3)}`}`,
    `f = ${hz(result.hertz)}${given.control === 'hysteretic' ? ' ± 30 %, it swings by itself' : ''}; on ${s(result.onSeconds)}, off ${s(result.offSeconds)}`,
    `ΔI = (${v(given.inputVolts)} − ${v(given.switchVolts)} − ${v(given.outputVolts)}) × ${formatNumber(result.duty, 3)} ÷ (${l(given.henries)} × ${hz(result.hertz)}) = ${a(result.rippleAmps)}; choke ${a(result.valleyAmps)} to ${a(result.peakAmps)}`,
    `freewheel diode: ${a(result.diodeAverageAmps)} average, ${a(result.peakAmps)} peak, ${w(result.diodeWatts)}, ${v(result.diodeReverseVolts)} reverse${result.diodeShare === null ? '' : `; ${formatNumber(result.diodeShare * 100, 3)} % of its rating`}`,
    result.rippleVolts === null
      ? 'output ripple: the choke runs empty, and the law of the triangle does not hold; expect bursts'
      : `output ripple: ${a(result.rippleAmps)} into ${formatQuantity(given.farads, 'F', { digits: 3 })} with ${formatQuantity(given.esrOhms, 'Ω', { digits: 3 })} = ${v(result.rippleVolts)} peak to peak`,
    `overlap: ${v(given.inputVolts)} × ${a(result.valleyAmps)} × ${s(given.overlapSeconds)} = ${j(result.overlapJoules)} at each switch-on, ${w(result.overlapWatts)} for switch and diode together`,
    `switch stops: ½ × ${l(given.henries)} × ${a(result.peakAmps)}² = ${j(down.chokeJoules)} run down in ${s(down.seconds)}; ${j(down.diodeJoules)} in the diode, ${formatQuantity(down.ampsSquaredSeconds, 'A²s', { digits: 3 })}`,
    `without the freewheel diode: ${j(down.chokeJoules)} × ${hz(result.hertz)} = ${w(result.withoutDiodeWatts)} break the switch down; it does not live long`,
  ];
  return lines;
}

function headlineOf(result: SwitchingRegulatorResult): string {
  const ripple = result.rippleVolts === null ? '' : `, ripple ${v(result.rippleVolts)}`;
  const over = result.diodeShare !== null && result.diodeShare > 1 ? ' The diode is too small for this.' : '';
  const empty = result.continuous ? '' : ` The choke runs empty below ${a(result.emptyBelowAmps)}.`;
  return `Duty ${formatNumber(result.duty, 3)} at ${hz(result.hertz)}; freewheel diode ${a(result.diodeAverageAmps)} average, ${a(result.peakAmps)} peak${ripple}.${empty}${over}`;
}

function plotOf(given: Inputs, result: SwitchingRegulatorResult): Plot {
  const period = 1 / result.hertz;
  const on = result.onSeconds;
  const end = on + result.diodeDuty * period;
  const one: readonly PlotPair[] = [
    [0, result.valleyAmps],
    [on, result.peakAmps],
    [end, result.valleyAmps],
    ...(result.continuous ? [] : [[period, 0] as const]),
  ];
  const choke = [...one, ...one.slice(1).map(([x, y]): PlotPair => [x + period, y])];
  return {
    title: 'Current in the choke over two periods',
    x: { title: 'Time', unit: 's', scale: 'linear', from: 0, to: 2 * period },
    y: { title: 'Current', unit: 'A', scale: 'linear', from: 0 },
    curves: [{ label: 'choke', role: 'main', points: choke }],
    points: [{ label: `peak ${a(result.peakAmps)}`, x: on, y: result.peakAmps, role: 'answer' }],
    bands: [],
    limits: [{ label: `load ${a(given.amps)}`, axis: 'y', at: given.amps }],
    words: `While the switch is on the current rises from ${a(result.valleyAmps)} to ${a(result.peakAmps)}; then it falls through the freewheel diode${result.continuous ? '' : ' to nothing and rests there'}. Its average is the load, ${a(given.amps)}.`,
  };
}

/** Switching-regulator expectations. */
export const sheet = defineSheet({
  id: 'switching-regulator',
  title: 'Switching regulator',
  question: 'What should this step-down switching regulator show when it is healthy?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'Duty 0.221 and diode 0.389 A at 25 V to 5 V, 0.5 A: TI SLVA477',
    'Ratio, duty, choke and capacitor of the step-down column: MC34063A data sheet, formula table',
    'About 122 kHz: TPS5103 data sheet, p. 22; ripple 26.6 mV: LM3485 data sheet, equation 3',
    'Choke of 0.25 to 1.75 A and ripple 0.469 %: Hart, Power Electronics, example 6-1 (from memory)',
  ],
  example: {
    inputVolts: 39,
    outputVolts: 5,
    amps: 17,
    henries: 200e-6,
    farads: 10e-3,
    esrOhms: 0.01,
    control: 'fixed',
    hertz: 20e3,
    diodeAmps: 30,
  },
  compute(given): SheetAnswer<SwitchingRegulatorResult> | SheetRefusal {
    if (given.outputVolts + given.switchVolts > given.inputVolts * 0.999) {
      return {
        ok: false,
        field: 'outputVolts',
        say: `Output volts must be less than the input volts less the drop of the switch, ${v(given.inputVolts - given.switchVolts)}.`,
      };
    }
    const hertz = hertzOf(given);
    if (typeof hertz !== 'number') return hertz;
    const result = workOut(given, hertz);
    return {
      ok: true,
      result,
      headline: headlineOf(result),
      formula: formulaOf(given, result),
      caution,
      validity,
      source,
      plot: plotOf(given, result),
    };
  },
});
