import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { OverVoltageTripResult } from '@/shared/workings/overVoltageTrip';
import { sheet } from '@/shared/workings/overVoltageTrip';
import { runSheet } from '@/shared/workings/sheet';

function work(given: Record<string, unknown>): OverVoltageTripResult {
  const answer = runSheet(sheet, given);
  if (!answer.ok) throw new Error(answer.say);
  return answer.result;
}
const say = (given: Record<string, unknown>): string => {
  const answer = runSheet(sheet, given);
  return answer.ok ? answer.headline : answer.say;
};

const logic = { nominalVolts: 5, mostVolts: 7, kind: 'set-point', tripVolts: 6.2, tripTolerancePercent: 6 };

describe('over-voltage trip', () => {
  it('says in one line where the trip stands', () => {
    expect(say(logic)).toBe('In order: rail at most 5.25 V, trip 5.828 V to 6.572 V, parts stand 7 V.');
    expect(say({ ...logic, tripVolts: 5.4 })).toBe('May fire in use: trip 5.076 V to 5.724 V, rail at most 5.25 V.');
    expect(say({ ...logic, tripVolts: 6.8 })).toBe('Too late: the trip may need 7.208 V, parts stand 7 V.');
    expect(say({ ...logic, tripVolts: 6, tripTolerancePercent: 20 })).toMatch(/^No room: trip 4.8 V to 7.2 V reaches from the rail/);
    expect(say({ ...logic, mostVolts: null })).toMatch(/^Above the rail: .* what the parts stand is not given\.$/);
    expect(say({ ...logic, farads: 0.02, surgeAmps: 200 })).toMatch(/The thyristor does not stand the discharge\.$/);
    expect(say({ ...logic, fuseI2t: 50, thyristorI2t: 40 })).toMatch(/The thyristor dies before the fuse opens\.$/);
  });

  it('adds the gate to the Zener: a 6.2 V Zener guards no 7 V logic', () => {
    const { tripVolts, tripHighVolts, says } = work(sheet.example);
    expect(tripVolts).toBeCloseTo(6.9, 12);
    expect(tripHighVolts).toBeGreaterThan(7);
    expect(says).toBe('too-late');
  });

  it('counts peaks, which a meter does not show', () => {
    expect(work({ ...logic, tripVolts: 5.7 }).says).toBe('in-order');
    expect(work({ ...logic, tripVolts: 5.7, peakVolts: 0.2 }).says).toBe('fires-in-use');
  });

  it('judges a trip test by size, and is not sure where the meter is not', () => {
    const read = (readVolts: number, rest = {}) => work({ ...logic, readVolts, meterVolts: 0.05, ...rest }).reading;
    expect([5, 5.27, 5.8, 6.5, 6.97, 7.1].map((volts) => read(volts))).toEqual(['too-low', 'close', 'in', 'in', 'close', 'too-high']);
    expect(work({ ...logic, nominalVolts: -5, readVolts: -6.2, meterVolts: 0.05 }).reading).toBe('in');
    expect(work({ ...logic, nominalVolts: -5, readVolts: 6.2, meterVolts: 0.05 }).reading).toBe('too-low');
    expect(say({ ...logic, readVolts: 7.5 })).toMatch(/^Fired at 7.5 V: it fires too late: do not fit the boards\./);
  });

  it('rises with the Zener, and scales: twice the capacitance is twice the energy, half the ohms twice the peak', () => {
    const volts = fc.double({ min: 1, max: 100, noNaN: true });
    const farads = fc.double({ min: 1e-6, max: 1, noNaN: true });
    const ohms = fc.double({ min: 0.001, max: 10, noNaN: true });
    fc.assert(
      fc.property(volts, farads, ohms, (tripVolts, capacitance, seriesOhms) => {
        const given = { nominalVolts: 0.6, kind: 'zener-gate', tripVolts, farads: capacitance, seriesOhms };
        const [one, more] = [work(given), work({ ...given, tripVolts: tripVolts + 0.01 })];
        const [double, half] = [work({ ...given, farads: 2 * capacitance }), work({ ...given, seriesOhms: seriesOhms / 2 })];
        const close = (value = 0, wanted = 1) => Math.abs(value / wanted - 1) < 1e-9;
        return (
          more.tripLowVolts > one.tripLowVolts &&
          more.tripHighVolts > one.tripHighVolts &&
          close(double.fault?.joules, 2 * (one.fault?.joules ?? 0)) &&
          close(half.fault?.peakAmps, 2 * (one.fault?.peakAmps ?? 0)) &&
          // All of the energy is burnt in the resistance: E = I²t × R.
          close((one.fault?.ampSquaredSeconds ?? 0) * seriesOhms, one.fault?.joules)
        );
      }),
    );
  });

  it.each([
    [{ ...logic, nominalVolts: 0 }, 'nominalVolts', 'Nominal volts must be 0.5 V or more, either sign.'],
    [{ ...logic, tripVolts: null }, 'tripVolts', 'Trip volts are missing: Zener volts, reference volts, or the trip point.'],
    [{ ...logic, kind: 'divider' }, 'upperOhms', 'The upper resistor of the divider is missing.'],
    [{ ...logic, kind: 'divider', upperOhms: 1000 }, 'lowerOhms', 'The lower resistor of the divider is missing.'],
    [
      { ...logic, kind: 'zener-gate', gateLeastVolts: 1, gateMostVolts: 0.8 },
      'gateMostVolts',
      'The most gate volts must not be below the least.',
    ],
    [
      { ...logic, mostVolts: 5 },
      'mostVolts',
      'The parts must stand more than the rail may have, 5.25 V. Check the rail, its peaks and the data sheet.',
    ],
    [{ ...logic, farads: 1e6 }, 'farads', 'Capacitance must be 10 F or less.'],
    [{ ...logic, seriesOhms: 0 }, 'seriesOhms', 'Ohms in the way must be 100 μΩ or more.'],
    [{ kind: 'set-point' }, 'nominalVolts', 'Nominal volts is missing.'],
  ])('refuses %j at its field', (given, field, sentence) => {
    expect(runSheet(sheet, given)).toEqual({ ok: false, field, say: sentence });
  });
});
