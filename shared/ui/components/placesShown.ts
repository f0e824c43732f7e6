/** Which places a bar has room for. */
import type { Href } from 'expo-router';

import type { IconName } from '@/shared/ui/components/icons/iconPaths';

export type PlaceName = 'Bench' | 'Trees' | 'Machines' | 'Records' | 'Workings' | 'Workshop';

export interface Place {
  name: PlaceName;
  href: Href;
}

const onPhone = 5;

/** All places on a wide screen; on a phone five at most, with Workings then found under Workshop. */
export function placesShown(places: readonly Place[], wide: boolean): Place[] {
  if (wide || places.length <= onPhone) return [...places];
  return places.filter((place) => place.name !== 'Workings');
}

/** The place that is marked as current in the bar: Workings stands under Workshop where it has no entry. */
export function placeMarked(shown: readonly Place[], current: PlaceName | null): PlaceName | null {
  if (current === null || shown.some((place) => place.name === current)) return current;
  return current === 'Workings' && shown.some((place) => place.name === 'Workshop') ? 'Workshop' : null;
}

const icons: Readonly<Record<PlaceName, IconName>> = {
  Bench: 'bench',
  Trees: 'trees',
  Machines: 'machines',
  Records: 'records',
  Workings: 'workings',
  Workshop: 'workshop',
};

/** The drawing of a place. */
export function placeIcon(name: PlaceName): IconName {
  return icons[name];
}
