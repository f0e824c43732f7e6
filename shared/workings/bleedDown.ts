/** Bleed-down: what a capacitor holds, and how long until it is safe to touch. */
import { z } from 'zod';

import { formatDuration, formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import {
  chooseResistor,
  energyJoules,
  JOULES_PER_WATT,
  judgeResistor,
  needsDischarge,
  PEAK_OVERLOAD,
  resistorChoice,
  resistorVerdict,
  secondsToFall,
} from '@/shared/workings/discharge';
import type { Plot } from '@/shared/workings/plot';
import { sampleCurve } from '@/shared/workings/plot';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField, rowsField, textField } from '@/shared/workings/sheet';
import {
  CHARGE_LIMITS,
  DEAD_VOLTS,
  HARMLESS_COULOMBS,
  REBOUND_KINDS,
  REBOUND_SHARES,
  TOUCH_LIMITS,
  voltsAtLimit,
} from '@/shared/workings/touchLimits';

const furtherCapacitor = z.strictObject({
  name: z.string(),
  joules: z.number(),
  worstSeconds: z.number(),
  /** What the tool swallows, worst case. */
  toolJoules: z.number(),
  toolVerdict: resistorVerdict,
  needsDischarge: z.boolean(),
});

/** A further capacitor, discharged after the first with the same tool. */
export type FurtherCapacitor = z.output<typeof furtherCapacitor>;

const output = z.strictObject({
  joules: z.number(),
  worstJoules: z.number(),
  coulombs: z.number(),
  ohms: z.number(),
  timeConstantSeconds: z.number(),
  secondsToSafe: z.number(),
  worstSecondsToSafe: z.number(),
  /** Through the bleeder alone, worst case; null without one. */
  bleederSeconds: z.number().nullable(),
  toolPeakWatts: z.number().nullable(),
  toolPeakAmps: z.number().nullable(),
  toolJoules: z.number().nullable(),
  /** Over the time to safe, worst case; null without a tool or without a wait. */
  toolAverageWatts: z.number().nullable(),
  toolVerdict: resistorVerdict,
  suggestion: resistorChoice.nullable(),
  reboundVolts: z.number(),
  thresholds: z.array(
    z.strictObject({
      limit: z.strictObject({ volts: z.number(), name: z.string(), withinSeconds: z.number().nullable() }),
      worstSeconds: z.number(),
    }),
  ),
  chargeThresholds: z.array(
    z.strictObject({
      limit: z.strictObject({ name: z.string(), coulombs: z.number().nullable(), joules: z.number().nullable() }),
      volts: z.number(),
      worstSeconds: z.number(),
    }),
  ),
  others: z.array(furtherCapacitor),
  /** All capacitors together, one after the other. */
  allJoules: z.number(),
  allSeconds: z.number(),
  /** Whether it must be discharged through a resistor before it is proved dead. */
  needsDischarge: z.boolean(),
});

/** Result of the sheet; SI, nothing rounded, worst case means capacitor and resistors at their upper tolerance. */
export type BleedDownResult = z.output<typeof output>;

const further = z.strictObject({
  name: textField('Name', 'As on the drawing', 40),
  farads: numberField({ title: 'Capacitance', description: 'As marked', unit: 'F', min: 1e-12, max: 10 }),
  volts: numberField({ title: 'Volts', description: 'D.c. volts on it at the start', unit: 'V', min: 0.1, max: 30_000 }),
  bleederOhms: numberField({
    title: 'Bleeder',
    description: 'Across it, measured today; empty for none',
    unit: 'Ω',
    min: 0.1,
    max: 1e9,
  })
    .nullable()
    .default(null),
});

