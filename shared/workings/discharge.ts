/** What it takes to discharge a capacitor: energy, time, and a resistor that stands it. */
import { z } from 'zod';

import { nextE24, RESISTOR_WATTS } from '@/shared/workings/preferred';
import { HARMLESS_JOULES } from '@/shared/workings/touchLimits';

/** Most times its rated watts that a wire-wound resistor takes at the first moment. Common practice, no source. */
export const PEAK_OVERLOAD = 10;
/** Most joules per rated watt in one pulse: five times rated for five seconds, the careful end of common practice, no source. */
export const JOULES_PER_WATT = 25;
/** How a resistor stands the discharge. */
export const resistorVerdict = z.enum(['continuous', 'pulse', 'too-small', 'none']);
/** How a resistor stands the discharge. */
export type ResistorVerdict = z.output<typeof resistorVerdict>;

/** The form of a discharge resistor that does it. */
export const resistorChoice = z.strictObject({ ohms: z.number(), watts: z.number(), secondsToSafe: z.number() });
/** A discharge resistor that does it. */
export type ResistorChoice = z.output<typeof resistorChoice>;

/** Energy of a capacitor, ½CV², in joules. */
export const energyJoules = (farads: number, volts: number): number => (farads * volts * volts) / 2;

/**
 * Time to fall from one voltage to another through a resistance: t = RC ln(V/V safe).
 * @returns seconds; 0 when it is there already
 */
export function secondsToFall(farads: number, ohms: number, fromVolts: number, toVolts: number): number {
  return fromVolts <= toVolts ? 0 : ohms * farads * Math.log(fromVolts / toVolts);
}

/** Whether a part must be discharged first: more than 350 mJ at more than 60 V d.c., or more than 10 J at any voltage. */
export function needsDischarge(farads: number, volts: number): boolean {
  const joules = energyJoules(farads, volts);
  return (volts > 60 && joules > HARMLESS_JOULES) || joules > 10;
}

/**
 * Judges a wire-wound resistor across a charged capacitor.
 * @param peakWatts V²/R
 * @param joules what it has to swallow
 */
export function judgeResistor(peakWatts: number, joules: number, ratedWatts: number): ResistorVerdict {
  // A resistor chosen to sit on the limit must not fall off it by the last bit of a double.
  const rated = ratedWatts * (1 + 1e-9);
  if (peakWatts <= rated) return 'continuous';
  return peakWatts <= PEAK_OVERLOAD * rated && joules <= JOULES_PER_WATT * rated ? 'pulse' : 'too-small';
}

/**
 * The fastest E24 resistor that stands the whole discharge alone: of the rating given if that will do, else of the next.
 * @returns null when no single usual resistor does it
 */
export function chooseResistor(farads: number, volts: number, safeVolts: number, ratedWatts: number): ResistorChoice | null {
  const joules = energyJoules(farads, volts);
  const usual = [ratedWatts, ...RESISTOR_WATTS.filter((rating) => rating > ratedWatts)];
  const watts = usual.find((rating) => joules <= JOULES_PER_WATT * rating);
  if (watts === undefined) return null;
  const ohms = nextE24((volts * volts) / (PEAK_OVERLOAD * watts));
  return { ohms, watts, secondsToSafe: secondsToFall(farads, ohms, volts, safeVolts) };
}
