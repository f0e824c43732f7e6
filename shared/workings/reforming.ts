/** Reforming: a staged plan for an electrolytic that has long been without volts, and a verdict on its logged curve. */
import { z } from 'zod';

import { formatDuration, formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { LEAKAGE_NAMES, LEAKAGE_RULES, leakageLimit, PERIOD_MOST_VOLTS } from '@/shared/workings/leakage';
import type { Plot, PlotPair } from '@/shared/workings/plot';
import type { ReformReading } from '@/shared/workings/reformCurve';
import { judgeReforming, REFORM_WORDS } from '@/shared/workings/reformCurve';
import type { ReformResistor } from '@/shared/workings/reformPlan';
import { doneAmps, JIG_AMPS, reformResistor, reformStages, resistorOf, STOP_WATTS } from '@/shared/workings/reformPlan';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField, rowsField } from '@/shared/workings/sheet';

const output = z.strictObject({
  limitAmps: z.number(),
  targetVolts: z.number(),
  resistor: z.strictObject({
    ohms: z.number(),
    /** Into a capacitor that is a short. */
    shortAmps: z.number(),
    shortWatts: z.number(),
    /** Rated watts to take: twice the heat into a short. */
    watts: z.number(),
    /** Most heat that can arise inside the can, at half the volts. */
    mostCanWatts: z.number(),
    timeConstantSeconds: z.number(),
  }),
  /** Empty where it needs none. */
  stages: z.array(
    z.strictObject({
      share: z.number(),
      /** Set on the supply. */
      volts: z.number(),
      minutes: z.number(),
      /** Leakage at or below which it is done. */
      doneAmps: z.number(),
    }),
  ),
  minutes: z.number(),
  /** Heat in the can at the limit and the full volts. */
  limitWatts: z.number(),
  joules: z.number(),
  /** What is wrong with the resistor that was given; null where nothing is. */
  resistorTrouble: z.string().nullable(),
  verdict: z
    .strictObject({
      says: z.enum(['too-early', 'falling', 'next-stage', 'formed', 'stalled', 'rising', 'too-hot']),
      /** On the capacitor at the last reading. */
      capacitorVolts: z.number(),
      canWatts: z.number(),
      /** Minutes from the last reading until it is done at this stage, if it goes on like this; null where that cannot be said. */
      minutesToGo: z.number().nullable(),
    })
    .nullable(),
});

/** Result of the sheet; SI and minutes, nothing rounded. */
export type ReformingResult = z.output<typeof output>;

const reading = z.strictObject({
  minutes: numberField({ title: 'Minutes', description: 'Since the first volts', unit: null, min: 0, max: 100_000 }),
  volts: numberField({ title: 'Volts', description: 'Set on the supply', unit: 'V', min: 0.1, max: 700 }),
  amps: numberField({ title: 'Leakage', description: 'Read in series', unit: 'A', min: 0, max: 10 }),
});

const inputs = z.strictObject({
  farads: numberField({ title: 'Capacitance', description: 'As marked', unit: 'F', min: 1e-7, max: 10 }),
  ratedVolts: numberField({ title: 'Rated volts', description: 'D.c. volts as marked', unit: 'V', min: 3, max: 700 }),
  targetVolts: numberField({
    title: 'Target volts',
    description: 'Most that it will see in its circuit; empty for the rated volts',
    unit: 'V',
    min: 1,
    max: 700,
  })
    .nullable()
    .default(null),
  ageYears: numberField({ title: 'Age', description: 'Years since it was made', unit: null, min: 0, max: 150 }),
  storageYears: numberField({ title: 'Without volts', description: 'Years since it last had its volts', unit: null, min: 0, max: 150 }),
  rule: choiceField('Leakage rule', 'Two minutes: 0.01 CV; five minutes: 0.002 CV + 3 μA; period: JAN-C-62', LEAKAGE_RULES).default(
    'two-minutes',
  ),
  seriesOhms: numberField({
    title: 'Series resistor',
    description: 'The one that you have; empty for the one that the sheet takes',
    unit: 'Ω',
    min: 1,
    max: 10e6,
  })
    .nullable()
    .default(null),
  seriesWatts: numberField({
    title: 'Its watts',
    description: 'Rated watts of the series resistor that you have',
    unit: 'W',
    min: 0.1,
    max: 1000,
  })
    .nullable()
    .default(null),
  log: rowsField({
    title: 'Log',
    description: 'Readings in the order in which they were taken',
    rowName: 'reading',
    row: reading,
    fewest: 0,
    most: 200,
  }).default([]),
});