const inputs = z.strictObject({
  farads: numberField({
    title: 'Capacitance',
    description: 'As marked; for capacitors in parallel their sum',
    unit: 'F',
    min: 1e-12,
    max: 10,
  }),
  volts: numberField({
    title: 'Volts',
    description: 'D.c. volts on it at the start; when not measured, the most that the circuit can put there',
    unit: 'V',
    min: 0.1,
    max: 30_000,
  }),
  safeVolts: numberField({
    title: 'Safe volts',
    description: 'Volts to come down to; 5 V counts as dead here',
    unit: 'V',
    min: 0.1,
    max: 60,
  }).default(DEAD_VOLTS),
  bleederOhms: numberField({
    title: 'Bleeder',
    description: 'Fitted bleeder resistor, measured today; empty for none or not sure',
    unit: 'Ω',
    min: 0.1,
    max: 1e9,
  })
    .nullable()
    .default(null),
  toolOhms: numberField({
    title: 'Tool resistor',
    description: 'Discharge resistor in your hand; empty for none',
    unit: 'Ω',
    min: 0.1,
    max: 1e9,
  })
    .nullable()
    .default(null),
  toolWatts: numberField({
    title: 'Tool watts',
    description: 'Rated watts of the tool resistor, wire-wound',
    unit: 'W',
    min: 0.1,
    max: 1000,
  }).default(10),
  tolerancePercent: numberField({
    title: 'Tolerance',
    description: 'How far the capacitance may be above its marking; 50 % for old electrolytics unless marked',
    unit: '%',
    min: 0,
    max: 200,
  }).default(50),
  resistorTolerancePercent: numberField({
    title: 'Resistor tolerance',
    description: 'How far bleeder and tool may be above their value; old ones drift up, so measure them',
    unit: '%',
    min: 0,
    max: 100,
  }).default(5),
  kind: choiceField('Kind', 'What the capacitor is made of, for how far it comes back', REBOUND_KINDS).default('electrolytic'),
  others: rowsField({
    title: 'Further capacitors',
    description: 'Others of the machine, discharged one after the other with the same tool; those in parallel are one',
    rowName: 'capacitor',
    row: further,
    fewest: 0,
    most: 24,
  }).default([]),
});

const law = [
  'E = ½ × C × V²,  Q = C × V',
  'R = bleeder in parallel with tool,  τ = R × C',
  't = τ × ln(V ÷ V safe); worst case with C and R at their upper tolerance',
  'harmless charge: V = Q ÷ C or √(2 × E ÷ C), and the time to there',
  'rebound: up to 15 % of V for an electrolytic, 5 % paper, 2.5 % ceramic, 2 % film',
  'P peak = V² ÷ R tool; the tool takes E × R ÷ R tool of the energy',
  'a wire-wound resistor stands P peak up to its watts for ever, or up to 10 × its watts if it swallows no more than 25 J a watt in one pulse',
];
const validity =
  'A capacitor that still is one, discharged through resistors alone. An open bleeder discharges nothing: measure it. The pulse rule is for wire-wound resistors, cold at the start, once and then left to cool; carbon, film and wire-wound parts in cases differ, and the maker’s figure comes first. Mind the resistor’s rated volts too.';
const source =
  'E = ½CV² and V = V₀·e^(−t/RC): any textbook. Touch limits as named in the answer. Pulse rule: common practice, no source. Rebound (dielectric absorption): electrolytic up to 15 %, films 1 to 2 % at most, public encyclopaedia; ceramic up to 2.5 %, WIMA, technical information; paper 5 %, from memory.';
const caution =
  'A charged capacitor can kill and burns. All sources out first; insulated probes, one hand, eye protection; through a resistor and never with a bare tool. Measure afterwards, wait, measure again, and leave the link on: charge comes back by itself. Local codes, the maker’s data and licensed practice come first.';

const v = (value: number): string => formatQuantity(value, 'V', { digits: 3 });
const f = (value: number): string => formatQuantity(value, 'F', { digits: 3 });
const r = (value: number): string => formatQuantity(value, 'Ω', { digits: 3 });
const j = (value: number): string => formatQuantity(value, 'J', { digits: 3 });
const w = (value: number): string => formatQuantity(value, 'W', { digits: 3 });

