/** Pass-element heat and "is it switching?": what it burns as a linear and as a switching regulator, and how two currents tell which it is. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { dutyOf } from '@/shared/workings/buck';
import type { Plot } from '@/shared/workings/plot';
import { sampleCurve } from '@/shared/workings/plot';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField } from '@/shared/workings/sheet';
import type { SwitchingVerdict } from '@/shared/workings/switchingVerdict';
import { judgeSwitching, SWITCHING_WORDS } from '@/shared/workings/switchingVerdict';
import { mostSinkToAir, settledTemperatures } from '@/shared/workings/thermal';

const loss = z.strictObject({
  inputAmps: z.number(),
  inputWatts: z.number(),
  /** In the pass device or devices, all together. */
  deviceWatts: z.number(),
  /** In the freewheel diode; 0 for a linear one. */
  diodeWatts: z.number(),
  /** Share of the input that reaches the load, 0 to 1. */
  efficiency: z.number(),
});

/** What one way of regulating costs. */
export type PassLoss = z.output<typeof loss>;

const output = z.strictObject({
  outputWatts: z.number(),
  linear: loss,
  /** Null where the input less the drop when on does not reach the output. */
  switching: loss.extend({ duty: z.number() }).nullable(),
  /** Of one device, in the style that the sheet was asked about. */
  watts: z.number(),
  temperatures: z.strictObject({ junction: z.number(), case: z.number(), sink: z.number() }),
  tooHot: z.boolean(),
  /** Most K/W of the heatsink; below zero when no heatsink does it, null when there is no heat. */
  mostSinkToAir: z.number().nullable(),
  verdict: z
    .strictObject({
      is: z.enum(['switching', 'not-switching', 'between', 'cannot-tell', 'takes-more', 'impossible']),
      /** Amps in for each amp out. */
      ratio: z.number(),
      /** What a loss-free switching regulator would show. */
      ideal: z.number(),
      /** Efficiency that the ratio stands for, where it can be a switching one. */
      efficiency: z.number(),
      /** Ohms behind which the rail sags between the two loads; null without a light load or its volts. */
      sagOhms: z.number().nullable(),
      formula: z.string(),
    })
    .nullable(),
});

/** Result of the sheet; SI and °C, nothing rounded. */
export type PassElementResult = z.output<typeof output>;

const inputs = z.strictObject({
  inputVolts: numberField({
    title: 'Input volts',
    description: 'Raw d.c. ahead of the pass device, by size',
    unit: 'V',
    min: 0.01,
    max: 10_000,
  }),
  outputVolts: numberField({ title: 'Output volts', description: 'Of the rail, by size', unit: 'V', min: 0.01, max: 10_000 }),
  amps: numberField({ title: 'Output amps', description: 'Load of the rail', unit: 'A', min: 1e-6, max: 1000 }),
  style: choiceField('Works as', 'How it is meant to work; the temperatures are for this', ['linear', 'switching']),
  standingAmps: numberField({
    title: 'Standing amps',
    description: 'What the regulator itself and a bleeder draw from the input',
    unit: 'A',
    min: 0,
    max: 100,
  }).default(0),
  switchVolts: numberField({
    title: 'Drop when on',
    description: 'Of the saturated pass device, when switching',
    unit: 'V',
    min: 0,
    max: 10,
  }).default(1.5),
  diodeVolts: numberField({
    title: 'Diode drop',
    description: 'Of the freewheel diode, when switching',
    unit: 'V',
    min: 0,
    max: 5,
  }).default(0.9),
  hertz: numberField({ title: 'Frequency', description: 'Of the switch', unit: 'Hz', min: 0, max: 10e6 }).default(20e3),
  edgeSeconds: numberField({
    title: 'Edges',
    description: 'Rise and fall time of the switch together',
    unit: 's',
    min: 0,
    max: 1e-3,
  }).default(2e-6),
  alike: numberField({
    title: 'Devices',
    description: 'Alike and in parallel on one heatsink, sharing evenly',
    unit: null,
    min: 1,
    max: 64,
  }).default(1),
  junctionToCase: numberField({
    title: 'Junction to case',
    description: 'Kelvin per watt, of one device (data sheet)',
    unit: null,
    min: 0,
    max: 1000,
  }).default(1.5),
  caseToSink: numberField({
    title: 'Case to heatsink',
    description: 'Kelvin per watt, washer and paste',
    unit: null,
    min: 0,
    max: 1000,
  }).default(0.5),
  sinkToAir: numberField({
    title: 'Heatsink to air',
    description: 'Kelvin per watt, with the fan as it runs today',
    unit: null,
    min: 0,
    max: 1000,
  }).default(1),
  ambient: numberField({ title: 'Air', description: 'At the heatsink', unit: '°C', min: -40, max: 85 }).default(35),
  junctionLimit: numberField({
    title: 'Junction limit',
    description: 'Of the data sheet: silicon 125 to 200 °C, germanium 85 to 100 °C',
    unit: '°C',
    min: 50,
    max: 250,
  }).default(150),
  readInputAmps: numberField({
    title: 'Read: input amps',
    description: 'Average d.c. amps from the raw supply, read at the output amps above',
    unit: 'A',
    min: 0,
    max: 1000,
  })
    .nullable()
    .default(null),
  lightOutputAmps: numberField({
    title: 'Light load: output amps',
    description: 'A second reading at a lighter load makes the answer sure',
    unit: 'A',
    min: 0,
    max: 1000,
  })
    .nullable()
    .default(null),
  lightInputAmps: numberField({
    title: 'Light load: input amps',
    description: 'Average d.c. amps from the raw supply at the light load',
    unit: 'A',
    min: 0,
    max: 1000,
  })
    .nullable()
    .default(null),
  lightOutputVolts: numberField({
    title: 'Light load: output volts',
    description: 'Of the rail at the light load',
    unit: 'V',
    min: 0,
    max: 10_000,
  })
    .nullable()
    .default(null),
});