type Inputs = z.output<typeof inputs>;

const law = [
  'limit: 0.01 × C × V or 3 μA (2 minutes), 0.002 × C × V + 3 μA (5 minutes), k × C + 0.3 mA (JAN-C-62); C in μF, V rated',
  `R = V ÷ (5 mA or twice the limit, the greater), never less than V² ÷ 4 W, so that the can gets ${String(STOP_WATTS)} W at the very most; next E24`,
  'into a short: I = V ÷ R, P = V² ÷ R; resistor of twice that; can at most V² ÷ 4R',
  'less than 1 year without volts: none; to 2: full volts for 1 h; to 3: quarters of 30 min; longer: quarters of 2 h, with a tenth first when very old; never less than 5 × R × C',
  'done: leakage within the limit and no more than a tenth of the volts lost in R;  V capacitor = V supply − I × R',
];
const validity =
  'Aluminium electrolytics with liquid electrolyte, alone on the bench or with a lead lifted, at room temperature, right polarity; not tantalum, not motor-start, not oil-filled parts. Charging current is no leakage: readings count from five time constants on. Forming mends the oxide and not a dried-out can: measure capacitance and ESR afterwards. Many cans of that age do not form, and a new one inside the old is the usual end.';
const source =
  'Limits as named. Stages by years without volts: drive makers’ guides as published (Siemens, Rockwell). 100 Ω or 1 kΩ for one hour at rated volts as preconditioning of sound parts: EPCOS/TDK, general technical information. 90 kΩ at 450 V: amateur practice as published. 1 W in the can, a tenth first, rising and stalled: common practice, no source.';
const caution =
  'A can may burst and spray: behind a screen, eye protection, nobody leaning over it, vent turned away. Stop when it is warm to a thermometer, bulges, hisses, smells, or when the leakage rises. It holds its charge afterwards and comes back by itself: discharge through a resistor, prove dead, leave the link on. Local codes, the maker’s data and licensed practice come first.';

const v = (value: number): string => formatQuantity(value, 'V', { digits: 3 });
const a = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const w = (value: number): string => formatQuantity(value, 'W', { digits: 3 });
const r = (value: number): string => formatQuantity(value, 'Ω', { digits: 3 });
const minutes = (value: number): string => formatDuration(value * 60);

function troubleOf(given: Inputs, resistor: ReformResistor): string | null {
  if (given.seriesOhms === null) return null;
  if (resistor.mostCanWatts > STOP_WATTS)
    return `with ${r(resistor.ohms)} the can may get ${w(resistor.mostCanWatts)}, more than ${w(STOP_WATTS)}`;
  if (given.seriesWatts !== null && resistor.shortWatts > given.seriesWatts)
    return `a shorted can puts ${w(resistor.shortWatts)} into a resistor of ${w(given.seriesWatts)}`;
  return null;
}

