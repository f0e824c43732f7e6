/** Rail load plan: in which order and by which steps each rail is loaded, what to set, and what to read there. */
import { z } from 'zod';

import { formatDuration, formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { OwnedResistor } from '@/shared/workings/loadChoice';
import { chooseLoad } from '@/shared/workings/loadChoice';
import type { Plot } from '@/shared/workings/plot';
import { nextE24, RESISTOR_WATTS } from '@/shared/workings/preferred';
import { railLimits } from '@/shared/workings/railLimits';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField, rowsField, textField } from '@/shared/workings/sheet';

const loadStep = z.strictObject({
  percent: z.number(),
  wantedAmps: z.number(),
  amps: z.number(),
  /** What draws it: of owned resistors, or as one resistor. */
  ohms: z.number(),
  /** Owned resistors that make it, in words; null for an electronic load or where none do. */
  pieces: z.string().nullable(),
  terminalVolts: z.number(),
  loadVolts: z.number(),
  loadWatts: z.number(),
  leadWatts: z.number(),
  minutes: z.number(),
  /** Why it cannot be done with what is there; null where it can. */
  trouble: z.string().nullable(),
});

/** One step of one rail. Volts are signed as the meter shows them, amps and watts by size. */
export type LoadStep = z.output<typeof loadStep>;

const railPlan = z.strictObject({
  name: z.string(),
  nominalVolts: z.number(),
  /** Acceptance band at the sense point. */
  lowVolts: z.number(),
  highVolts: z.number(),
  minimumAmps: z.number(),
  steps: z.array(loadStep),
  /** One resistor for full load: ohms from E24 and watts at twice its heat or more; null above the usual sizes. */
  fullOhms: z.number(),
  fullWatts: z.number().nullable(),
});

/** Plan of one rail. */
export type RailPlan = z.output<typeof railPlan>;

const output = z.strictObject({ rails: z.array(railPlan), fullWatts: z.number(), minutes: z.number(), troubles: z.number() });

/** Result of the sheet; rails in the order in which they are loaded. */
export type RailLoadPlanResult = z.output<typeof output>;

/** Steps in percent of the rating. Common practice, no source. */
export const PERCENTS: Readonly<Record<'careful' | 'usual', readonly number[]>> = { careful: [10, 25, 50, 80, 100], usual: [25, 50, 100] };
/** Owned resistors must come this near to the step that is wanted. Common practice, no source. */
const NEAR_ENOUGH = 0.25;

const rail = z.strictObject({
  name: textField('Name', 'As on the supply', 40),
  nominalVolts: numberField({ title: 'Nominal volts', description: 'With its sign', unit: 'V', min: -1000, max: 1000 }),
  tolerancePercent: numberField({ title: 'Tolerance', description: 'Allowed either way', unit: '%', min: 0, max: 50 }).default(5),
  maxAmps: numberField({ title: 'Rated amps', description: 'Most that it gives for ever', unit: 'A', min: 1e-3, max: 1000 }),
  minimumAmps: numberField({
    title: 'Minimum load',
    description: 'Least load at which it regulates; 0 for none',
    unit: 'A',
    min: 0,
    max: 1000,
  }).default(0),
  sense: choiceField('Sense', 'Where the supply looks at its volts: at its own terminals, or remote at the load', [
    'terminals',
    'remote',
  ]).default('terminals'),
  first: choiceField('Comes first', 'Whether others need it first, such as the bias of memory boards', ['no', 'yes']).default('no'),
});
const resistor = z.strictObject({
  ohms: numberField({ title: 'Ohms', description: 'Of each', unit: 'Ω', min: 1e-3, max: 1e6 }),
  watts: numberField({ title: 'Watts', description: 'Rated, of each', unit: 'W', min: 0.1, max: 5000 }),
  count: numberField({ title: 'Pieces', description: 'How many are there', unit: null, min: 1, max: 4 }).default(1),
});

