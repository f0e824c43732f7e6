import { describe, expect, it } from 'vitest';

import type { Lamp } from '@/shared/workings/lamp';
import { coldOhms, CURRENT_EXPONENT, floorVolts, lampAmps } from '@/shared/workings/lamp';

const hundred: Lamp = { ratedVolts: 120, ratedWatts: 100, coldRatio: 15 };

// Currents, ohms and operating points stand as rows in values/seriesLamp.ts.
describe('the law of the lamp against what else is published', () => {
  it('keeps to the other published exponent, watts ~ V^1.6, within 1.5 % near full volts and 3.6 % at half', () => {
    for (const [ratio, watts] of [
      [0.5, 0.32988],
      [0.75, 0.6311],
      [0.9, 0.84487],
      [1.1, 1.16474],
    ] as const) {
      const ours = ratio * ratio ** CURRENT_EXPONENT;
      expect(Math.abs(ours / watts - 1)).toBeLessThan(ratio < 0.6 ? 0.036 : 0.015);
    }
  });

  it('lies near the exponent of the SPIE Field Guide to Illumination, p. 21: volts ~ current^1.9', () => {
    expect(1 / 1.9).toBeCloseTo(CURRENT_EXPONENT, 1);
  });

  it('the first moment draws 10 to 15 times the rated current for some milliseconds (published installation guide); ours 15 rms', () => {
    expect(120 / coldOhms(hundred) / (100 / 120)).toBeCloseTo(15, 9);
  });

  it('the law alone falls below the cold filament under about 0.3 V', () => {
    expect(floorVolts(hundred)).toBeCloseTo(0.29, 2);
    expect(lampAmps(hundred, 0.1)).toBeCloseTo(0.1 / 9.6, 9);
  });

  it('a load that holds its watts gets at most 0.365 of the lamp’s, so the lamp has 3 × the plate', () => {
    expect(1 / (0.55 ** 0.55 / 1.55 ** 1.55)).toBeLessThan(3);
  });
});
