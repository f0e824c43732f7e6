/** Series lamp: what the lamp and the supply behind it get, and which lamp to take. */
import { z } from 'zod';

import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import { bisect } from '@/shared/workings/bisect';
import type { Lamp, LampChoice } from '@/shared/workings/lamp';
import { brightnessInWords, coldOhms, CURRENT_EXPONENT, floorVolts, hotOhms, lampAmps, lampFor } from '@/shared/workings/lamp';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField } from '@/shared/workings/sheet';

const point = z.strictObject({
  lampVolts: z.number(),
  loadVolts: z.number(),
  amps: z.number(),
  lampWatts: z.number(),
  loadWatts: z.number(),
  /** False where the least disturbance carries it away, as on the upper branch of a constant-power load. */
  stable: z.boolean(),
  brightness: z.string(),
});

/** One state in which lamp and load agree. */
export type OperatingPoint = z.output<typeof point>;

/** What the lamp is in series with. */
export type LampLoad =
  | { readonly kind: 'short' }
  | { readonly kind: 'resistance'; readonly ohms: number }
  | { readonly kind: 'constant-power'; readonly watts: number };

const output = z.strictObject({
  points: z.array(point),
  /** The stable point, or null where there is none or the supply gives up there. */
  settled: point.nullable(),
  /** What a dead short behind the lamp does: the lamp takes the whole supply. */
  deadShort: point,
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

function pointAt(lamp: Lamp, lampVolts: number, loadVolts: number, stable: boolean): OperatingPoint {
  const amps = lampAmps(lamp, lampVolts);
  return {
    lampVolts,
    loadVolts,
    amps,
    lampWatts: lampVolts * amps,
    loadWatts: loadVolts * amps,
    stable,
    brightness: brightnessInWords(lamp, lampVolts),
  };
}

/** Lamp volts at which the load gets the most watts; below them the load sees a stiff source, above them a starving one. */
function peakVolts(lamp: Lamp, supplyVolts: number): number {
  // On the law (V − v)·v^0.55 peaks at 0.55/1.55 of V; on the cold filament (V − v)·v at V/2; between the two at the joint.
  const onLaw = (supplyVolts * CURRENT_EXPONENT) / (1 + CURRENT_EXPONENT);
  return Math.min(Math.max(onLaw, floorVolts(lamp)), supplyVolts / 2);
}

/**
 * Every state in which lamp and load agree, the stable one first.
 * @param supplyVolts rms
 * @returns one point for a resistance or a short; two, one or none for constant power
 */
export function operatingPoints(lamp: Lamp, supplyVolts: number, load: LampLoad): OperatingPoint[] {
  if (load.kind === 'short') return [pointAt(lamp, supplyVolts, 0, true)];
  if (load.kind === 'resistance') {
    const { ohms } = load;
    const lampVolts = bisect((volts) => volts + lampAmps(lamp, volts) * ohms - supplyVolts, 0, supplyVolts);
    return [pointAt(lamp, lampVolts, lampAmps(lamp, lampVolts) * ohms, true)];
  }
  const { watts } = load;
  const offered = (volts: number): number => (supplyVolts - volts) * lampAmps(lamp, volts);
  const peak = peakVolts(lamp, supplyVolts);
  if (offered(peak) < watts) return [];
  const lower = bisect((volts) => offered(volts) - watts, 0, peak);
  const upper = bisect((volts) => watts - offered(volts), peak, supplyVolts);
  // A load that holds its watts has a falling resistance −V/I; it settles only where the lamp's own rise is the smaller one.
  const stable = pointAt(lamp, lower, watts / lampAmps(lamp, lower), lower < peak);
  return lower < upper ? [stable, pointAt(lamp, upper, watts / lampAmps(lamp, upper), false)] : [stable];
}

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
  'transformer, rectifier and reservoir: taken as the resistance V mains² ÷ plate watts',
  'switch-mode: (V mains − V lamp) × I = watts; two points or none; the one with the lower lamp volts is stable',
  'lamp to take: 1 to 2 × plate watts for a transformer supply, 3 × or more for a switch-mode one',
];
const validity =
  'Settled rms values on a sine. The law is published for volts near the rated ones and is stretched here down to the cold filament; lamp amps spread by ±10 %. A rectifier draws its current in peaks, so its plate watts as a resistance are a first estimate. A halogen or LED lamp does not follow this law.';
const source =
  'Lamp law and exponent 0.55: Fink & Beaty, Standard Handbook for Electrical Engineers, 11th ed. (1978), p. 22-8. Hot-to-cold ratio 15: 144 Ω hot and about 9.5 Ω cold of a 100 W, 120 V lamp. Choice of lamp: common practice, no source.';
const caution =
  'The lamp limits current and does nothing else: everything on the mains side stays live at full mains volts, and the lamp is no switch. Through an RCD, behind a guard, nobody touching; local codes, the maker’s data and licensed practice come first.';

function loadOf(given: Inputs): LampLoad | SheetRefusal {
  if (given.load === 'short') return { kind: 'short' };
  if (given.load === 'resistance') {
    if (given.loadOhms === null) return { ok: false, field: 'loadOhms', say: 'Load ohms are missing.' };
    return { kind: 'resistance', ohms: given.loadOhms };
  }
  if (given.loadWatts === null) return { ok: false, field: 'loadWatts', say: 'Load watts are missing.' };
  if (given.load === 'rectifier') return { kind: 'resistance', ohms: (given.supplyVolts * given.supplyVolts) / given.loadWatts };
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
  return `Lamp ${volts(point.lampVolts)}, ${point.brightness}; load ${volts(point.loadVolts)}, ${amps(point.amps)}, ${watts(point.loadWatts)}.`;
}

function formulaOf(given: Inputs, load: LampLoad, result: SeriesLampResult): readonly string[] {
  const { deadShort } = result;
  const lines = [
    `I₀ = ${watts(given.lampWatts)} ÷ ${volts(given.lampVolts)} = ${amps(given.lampWatts / given.lampVolts)}`,
    `R hot = ${volts(given.lampVolts)}² ÷ ${watts(given.lampWatts)} = ${ohms(result.hotOhms)}; R cold = ${ohms(result.hotOhms)} ÷ ${formatNumber(given.coldRatio)} = ${ohms(result.coldOhms)}`,
  ];
  if (given.load === 'rectifier' && load.kind === 'resistance') {
    lines.push(`R load = ${volts(given.supplyVolts)}² ÷ ${watts(given.loadWatts ?? 0)} = ${ohms(load.ohms)}`);
  }
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
      recommended: given.loadWatts === null ? null : lampFor(given.loadWatts, given.load === 'switch-mode' ? 'switch-mode' : 'linear'),
    };
    return { ok: true, result, headline: headlineOf(given, result), formula: formulaOf(given, load, result), caution, validity, source };
  },
});
