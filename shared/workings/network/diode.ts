/** The diode as a circuit element: Shockley's equation behind a series resistance, as one current of one voltage. */

/** A diode's card, the same three figures that a SPICE model line calls IS, N and RS. */
export interface DiodeCard {
  readonly saturationAmps: number;
  /** Emission coefficient: 1 for one silicon junction, 2 for two in series taken as one. */
  readonly emission: number;
  /** Of the chip, its leads and what lies in the same path, such as the output choke; more than zero. */
  readonly seriesOhms: number;
}

/** kT/q at 27 °C, in volts (CODATA 2014: k = 1.38064852e−23 J/K, q = 1.6021766208e−19 C). */
export const THERMAL_VOLTS = (1.38064852e-23 * 300.15) / 1.6021766208e-19;

/** Leakage across every junction, in siemens, as circuit simulators have it. */
export const JUNCTION_SIEMENS = 1e-12;

const MOST_STEPS = 200;
/** Share of N Vt below which a last change of the junction's volts is as good as none. */
const NEAR = 1e-7;

/** A current with its slope, amps and siemens. */
export interface BranchCurrent {
  readonly amps: number;
  readonly siemens: number;
}

/**
 * Current from anode to cathode: i = IS (e^((v − i RS)/(N Vt)) − 1). Reverse breakdown is not in it.
 * @param volts anode against cathode, leads included
 */
export function diodeCurrent({ saturationAmps, emission, seriesOhms }: DiodeCard, volts: number): BranchCurrent {
  const scale = emission * THERMAL_VOLTS;
  // The volts across the junction alone; f is rising and convex and the start lies above its root, so Newton only descends.
  let junction = volts <= 0 ? volts : Math.min(volts, scale * Math.log1p(volts / (seriesOhms * saturationAmps)));
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const grown = Math.expm1(junction / scale);
    const siemens = (saturationAmps / scale) * (grown + 1) + JUNCTION_SIEMENS;
    const amps = saturationAmps * grown + JUNCTION_SIEMENS * junction;
    const change = (volts - junction - seriesOhms * amps) / (1 + seriesOhms * siemens);
    // What is left of the change is put on by the slope, which is exact to the last figure when it is this small.
    if (Math.abs(change) <= NEAR * scale) return { amps: amps + siemens * change, siemens: siemens / (1 + seriesOhms * siemens) };
    junction += change;
  }
  throw new Error('a descent that cannot miss has missed');
}
