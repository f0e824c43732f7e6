/** Series lamp: what the lamp and the supply behind it get, and which lamp to take. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Lamp, LampChoice } from '@/shared/workings/lamp';
import { coldOhms, hotOhms, lampAmps, lampFor } from '@/shared/workings/lamp';
import { lampPlot } from '@/shared/workings/lampPlot';
import type { LampLoad } from '@/shared/workings/lampPoints';
import { operatingPoint, operatingPoints, peakVolts, pointAt, reservoirOhms } from '@/shared/workings/lampPoints';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField } from '@/shared/workings/sheet';

const output = z.strictObject({
  points: z.array(operatingPoint),
  /** The stable point, or null where there is none or the supply gives up there. */
  settled: operatingPoint.nullable(),
  /** What a dead short behind the lamp does: the lamp takes the whole supply. */
  deadShort: operatingPoint,
  /** Switch-mode only: it starts, starves and stops over and over. */
  willTick: z.boolean(),
  /** Most watts that any load can draw through this lamp. */
  mostLoadWatts: z.number(),
  hotOhms: z.number(),
  coldOhms: z.number(),
  /** First moment of a dead short, at the peak of the mains, filament cold. */
  coldPeakAmps: z.number(),
  recommended: z
    .strictObject({
      leastWatts: z.number(),
      mostWatts: z.number().nullable(),
      count: z.number(),
      eachWatts: z.number(),
      totalWatts: z.number(),
    })
    .nullable(),
});

/** Result of the sheet; nothing rounded. */
export type SeriesLampResult = z.output<typeof output>;

/** Share of the mains volts below which a switch-mode supply is taken to give up. Common practice, no source. */
export const GIVES_UP_SHARE = 0.7;

const inputs = z.strictObject({
  supplyVolts: numberField({ title: 'Mains volts', description: 'Mains volts, rms', unit: 'V', min: 6, max: 480 }),
  lampVolts: numberField({ title: 'Lamp volts', description: 'Rated volts of the lamp', unit: 'V', min: 6, max: 480 }),
  lampWatts: numberField({
    title: 'Lamp watts',
    description: 'Rated watts of the lamp; for lamps in parallel their sum',
    unit: 'W',
    min: 1,
    max: 10_000,
  }),
  coldRatio: numberField({
    title: 'Hot-to-cold ratio',
    description: 'Hot resistance divided by cold resistance; 15 for a mains lamp, 6 to 7 for a small one',
    unit: null,
    min: 2,
    max: 25,
  }).default(15),
  load: choiceField('Load', 'What is behind the lamp; rectifier is a transformer supply with reservoir', [
    'resistance',
    'rectifier',
    'switch-mode',
    'short',
  ]),
  loadOhms: numberField({ title: 'Load ohms', description: 'For a resistance', unit: 'Ω', min: 0.001, max: 10e6 }).nullable().default(null),
  loadWatts: numberField({
    title: 'Load watts',
    description: 'Plate watts of the supply, or what it draws as it stands',
    unit: 'W',
    min: 0.01,
    max: 100_000,
  })
    .nullable()
    .default(null),
});

type Inputs = z.output<typeof inputs>;

const law = [
  'I₀ = W₀ ÷ V₀,  I = I₀ × (V ÷ V₀)^0.55,  never more than V ÷ R cold,  R cold = V₀² ÷ W₀ ÷ ratio',
  'resistance: V lamp + I × R = V mains',
  'transformer, rectifier and reservoir: R load = (√2 × V mains)² ÷ plate watts;  tan θ − θ = π × R lamp ÷ (2 × R load);  reservoir cos θ of its volts',
  'switch-mode: (V mains − V lamp) × I = watts; two points or none; the one with the lower lamp volts is stable',
  'lamp to take: 1 to 2 × plate watts for a transformer supply, 3 × or more for a switch-mode one',
];
const validity =
  'Settled rms values on a sine. The law is published for volts near the rated ones and is stretched here down to the cold filament; lamp amps spread by ±10 %. A rectifier’s current comes in pulses: its reservoir is taken as large, its load as one that falls with the volts, its transformer as ideal; a regulator that holds its amps pulls the reservoir lower. A halogen or LED lamp does not follow this law.';