function verdictLine(result: BleedDownResult, toolWatts: number): string | null {
  const { toolVerdict, toolPeakWatts, toolJoules } = result;
  if (toolPeakWatts === null || toolJoules === null) return null;
  if (toolVerdict === 'continuous') return `${w(toolPeakWatts)} is within the tool’s ${w(toolWatts)}: it stands it for ever`;
  const rule = `10 × ${w(toolWatts)} = ${w(PEAK_OVERLOAD * toolWatts)} and 25 J/W × ${w(toolWatts)} = ${j(JOULES_PER_WATT * toolWatts)} (common practice, no source)`;
  return `${w(toolPeakWatts)} and ${j(toolJoules)} against ${rule}: ${toolVerdict === 'pulse' ? 'stands it once, then let it cool' : 'too small for this'}`;
}

type Inputs = z.output<typeof inputs>;
interface Discharged {
  readonly farads: number;
  readonly volts: number;
  readonly bleederOhms: number | null;
}

const parallel = (one: number | null, two: number | null): number => 1 / ((one === null ? 0 : 1 / one) + (two === null ? 0 : 1 / two));

function furtherOf(given: Inputs, { name, ...one }: Discharged & { readonly name: string }): FurtherCapacitor {
  const { toolOhms } = given;
  const ohms = parallel(one.bleederOhms, toolOhms);
  const worstFarads = one.farads * (1 + given.tolerancePercent / 100);
  const worstJoules = energyJoules(worstFarads, one.volts);
  return {
    name,
    joules: energyJoules(one.farads, one.volts),
    worstSeconds: secondsToFall(worstFarads, ohms * (1 + given.resistorTolerancePercent / 100), one.volts, given.safeVolts),
    toolJoules: toolOhms === null ? 0 : (worstJoules * ohms) / toolOhms,
    toolVerdict:
      toolOhms === null ? 'none' : judgeResistor((one.volts * one.volts) / toolOhms, (worstJoules * ohms) / toolOhms, given.toolWatts),
    needsDischarge: needsDischarge(worstFarads, one.volts),
  };
}

function plotOf(given: Inputs, result: BleedDownResult): Plot | undefined {
  const { volts, safeVolts } = given;
  const end = result.worstSecondsToSafe;
  if (!(end > 0)) return undefined;
  const falling = (tau: number) => (seconds: number) => volts * Math.exp(-seconds / tau);
  const worst = end / Math.log(volts / safeVolts);
  return {
    title: 'Volts while it discharges',
    x: { title: 'Time', unit: 's', scale: 'linear', from: 0, to: end },
    y: { title: 'Volts', unit: 'V', scale: 'log', to: volts },
    curves: [
      { label: 'worst case', role: 'bound', points: sampleCurve(falling(worst), 0, end, 'linear', 2) },
      { label: 'as marked', role: 'main', points: sampleCurve(falling(result.timeConstantSeconds), 0, result.secondsToSafe, 'linear', 2) },
    ],
    points: [{ label: formatDuration(end), x: end, y: safeVolts, role: 'answer' }],
    bands: [],
    limits: [
      ...[...new Set(TOUCH_LIMITS.map((limit) => limit.volts))]
        .filter((limit) => limit < volts && limit > safeVolts)
        .map((limit) => ({ label: v(limit), axis: 'y' as const, at: limit })),
      { label: `safe, ${v(safeVolts)}`, axis: 'y', at: safeVolts },
    ],
    words: `On a logarithmic scale the volts fall in a straight line from ${v(volts)} to ${v(safeVolts)}, as marked within ${formatDuration(result.secondsToSafe)}, at worst within ${formatDuration(end)}.`,
  };
}

