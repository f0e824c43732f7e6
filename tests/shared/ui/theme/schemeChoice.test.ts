import { afterEach, describe, expect, it } from 'vitest';

import { keepSchemeChoice, readSchemeChoice, schemeFor } from '@/shared/ui/theme/schemeChoice';

afterEach(() => localStorage.clear());

describe('schemeFor', () => {
  it.each([
    ['system', 'dark', 'dark'],
    ['system', 'light', 'light'],
    ['system', null, 'light'],
    ['light', 'dark', 'light'],
    ['dark', 'light', 'dark'],
  ] as const)('choice %s under a %s system draws %s', (choice, system, drawn) => {
    expect(schemeFor(choice, system)).toBe(drawn);
  });
});

describe('readSchemeChoice', () => {
  it('gives back what was kept', () => {
    keepSchemeChoice('dark');
    expect(readSchemeChoice()).toBe('dark');
  });

  it('forgets a choice when the system is followed again', () => {
    keepSchemeChoice('dark');
    keepSchemeChoice('system');
    expect(readSchemeChoice()).toBe('system');
  });

  it('follows the system when something strange was kept', () => {
    localStorage.setItem('lampstep.scheme', 'sepia');
    expect(readSchemeChoice()).toBe('system');
  });
});