type Inputs = z.output<typeof inputs>;

const law = [
  'linear: P = (V in − V out) × I + V in × I standing;  I in = I + I standing',
  'switching: D = (V out + V diode) ÷ (V in − V on + V diode);  I in = I × D + losses of the edges ÷ V in + I standing',
  'switching: P = V on × I × D + ½ × V in × I × t edges × f + V in × I standing;  P diode = V diode × I × (1 − D)',
  'T sink = T air + P all × K/W sink;  T junction = T sink + P one × (K/W case–sink + K/W junction–case)',
  'is it switching: (I in − I in light) ÷ (I − I light) is 1 for a linear regulator and V out ÷ (V in × efficiency) for a switching one',
];
const validity =
  'Settled d.c. and settled heat. The input amps must be the average: read them ahead of the reservoir choke or with a meter that averages, not with one that shows peaks. Devices in parallel share evenly only with their ballast resistors good. Where V out is more than 0.7 of V in the two currents lie too close to tell, and a scope at the choke must. Defaults of drops, edges and K/W are typical for old bipolar devices: common practice, no source.';
const source =
  'P = (V in − V out) × I and the row of thermal resistances: any data sheet of a regulator. D: MC34063A data sheet, formula table; average currents of switch and diode: Maniktala, Switching Power Supplies A to Z, appendix 2. Two currents as the test of switching: common practice, no source.';
const caution =
  'Heatsinks and device cases may be live at the raw volts and hot enough to burn: read, do not touch. Old power devices may hold beryllium oxide: never file or break them. Local codes, the maker’s data and licensed practice come first.';

/** Losses as a linear regulator. */
export function linearLoss(inputVolts: number, outputVolts: number, amps: number, standingAmps = 0): PassLoss {
  const inputAmps = amps + standingAmps;
  const inputWatts = inputVolts * inputAmps;
  const outputWatts = outputVolts * amps;
  return {
    inputAmps,
    inputWatts,
    deviceWatts: (inputVolts - outputVolts) * amps + inputVolts * standingAmps,
    diodeWatts: 0,
    efficiency: outputWatts / inputWatts,
  };
}

type SwitchingInputs = Pick<
  Inputs,
  'inputVolts' | 'outputVolts' | 'amps' | 'standingAmps' | 'switchVolts' | 'diodeVolts' | 'hertz' | 'edgeSeconds'
>;

