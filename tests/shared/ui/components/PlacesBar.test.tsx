import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { PlacesBar } from '@/shared/ui/components/PlacesBar';
import type { Place } from '@/shared/ui/components/placesShown';
import { renderSheet } from '@/tests/shared/ui/components/renderSheet';

const places: Place[] = (['Bench', 'Trees', 'Machines', 'Records', 'Workings', 'Workshop'] as const).map((name) => ({
  name,
  href: `/${name.toLowerCase()}` as Place['href'],
}));

describe('PlacesBar', () => {
  it('is a navigation of real addresses in which the current place is marked', () => {
    renderSheet(<PlacesBar places={places} current="Records" />);
    expect(screen.getByRole('navigation', { name: 'Places' })).toBeTruthy();
    const current = screen.getAllByRole('link').filter((link) => link.getAttribute('aria-current') === 'page');
    expect(current.map((link) => link.textContent)).toEqual(['Records']);
    expect(screen.getByRole('link', { name: 'Machines' }).getAttribute('href')).toBe('/machines');
  });
});
