/** Which safety sign stands beside a hazard. */
import type { HazardKind } from '@/flows/document/hazards';
import type { SignName } from '@/shared/ui/components/icons/SafetySign';

const signs: Readonly<Partial<Record<HazardKind, SignName>>> = {
  'mains-shock': 'electricity',
  'stored-charge': 'charge',
  'live-low-voltage': 'electricity',
  'hot-parts': 'hot',
  'live-heatsink': 'electricity',
  'rotating-parts': 'rotating',
  implosion: 'burst',
  'beryllium-oxide': 'toxic',
  pcb: 'toxic',
  selenium: 'toxic',
  asbestos: 'toxic',
  'lead-solder': 'toxic',
  'bursting-capacitor': 'burst',
  mercury: 'toxic',
  'x-ray': 'xray',
  weight: 'heavy',
  'earthed-clip': 'electricity',
  'isolating-transformer': 'electricity',
  'insulation-test': 'electricity',
};

/** The sign of a hazard; the general warning sign where none says it better. */
export function signOf(kind: HazardKind): SignName {
  return signs[kind] ?? 'general';
}
