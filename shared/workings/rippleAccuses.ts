/** What the frequency and the size of a ripple accuse. */
import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';

/** What a ripple's frequency says. */
export type RippleFrom = 'both-halves' | 'one-half' | 'three-phase' | 'slower' | 'faster' | 'between';

/**
 * Reads the frequency of a ripple against the mains. A meter's few percent are allowed for.
 * @param rippleHertz more than zero
 * @param mainsHertz more than zero
 */
export function rippleFrom(rippleHertz: number, mainsHertz: number): RippleFrom {
  const ratio = rippleHertz / mainsHertz;
  const near = (wanted: number): boolean => Math.abs(ratio / wanted - 1) <= 0.06;
  if (near(1)) return 'one-half';
  if (near(2)) return 'both-halves';
  if (near(3) || near(6)) return 'three-phase';
  if (ratio < 0.94) return 'slower';
  return ratio > 6.4 ? 'faster' : 'between';
}

/** What it accuses, in a sentence; common practice, no source. */
export function accusedByFrequency(from: RippleFrom, fullWave: boolean, mainsHertz: number): string {
  const mains = formatQuantity(mainsHertz, 'Hz');
  switch (from) {
    case 'one-half':
      return fullWave
        ? `Ripple at the mains’ ${mains}: only one half of the rectifier works. Look for an open diode, an open half of the winding or a bad joint; the capacitor comes second.`
        : `Ripple at the mains’ ${mains} is right for a half-wave rectifier.`;
    case 'both-halves':
      return fullWave
        ? 'Ripple at twice the mains is right for this rectifier: its size tells of the capacitor and the load.'
        : 'Ripple at twice the mains does not come from a half-wave rectifier: look at the circuit again, or for hum from another supply.';
    case 'three-phase':
      return 'Ripple at three or six times the mains comes from a three-phase rectifier; in a single-phase supply look at the reading again.';
    case 'slower':
      return 'Slower than the mains: a regulator that hunts, a trip or a supply that stops and starts, or a bad joint. The reservoir is not accused.';
    case 'faster':
      return 'Far faster than the mains: the switching regulator, or a regulator that oscillates. Its output capacitor and its ESR are accused, not the reservoir.';
    case 'between':
      return 'No multiple of the mains that a rectifier makes: a regulator that oscillates or hum from elsewhere. Read the frequency again with a scope.';
  }
}

/** Share either way by which a measured ripple may differ from the expected one before it accuses; capacitors are marked −20 to +50 %. Common practice, no source. */
export const RIPPLE_SLACK = 1.3;

/**
 * What the size of a ripple accuses.
 * @param expectedVolts for the halves that work, peak to peak
 */
export function accusedBySize(measuredVolts: number, expectedVolts: number, farads: number): string {
  const times = measuredVolts / expectedVolts;
  const shown = formatNumber(times, 2);
  if (times > RIPPLE_SLACK) {
    return `${shown} times the expected ripple: about ${formatQuantity(farads / times, 'F', { digits: 2 })} is left of the capacitor, or the load is ${shown} times what was entered. Read the load first, then the capacitor dead.`;
  }
  if (times < 1 / RIPPLE_SLACK) return `${shown} times the expected ripple: the load is less than entered, or the capacitance more.`;
  return `${shown} times the expected ripple: the reservoir and the load fit together.`;
}
