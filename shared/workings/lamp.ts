/** The incandescent lamp as a circuit element: the published re-rating law with a floor at its cold resistance. */
import { LAMP_WATTS } from '@/shared/workings/preferred';

/** Exponent of current on volts (Fink & Beaty, Standard Handbook for Electrical Engineers, 11th ed., p. 22-8). */
export const CURRENT_EXPONENT = 0.55;

/** One lamp, or several alike in parallel taken as one of their total watts. */
export interface Lamp {
  readonly ratedVolts: number;
  readonly ratedWatts: number;
  /** Hot resistance at rated volts divided by cold resistance; about 15 for a mains lamp, 6 to 7 for a small one. */
  readonly coldRatio: number;
}

/** Resistance at rated volts, in ohms. */
export const hotOhms = (lamp: Lamp): number => (lamp.ratedVolts * lamp.ratedVolts) / lamp.ratedWatts;

/** Resistance with the filament cold, in ohms. */
export const coldOhms = (lamp: Lamp): number => hotOhms(lamp) / lamp.coldRatio;

/**
 * Resistance when settled at some volts. The law alone would let it fall to nothing at no volts; a filament does not.
 * @param volts rms, zero or more
 */
export function lampOhms(lamp: Lamp, volts: number): number {
  const law = hotOhms(lamp) * (volts / lamp.ratedVolts) ** (1 - CURRENT_EXPONENT);
  return Math.max(coldOhms(lamp), law);
}

/**
 * Settled current: I = I₀ (V/V₀)^0.55, never more than the cold filament would take.
 * @param volts rms, zero or more
 * @returns amps
 */
export function lampAmps(lamp: Lamp, volts: number): number {
  return volts / lampOhms(lamp, volts);
}

/** Volts below which the filament counts as cold. */
export function floorVolts(lamp: Lamp): number {
  return lamp.ratedVolts * (1 / lamp.coldRatio) ** (1 / (1 - CURRENT_EXPONENT));
}

/**
 * What the eye sees. The steps come from filament temperature 2800 K · r^0.42 (re-rating law): no glow below 800 K, dull
 * red to 1100 K, orange to 1600 K, yellow to 2400 K. The words and the rated 2800 K are common practice, no source.
 */
export function brightnessInWords(lamp: Lamp, volts: number): string {
  const kelvin = 2800 * (volts / lamp.ratedVolts) ** 0.42;
  if (kelvin < 800) return 'dark';
  if (kelvin < 1100) return 'dull red';
  if (kelvin < 1600) return 'dim orange';
  if (kelvin < 2400) return 'yellow, clearly lit';
  return 'full, or nearly';
}

/** How the supply under test draws its power. */
export type SupplyKind = 'linear' | 'switch-mode';

/** The lamp that suits a supply. */
export interface LampChoice {
  /** Least and most watts of lamp at mains volts; null where more only limits less. */
  readonly leastWatts: number;
  readonly mostWatts: number | null;
  /** Usual lamps that give it, alike and in parallel. */
  readonly count: number;
  readonly eachWatts: number;
  readonly totalWatts: number;
}

/**
 * The lamp for a plate rating: 1 to 2 × the plate's volt-amps for a linear supply, 3 × or more for a switch-mode one, which
 * otherwise starts, starves and stops. Common practice, no source; 3 × also follows from the lamp law (a constant-power
 * load above 0.365 of the lamp's rated watts has no operating point).
 * @param plateVoltAmps more than zero
 */
export function lampFor(plateVoltAmps: number, supplyKind: SupplyKind): LampChoice {
  const leastWatts = supplyKind === 'linear' ? plateVoltAmps : 3 * plateVoltAmps;
  const mostWatts = supplyKind === 'linear' ? 2 * plateVoltAmps : null;
  const largest = LAMP_WATTS[LAMP_WATTS.length - 1] ?? 500;
  const count = Math.max(1, Math.ceil(leastWatts / largest));
  const eachWatts = LAMP_WATTS.find((watts) => watts * count >= leastWatts) ?? largest;
  return { leastWatts, mostWatts, count, eachWatts, totalWatts: count * eachWatts };
}
