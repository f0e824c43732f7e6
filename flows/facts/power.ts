/** What class and kind of power a step puts in (C5, A27). */
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

/** Limited mains is a lamp or an AC source with an amps limit; a bench supply by its amps; everything else is full. */
export function powerClass(step: PowerStep, profile: Profile, settings: Settings): 'limited' | 'full' {
  if (step.through === 'lamp' || step.through === 'limited-ac') return 'limited';
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