const inputs = z.strictObject({
  rails: rowsField({ title: 'Rails', description: 'Of the supply, in any order', rowName: 'rail', row: rail, fewest: 1, most: 12 }),
  load: choiceField('Load', 'What draws the amps', ['electronic', 'resistors']),
  steps: choiceField('Steps', 'Careful: 10, 25, 50, 80, 100 % of the rating; usual: 25, 50, 100 %', ['careful', 'usual']).default(
    'careful',
  ),
  loadWatts: numberField({ title: 'Load rating', description: 'Most watts of the electronic load', unit: 'W', min: 1, max: 100_000 })
    .nullable()
    .default(null),
  loadAmps: numberField({ title: 'Load amps', description: 'Most amps of the electronic load', unit: 'A', min: 0.01, max: 10_000 })
    .nullable()
    .default(null),
  owned: rowsField({
    title: 'Owned resistors',
    description: 'Load resistors that the workshop has',
    rowName: 'resistor',
    row: resistor,
    fewest: 0,
    most: 5,
  }).default([]),
  leadOhms: numberField({
    title: 'Lead ohms',
    description: 'From the terminals to the load and back, contacts included',
    unit: 'Ω',
    min: 0,
    max: 10,
  }).default(0.01),
  dwellMinutes: numberField({ title: 'Dwell', description: 'Minutes at each step', unit: null, min: 1, max: 240 }).default(5),
  fullMinutes: numberField({ title: 'Full load', description: 'Minutes at the last step', unit: null, min: 1, max: 1440 }).default(30),
});

type Inputs = z.output<typeof inputs>;
type Rail = Inputs['rails'][number];

const law = [
  'amps = percent × rated amps, never less than the minimum load; ohms = volts ÷ amps',
  'sense at the terminals: V load = V nominal − amps × lead ohms; sense at the load: V terminals = V nominal + amps × lead ohms; by size',
  'heat: V load × amps in the load, amps² × lead ohms in the leads',
  'resistors in parallel, each at half its rated watts or less, as near to the wanted amps as they come',
  'order: rails that others need, then rails with a minimum load, then by watts, smallest first; minimum loads are on before power',
];
const validity =
  'Settled d.c. One rail at a time is brought up with the others at their minimum load; then all at full. A resistor’s amps follow the volts; an electronic load wants its own least volts, often 1 to 3 V. Half the rated watts is for free air; with a fan the maker’s curve holds. Steps, dwell and order are common practice, no source; the maker’s procedure comes first.';
const source =
  'Ohm’s law and the acceptance band as the maker gives it. Steps, order, dwell and half-rated resistors: common practice, no source.';
const caution =
  'Load resistors glow, burn and melt leads: on metal or ceramic, away from everything, never touched. Connect and change the load with the power off; an open sense lead drives a rail above its limit. Local codes, the maker’s data and licensed practice come first.';

const v = (value: number): string => formatQuantity(value, 'V', { digits: 4 });
const a = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const w = (value: number): string => formatQuantity(value, 'W', { digits: 3 });
const r = (value: number): string => formatQuantity(value, 'Ω', { digits: 3 });

interface Drawn {
  readonly amps: number;
  readonly ohms: number;
  readonly pieces: string | null;
  readonly trouble: string | null;
}

function electronic(given: Inputs, volts: number, wanted: number): Drawn {
  const watts = volts * wanted;
  const trouble =
    given.loadAmps !== null && wanted > given.loadAmps
      ? `${a(wanted)} is more than the load’s ${a(given.loadAmps)}`
      : given.loadWatts !== null && watts > given.loadWatts
        ? `${w(watts)} is more than the load’s ${w(given.loadWatts)}`
        : null;
  return { amps: wanted, ohms: volts / wanted, pieces: null, trouble };
}

function resistive(given: Inputs, railOf: Rail, size: number, wanted: number): Drawn {
  // Chosen at the nominal volts, then drawn through the leads where the rail is sensed at its own terminals.
  const choice = chooseLoad(given.owned as readonly OwnedResistor[], size, wanted, Math.max(wanted, railOf.maxAmps) * 1.001);
  if (choice === null) return { amps: wanted, ohms: size / wanted, pieces: null, trouble: 'no owned resistor stands these volts' };
  const amps = railOf.sense === 'remote' ? size / choice.ohms : size / (choice.ohms + given.leadOhms);
  const off = Math.abs(size / choice.ohms / wanted - 1) > NEAR_ENOUGH;
  const pieces = choice.pieces.map(({ resistor: one, count }) => `${formatNumber(count)} × ${r(one.ohms)}, ${w(one.watts)}`).join(' and ');
  return { amps, ohms: choice.ohms, pieces, trouble: off ? `the nearest that is owned draws ${a(amps)}` : null };
}