/** Losses as a switching regulator whose choke never runs empty; the choke's own are left out. */
export function switchingLoss(given: SwitchingInputs): PassLoss & { readonly duty: number } {
  const { inputVolts, outputVolts, amps, standingAmps, switchVolts, diodeVolts, hertz, edgeSeconds } = given;
  const duty = dutyOf(given);
  const edgeWatts = (inputVolts * amps * edgeSeconds * hertz) / 2;
  const deviceWatts = switchVolts * amps * duty + edgeWatts + inputVolts * standingAmps;
  const diodeWatts = diodeVolts * amps * (1 - duty);
  const inputAmps = amps * duty + edgeWatts / inputVolts + standingAmps;
  const inputWatts = inputVolts * inputAmps;
  return { duty, inputAmps, inputWatts, deviceWatts, diodeWatts, efficiency: (outputVolts * amps) / inputWatts };
}

const v = (value: number): string => formatQuantity(value, 'V', { digits: 3 });
const a = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const w = (value: number): string => formatQuantity(value, 'W', { digits: 3 });
const c = (value: number): string => formatQuantity(Math.round(value), '°C', { digits: 6 });
const kw = (value: number): string => `${formatNumber(value, 3)} K/W`;

function formulaOf(given: Inputs, result: PassElementResult): readonly string[] {
  const { linear, switching, temperatures, verdict } = result;
  const standing = given.standingAmps === 0 ? '' : ` + ${v(given.inputVolts)} × ${a(given.standingAmps)}`;
  const lines = [
    `linear: (${v(given.inputVolts)} − ${v(given.outputVolts)}) × ${a(given.amps)}${standing} = ${w(linear.deviceWatts)}; ${a(linear.inputAmps)} in, efficiency ${formatNumber(linear.efficiency * 100, 2)} %`,
    ...(switching === null
      ? [`switching: ${v(given.inputVolts)} less ${v(given.switchVolts)} does not reach ${v(given.outputVolts)}`]
      : [
          `D = (${v(given.outputVolts)} + ${v(given.diodeVolts)}) ÷ (${v(given.inputVolts)} − ${v(given.switchVolts)} + ${v(given.diodeVolts)}) = ${formatNumber(switching.duty, 3)}`,
          `switching: device ${w(switching.deviceWatts)}, diode ${w(switching.diodeWatts)}; ${a(switching.inputAmps)} in, efficiency ${formatNumber(switching.efficiency * 100, 2)} %`,
        ]),
    `each of ${formatNumber(given.alike)} as ${given.style}: ${w(result.watts)}; heatsink ${c(temperatures.sink)}, case ${c(temperatures.case)}, junction ${c(temperatures.junction)} (limit ${c(given.junctionLimit)})`,
  ];
  if (result.mostSinkToAir !== null)
    lines.push(
      result.mostSinkToAir > 0
        ? `heatsink that holds the limit: ${kw(result.mostSinkToAir)} or less`
        : 'no heatsink holds the limit: fewer watts or more devices',
    );
  if (verdict !== null) lines.push(verdict.formula);
  return lines;
}

function headlineOf(given: Inputs, result: PassElementResult): string {
  const hot = `junction ${c(result.temperatures.junction)}${result.tooHot ? `, above its limit of ${c(given.junctionLimit)}` : ''}`;
  const both = result.switching === null ? '' : `, ${w(result.switching.deviceWatts)} as switching`;
  const heat = `${w(result.linear.deviceWatts)} as linear${both}; as ${given.style} ${hot}`;
  return result.verdict === null ? `${heat}.` : `${SWITCHING_WORDS[result.verdict.is]}. ${heat}.`;
}

function plotOf(given: Inputs, result: PassElementResult): Plot {
  const most = given.amps * 1.25;
  const { switching } = result;
  const watts = given.style === 'linear' || switching === null ? result.linear.deviceWatts : switching.deviceWatts;
  return {
    title: 'Heat in the pass device',
    x: { title: 'Load', unit: 'A', scale: 'linear', from: 0, to: most },
    y: { title: 'Heat', unit: 'W', scale: 'linear', from: 0 },
    curves: [
      {
        label: 'linear',
        role: given.style === 'linear' ? 'main' : 'other',
        points: sampleCurve(
          (amps) => linearLoss(given.inputVolts, given.outputVolts, amps, given.standingAmps).deviceWatts,
          0,
          most,
          'linear',
          3,
        ),
      },
      ...(switching === null
        ? []
        : [
            {
              label: 'switching',
              role: given.style === 'switching' ? ('main' as const) : ('other' as const),
              points: sampleCurve((amps) => switchingLoss({ ...given, amps }).deviceWatts, 0, most, 'linear', 3),
            },
          ]),
    ],
    points: [{ label: w(watts), x: given.amps, y: watts, role: 'answer' }],
    bands: [],
    limits: [],
    words: `Heat rises straight with the load. At ${a(given.amps)} a linear regulator turns ${w(result.linear.deviceWatts)} into heat${switching === null ? '' : ` and a switching one ${w(switching.deviceWatts)}`}.`,
  };
}

