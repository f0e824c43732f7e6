import { describe, expect, it } from 'vitest';

import { placeMarked, placesShown } from '@/shared/ui/components/placesShown';
import type { Place } from '@/shared/ui/components/placesShown';

const six: Place[] = (['Bench', 'Trees', 'Machines', 'Records', 'Workings', 'Workshop'] as const).map((name) => ({ name, href: '/' }));
const names = (places: Place[]) => places.map((place) => place.name);

describe('placesShown', () => {
  it('shows all six on a wide screen', () => {
    expect(placesShown(six, true)).toHaveLength(6);
  });

  it('shows five on a phone, with Workings under Workshop', () => {
    expect(names(placesShown(six, false))).toEqual(['Bench', 'Trees', 'Machines', 'Records', 'Workshop']);
  });

  it('leaves out nothing when there are few', () => {
    const few = six.filter((place) => place.name !== 'Trees');
    expect(names(placesShown(few, false))).toContain('Workings');
  });
});

describe('placeMarked', () => {
  it('marks Workshop for Workings where Workings has no entry', () => {
    expect(placeMarked(placesShown(six, false), 'Workings')).toBe('Workshop');
    expect(placeMarked(placesShown(six, true), 'Workings')).toBe('Workings');
    expect(placeMarked(six, null)).toBeNull();
  });
});