function stepOf(given: Inputs, railOf: Rail, percent: number, last: boolean): LoadStep {
  const sign = Math.sign(railOf.nominalVolts);
  const size = Math.abs(railOf.nominalVolts);
  const wanted = Math.max((percent / 100) * railOf.maxAmps, railOf.minimumAmps);
  const drawn = given.load === 'electronic' ? electronic(given, size, wanted) : resistive(given, railOf, size, wanted);
  const drop = drawn.amps * given.leadOhms;
  const remote = railOf.sense === 'remote';
  const [terminals, atLoad] = remote ? [size + drop, size] : [size, size - drop];
  return {
    percent,
    wantedAmps: wanted,
    amps: drawn.amps,
    ohms: drawn.ohms,
    pieces: drawn.pieces,
    terminalVolts: sign * terminals,
    loadVolts: sign * atLoad,
    loadWatts: atLoad * drawn.amps,
    leadWatts: drop * drawn.amps,
    minutes: last ? given.fullMinutes : given.dwellMinutes,
    trouble: atLoad <= 0 ? 'the leads eat all the volts: take shorter or thicker ones' : drawn.trouble,
  };
}

function planOf(given: Inputs, railOf: Rail): RailPlan {
  const percents = PERCENTS[given.steps];
  const size = Math.abs(railOf.nominalVolts);
  const heat = size * railOf.maxAmps;
  return {
    name: railOf.name,
    nominalVolts: railOf.nominalVolts,
    ...railLimits(railOf.nominalVolts, railOf.tolerancePercent),
    minimumAmps: railOf.minimumAmps,
    steps: percents.map((percent, at) => stepOf(given, railOf, percent, at === percents.length - 1)),
    fullOhms: nextE24(size / railOf.maxAmps),
    fullWatts: RESISTOR_WATTS.find((watts) => watts >= 2 * heat) ?? null,
  };
}

/** Order of loading: needed first, then those with a minimum load, then by rated watts, smallest first. */
export function loadingOrder(rails: readonly Rail[]): readonly Rail[] {
  const rank = (one: Rail): number => (one.first === 'yes' ? 0 : one.minimumAmps > 0 ? 1 : 2);
  return [...rails].sort(
    (one, two) => rank(one) - rank(two) || Math.abs(one.nominalVolts) * one.maxAmps - Math.abs(two.nominalVolts) * two.maxAmps,
  );
}

function linesOf(given: Inputs, plan: RailPlan): readonly string[] {
  const minimum = plan.minimumAmps > 0 ? `; minimum load ${a(plan.minimumAmps)} on before power` : '';
  return [
    `${plan.name}: good from ${v(plan.lowVolts)} to ${v(plan.highVolts)} at the sense point${minimum}`,
    ...plan.steps.map((step) => {
      const how = step.pieces ?? (given.load === 'electronic' ? 'set' : `as ${r(step.ohms)}`);
      const said = step.trouble === null ? '' : ` (not like this: ${step.trouble})`;
      return `${plan.name} ${formatNumber(step.percent)} %: ${a(step.amps)}, ${how}; terminals ${v(step.terminalVolts)}, load ${v(step.loadVolts)}, ${w(step.loadWatts)}; ${formatDuration(step.minutes * 60)}${said}`;
    }),
    `${plan.name} full load as one resistor: ${r(plan.fullOhms)}, ${plan.fullWatts === null ? 'more watts than a usual one has: several in parallel' : w(plan.fullWatts)}`,
  ];
}

