/** Fuse and inrush: whether this fuse carries the load, stands the start, and when it blows. */
import { z } from 'zod';

import { formatDuration, formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { FuseGate } from '@/shared/workings/fuse';
import {
  breakingAmps,
  carryShare,
  FUSE_MOST_VOLTS,
  fuseGates,
  leastRating,
  PULSE_LIFE,
  PULSE_SHAPES,
  PULSE_SHARE,
} from '@/shared/workings/fuse';
import type { Plot, PlotCurve } from '@/shared/workings/plot';
import type { SheetAnswer, SheetRefusal } from '@/shared/workings/sheet';
import { choiceField, defineSheet, numberField } from '@/shared/workings/sheet';

const gate = z.strictObject({ times: z.number(), leastSeconds: z.number().nullable(), mostSeconds: z.number().nullable() });

const output = z.strictObject({
  /** Amps that it may carry for good. */
  carryAmps: z.number(),
  carries: z.boolean(),
  /** Least usual rating of that standard that carries the load; null where none does. */
  leastRating: z.number().nullable(),
  gates: z.array(gate),
  /** From these amps on it must blow, within the time of that test point. */
  blowsFromAmps: z.number(),
  blowsWithinSeconds: z.number(),
  breakingAmps: z.number(),
  /** Whether it breaks the fault current; null when that is not given. */
  breaks: z.boolean().nullable(),
  pulse: z
    .strictObject({
      ampSquaredSeconds: z.number(),
      /** Share of the melting value; null when that is not given. */
      share: z.number().nullable(),
      /** Least melting value that stands the wanted starts; null when more are wanted than the chart has. */
      leastMelting: z.number().nullable(),
      /** Starts that it stands, of the chart's 100 000, 10 000, 1000 and 100; 0 when it may blow at the first; null when not known. */
      starts: z.number().nullable(),
      stands: z.boolean().nullable(),
    })
    .nullable(),
});

/** Result of the sheet; nothing rounded. */
export type FuseInrushResult = z.output<typeof output>;

const inputs = z.strictObject({
  standard: choiceField('Standard', 'As marked: IEC 60127 (5 × 20 mm, F or T before the amps), or UL/CSA 248-14', [
    'iec-60127',
    'ul-248-14',
  ]).default('iec-60127'),
  speed: choiceField('Speed', 'F is fast, T is slow', ['fast', 'slow']).default('slow'),
  ratedAmps: numberField({ title: 'Rated current', description: 'As marked on the cap', unit: 'A', min: 0.01, max: 30 }),
  volts: numberField({
    title: 'Circuit volts',
    description: 'Mains volts, rms; it counts for the short that the fuse can break',
    unit: 'V',
    min: 1,
    max: FUSE_MOST_VOLTS,
  }).default(FUSE_MOST_VOLTS),
  loadAmps: numberField({
    title: 'Steady current',
    description: 'Rms amps once it runs; plate volt-amps divided by mains volts is the most',
    unit: 'A',
    min: 0,
    max: 100,
  }),
  peakAmps: numberField({
    title: 'Peak at switch-on',
    description: 'Peak of the start pulse, scope on a shunt or mains peak through all ohms in the way; empty when not known',
    unit: 'A',
    min: 0.001,
    max: 100_000,
  })
    .nullable()
    .default(null),
  pulseSeconds: numberField({
    title: 'Pulse time',
    description: 'Length of the pulse; for an exponential its time constant',
    unit: 's',
    min: 1e-6,
    max: 10,
  })
    .nullable()
    .default(null),
  shape: choiceField(
    'Pulse shape',
    'Half a sine for a transformer, exponential for a capacitor through a resistance',
    PULSE_SHAPES,
  ).default('half-sine'),
  starts: numberField({
    title: 'Starts',
    description: 'How many switch-ons it is to last, ten seconds or more apart',
    unit: null,
    min: 1,
    max: 100_000,
  }).default(10_000),
  melting: numberField({
    title: 'Melting I²t',
    description: 'Nominal melting value from the maker’s data sheet; empty when not known',
    unit: 'A²s',
    min: 1e-6,
    max: 1e6,
  })
    .nullable()
    .default(null),
  faultAmps: numberField({
    title: 'Fault current',
    description: 'What a dead short behind the fuse can draw; empty when not known',
    unit: 'A',
    min: 0.1,
    max: 1e6,
  })
    .nullable()
    .default(null),
});

type Inputs = z.output<typeof inputs>;

const law = [
  'may carry for good: IEC 60127 all of its rating; UL 248-14 three quarters of it at 25 °C',
  'must not blow: IEC 1.5 × rated for an hour · must blow: IEC from 2.1 × rated, UL from 1.35 × rated within an hour',
  'pulse I²t = share × peak² × time; share: square 1, half-sine and exponential ½, triangle ⅓, parabola ⅕',
  'stands 100 000 starts at 22 % of its melting value, 10 000 at 29 %, 1000 at 38 %, 100 at 48 %',
];
const validity =
  'Fuse-links at room temperature; a hot place or a tired holder carries less. Test points of IEC 60127 are those of 5 × 20 mm glass fuses of 125 mA to 6.3 A (sheets 2 and 3); ceramic ones (sheets 1 and 5) blow a little otherwise and break 1500 A. Alternating current: a fuse breaks far less d.c. The chart of starts is one maker’s. Below its must-blow amps a fuse protects nothing: a rail that draws twice too much may smoulder behind it for good.';
const source =
  'UL/CSA 248-14 test points, breaking ratings, pulse shapes and starts: Littelfuse fuse guide. Three quarters: L. Lundy, EDN, 26 September 1996. IEC 60127-2, sheets 2 and 3, as printed in makers’ data sheets; 150 % and 210 %: standard, as quoted.';
const caution =
  'Replace a fuse by the same amps, speed, standard and breaking capacity only, dead, and never by a larger one to see what happens: the reason that it blew comes first. T3A to IEC is not a 3 A slow-blow to UL. Local codes, the maker’s data and licensed practice come first.';

const a = (value: number): string => formatQuantity(value, 'A', { digits: 3 });
const i2t = (value: number): string => formatQuantity(value, 'A²s', { digits: 3 });
const t = (value: number): string => formatDuration(value);

/** How many starts of the chart a share of the melting value allows; 0 above the chart's largest share. */
function startsAt(share: number): number {
  return PULSE_LIFE.find(([, most]) => share <= most * (1 + 1e-12))?.[0] ?? 0;
}

function shareFor(starts: number): number {
  // The chart's next larger number of starts: in between, the careful side.
  return [...PULSE_LIFE].reverse().find(([pulses]) => pulses >= starts)?.[1] ?? 0.22;
}

function pulseOf(given: Inputs): FuseInrushResult['pulse'] {
  const { peakAmps, pulseSeconds, melting } = given;
  if (peakAmps === null || pulseSeconds === null) return null;
  const ampSquaredSeconds = PULSE_SHARE[given.shape] * peakAmps * peakAmps * pulseSeconds;
  const leastMelting = ampSquaredSeconds / shareFor(given.starts);
  if (melting === null) return { ampSquaredSeconds, share: null, leastMelting, starts: null, stands: null };
  const share = ampSquaredSeconds / melting;
  return { ampSquaredSeconds, share, leastMelting, starts: startsAt(share), stands: melting >= leastMelting * (1 - 1e-12) };
}

const mustBlow = (gates: readonly FuseGate[]): { times: number; seconds: number } => {
  const found = gates.find(({ mostSeconds }) => mostSeconds !== null);
  return { times: found?.times ?? 0, seconds: found?.mostSeconds ?? 0 };
};

function headlineOf(given: Inputs, result: FuseInrushResult): string {
  const { pulse, leastRating: least } = result;
  if (result.breaks === false)
    return `Cannot break it safely: a short draws ${a(given.faultAmps ?? 0)}, this fuse breaks ${a(result.breakingAmps)}. Take one of high breaking capacity.`;
  if (!result.carries)
    return `Too small: it may carry ${a(result.carryAmps)} for good, the load draws ${a(given.loadAmps)}. ${least === null ? 'No usual miniature fuse carries that.' : `The least usual rating is ${a(least)}.`}`;
  const blows = `Blows from ${a(result.blowsFromAmps)} on, within ${t(result.blowsWithinSeconds)}.`;
  if (pulse === null) return `Carries the ${a(given.loadAmps)}. ${blows}`;
  if (pulse.stands === null || pulse.starts === null)
    return `Carries the ${a(given.loadAmps)}; the start of ${i2t(pulse.ampSquaredSeconds)} wants a melting value of ${i2t(pulse.leastMelting ?? 0)} or more. ${blows}`;
  const share = `the start takes ${formatNumber((pulse.share ?? 0) * 100, 3)} % of its melting value`;
  if (pulse.stands) return `Holds: ${share}, good for ${formatNumber(pulse.starts)} starts. ${blows}`;
  return pulse.starts === 0
    ? `May blow at the first start: ${share}.`
    : `Will tire: ${share}, good for ${formatNumber(pulse.starts)} starts only.`;
}

function formulaOf(given: Inputs, result: FuseInrushResult): readonly string[] {
  const { pulse } = result;
  const lines = [
    `may carry ${formatNumber(carryShare(given.standard) * 100)} % × ${a(given.ratedAmps)} = ${a(result.carryAmps)}; load ${a(given.loadAmps)}`,
    ...result.gates.map(({ times, leastSeconds, mostSeconds }) => {
      const when =
        leastSeconds === null
          ? `blows within ${t(mostSeconds ?? 0)}`
          : mostSeconds === null
            ? `does not blow in ${t(leastSeconds)}`
            : `blows after ${t(leastSeconds)} to ${t(mostSeconds)}`;
      return `${formatNumber(times)} × ${a(given.ratedAmps)} = ${a(times * given.ratedAmps)}: ${when}`;
    }),
  ];
  if (pulse !== null) {
    lines.push(
      `pulse: ${formatNumber(PULSE_SHARE[given.shape], 3)} × (${a(given.peakAmps ?? 0)})² × ${t(given.pulseSeconds ?? 0)} = ${i2t(pulse.ampSquaredSeconds)}`,
      `${formatNumber(given.starts, 6)} starts want ${i2t(pulse.ampSquaredSeconds)} ÷ ${formatNumber(shareFor(given.starts) * 100)} % = ${i2t(pulse.leastMelting ?? 0)} of melting value${given.melting === null ? '' : `; it has ${i2t(given.melting)}`}`,
    );
  }
  lines.push(
    `breaks at least ${a(result.breakingAmps)} at ${formatQuantity(given.volts, 'V', { digits: 3 })}${given.faultAmps === null ? '' : `; a short draws ${a(given.faultAmps)}`}`,
  );
  return lines;
}

/** Times from which the plot begins and at which it ends. */
const [SHORTEST, LONGEST] = [1e-3, 10_000];

function plotOf(given: Inputs, result: FuseInrushResult): Plot {
  const edge = (side: 'leastSeconds' | 'mostSeconds'): readonly (readonly [number, number])[] =>
    result.gates.flatMap((one): (readonly [number, number])[] => {
      const seconds = one[side];
      return seconds === null ? [] : [[one.times * given.ratedAmps, seconds] as const];
    });
  const curves: PlotCurve[] = [
    { label: 'blows at the latest', points: edge('mostSeconds'), role: 'main' },
    { label: 'holds at least', points: edge('leastSeconds'), role: 'bound' },
  ];
  const pulse = given.peakAmps === null || given.pulseSeconds === null ? null : { x: given.peakAmps, y: given.pulseSeconds };
  const most = Math.max(20 * given.ratedAmps, 2 * (pulse?.x ?? 0), 2 * given.loadAmps);
  return {
    title: 'Time over current',
    x: { title: 'Current', unit: 'A', scale: 'log', from: given.ratedAmps / 2, to: most },
    y: { title: 'Time', unit: 's', scale: 'log', from: Math.min(SHORTEST, (pulse?.y ?? SHORTEST) / 2), to: LONGEST },
    curves: curves.filter(({ points }) => points.length > 1),
    points: pulse === null ? [] : [{ label: 'start pulse', ...pulse, role: 'answer' }],
    bands: [],
    limits: [
      { label: 'may carry', axis: 'x', at: result.carryAmps },
      ...(given.loadAmps > 0 ? [{ label: 'load', axis: 'x' as const, at: given.loadAmps }] : []),
    ],
    words: `The test points of the fuse: from ${a(result.blowsFromAmps)} on it must blow, the sooner the more flows.${pulse === null ? '' : ` The start is a point at ${a(pulse.x)} and ${t(pulse.y)}.`} The load of ${a(given.loadAmps)} lies ${result.carries ? 'below' : 'above'} what the fuse may carry.`,
  };
}

/** Fuse and inrush. */
export const sheet = defineSheet({
  id: 'fuse-inrush',
  title: 'Fuse and inrush',
  question: 'Does this fuse carry the load, stand the start, and when does it blow?',
  inputs,
  output,
  law,
  validity,
  source,
  caution,
  checks: [
    'Test points and breaking ratings of UL 248-14: Littelfuse fuse guide',
    'Test points of IEC 60127-2, sheets 2 and 3: Littelfuse data sheets 617 and 218, Schurter data sheet FST 5×20',
    'Pulse shapes, starts, and the load ratio of a fuse for a 60 A²s pulse: fuse makers’ guides',
  ],
  example: { ratedAmps: 1, speed: 'slow', loadAmps: 0.55, peakAmps: 12, pulseSeconds: 0.01, melting: 3, faultAmps: 30 },
  compute(given): SheetAnswer<FuseInrushResult> | SheetRefusal {
    if ((given.peakAmps === null) !== (given.pulseSeconds === null))
      return given.peakAmps === null
        ? { ok: false, field: 'peakAmps', say: 'A pulse time without its peak says nothing: give both or neither.' }
        : { ok: false, field: 'pulseSeconds', say: 'A peak without its time says nothing: give both or neither.' };
    if (given.peakAmps !== null && given.peakAmps < given.loadAmps)
      return { ok: false, field: 'peakAmps', say: 'The peak at switch-on must not be below the steady current.' };
    const gates = fuseGates(given.standard, given.speed);
    const blow = mustBlow(gates);
    const carryAmps = carryShare(given.standard) * given.ratedAmps;
    const breaking = breakingAmps(given.standard, given.ratedAmps, given.volts);
    const result: FuseInrushResult = {
      carryAmps,
      carries: given.loadAmps <= carryAmps * (1 + 1e-12),
      leastRating: leastRating(given.standard, given.loadAmps),
      gates: [...gates],
      blowsFromAmps: blow.times * given.ratedAmps,
      blowsWithinSeconds: blow.seconds,
      breakingAmps: breaking,
      breaks: given.faultAmps === null ? null : given.faultAmps <= breaking,
      pulse: pulseOf(given),
    };
    const plot = plotOf(given, result);
    return { ok: true, result, headline: headlineOf(given, result), formula: formulaOf(given, result), caution, validity, source, plot };
  },
});
