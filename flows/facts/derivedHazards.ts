/** Hazards that follow from what a step does and from the profile (H17); authors add more. */
import type { HazardKind } from '../document/hazards';
import type { Step } from '../document/steps';
import type { StepScope } from './effects';
import { partsToDischarge } from './stores';

/** The hazards of a step in a fixed order, derived ones first, none twice. */
export function hazardsOf(step: Step, scope: StepScope): HazardKind[] {
  return [...new Set<HazardKind>([...derivedHazards(step, scope), ...step.hazards])];
}

/** What a step is dangerous by: mains at the inlet, stored charge under hands or discharge, flags of the profile. */
export function derivedHazards(step: Step, { profile, settings }: StepScope): HazardKind[] {
  const found: HazardKind[] = [];
  const stores = partsToDischarge(profile, settings).length > 0;
  if (step.kind === 'energise' || step.kind === 'raise') {
    found.push(step.node === 'inlet' ? 'mains-shock' : 'live-low-voltage');
    if (step.kind === 'energise' && profile.stores.length > 0) found.push('bursting-capacitor');
    if (step.through === 'lamp') found.push('hot-parts');
    if (step.node === 'inlet' && profile.mains.protection === 'isolating-transformer') found.push('isolating-transformer');
    if (profile.heatsinks.some((h) => h.live)) found.push('live-heatsink');
  }
  if (step.kind === 'prove-insulation') found.push('insulation-test');
  if (step.kind === 'prove-dead' || step.kind === 'discharge') found.push('mains-shock');
  if (stores && (step.kind === 'discharge' || step.kind === 'prove-dead' || step.contact === 'hands')) found.push('stored-charge');
  if (step.contact === 'probe' && 'power' in step && step.power === 'live') found.push('live-low-voltage');
  if ((step.kind === 'prove-rails' || step.kind === 'prove-trip') && step.probe === 'hand') found.push('live-low-voltage');
  if (step.kind === 'prove-rails' && step.level === 'full') found.push('hot-parts');
  if (step.kind === 'do' && (step.fits ?? []).some((f) => f.earthed === true)) found.push('earthed-clip');
  if (step.contact === 'hands' || step.contact === 'cover') {
    const flags: Partial<Record<(typeof profile.hazards)[number], HazardKind>> = { crt: 'implosion', 'beryllium-oxide': 'beryllium-oxide', pcb: 'pcb', selenium: 'selenium', asbestos: 'asbestos', mercury: 'mercury', heavy: 'weight' };
    for (const flag of profile.hazards) if (flags[flag] !== undefined) found.push(flags[flag]);
  }
  return found;
}