const source =
  'Lamp law and exponent 0.55: Fink & Beaty, Standard Handbook for Electrical Engineers, 11th ed. (1978), p. 22-8. Hot-to-cold ratio 15: 144 Ω hot and about 9.5 Ω cold of a 100 W, 120 V lamp. Rectifier behind a resistance: Schade (1943), any textbook. Choice of lamp: common practice, no source.';
const caution =
  'The lamp limits current and does nothing else: everything on the mains side stays live at full mains volts, and the lamp is no switch. Through an RCD, behind a guard, nobody touching; local codes, the maker’s data and licensed practice come first.';

function loadOf(given: Inputs): LampLoad | SheetRefusal {
  if (given.load === 'short') return { kind: 'short' };
  if (given.load === 'resistance') {
    if (given.loadOhms === null) return { ok: false, field: 'loadOhms', say: 'Load ohms are missing.' };
    return { kind: 'resistance', ohms: given.loadOhms };
  }
  if (given.loadWatts === null) return { ok: false, field: 'loadWatts', say: 'Load watts are missing.' };
  if (given.load === 'rectifier') return { kind: 'reservoir', watts: given.loadWatts };
  return { kind: 'constant-power', watts: given.loadWatts };
}

const volts = (value: number): string => formatQuantity(value, 'V', { digits: 3 });
const amps = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const watts = (value: number): string => formatQuantity(value, 'W', { digits: 3 });
const ohms = (value: number): string => formatQuantity(value, 'Ω', { digits: 3 });
const lampsInWords = ({ count, eachWatts }: LampChoice): string =>
  count === 1 ? `a lamp of ${watts(eachWatts)}` : `${count} lamps of ${watts(eachWatts)} in parallel`;

function headlineOf(given: Inputs, result: SeriesLampResult): string {
  const { settled, deadShort, willTick, recommended } = result;
  if (willTick) {
    const better = recommended === null ? '' : ` Take ${lampsInWords(recommended)} or more.`;
    return `Will tick: ${watts(given.lampWatts)} of lamp cannot carry a switch-mode supply of ${watts(given.loadWatts ?? 0)}.${better}`;
  }
  const point = settled ?? deadShort;
  if (point.reservoirShare !== null) {
    return `Lamp ${volts(point.lampVolts)}, ${point.brightness}; the reservoir comes to ${formatNumber(point.reservoirShare * 100, 2)} % of its volts, ${amps(point.amps)}, ${watts(point.loadWatts)}.`;
  }
  return `Lamp ${volts(point.lampVolts)}, ${point.brightness}; load ${volts(point.loadVolts)}, ${amps(point.amps)}, ${watts(point.loadWatts)}.`;
}

function formulaOf(given: Inputs, load: LampLoad, result: SeriesLampResult): readonly string[] {
  const { deadShort } = result;
  const lines = [
    `I₀ = ${watts(given.lampWatts)} ÷ ${volts(given.lampVolts)} = ${amps(given.lampWatts / given.lampVolts)}`,
    `R hot = ${volts(given.lampVolts)}² ÷ ${watts(given.lampWatts)} = ${ohms(result.hotOhms)}; R cold = ${ohms(result.hotOhms)} ÷ ${formatNumber(given.coldRatio)} = ${ohms(result.coldOhms)}`,
  ];
  if (load.kind === 'reservoir') {
    const [point] = result.points;
    lines.push(
      `R load = (√2 × ${volts(given.supplyVolts)})² ÷ ${watts(load.watts)} = ${ohms(reservoirOhms(given.supplyVolts, load.watts))}`,
    );
    if (point !== undefined)
      lines.push(
        `lamp ${volts(point.lampVolts)}, inlet ${volts(point.loadVolts)} r.m.s. at ${amps(point.amps)}; reservoir ${formatNumber((point.reservoirShare ?? 0) * 100, 3)} % of its volts at full mains; lamp ${watts(point.lampWatts)}, load ${watts(point.loadWatts)}`,
      );
  } else
    for (const point of result.points) {
      lines.push(
        `${volts(point.lampVolts)} + ${volts(point.loadVolts)} = ${volts(given.supplyVolts)} at ${amps(point.amps)}; lamp ${watts(point.lampWatts)}, load ${watts(point.loadWatts)}${point.stable ? '' : ' (not stable)'}`,
      );
    }
  if (load.kind === 'constant-power') {
    lines.push(`most that this lamp lets through: ${watts(result.mostLoadWatts)}; wanted: ${watts(load.watts)}`);
    const [first] = result.points;
    if (result.willTick && first !== undefined) {
      lines.push(
        `${volts(first.loadVolts)} is less than ${formatNumber(GIVES_UP_SHARE * 100)} % of the mains, where such a supply gives up (common practice, no source)`,
      );
    }
  }
  lines.push(
    `dead short: lamp ${volts(deadShort.lampVolts)}, ${deadShort.brightness}, ${amps(deadShort.amps)}; first moment up to ${amps(result.coldPeakAmps)}`,
  );
  if (result.recommended !== null) lines.push(`lamp to take: ${lampsInWords(result.recommended)}`);
  return lines;
}

