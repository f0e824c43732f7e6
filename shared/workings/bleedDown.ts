/** Bleed-down: what a capacitor holds, and how long until it is safe to touch. */
import { z } from 'zod';

import { formatDuration, formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { nextE24, RESISTOR_WATTS } from '@/shared/workings/preferred';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { defineSheet, numberField } from '@/shared/workings/sheet';
import { DEAD_VOLTS, HARMLESS_COULOMBS, HARMLESS_JOULES, TOUCH_LIMITS } from '@/shared/workings/touchLimits';

/** Most times its rated watts that a wire-wound resistor takes at the first moment. Common practice, no source. */
export const PEAK_OVERLOAD = 10;
/** Most joules per rated watt in one pulse: five times rated for five seconds, the careful end of common practice, no source. */
export const JOULES_PER_WATT = 25;
/** Share of the first volts that an old electrolytic may come back to (dielectric absorption 10 to 15 %; from memory). */
export const REBOUND_SHARE = 0.15;

const verdict = z.enum(['continuous', 'pulse', 'too-small', 'none']);

/** How a resistor stands the discharge. */
export type ResistorVerdict = z.output<typeof verdict>;

const choice = z.strictObject({ ohms: z.number(), watts: z.number(), secondsToSafe: z.number() });

/** A discharge resistor that does it. */
export type ResistorChoice = z.output<typeof choice>;

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
  toolVerdict: verdict,
  suggestion: choice.nullable(),
  reboundVolts: z.number(),
  thresholds: z.array(
    z.strictObject({
      limit: z.strictObject({ volts: z.number(), name: z.string(), withinSeconds: z.number().nullable() }),
      worstSeconds: z.number(),
    }),
  ),
  /** Whether it must be discharged through a resistor before it is proved dead. */
  needsDischarge: z.boolean(),
});

/** Result of the sheet; SI, nothing rounded, worst case means the capacitor at its upper tolerance. */
export type BleedDownResult = z.output<typeof output>;

/** Energy of a capacitor, ½CV², in joules. */
export const energyJoules = (farads: number, volts: number): number => (farads * volts * volts) / 2;

/**
 * Time to fall from one voltage to another through a resistance: t = RC ln(V/V safe).
 * @returns seconds; 0 when it is there already
 */
export function secondsToFall(farads: number, ohms: number, fromVolts: number, toVolts: number): number {
  return fromVolts <= toVolts ? 0 : ohms * farads * Math.log(fromVolts / toVolts);
}

/** Whether a part must be discharged first: more than 350 mJ at more than 60 V d.c., or more than 10 J at any voltage. */
export function needsDischarge(farads: number, volts: number): boolean {
  const joules = energyJoules(farads, volts);
  return (volts > 60 && joules > HARMLESS_JOULES) || joules > 10;
}

/**
 * Judges a wire-wound resistor across a charged capacitor.
 * @param peakWatts V²/R
 * @param joules what it has to swallow
 */
export function judgeResistor(peakWatts: number, joules: number, ratedWatts: number): ResistorVerdict {
  // A resistor chosen to sit on the limit must not fall off it by the last bit of a double.
  const rated = ratedWatts * (1 + 1e-9);
  if (peakWatts <= rated) return 'continuous';
  return peakWatts <= PEAK_OVERLOAD * rated && joules <= JOULES_PER_WATT * rated ? 'pulse' : 'too-small';
}

/**
 * The fastest E24 resistor that stands the whole discharge alone: of the rating given if that will do, else of the next.
 * @returns null when no single usual resistor does it
 */
export function chooseResistor(farads: number, volts: number, safeVolts: number, ratedWatts: number): ResistorChoice | null {
  const joules = energyJoules(farads, volts);
  const usual = [ratedWatts, ...RESISTOR_WATTS.filter((rating) => rating > ratedWatts)];
  const watts = usual.find((rating) => joules <= JOULES_PER_WATT * rating);
  if (watts === undefined) return null;
  const ohms = nextE24((volts * volts) / (PEAK_OVERLOAD * watts));
  return { ohms, watts, secondsToSafe: secondsToFall(farads, ohms, volts, safeVolts) };
}

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
});

const law = [
  'E = ½ × C × V²,  Q = C × V',
  'R = bleeder in parallel with tool,  τ = R × C',
  't = τ × ln(V ÷ V safe); worst case with C × (1 + tolerance)',
  'P peak = V² ÷ R tool; the tool takes E × R ÷ R tool of the energy',
  'a wire-wound resistor stands P peak up to its watts for ever, or up to 10 × its watts if it swallows no more than 25 J a watt in one pulse',
];
const validity =
  'A capacitor that still is one, discharged through resistors alone. An open bleeder discharges nothing: measure it. The pulse rule is for wire-wound resistors, cold at the start, once and then left to cool; carbon, film and wire-wound parts in cases differ, and the maker’s figure comes first. Mind the resistor’s rated volts too.';