function formulaOf(given: Inputs, result: ReformingResult): readonly string[] {
  const { resistor, stages, verdict } = result;
  const lines = [
    `limit ${a(result.limitAmps)}: ${LEAKAGE_NAMES[given.rule]}`,
    `R = ${r(resistor.ohms)}${given.seriesOhms === null ? `, ${w(resistor.watts)} (${v(result.targetVolts)} ÷ ${a(Math.max(JIG_AMPS, 2 * result.limitAmps))}, no less than ${v(result.targetVolts)}² ÷ 4 W, next E24)` : ', yours'}`,
    `into a short: ${a(resistor.shortAmps)}, ${w(resistor.shortWatts)} in R; the can gets ${w(resistor.mostCanWatts)} at the very most`,
    `R × C = ${formatDuration(resistor.timeConstantSeconds)}; readings count after ${formatDuration(5 * resistor.timeConstantSeconds)}`,
  ];
  if (result.resistorTrouble !== null) lines.push(`not this resistor: ${result.resistorTrouble}`);
  if (stages.length === 0) lines.push('less than a year without volts: no reforming; watch the leakage at the first power all the same');
  for (const stage of stages)
    lines.push(
      `${formatNumber(stage.share * 100)} %: ${v(stage.volts)} for ${minutes(stage.minutes)}, on to the next at ${a(stage.doneAmps)} or less`,
    );
  lines.push(
    `stop: leakage rises, or no longer falls within 10 min above the limit, or ${w(STOP_WATTS)} in the can, or warmth, bulge, hiss, smell`,
    `at the limit and full volts the can gets ${w(result.limitWatts)}${result.limitWatts > STOP_WATTS ? ', too much to stay there: this rule is no limit at which to stop' : ''}`,
  );
  const last = given.log.at(-1);
  if (verdict !== null && last !== undefined) {
    const togo = verdict.minutesToGo === null ? '' : `; about ${minutes(verdict.minutesToGo)} more if it goes on like this`;
    lines.push(
      `last reading: ${v(last.volts)} − ${a(last.amps)} × ${r(resistor.ohms)} = ${v(verdict.capacitorVolts)} on the can, ${w(verdict.canWatts)} in it; done at ${a(doneAmps(last.volts, result.limitAmps, resistor.ohms))}${togo}`,
    );
  }
  return lines;
}

function headlineOf(result: ReformingResult): string {
  const { verdict, stages, resistor } = result;
  if (verdict !== null) return `${REFORM_WORDS[verdict.says]}.`;
  if (result.resistorTrouble !== null) return `Not with this resistor: ${result.resistorTrouble}.`;
  if (stages.length === 0) return `No reforming needed; leakage limit ${a(result.limitAmps)}.`;
  const some = stages.length === 1 ? 'one stage' : `${formatNumber(stages.length)} stages`;
  return `${some.charAt(0).toUpperCase()}${some.slice(1)} to ${v(result.targetVolts)} through ${r(resistor.ohms)}, ${w(resistor.watts)}: ${minutes(result.minutes)} at least; done at ${a(stages.at(-1)?.doneAmps ?? 0)}.`;
}

function plotOf(given: Inputs, result: ReformingResult): Plot | undefined {
  const log = given.log.filter(({ amps }) => amps > 0);
  const last = log.at(-1);
  if (last !== undefined && log.length >= 2) {
    const done = doneAmps(last.volts, result.limitAmps, result.resistor.ohms);
    return {
      title: 'Leakage as logged',
      x: { title: 'Minutes', unit: '', scale: 'linear' },
      y: { title: 'Leakage', unit: 'A', scale: 'log' },
      curves: [{ label: 'leakage', role: 'main', points: log.map(({ minutes: x, amps }) => [x, amps]) }],
      points: log.map(({ minutes: x, volts, amps }) => ({ label: v(volts), x, y: amps, role: 'reading' })),
      bands: [],
      limits: [{ label: `done at ${a(done)}`, axis: 'y', at: done }],
      words: `The leakage goes from ${a(log[0]?.amps ?? 0)} to ${a(last.amps)} over ${minutes(last.minutes - (log[0]?.minutes ?? 0))}; it is done at ${a(done)}.`,
    };
  }
  if (result.stages.length === 0) return undefined;
  let at = 0;
  const stairs = result.stages.flatMap((stage): PlotPair[] => {
    const from = at;
    at += stage.minutes;
    return [
      [from, stage.volts],
      [at, stage.volts],
    ];
  });
  return {
    title: 'Volts over the stages',
    x: { title: 'Minutes', unit: '', scale: 'linear', from: 0 },
    y: { title: 'Supply', unit: 'V', scale: 'linear', from: 0 },
    curves: [{ label: 'supply', role: 'main', points: stairs }],
    points: [],
    bands: [],
    limits: [{ label: 'rated', axis: 'y', at: given.ratedVolts }],
    words: `The supply is raised in ${formatNumber(result.stages.length)} stages to ${v(result.targetVolts)} within ${minutes(at)}, each held until its leakage has fallen.`,
  };
}

