/** The places of the workshop, in the order of the bar, and which of them an address lies in. */
import type { Place, PlaceName } from '@/shared/ui/components/placesShown';

export const places: readonly Place[] = [
  { name: 'Bench', href: '/bench' },
  { name: 'Trees', href: '/trees' },
  { name: 'Machines', href: '/machines' },
  { name: 'Records', href: '/records' },
  { name: 'Workings', href: '/workings' },
  { name: 'Workshop', href: '/workshop' },
];

/** The place that an address belongs to, or null. */
export function placeOf(pathname: string): PlaceName | null {
  const first = pathname.split('/')[1] ?? '';
  return places.find((place) => place.href === `/${first}`)?.name ?? null;
}

/** True on the screen of a run, where nothing leads away but its own answers and Stop. */
export function isRun(pathname: string): boolean {
  return /^\/bench\/[^/]+$/.test(pathname);
}