function verdictOf(given: Inputs, switching: PassLoss | null): SwitchingVerdict | SheetRefusal | null {
  const { readInputAmps, lightInputAmps, lightOutputAmps, lightOutputVolts } = given;
  if (readInputAmps === null) {
    if (lightInputAmps === null && lightOutputAmps === null) return null;
    return { ok: false, field: 'readInputAmps', say: 'Read: input amps are missing: they must be read at the heavier load too.' };
  }
  if ((lightInputAmps === null) !== (lightOutputAmps === null)) {
    const field = lightInputAmps === null ? 'lightInputAmps' : 'lightOutputAmps';
    return { ok: false, field, say: 'A light load needs both its input amps and its output amps; one is missing.' };
  }
  if (lightOutputAmps !== null && lightOutputAmps >= given.amps * 0.9) {
    return { ok: false, field: 'lightOutputAmps', say: `The light load must be lighter: less than 90 % of ${a(given.amps)}.` };
  }
  const light =
    lightInputAmps === null || lightOutputAmps === null
      ? null
      : { inputAmps: lightInputAmps, outputAmps: lightOutputAmps, outputVolts: lightOutputVolts };
  return judgeSwitching({ ...given, readInputAmps, light }, switching === null ? null : switching.inputAmps - given.standingAmps);
}

/** Pass-element heat and "is it switching?". */
export const sheet = defineSheet({
  id: 'pass-element',
  title: 'Pass-element heat',
  question: 'How hot does the pass device get, and is this regulator switching at all?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    '39 V to 5 V at 17 A: 578 W as linear, duty near 0.13: common practice, no source',
    '12 V to 5 V at 0.5 A over 5 + 1 + 10 K/W: 3.5 W and 81 °C, published worked example',
    'Heatsink of 26.07 K/W for 3.5 W, 125 °C, 25 °C, 2 + 0.5 K/W: published worked example',
    'D = 0.5 at an input of 2 × V out + V on + V diode: Maniktala, Switching Power Supplies A to Z, appendix 2',
  ],
  example: { inputVolts: 39, outputVolts: 5, amps: 17, style: 'switching', readInputAmps: 3.1 },
  compute(given): SheetAnswer<PassElementResult> | SheetRefusal {
    if (given.outputVolts > given.inputVolts * 0.999) {
      return { ok: false, field: 'outputVolts', say: `Output volts must be less than the input volts, ${v(given.inputVolts)}.` };
    }
    const reached = switchingLoss(given);
    // A duty of one is no switching any more; more than one is an output that cannot be reached.
    const switching = reached.duty > 0 && reached.duty <= 0.999 ? reached : null;
    if (switching === null && given.style === 'switching') {
      return {
        ok: false,
        field: 'switchVolts',
        say: `Drop when on must be less than ${v(given.inputVolts - given.outputVolts)}, or switching does not reach ${v(given.outputVolts)} from ${v(given.inputVolts)}.`,
      };
    }
    const linear = linearLoss(given.inputVolts, given.outputVolts, given.amps, given.standingAmps);
    const verdict = verdictOf(given, switching);
    if (verdict !== null && 'ok' in verdict) return verdict;
    const watts = (switching === null || given.style === 'linear' ? linear : switching).deviceWatts / given.alike;
    const temperatures = settledTemperatures(watts, given, given.ambient, given.alike);
    const result: PassElementResult = {
      outputWatts: given.outputVolts * given.amps,
      linear,
      switching,
      watts,
      temperatures,
      tooHot: temperatures.junction > given.junctionLimit,
      mostSinkToAir: watts > 1e-9 ? mostSinkToAir(watts, given, given.ambient, given.junctionLimit, given.alike) : null,
      verdict,
    };
    return {
      ok: true,
      result,
      headline: headlineOf(given, result),
      formula: formulaOf(given, result),
      caution,
      validity,
      source,
      plot: plotOf(given, result),
    };
  },
});