function headlineOf(given: Inputs, result: BleedDownResult): string {
  const time =
    result.worstSecondsToSafe === 0
      ? `already at or below ${v(given.safeVolts)}`
      : `${formatDuration(result.worstSecondsToSafe)} to ${v(given.safeVolts)}, worst case`;
  const { suggestion } = result;
  const better =
    suggestion === null
      ? 'Discharge it in stages with a proper discharge set.'
      : `Take ${r(suggestion.ohms)}, ${w(suggestion.watts)}, wire-wound.`;
  const tool = result.toolVerdict === 'too-small' ? ` The tool resistor is too small. ${better}` : '';
  const small = result.others.filter(({ toolVerdict }) => toolVerdict === 'too-small').map(({ name }) => name);
  const heat = result.others.reduce((sum, one) => sum + one.toolJoules, result.toolJoules ?? 0);
  const cool = result.others.length > 0 && heat > JOULES_PER_WATT * given.toolWatts ? ' Let the tool cool between them.' : '';
  const others =
    result.others.length === 0
      ? ''
      : ` All ${formatNumber(result.others.length + 1)}: ${j(result.allJoules)}, ${formatDuration(result.allSeconds)} one after the other.${small.length === 0 ? '' : ` Too small for ${small.join(', ')}.`}${cool}`;
  return `${j(result.joules)}: ${time}.${tool}${others}`;
}

function formulaOf(given: Inputs, result: BleedDownResult): readonly string[] {
  const { farads, volts, safeVolts, tolerancePercent } = given;
  const lines = [
    `E = ½ × ${f(farads)} × ${v(volts)}² = ${j(result.joules)}; at +${formatNumber(tolerancePercent)} % ${j(result.worstJoules)}`,
    `Q = ${f(farads)} × ${v(volts)} = ${formatQuantity(result.coulombs, 'C', { digits: 3 })}${result.coulombs <= HARMLESS_COULOMBS ? ' (45 μC or less)' : ''}`,
    `τ = ${r(result.ohms)} × ${f(farads)} = ${formatDuration(result.timeConstantSeconds)}`,
    `t = ${formatDuration(result.timeConstantSeconds)} × ln(${v(volts)} ÷ ${v(safeVolts)}) = ${formatDuration(result.secondsToSafe)}; at +${formatNumber(tolerancePercent)} % and R +${formatNumber(given.resistorTolerancePercent)} % ${formatDuration(result.worstSecondsToSafe)}`,
  ];
  if (result.bleederSeconds !== null && given.toolOhms !== null)
    lines.push(`through the bleeder alone: ${formatDuration(result.bleederSeconds)}`);
  const tool = verdictLine(result, given.toolWatts);
  if (tool !== null) lines.push(tool);
  if (result.toolAverageWatts !== null && result.toolPeakWatts !== null)
    lines.push(`tool: ${w(result.toolPeakWatts)} at the first moment, ${w(result.toolAverageWatts)} on average`);
  const { suggestion } = result;
  if (suggestion !== null)
    lines.push(
      `E24: ${r(suggestion.ohms)}, ${w(suggestion.watts)} wire-wound does it alone in ${formatDuration(suggestion.secondsToSafe)}, worst case`,
    );
  const back = result.reboundVolts > safeVolts ? `, above ${v(safeVolts)}: wait, read, discharge again` : ': wait, read again';
  lines.push(`rebound: may come back to ${v(result.reboundVolts)}${back}, leave the link on`);
  for (const { limit, worstSeconds } of result.thresholds) {
    const time = worstSeconds === 0 ? 'below it from the start' : `after ${formatDuration(worstSeconds)}`;
    const { withinSeconds } = limit;
    const met =
      withinSeconds === null
        ? ''
        : `; that standard wants ${formatDuration(withinSeconds)}: ${worstSeconds <= withinSeconds ? 'met' : 'not met'}`;
    lines.push(`${v(limit.volts)} (${limit.name}): ${time}${met}`);
  }
  for (const { limit, volts: at, worstSeconds } of result.chargeThresholds) {
    const held = limit.coulombs === null ? j(limit.joules ?? 0) : formatQuantity(limit.coulombs, 'C', { digits: 3 });
    lines.push(
      `${held} (${limit.name}): ${worstSeconds === 0 ? 'below it from the start' : `at ${v(at)}, after ${formatDuration(worstSeconds)}`}`,
    );
  }
  for (const one of result.others)
    lines.push(
      `${one.name}: ${j(one.joules)}, ${formatDuration(one.worstSeconds)} worst case${one.toolVerdict === 'too-small' ? '; the tool is too small for it' : ''}${one.needsDischarge ? '' : '; need not be discharged first'}`,
    );
  return lines;
}

