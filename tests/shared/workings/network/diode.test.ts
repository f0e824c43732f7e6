import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { diodeCurrent, JUNCTION_SIEMENS, THERMAL_VOLTS } from '@/shared/workings/network/diode';

const card = fc.record({
  saturationAmps: fc.double({ min: 1e-18, max: 1e-2, noNaN: true }),
  emission: fc.double({ min: 0.5, max: 10, noNaN: true }),
  seriesOhms: fc.double({ min: 1e-4, max: 100, noNaN: true }),
});
const volts = fc.double({ min: -2000, max: 2000, noNaN: true });

describe('diodeCurrent', () => {
  it('is kT/q apart by 59.5 mV a decade at 27 °C', () => {
    // 2.303 kT/q is 60 mV at room temperature in every textbook; 59.6 mV at 27 °C.
    expect(THERMAL_VOLTS * Math.LN10).toBeCloseTo(0.0596, 4);
    const at = (v: number) => diodeCurrent({ saturationAmps: 1e-12, emission: 1, seriesOhms: 1e-4 }, v).amps;
    expect(at(0.5 + THERMAL_VOLTS * Math.LN10) / at(0.5)).toBeCloseTo(10, 2);
  });

  it('solves the equation with its series ohms, forwards and backwards', () => {
    fc.assert(
      fc.property(card, volts, (diode, v) => {
        const { amps, siemens } = diodeCurrent(diode, v);
        const junction = v - amps * diode.seriesOhms;
        expect(siemens).toBeGreaterThan(0);
        expect(siemens).toBeLessThanOrEqual(1 / diode.seriesOhms + 1e-9);
        // Told by the junction, whose volts are steady where amps are steep.
        if (amps > 1e3 * diode.saturationAmps && amps > 1e-6) {
          const wanted = diode.emission * THERMAL_VOLTS * Math.log1p((amps - JUNCTION_SIEMENS * junction) / diode.saturationAmps);
          expect(Math.abs(junction - wanted)).toBeLessThanOrEqual(1e-8 * (1 + Math.abs(v)));
        } else expect(amps).toBeGreaterThanOrEqual(-diode.saturationAmps - 1e-8);
      }),
      { numRuns: 2000 },
    );
  });

  it('never falls as the volts rise', () => {
    fc.assert(
      fc.property(card, volts, volts, (diode, a, b) => {
        const [low, high] = [Math.min(a, b), Math.max(a, b)];
        const [less, more] = [diodeCurrent(diode, low).amps, diodeCurrent(diode, high).amps];
        // But for the last figure of a double.
        expect(more).toBeGreaterThanOrEqual(less - 1e-13 * Math.abs(less) - 1e-300);
      }),
      { numRuns: 1000 },
    );
  });
});
