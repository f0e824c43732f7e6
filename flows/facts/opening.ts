/** Parts that are opened to be looked at: which machines have none opened, and what stands there instead. */
import type { Profile } from '../document/profile';
import type { Step } from '../document/steps';

/** True where the profile says that a part may hold beryllium oxide: nothing of such a machine is opened. */
export function staysShut(profile: Profile): boolean {
  return profile.hazards.includes('beryllium-oxide');
}

/** The step that stands in the place of an opening on a machine that has none opened; null where the step itself stands. */
export function insteadOf(step: Step, profile: Profile): string | null {
  return step.kind === 'observe' && step.opens?.instead !== undefined && staysShut(profile) ? step.opens.instead : null;
}
