/** Live work above 60 V DC or 25 V AC, where a second person has to be present (C9). */
import { exposedVolts } from './exposure';
import type { ProgramStep } from './program';
import type { Row } from './rows';

/** True for a reading with a probe in the hand on a live point above the limits of the workshop. */
export function liveAboveLimits(row: Row, placed: ProgramStep): boolean {
  const { step, scope } = placed;
  const byHand = step.contact === 'probe' && (('power' in step && step.power === 'live') || step.kind === 'prove-rails' || step.kind === 'prove-trip');
  if (row.ask !== 'reading' || !byHand) return false;
  const dc = exposedVolts(row, scope.profile);
  return dc === null ? scope.profile.mains.volts > scope.settings.secondPersonVoltsAc : dc > scope.settings.secondPersonVoltsDc;
}
