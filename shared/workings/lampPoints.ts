/** Where a lamp and the load behind it agree. */
import { z } from 'zod';

import { bisect } from '@/shared/workings/bisect';
import type { Lamp } from '@/shared/workings/lamp';
import { brightnessInWords, CURRENT_EXPONENT, floorVolts, lampAmps, lampOhms } from '@/shared/workings/lamp';
import { reservoirBehind } from '@/shared/workings/reservoirLoad';

/** The form of one state in which lamp and load agree. */
export const operatingPoint = z.strictObject({
  lampVolts: z.number(),
  /** R.m.s. at the inlet of the load; lamp and load volts add up to the mains but for a rectifier, whose current comes in pulses. */
  loadVolts: z.number(),
  amps: z.number(),
  lampWatts: z.number(),
  loadWatts: z.number(),
  /** False where the least disturbance carries it away, as on the upper branch of a constant-power load. */
  stable: z.boolean(),
  brightness: z.string(),
  /** Volts of the reservoir as a share of what it has at full mains; null without one. */
  reservoirShare: z.number().nullable(),
});

/** One state in which lamp and load agree. */
export type OperatingPoint = z.output<typeof operatingPoint>;

/** What the lamp is in series with. */
export type LampLoad =
  | { readonly kind: 'short' }
  | { readonly kind: 'resistance'; readonly ohms: number }
  /** Rectifier with reservoir and a load across it that would take these watts at full mains and falls with the volts. */
  | { readonly kind: 'reservoir'; readonly watts: number }
  | { readonly kind: 'constant-power'; readonly watts: number };

/** The state with the lamp at some volts. */
export function pointAt(lamp: Lamp, lampVolts: number, loadVolts: number, stable: boolean): OperatingPoint {
  const amps = lampAmps(lamp, lampVolts);
  return {
    lampVolts,
    loadVolts,
    amps,
    lampWatts: lampVolts * amps,
    loadWatts: loadVolts * amps,
    stable,
    brightness: brightnessInWords(lamp, lampVolts),
    reservoirShare: null,
  };
}

/** Lamp volts at which the load gets the most watts; below them the load sees a stiff source, above them a starving one. */
export function peakVolts(lamp: Lamp, supplyVolts: number): number {
  // On the law (V − v)·v^0.55 peaks at 0.55/1.55 of V; on the cold filament (V − v)·v at V/2; between the two at the joint.
  const onLaw = (supplyVolts * CURRENT_EXPONENT) / (1 + CURRENT_EXPONENT);
  return Math.min(Math.max(onLaw, floorVolts(lamp)), supplyVolts / 2);
}

/** Resistance across the reservoir that takes the watts at the peak of the full mains. */
export const reservoirOhms = (supplyVolts: number, watts: number): number => (2 * supplyVolts * supplyVolts) / watts;

function reservoirPoint(lamp: Lamp, supplyVolts: number, watts: number): OperatingPoint {
  const loadOhms = reservoirOhms(supplyVolts, watts);
  // The filament is far slower than the pulses: it has the one resistance of its r.m.s. volts.
  const behind = (volts: number) => reservoirBehind(supplyVolts, lampOhms(lamp, volts), loadOhms);
  const lampVolts = bisect((volts) => volts - behind(volts).seriesVolts, 0, supplyVolts);
  const state = behind(lampVolts);
  return {
    lampVolts: state.seriesVolts,
    loadVolts: state.inletVolts,
    amps: state.amps,
    lampWatts: state.seriesWatts,
    loadWatts: state.loadWatts,
    stable: true,
    brightness: brightnessInWords(lamp, lampVolts),
    reservoirShare: state.share,
  };
}

/**
 * Every state in which lamp and load agree, the stable one first.
 * @param supplyVolts rms
 * @returns one point for a resistance, a reservoir or a short; two, one or none for constant power
 */
export function operatingPoints(lamp: Lamp, supplyVolts: number, load: LampLoad): OperatingPoint[] {
  if (load.kind === 'short') return [pointAt(lamp, supplyVolts, 0, true)];
  if (load.kind === 'reservoir') return [reservoirPoint(lamp, supplyVolts, load.watts)];
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
