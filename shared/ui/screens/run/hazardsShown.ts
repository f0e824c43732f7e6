/** The hazards of a step as its warning shows them, with this machine's own figures. Pure. */
import { HAZARDS } from '@/flows/document/hazards';
import type { HazardKind } from '@/flows/document/hazards';
import type { Profile } from '@/flows/document/profile';
import type { Settings } from '@/flows/document/settings';
import { partsToDischarge, storedJoules } from '@/flows/facts/stores';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Hazard } from '@/shared/ui/components/WarningGate';
import { signOf } from '@/shared/ui/screens/trees/signOf';

const ORDER = ['danger', 'warning', 'caution'] as const;

/** Worst first. */
export function hazardsShown(kinds: readonly HazardKind[], profile: Profile, settings: Settings): Hazard[] {
  return kinds
    .map((kind): Hazard => ({
      id: kind,
      signal: HAZARDS[kind].signal,
      sign: signOf(kind),
      hazard: named(kind, profile, settings),
      result: HAZARDS[kind].result,
      avoid: [HAZARDS[kind].avoid],
    }))
    .sort((a, b) => ORDER.indexOf(a.signal as (typeof ORDER)[number]) - ORDER.indexOf(b.signal as (typeof ORDER)[number]));
}

function named(kind: HazardKind, profile: Profile, settings: Settings): string {
  const { hazard } = HAZARDS[kind];
  if (kind === 'mains-shock') return `${hazard}: ${glued(formatQuantity(profile.mains.volts, 'V', { digits: 3 }))}`;
  const [most] = [...partsToDischarge(profile, settings)].sort((a, b) => storedJoules(b) - storedJoules(a));
  if (kind === 'stored-charge' && most !== undefined)
    return `${hazard}: ${most.name}, ${glued(formatQuantity(storedJoules(most), 'J', { digits: 3 }))}`;
  return hazard;
}

/** A number is not parted from its unit at the end of a line. */
function glued(words: string): string {
  return words.replaceAll(' ', '\u00a0');
}