/** Bleed-down. */
export const sheet = defineSheet({
  id: 'bleed-down',
  title: 'Bleed-down',
  question: 'What does this capacitor hold, and how long until it is safe?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'Discharge of 195 μF from 1500 V to 320 V through 50 Ω: TT electronics/Welwyn, Design Tool 4 (S. J. Oxley, 2005)',
    'E24: IEC 60063',
    'Thresholds: IEC 61010-1, IEC 60204-1, IEC 60335-1, NEC 460.6',
    'Discharge of generated circuits in ngspice, within 1 %',
  ],
  example: { farads: 4700e-6, volts: 40, bleederOhms: 1000, toolOhms: 100, toolWatts: 10 },
  compute(given): SheetAnswer<BleedDownResult> | SheetRefusal {
    const { farads, volts, safeVolts, bleederOhms, toolOhms, toolWatts } = given;
    if (bleederOhms === null && toolOhms === null) {
      return {
        ok: false,
        field: 'toolOhms',
        say: 'Without a bleeder and without a tool resistor the charge has no way out: give one of them.',
      };
    }
    const stuck = given.others.findIndex((one) => one.bleederOhms === null && toolOhms === null);
    if (stuck >= 0) {
      return {
        ok: false,
        field: 'toolOhms',
        say: `Tool resistor is missing: without it and without a bleeder ${given.others[stuck]?.name ?? ''} has no way out.`,
      };
    }
    const ohms = parallel(bleederOhms, toolOhms);
    const worstOf = (resistance: number): number => resistance * (1 + given.resistorTolerancePercent / 100);
    const worstFarads = farads * (1 + given.tolerancePercent / 100);
    const worstJoules = energyJoules(worstFarads, volts);
    const toolPeakWatts = toolOhms === null ? null : (volts * volts) / toolOhms;
    const toolJoules = toolOhms === null ? null : (worstJoules * ohms) / toolOhms;
    const worstSecondsToSafe = secondsToFall(worstFarads, worstOf(ohms), volts, safeVolts);
    const fallTo = (low: number): number => secondsToFall(worstFarads, worstOf(ohms), volts, low);
    const others = given.others.map((one) => furtherOf(given, one));
    const result: BleedDownResult = {
      joules: energyJoules(farads, volts),
      worstJoules,
      coulombs: farads * volts,
      ohms,
      timeConstantSeconds: ohms * farads,
      secondsToSafe: secondsToFall(farads, ohms, volts, safeVolts),
      worstSecondsToSafe,
      bleederSeconds: bleederOhms === null ? null : secondsToFall(worstFarads, worstOf(bleederOhms), volts, safeVolts),
      toolPeakWatts,
      toolPeakAmps: toolOhms === null ? null : volts / toolOhms,
      toolJoules,
      toolAverageWatts: toolJoules === null || worstSecondsToSafe === 0 ? null : toolJoules / worstSecondsToSafe,
      toolVerdict: toolPeakWatts === null || toolJoules === null ? 'none' : judgeResistor(toolPeakWatts, toolJoules, toolWatts),
      suggestion: chooseResistor(worstFarads, volts, safeVolts, toolWatts),
      reboundVolts: REBOUND_SHARES[given.kind] * volts,
      thresholds: TOUCH_LIMITS.map((limit) => ({ limit, worstSeconds: fallTo(limit.volts) })),
      chargeThresholds: CHARGE_LIMITS.map((limit) => {
        const at = voltsAtLimit(limit, worstFarads);
        return { limit, volts: at, worstSeconds: fallTo(at) };
      }),
      others,
      allJoules: others.reduce((sum, one) => sum + one.joules, energyJoules(farads, volts)),
      allSeconds: others.reduce((sum, one) => sum + one.worstSeconds, worstSecondsToSafe),
      needsDischarge: needsDischarge(worstFarads, volts),
    };
    const plot = plotOf(given, result);
    return {
      ok: true,
      result,
      headline: headlineOf(given, result),
      formula: formulaOf(given, result),
      caution,
      validity,
      source,
      ...(plot !== undefined && { plot }),
    };
  },
});
