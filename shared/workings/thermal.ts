/** Heat on its way from a junction to the air: thermal resistances in a row, like resistors. */

/** Way of the heat, each in kelvin per watt. */
export interface ThermalPath {
  readonly junctionToCase: number;
  readonly caseToSink: number;
  readonly sinkToAir: number;
}

/** Temperatures along the way, in °C. */
export interface ThermalState {
  readonly junction: number;
  readonly case: number;
  readonly sink: number;
}

/**
 * Settled temperatures: each is the next cooler one plus watts × K/W.
 * @param watts heat of one device, zero or more
 * @param ambient air at the heatsink, °C
 * @param alike devices alike that share the heatsink, each with its own case
 */
export function settledTemperatures(watts: number, path: ThermalPath, ambient: number, alike = 1): ThermalState {
  const sink = ambient + watts * alike * path.sinkToAir;
  const atCase = sink + watts * path.caseToSink;
  return { junction: atCase + watts * path.junctionToCase, case: atCase, sink };
}

/**
 * Most K/W that the heatsink may have for the junction to stay at its limit.
 * @returns below zero when no heatsink can do it
 */
export function mostSinkToAir(
  watts: number,
  path: Omit<ThermalPath, 'sinkToAir'>,
  ambient: number,
  junctionLimit: number,
  alike = 1,
): number {
  return ((junctionLimit - ambient) / watts - path.junctionToCase - path.caseToSink) / alike;
}
