import { describe, expect, it } from 'vitest';

import { classifyRail, railLimits } from '@/shared/workings/railLimits';

// Low and high of published rails stand as rows in values/railLimits.ts.
describe('rail limits against published tolerances', () => {
  it('a rail, its trip and the logic behind it stand in order: 5.25 < 5.8 < 6.6 < 7 V (TI SDLS025B, absolute maximum VCC)', () => {
    const [rail, trip] = [railLimits(5, 5), railLimits(6.2, (0.4 / 6.2) * 100)];
    expect(rail.highVolts).toBeLessThan(trip.lowVolts);
    expect(trip.highVolts).toBeLessThan(7);
  });

  it('a rail pulled to −0.7 V through a silicon diode (forward 0.5 to 0.8 V, Fluke 80 Series V manual, p. 30) is reversed, and so is −0.5 V', () => {
    for (const volts of [-0.5, -0.7, -0.8]) expect(classifyRail(volts, railLimits(5, 5), 0.03)).toBe('reversed');
  });
});
