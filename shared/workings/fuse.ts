/** What two fuse standards promise, and what a start pulse does to a fuse. They are not interchangeable: the same amps mean different fuses. */

/** The standard that a fuse is marked to. Old fuses of North America are nearest to UL 248-14, of Europe to IEC 60127. */
export type FuseStandard = 'iec-60127' | 'ul-248-14';

/** F or T on the cap. */
export type FuseSpeed = 'fast' | 'slow';

/** One test point: at so many times the rated amps it blows no sooner than `leastSeconds` and no later than `mostSeconds`. */
export interface FuseGate {
  readonly times: number;
  readonly leastSeconds: number | null;
  readonly mostSeconds: number | null;
}

const HOUR = 3600;

/** IEC 60127-2 sheet 2 (5 × 20 mm, F, low breaking capacity) and sheet 3 (T), 125 mA to 6.3 A, as printed in makers’ data sheets. */
const IEC_GATES: Readonly<Record<FuseSpeed, readonly FuseGate[]>> = {
  fast: [
    { times: 1.5, leastSeconds: HOUR, mostSeconds: null },
    { times: 2.1, leastSeconds: null, mostSeconds: 1800 },
    { times: 2.75, leastSeconds: 0.05, mostSeconds: 2 },
    { times: 4, leastSeconds: 0.01, mostSeconds: 0.3 },
    { times: 10, leastSeconds: null, mostSeconds: 0.02 },
  ],
  slow: [
    { times: 1.5, leastSeconds: HOUR, mostSeconds: null },
    { times: 2.1, leastSeconds: null, mostSeconds: 120 },
    { times: 2.75, leastSeconds: 0.6, mostSeconds: 10 },
    { times: 4, leastSeconds: 0.15, mostSeconds: 3 },
    { times: 10, leastSeconds: 0.02, mostSeconds: 0.3 },
  ],
};

/** UL/CSA 248-14, up to 30 A: carries 100 %, blows at 135 % within an hour and at 200 % within two minutes; fast and slow alike. */
const UL_GATES: readonly FuseGate[] = [
  { times: 1.35, leastSeconds: null, mostSeconds: HOUR },
  { times: 2, leastSeconds: null, mostSeconds: 120 },
];

/** The test points of a fuse. */
export function fuseGates(standard: FuseStandard, speed: FuseSpeed): readonly FuseGate[] {
  return standard === 'iec-60127' ? IEC_GATES[speed] : UL_GATES;
}

/** Share of its rated amps that a fuse may carry for good: all of it to IEC 60127, three quarters to UL 248-14 (at 25 °C). */
export function carryShare(standard: FuseStandard): number {
  return standard === 'iec-60127' ? 1 : 0.75;
}

/** Shape of a start pulse. For `exponential` the time is the time constant, for all others the whole length. */
export const PULSE_SHAPES = ['square', 'half-sine', 'triangle', 'exponential', 'parabola'] as const;
export type PulseShape = (typeof PULSE_SHAPES)[number];

/** Melting value of a pulse in units of peak² × time (Littelfuse fuse guide, chart 1). */
export const PULSE_SHARE: Readonly<Record<PulseShape, number>> = {
  square: 1,
  'half-sine': 1 / 2,
  triangle: 1 / 3,
  exponential: 1 / 2,
  parabola: 1 / 5,
};

/** Share of its melting value that a fuse stands so many times, ten seconds or more apart (Littelfuse fuse guide, chart 2). */
export const PULSE_LIFE: readonly (readonly [pulses: number, share: number])[] = [
  [100_000, 0.22],
  [10_000, 0.29],
  [1000, 0.38],
  [100, 0.48],
];

/** Volts up to which the usual fuses of both standards are rated. */
export const FUSE_MOST_VOLTS = 250;

/**
 * The most amps that a fuse breaks safely.
 * @param volts a.c. of the circuit, up to 250
 * @returns glass fuse to IEC 60127-2: 35 A or ten times rated, whichever is more; UL 248-14: 10 kA up to 125 V, else by its rating, at least
 */
export function breakingAmps(standard: FuseStandard, ratedAmps: number, volts: number): number {
  if (standard === 'iec-60127') return Math.max(35, 10 * ratedAmps);
  if (volts <= 125) return 10_000;
  if (ratedAmps <= 1) return 35;
  if (ratedAmps <= 3.5) return 100;
  if (ratedAmps <= 10) return 200;
  return ratedAmps <= 15 ? 750 : 1500;
}

/** Usual ratings in amps: R10 of ISO 3 as fuses to IEC 60127 are made, with the round ones that UL fuses come in. */
const RATINGS: Readonly<Record<FuseStandard, readonly number[]>> = {
  'iec-60127': [0.1, 0.125, 0.16, 0.2, 0.25, 0.315, 0.4, 0.5, 0.63, 0.8, 1, 1.25, 1.6, 2, 2.5, 3.15, 4, 5, 6.3, 8, 10, 12.5, 16],
  'ul-248-14': [0.1, 0.125, 0.2, 0.25, 0.3, 0.375, 0.5, 0.75, 1, 1.25, 1.5, 2, 2.5, 3, 4, 5, 6, 7, 8, 10, 12, 15, 20, 25, 30],
};

/** The least usual rating that carries so many amps for good; null where none does. */
export function leastRating(standard: FuseStandard, loadAmps: number): number | null {
  return RATINGS[standard].find((rating) => rating * carryShare(standard) >= loadAmps * (1 - 1e-12)) ?? null;
}
