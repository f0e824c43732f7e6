import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { buckCurrents, dutyOf, triangleRippleVolts } from '@/shared/workings/buck';
import { plotFaults } from '@/shared/workings/plot';
import { runSheet } from '@/shared/workings/sheet';
import { sheet } from '@/shared/workings/switchingRegulator';

const wide = (low: number, high: number) => fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);
const plain = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const close = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b));
const bench = sheet.example;
const supply = fc
  .record({ inputVolts: wide(1, 500), share: plain(0.02, 0.9), switchVolts: plain(0, 2), diodeVolts: plain(0, 1.2) })
  .map(({ share, ...rest }) => ({ ...rest, outputVolts: Math.max(0.1, (rest.inputVolts - rest.switchVolts) * share) }))
  .filter(({ inputVolts, outputVolts, switchVolts }) => outputVolts < inputVolts - switchVolts);

describe('buckCurrents', () => {
  it('balances: charge of switch and diode is the load, and the watts that go in come out, with the choke empty or not', () => {
    fc.assert(
      fc.property(supply, wide(1e-3, 100), wide(1e-6, 0.1), wide(100, 1e6), (volts, amps, henries, hertz) => {
        const at = buckCurrents(volts, amps, henries, hertz);
        expect(close(at.switchAverageAmps + at.diodeAverageAmps, amps)).toBe(true);
        const losses = volts.switchVolts * at.switchAverageAmps + volts.diodeVolts * at.diodeAverageAmps;
        expect(close(volts.inputVolts * at.switchAverageAmps, volts.outputVolts * amps + losses)).toBe(true);
        expect(at.continuous).toBe(amps >= at.emptyBelowAmps);
        expect(at.duty + at.diodeDuty <= 1 + 1e-9).toBe(true);
      }),
      { numRuns: 500 },
    );
  });

  it('meets itself where the choke just runs empty', () => {
    fc.assert(
      fc.property(supply, wide(1e-6, 0.1), wide(100, 1e6), (volts, henries, hertz) => {
        const edge = buckCurrents(volts, 1, henries, hertz).emptyBelowAmps;
        const [full, empty] = [edge * (1 + 1e-9), edge * (1 - 1e-9)].map((amps) => buckCurrents(volts, amps, henries, hertz));
        expect(Math.abs((full?.duty ?? 0) / (empty?.duty ?? 1) - 1)).toBeLessThan(1e-6);
        expect(Math.abs((full?.peakAmps ?? 0) / (empty?.peakAmps ?? 1) - 1)).toBeLessThan(1e-6);
      }),
    );
  });

  it('scales: twice the choke at half the frequency changes no current', () => {
    fc.assert(
      fc.property(supply, wide(1e-3, 100), wide(1e-6, 0.1), wide(100, 1e6), (volts, amps, henries, hertz) => {
        expect(close(buckCurrents(volts, amps, henries, hertz).peakAmps, buckCurrents(volts, amps, henries * 2, hertz / 2).peakAmps)).toBe(
          true,
        );
      }),
    );
  });

  it('needs more duty from less input', () => {
    fc.assert(
      fc.property(supply, plain(1.001, 3), (volts, times) => {
        expect(dutyOf({ ...volts, inputVolts: volts.inputVolts * times })).toBeLessThanOrEqual(dutyOf(volts));
      }),
    );
  });
});

