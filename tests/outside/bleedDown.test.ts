import { describe, expect, it } from 'vitest';

import { needsDischarge } from '@/shared/workings/discharge';
import { HARMLESS_COULOMBS, HARMLESS_JOULES, TOUCH_LIMITS } from '@/shared/workings/touchLimits';

// Times, energies and charges stand as rows in values/bleedDown.ts.
describe('charge and energy thresholds', () => {
  it('IEC 60335-1, 8.1.4: 45 μC, and 350 mJ above 15 kV', () => {
    expect(HARMLESS_COULOMBS).toBeCloseTo(45e-6, 15);
    expect(HARMLESS_JOULES).toBe(0.35);
  });

  it('IEC 61010-1, 6.3.1 c): 4.4 μF at 80 V fails by charge (352 μC, above 45 μC), not by energy (case argued in a standards mailing list)', () => {
    expect(4.4e-6 * 80).toBeGreaterThan(HARMLESS_COULOMBS);
    expect(needsDischarge(4.4e-6, 80)).toBe(false);
  });

  it('names no single touch limit for all standards: 60 V (IEC 61010-1, 60204-1), 50 V (NEC 460.6), 42.4 V and 34 V (IEC 60335-1)', () => {
    expect(TOUCH_LIMITS.map(({ volts, withinSeconds }) => [volts, withinSeconds])).toEqual([
      [60, null],
      [60, 5],
      [50, 60],
      [42.4, null],
      [34, 1],
    ]);
    for (const { name } of TOUCH_LIMITS) expect(name).toMatch(/^(IEC|NEC) \d/);
  });
});