function logRefusal(log: readonly ReformReading[], ratedVolts: number): SheetRefusal | null {
  for (const [at, row] of log.entries()) {
    const before = log[at - 1];
    if (before !== undefined && row.minutes <= before.minutes)
      return {
        ok: false,
        field: `log.${String(at)}.minutes`,
        say: `Reading ${String(at + 1)}: minutes must be more than those of the reading before.`,
      };
    if (row.volts > ratedVolts * 1.05)
      return {
        ok: false,
        field: `log.${String(at)}.volts`,
        say: `Reading ${String(at + 1)}: volts must be no more than the rated ${v(ratedVolts)}. If that was really set, stop: volts off.`,
      };
  }
  return log.length === 1 ? { ok: false, field: 'log', say: 'A curve needs two readings; there must be one more.' } : null;
}

/** Reforming. */
export const sheet = defineSheet({
  id: 'reforming',
  title: 'Reforming',
  question: 'How do I bring this electrolytic back to its volts, and is it forming?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'Leakage limits: Vishay 038 RSU, Nippon Chemi-Con FAQ, JAN-C-62 as quoted',
    '90 kΩ at 450 V, 5 mA into a short: published amateur practice',
    'Stages by years without volts: drive makers’ guides as published',
  ],
  example: { farads: 2200e-6, ratedVolts: 50, targetVolts: 40, ageYears: 40, storageYears: 15 },
  compute(given): SheetAnswer<ReformingResult> | SheetRefusal {
    const { farads, ratedVolts } = given;
    const targetVolts = given.targetVolts ?? ratedVolts;
    if (targetVolts > ratedVolts)
      return { ok: false, field: 'targetVolts', say: `Target volts must be no more than the rated ${v(ratedVolts)}.` };
    if (given.storageYears > given.ageYears)
      return { ok: false, field: 'storageYears', say: 'Without volts must be no longer than the age.' };
    const limitAmps = leakageLimit(given.rule, farads, ratedVolts);
    if (limitAmps === null)
      return { ok: false, field: 'rule', say: `Leakage rule must be another one: JAN-C-62 ends at ${v(PERIOD_MOST_VOLTS)}.` };
    const refused = logRefusal(given.log, ratedVolts);
    if (refused !== null) return refused;
    const resistor =
      given.seriesOhms === null ? reformResistor(farads, targetVolts, limitAmps) : resistorOf(given.seriesOhms, farads, targetVolts);
    const stages = reformStages(targetVolts, limitAmps, resistor, given.storageYears, given.ageYears);
    const { ohms, timeConstantSeconds } = resistor;
    const result: ReformingResult = {
      limitAmps,
      targetVolts,
      resistor,
      stages: [...stages],
      minutes: stages.reduce((sum, stage) => sum + stage.minutes, 0),
      limitWatts: limitAmps * targetVolts,
      joules: (farads * targetVolts * targetVolts) / 2,
      resistorTrouble: troubleOf(given, resistor),
      verdict: judgeReforming(given.log, { ohms, timeConstantSeconds, targetVolts, doneAt: (volts) => doneAmps(volts, limitAmps, ohms) }),
    };
    const plot = plotOf(given, result);
    return {
      ok: true,
      result,
      headline: headlineOf(result),
      formula: formulaOf(given, result),
      caution,
      validity,
      source,
      ...(plot !== undefined && { plot }),
    };
  },
});