/** Series lamp. */
export const sheet = defineSheet({
  id: 'series-lamp',
  title: 'Series lamp',
  question: 'What do the lamp and the supply behind it get, and which lamp is right?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'Re-rating exponents: Standard Handbook for Electrical Engineers, as quoted',
    'Worked example of a tungsten lamp at 105 % current: SPIE Field Guide to Illumination, p. 21',
    'Rectifier and reservoir behind a resistance: closed form, and transients in ngspice within 1 %',
    'Resistance and constant power: operating points of generated networks in ngspice, within 0.1 %',
    'Measured cold and hot resistance of a 3 V lamp: New Physics: Sae Mulli 74 (3), 311',
  ],
  example: { supplyVolts: 120, lampVolts: 120, lampWatts: 100, load: 'rectifier', loadWatts: 75 },
  compute(given): SheetAnswer<SeriesLampResult> | SheetRefusal {
    const { supplyVolts, lampVolts, lampWatts, coldRatio } = given;
    if (lampVolts < supplyVolts / 1.15) {
      return {
        ok: false,
        field: 'lampVolts',
        say: `A lamp for ${volts(lampVolts)} burns out at once when the load is a dead short on ${volts(supplyVolts)}. Take a lamp for the mains volts, or alike lamps in series and enter their summed volts and watts.`,
      };
    }
    const load = loadOf(given);
    if ('ok' in load) return load;
    // A short has no plate watts; a resistance has those of the mains across it.
    const plate =
      load.kind === 'short' ? given.loadWatts : load.kind === 'resistance' ? (supplyVolts * supplyVolts) / load.ohms : load.watts;
    const lamp: Lamp = { ratedVolts: lampVolts, ratedWatts: lampWatts, coldRatio };
    const points = operatingPoints(lamp, supplyVolts, load);
    const settled = points.find((point) => point.stable) ?? null;
    const peak = peakVolts(lamp, supplyVolts);
    const willTick = load.kind === 'constant-power' && (settled === null || settled.loadVolts < GIVES_UP_SHARE * supplyVolts);
    const result: SeriesLampResult = {
      points,
      settled: willTick ? null : settled,
      deadShort: pointAt(lamp, supplyVolts, 0, true),
      willTick,
      mostLoadWatts: (supplyVolts - peak) * lampAmps(lamp, peak),
      hotOhms: hotOhms(lamp),
      coldOhms: coldOhms(lamp),
      coldPeakAmps: (supplyVolts * Math.SQRT2) / coldOhms(lamp),
      recommended: plate === null ? null : lampFor(plate, given.load === 'switch-mode' ? 'switch-mode' : 'linear'),
    };
    return {
      ok: true,
      result,
      headline: headlineOf(given, result),
      formula: formulaOf(given, load, result),
      caution,
      validity,
      source,
      plot: lampPlot(lamp, supplyVolts, load, points),
    };
  },
});
