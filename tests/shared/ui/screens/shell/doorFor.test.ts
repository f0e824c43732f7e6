import { describe, expect, it } from 'vitest';

import { doorFor } from '@/shared/ui/screens/shell/doorFor';
import { isRun, placeOf } from '@/shared/ui/screens/shell/places';
import { returnPath } from '@/shared/ui/screens/sign-in/returnPath';

describe('doorFor', () => {
  it('lets everybody stay whose session holds, and whose network is away', () => {
    expect(doorFor(null, '/records', '')).toBeNull();
    expect(doorFor('no-network', '/records', '')).toBeNull();
  });

  it('leads to the door and back to the very place, search and all', () => {
    const door = doorFor('session-expired', '/records', '?show=returned') ?? '';
    const search = new URL(door, 'http://localhost').searchParams;
    expect(search.get('expired')).toBe('1');
    expect(returnPath(search.get('from') ?? undefined)).toBe('/records?show=returned');
  });

  it('does not speak of a session that ran out where there was none', () => {
    expect(doorFor('signed-out', '/bench', '')).toBe('/sign-in?from=%2Fbench');
  });
});

describe('returnPath', () => {
  it.each([
    undefined,
    '',
    'records',
    '//evil.example',
    '/\\evil.example',
    'https://evil.example',
    '/sign-in',
    '/sign-in?from=/x',
    '/a\nb',
    ['/a', '/b'],
  ])('leads home from %j', (from) => {
    expect(returnPath(from)).toBe('/bench');
  });
});

describe('places', () => {
  it('knows in which place an address lies', () => {
    expect(placeOf('/records/0198')).toBe('Records');
    expect(placeOf('/workings')).toBe('Workings');
    expect(placeOf('/verify')).toBeNull();
  });

  it('has no bar during a run', () => {
    expect(isRun('/bench/0198')).toBe(true);
    expect(isRun('/bench')).toBe(false);
  });
});
