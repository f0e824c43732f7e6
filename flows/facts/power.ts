/** What class and kind of power a step puts in (C5, A27). */
import { lampFor } from '@/shared/workings/lamp';

import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import type { StepOf } from '../document/steps';
import type { PowerKind } from './facts';

export type PowerStep = StepOf<'energise'> | StepOf<'raise'>;

/** Largest bench-supply current that still counts as limited, in amps: 1 A or 20 % of rated input, whichever is more. */
export function benchLimitedAmps(profile: Profile, settings: Settings): number {
  const rated = profile.raw?.ratedAmps ?? profile.mains.voltAmps / profile.mains.volts;
  return Math.max(settings.benchLimitedAmps, settings.benchLimitedShare * rated);
}

/** Largest lamp in watts that still limits this machine: twice its plate's volt-amps, or what the series lamp sheet gives where that is more. */
export function limitingLampWatts(profile: Profile): number {
  const { voltAmps } = profile.mains;
  return Math.max(2 * voltAmps, lampFor(voltAmps, profile.supplyKind === 'switch-mode' ? 'switch-mode' : 'linear').totalWatts);
}

/** Limited mains is a lamp that limits this machine or an AC source limited to as many amps; a bench supply by its amps; everything else is full. */
export function powerClass(step: PowerStep, profile: Profile, settings: Settings): 'limited' | 'full' {
  if (step.through === 'lamp') return (step.lampWatts ?? Infinity) <= limitingLampWatts(profile) ? 'limited' : 'full';
  if (step.through === 'limited-ac') return step.mostAmps <= limitingLampWatts(profile) / profile.mains.volts ? 'limited' : 'full';
  if (step.through === 'bench') return step.mostAmps <= benchLimitedAmps(profile, settings) ? 'limited' : 'full';
  return 'full';
}

/** The kind of power for hold points. */
export function powerKind(step: PowerStep, profile: Profile, settings: Settings): PowerKind {
  if (step.load === 'boards') return 'boards';
  if (step.source === 'bench') return 'bench';
  return powerClass(step, profile, settings);
}

/** Where the step feeds, as the source fact holds it. */
export function powerNode(step: PowerStep): string {
  return step.node === 'rail' ? `rail:${step.rail ?? ''}` : step.node;
}