describe('triangleRippleVolts', () => {
  it('is what a fine walk along the triangle finds', () => {
    fc.assert(
      fc.property(plain(0.05, 0.95), wide(1e-6, 1e-2), wide(1e-4, 1), (duty, farads, esrOhms) => {
        const hertz = 20e3;
        const steps = 4000;
        let [charge, low, high] = [0, Infinity, -Infinity];
        for (let i = 0; i <= steps; i += 1) {
          const share = i / steps;
          const amps = share < duty ? share / duty - 0.5 : 0.5 - (share - duty) / (1 - duty);
          const at = amps * esrOhms + charge / farads;
          [low, high] = [Math.min(low, at), Math.max(high, at)];
          charge += amps / steps / hertz;
        }
        expect(Math.abs(triangleRippleVolts(1, duty, hertz, farads, esrOhms) / (high - low) - 1)).toBeLessThan(2e-3);
      }),
    );
  });

  it('never gets less with more ESR or less capacitance', () => {
    fc.assert(
      fc.property(plain(0.05, 0.95), wide(1e-6, 1e-2), plain(0, 1), plain(1, 5), (duty, farads, esrOhms, times) => {
        const base = triangleRippleVolts(1, duty, 20e3, farads, esrOhms) * (1 - 1e-12);
        expect(triangleRippleVolts(1, duty, 20e3, farads, esrOhms * times)).toBeGreaterThanOrEqual(base);
        expect(triangleRippleVolts(1, duty, 20e3, farads / times, esrOhms)).toBeGreaterThanOrEqual(base);
      }),
    );
  });
});

describe('sheet', () => {
  it('answers the example in one line', () => {
    const answer = runSheet(sheet, bench);
    expect(answer.ok && answer.headline).toBe('Duty 0.154 at 20 kHz; freewheel diode 14.4 A average, 17.6 A peak, ripple 12.5 mV.');
  });

  it('says when the choke runs empty, and when the diode is too small', () => {
    expect(runSheet(sheet, { ...bench, amps: 0.2 })).toMatchObject({
      headline: expect.stringContaining('The choke runs empty below 624 mA.') as string,
      result: { rippleVolts: null },
    });
    expect(runSheet(sheet, { ...bench, diodeAmps: 10 })).toMatchObject({
      headline: expect.stringContaining('The diode is too small for this.') as string,
    });
  });

  it('has no NaN in its answer, and a plot that can be drawn, for any input that the form admits', () => {
    const given = fc.record({
      inputVolts: wide(0.11, 9999),
      outputVolts: wide(0.11, 9999),
      amps: wide(1.1e-3, 999),
      henries: wide(1.1e-7, 9.9),
      farads: wide(1.1e-9, 9.9),
      esrOhms: plain(0, 100),
      control: fc.constantFrom('fixed', 'hysteretic'),
      hertz: fc.option(wide(11, 9.9e6)),
      windowVolts: fc.option(wide(1.1e-5, 9.9)),
      divider: plain(1, 1000),
      delaySeconds: plain(0, 1e-3),
      switchVolts: plain(0, 10),
      diodeVolts: plain(0, 5),
      overlapSeconds: plain(0, 1e-4),
      diodeAmps: fc.option(wide(0.011, 999)),
    });
    fc.assert(
      fc.property(given, (input) => {
        const answer = runSheet(sheet, input);
        expect(JSON.stringify(answer)).not.toMatch(/NaN|Infinity|no value|over range/);
        if (answer.ok) expect(answer.plot === undefined ? ['none'] : plotFaults(answer.plot)).toEqual([]);
      }),
      { numRuns: 500 },
    );
  });

  it.each([
    [{ ...bench, hertz: null }, 'hertz', 'Frequency is missing.'],
    [{ ...bench, control: 'hysteretic' }, 'windowVolts', 'Window is missing.'],
    [
      { ...bench, control: 'hysteretic', windowVolts: 0.02, delaySeconds: 1e-3, esrOhms: 0.01 },
      'esrOhms',
      'ESR must be more than the delay divided by the capacitance, 100 mΩ: below it the law of the hysteretic regulator does not hold.',
    ],
    [{ ...bench, outputVolts: 38 }, 'outputVolts', 'Output volts must be less than the input volts less the drop of the switch, 37.5 V.'],
    [{ ...bench, henries: 0 }, 'henries', 'Choke must be 100 nH or more.'],
    [{ ...bench, henries: 1e6 }, 'henries', 'Choke must be 10 H or less.'],
    [{ ...bench, farads: -1 }, 'farads', 'Output capacitance must be 1 nF or more.'],
  ])('refuses %j at %s', (input, field, say) => {
    expect(runSheet(sheet, input)).toEqual({ ok: false, field, say });
  });
});