function plotOf(given: Inputs, plan: RailPlan): Plot {
  const first = plan.steps[0];
  const last = plan.steps[plan.steps.length - 1];
  const both = (pick: (step: LoadStep) => number) => plan.steps.map((step) => [step.amps, pick(step)] as const);
  return {
    title: `${plan.name} under load`,
    x: { title: 'Load', unit: 'A', scale: 'linear', from: 0 },
    y: { title: 'Volts', unit: 'V', scale: 'linear' },
    curves: [
      { label: 'terminals', role: 'main', points: both((step) => step.terminalVolts) },
      { label: 'load', role: 'other', points: both((step) => step.loadVolts) },
    ],
    points: [],
    bands: [
      {
        label: 'good',
        axis: 'y',
        from: Math.min(plan.lowVolts, plan.highVolts),
        to: Math.max(plan.lowVolts, plan.highVolts),
        role: 'good',
      },
    ],
    limits: [],
    words: `From ${a(first?.amps ?? 0)} to ${a(last?.amps ?? 0)} the volts at the terminals go from ${v(first?.terminalVolts ?? 0)} to ${v(last?.terminalVolts ?? 0)} and at the load from ${v(first?.loadVolts ?? 0)} to ${v(last?.loadVolts ?? 0)}, if the rail holds its nominal volts and ${r(given.leadOhms)} of leads are the only loss.`,
  };
}

function refusal(given: Inputs): SheetRefusal | null {
  for (const [at, one] of given.rails.entries()) {
    const field = (name: string): string => `rails.${String(at)}.${name}`;
    if (Math.abs(one.nominalVolts) < 0.1)
      return { ok: false, field: field('nominalVolts'), say: `${one.name}: nominal volts must be 0.1 V or more, either sign.` };
    if (one.minimumAmps > one.maxAmps)
      return { ok: false, field: field('minimumAmps'), say: `${one.name}: minimum load must be no more than the rated ${a(one.maxAmps)}.` };
  }
  const names = given.rails.map(({ name }) => name);
  const twice = names.findIndex((name, at) => names.indexOf(name) !== at);
  if (twice >= 0) return { ok: false, field: `rails.${String(twice)}.name`, say: `There are two rails “${names[twice] ?? ''}”.` };
  if (given.load === 'resistors' && given.owned.length === 0)
    return { ok: false, field: 'owned', say: 'Owned resistors are missing: list at least one.' };
  return null;
}

/** Rail load plan. */
export const sheet = defineSheet({
  id: 'rail-load-plan',
  title: 'Rail load plan',
  question: 'In which order and by which steps is each rail loaded, with what, and what should I read?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'Bands of +5 V, +12 V, −12 V and +3.3 V: ATX12V power supply design guide (from memory)',
    '10 Ω across 5 V: 0.5 A and 2.5 W, in a 10 W part: common practice, no source',
    '5 V at 17 A: 85 W and 0.294 Ω: Ohm’s law',
  ],
  example: {
    rails: [
      { name: '+5 V', nominalVolts: 5, maxAmps: 17, minimumAmps: 1, sense: 'remote' },
      { name: '+12 V', nominalVolts: 12, maxAmps: 3 },
      { name: '−5 V', nominalVolts: -5, maxAmps: 0.5, first: 'yes' },
    ],
    load: 'electronic',
    loadWatts: 150,
    leadOhms: 0.015,
  },
  compute(given): SheetAnswer<RailLoadPlanResult> | SheetRefusal {
    const refused = refusal(given);
    if (refused !== null) return refused;
    const plans = loadingOrder(given.rails).map((one) => planOf(given, one));
    const steps = plans.flatMap((plan) => plan.steps);
    const fullWatts = given.rails.reduce((sum, one) => sum + Math.abs(one.nominalVolts) * one.maxAmps, 0);
    const minutes = steps.reduce((sum, step) => sum + step.minutes, 0);
    const troubles = steps.filter((step) => step.trouble !== null).length;
    const trouble = troubles === 0 ? '' : ` ${formatNumber(troubles)} of ${formatNumber(steps.length)} steps cannot be done like this.`;
    const heaviest = [...plans].sort((one, two) => (two.steps.at(-1)?.loadWatts ?? 0) - (one.steps.at(-1)?.loadWatts ?? 0))[0];
    return {
      ok: true,
      result: { rails: plans, fullWatts, minutes, troubles },
      headline: `${plans.map(({ name }) => name).join(', then ')}; ${w(fullWatts)} at full load, ${formatDuration(minutes * 60)} in all.${trouble}`,
      formula: plans.flatMap((plan) => linesOf(given, plan)),
      caution,
      validity,
      source,
      ...(heaviest !== undefined && { plot: plotOf(given, heaviest) }),
    };
  },
});