const source =
  'E = ½CV² and V = V₀·e^(−t/RC): any textbook. Touch limits as named in the answer. Pulse rule: common practice, no source. Rebound of up to 15 % for electrolytics: from memory.';
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
  return `${j(result.joules)}: ${time}.${tool}`;
}

function formulaOf(given: Inputs, result: BleedDownResult): readonly string[] {
  const { farads, volts, safeVolts, tolerancePercent } = given;
  const lines = [
    `E = ½ × ${f(farads)} × ${v(volts)}² = ${j(result.joules)}; at +${formatNumber(tolerancePercent)} % ${j(result.worstJoules)}`,
    `Q = ${f(farads)} × ${v(volts)} = ${formatQuantity(result.coulombs, 'C', { digits: 3 })}${result.coulombs <= HARMLESS_COULOMBS ? ' (45 μC or less)' : ''}`,
    `τ = ${r(result.ohms)} × ${f(farads)} = ${formatDuration(result.timeConstantSeconds)}`,
    `t = ${formatDuration(result.timeConstantSeconds)} × ln(${v(volts)} ÷ ${v(safeVolts)}) = ${formatDuration(result.secondsToSafe)}; at +${formatNumber(tolerancePercent)} % ${formatDuration(result.worstSecondsToSafe)}`,
  ];
  if (result.bleederSeconds !== null && given.toolOhms !== null)
    lines.push(`through the bleeder alone: ${formatDuration(result.bleederSeconds)}`);
  const tool = verdictLine(result, given.toolWatts);
  if (tool !== null) lines.push(tool);
  const { suggestion } = result;
  if (suggestion !== null)
    lines.push(
      `E24: ${r(suggestion.ohms)}, ${w(suggestion.watts)} wire-wound does it alone in ${formatDuration(suggestion.secondsToSafe)}, worst case`,
    );
  lines.push(`rebound: may come back to ${v(result.reboundVolts)}; wait, read again, leave the link on`);
  for (const { limit, worstSeconds } of result.thresholds) {
    const time = worstSeconds === 0 ? 'below it from the start' : `after ${formatDuration(worstSeconds)}`;
    const { withinSeconds } = limit;
    const met =
      withinSeconds === null
        ? ''
        : `; that standard wants ${formatDuration(withinSeconds)}: ${worstSeconds <= withinSeconds ? 'met' : 'not met'}`;
    lines.push(`${v(limit.volts)} (${limit.name}): ${time}${met}`);
  }
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
    const ohms = 1 / ((bleederOhms === null ? 0 : 1 / bleederOhms) + (toolOhms === null ? 0 : 1 / toolOhms));
    const worstFarads = farads * (1 + given.tolerancePercent / 100);
    const worstJoules = energyJoules(worstFarads, volts);
    const toolPeakWatts = toolOhms === null ? null : (volts * volts) / toolOhms;
    const toolJoules = toolOhms === null ? null : (worstJoules * ohms) / toolOhms;
    const result: BleedDownResult = {
      joules: energyJoules(farads, volts),
      worstJoules,
      coulombs: farads * volts,
      ohms,
      timeConstantSeconds: ohms * farads,
      secondsToSafe: secondsToFall(farads, ohms, volts, safeVolts),
      worstSecondsToSafe: secondsToFall(worstFarads, ohms, volts, safeVolts),
      bleederSeconds: bleederOhms === null ? null : secondsToFall(worstFarads, bleederOhms, volts, safeVolts),
      toolPeakWatts,
      toolPeakAmps: toolOhms === null ? null : volts / toolOhms,
      toolJoules,
      toolVerdict: toolPeakWatts === null || toolJoules === null ? 'none' : judgeResistor(toolPeakWatts, toolJoules, toolWatts),
      suggestion: chooseResistor(worstFarads, volts, safeVolts, toolWatts),
      reboundVolts: REBOUND_SHARE * volts,
      thresholds: TOUCH_LIMITS.map((limit) => ({ limit, worstSeconds: secondsToFall(worstFarads, ohms, volts, limit.volts) })),
      needsDischarge: needsDischarge(worstFarads, volts),
    };
    return { ok: true, result, headline: headlineOf(given, result), formula: formulaOf(given, result), caution, validity, source };
  },
});
