/** The stages of reforming an electrolytic, and the resistor that keeps it from harm meanwhile. */
import { nextE24, RESISTOR_WATTS } from '@/shared/workings/preferred';

/** Heat inside the can at which to stop. Common practice, no source. */
export const STOP_WATTS = 1;
/** Short-circuit current of the jig, where the allowed leakage does not ask for more: 90 kΩ at 450 V, amateur practice as published. */
export const JIG_AMPS = 5e-3;
/** Share of the volts that may be lost in the resistor when a stage is done. Common practice, no source. */
const LOST_SHARE = 0.1;

/** One stage. */
export interface ReformStage {
  readonly share: number;
  /** Set on the supply. */
  readonly volts: number;
  readonly minutes: number;
  /** Leakage at or below which it is done. */
  readonly doneAmps: number;
}

/** The series resistor. */
export interface ReformResistor {
  readonly ohms: number;
  /** Into a capacitor that is a short. */
  readonly shortAmps: number;
  readonly shortWatts: number;
  /** Rated watts to take: twice the heat into a short. */
  readonly watts: number;
  /** Most heat that can arise inside the can, at half the volts. */
  readonly mostCanWatts: number;
  readonly timeConstantSeconds: number;
}

/**
 * The resistor: so many ohms that a short draws no more than 5 mA or twice the allowed leakage, and that the can never gets
 * more than 1 W; the next E24 above.
 */
export function reformResistor(farads: number, volts: number, limitAmps: number): ReformResistor {
  const mostAmps = Math.max(JIG_AMPS, 2 * limitAmps);
  return resistorOf(nextE24(Math.max(volts / mostAmps, (volts * volts) / (4 * STOP_WATTS))), farads, volts);
}

/** What a given resistor does. */
export function resistorOf(ohms: number, farads: number, volts: number): ReformResistor {
  const shortWatts = (volts * volts) / ohms;
  return {
    ohms,
    shortAmps: volts / ohms,
    shortWatts,
    watts: RESISTOR_WATTS.find((watts) => watts >= 2 * shortWatts) ?? 2 * shortWatts,
    mostCanWatts: shortWatts / 4,
    timeConstantSeconds: ohms * farads,
  };
}

/** Shares of the target and minutes at each, by years without volts; empty where none is needed. */
export function stagesFor(storageYears: number, ageYears: number): readonly (readonly [share: number, minutes: number])[] {
  if (storageYears < 1) return [];
  if (storageYears <= 2) return [[1, 60]];
  const minutes = storageYears <= 3 ? 30 : 120;
  const quarters = [0.25, 0.5, 0.75, 1].map((share) => [share, minutes] as const);
  // A can that old is first asked at a tenth whether it is one at all.
  return ageYears > 20 || storageYears > 10 ? [[0.1, minutes], ...quarters] : quarters;
}

/**
 * The plan.
 * @param volts target, at most the rated volts
 * @param limitAmps allowed leakage at the rated volts
 */
export function reformStages(
  volts: number,
  limitAmps: number,
  resistor: ReformResistor,
  storageYears: number,
  ageYears: number,
): readonly ReformStage[] {
  return stagesFor(storageYears, ageYears).map(([share, minutes]) => ({
    share,
    volts: share * volts,
    // Five time constants leave less than 1 % to charge.
    minutes: Math.max(minutes, (5 * resistor.timeConstantSeconds) / 60),
    doneAmps: doneAmps(share * volts, limitAmps, resistor.ohms),
  }));
}

/** Leakage at which a stage is done: the limit, or what loses a tenth of the volts in the resistor, whichever is less. */
export const doneAmps = (volts: number, limitAmps: number, ohms: number): number => Math.min(limitAmps, (LOST_SHARE * volts) / ohms);
