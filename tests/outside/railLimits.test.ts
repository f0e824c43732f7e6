import { describe, expect, it } from 'vitest';

import { classifyRail, railLimits } from '@/shared/workings/railLimits';

describe('rail limits against published tolerances', () => {
  it.each([
    // Recommended VCC of the 74 series: 4.75 to 5.25 V (Fairchild DM74LS08, DM93S62 data sheets).
    ['74 series, 5 V ± 5 %', 5, 5, 4.75, 5.25],
    // Recommended VCC of the 54 series: 4.5 to 5.5 V (from memory).
    ['54 series, 5 V ± 10 %', 5, 10, 4.5, 5.5],
    // ATX power supply design guide, table of d.c. output regulation (from memory).
    ['ATX +12 V ± 5 %', 12, 5, 11.4, 12.6],
    ['ATX −12 V ± 10 %', -12, 10, -10.8, -13.2],
    ['ATX −5 V ± 10 %', -5, 10, -4.5, -5.5],
    // 5 V linear supply, factory over-voltage trip 6.2 V ± 0.4 V (Power-One data sheet MCD10016): 5.8 to 6.6 V.
    ['trip 6.2 V ± 6.4516 %', 6.2, (0.4 / 6.2) * 100, 5.8, 6.6],
  ])('%s', (_, nominal, tolerance, low, high) => {
    const limits = railLimits(nominal, tolerance);
    expect(limits.lowVolts).toBeCloseTo(low, 9);
    expect(limits.highVolts).toBeCloseTo(high, 9);
    expect(classifyRail(low, limits, 0)).toBe('in');
    expect(classifyRail(high, limits, 0)).toBe('in');
  });

  it('a rail, its trip and the logic behind it stand in order: 5.25 < 5.8 < 6.6 < 7 V (TI SDLS025B, absolute maximum VCC)', () => {
    const [rail, trip] = [railLimits(5, 5), railLimits(6.2, (0.4 / 6.2) * 100)];
    expect(rail.highVolts).toBeLessThan(trip.lowVolts);
    expect(trip.highVolts).toBeLessThan(7);
  });

  it('a rail pulled to −0.7 V through a silicon diode (forward 0.5 to 0.8 V, Fluke 80 Series V manual, p. 30) is reversed, and so is −0.5 V', () => {
    for (const volts of [-0.5, -0.7, -0.8]) expect(classifyRail(volts, railLimits(5, 5), 0.03)).toBe('reversed');
  });
});
