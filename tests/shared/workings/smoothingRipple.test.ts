import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { plotFaults } from '@/shared/workings/plot';
import type { ReservoirCircuit } from '@/shared/workings/reservoir';
import { settledReservoir } from '@/shared/workings/reservoir';
import { accusedBySize } from '@/shared/workings/rippleAccuses';
import { runSheet } from '@/shared/workings/sheet';
import { sheet } from '@/shared/workings/smoothingRipple';

const wide = (low: number, high: number) => fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);
const bench = { secondaryVolts: 28, mainsHertz: 60, rectifier: 'bridge', sourceOhms: 0.15, farads: 22e-3, load: 'steady', amps: 3.5 };

const circuits: fc.Arbitrary<ReservoirCircuit> = fc.record({
  peakVolts: wide(5, 500),
  mainsHertz: fc.constantFrom(50, 60, 400),
  fullWave: fc.boolean(),
  dropVolts: fc.double({ min: 0, max: 2, noNaN: true }),
  sourceOhms: wide(0.01, 10),
  farads: wide(1e-5, 0.1),
  loadAmps: fc.oneof(fc.constant(0), wide(1e-3, 2)),
  loadSiemens: fc.oneof(fc.constant(0), wide(1e-4, 0.1)),
});

describe('settledReservoir', () => {
  it('repeats itself: the charge that comes through the diodes is what the load takes', () => {
    fc.assert(
      fc.property(circuits, (circuit) => {
        const state = settledReservoir(circuit);
        if (state === null || state.lowVolts <= 0) return;
        const mean = state.instants.reduce((sum, { diodeAmps }) => sum + diodeAmps, 0) / state.instants.length;
        // A sum over 400 instants sees short pulses coarsely.
        expect(Math.abs(mean - state.meanAmps)).toBeLessThan(0.03 * Math.max(state.meanAmps, state.peakDiodeAmps * 0.05) + 1e-9);
        expect(state.highVolts).toBeLessThanOrEqual(circuit.peakVolts - circuit.dropVolts);
      }),
      { numRuns: 40 },
    );
  });

  it('scales: twice the volts and twice the amps ripple twice as much; ten times the frequency with a tenth of the capacitance the same', () => {
    fc.assert(
      fc.property(circuits, (circuit) => {
        const one = settledReservoir(circuit);
        const two = settledReservoir({
          ...circuit,
          peakVolts: circuit.peakVolts * 2,
          dropVolts: circuit.dropVolts * 2,
          loadAmps: circuit.loadAmps * 2,
        });
        const fast = settledReservoir({ ...circuit, mainsHertz: circuit.mainsHertz * 10, farads: circuit.farads / 10 });
        const slack = 1e-6 * circuit.peakVolts;
        expect(Math.abs((two?.rippleVolts ?? 0) - 2 * (one?.rippleVolts ?? 0))).toBeLessThan(slack);
        expect(Math.abs((fast?.rippleVolts ?? 0) - (one?.rippleVolts ?? 0))).toBeLessThan(slack);
      }),
      { numRuns: 25 },
    );
  });

  it('sags lower with more load, a weaker source or a smaller capacitor', () => {
    fc.assert(
      fc.property(circuits, fc.double({ min: 1.05, max: 3, noNaN: true }), (circuit, times) => {
        const low = (given: ReservoirCircuit): number => settledReservoir(given)?.lowVolts ?? 0;
        const base = low(circuit) + 1e-6 * circuit.peakVolts;
        expect(low({ ...circuit, loadAmps: circuit.loadAmps * times })).toBeLessThanOrEqual(base);
        expect(low({ ...circuit, sourceOhms: circuit.sourceOhms * times })).toBeLessThanOrEqual(base);
        expect(low({ ...circuit, farads: circuit.farads / times })).toBeLessThanOrEqual(base);
      }),
      { numRuns: 25 },
    );
  });

  it('is nothing where the drop eats the peak', () => {
    expect(
      settledReservoir({
        peakVolts: 1,
        mainsHertz: 50,
        fullWave: true,
        dropVolts: 1,
        sourceOhms: 1,
        farads: 1e-3,
        loadAmps: 0,
        loadSiemens: 0,
      }),
    ).toBeNull();
  });
});

describe('sheet', () => {
  it('puts simple and exact side by side', () => {
    const answer = runSheet(sheet, bench);
    expect(answer.ok && answer.headline).toBe('Ripple 1 V peak to peak at 120 Hz, 34.2 V to 35.2 V (simple formula 1.33 V).');
  });

  it('accuses the rectifier by the frequency, then compares the size with one half working', () => {
    const answer = runSheet(sheet, { ...bench, readHertz: 60, readRippleVolts: 2.3 });
    if (!answer.ok) throw new Error(answer.say);
    const said = answer.formula.join('\n');
    expect(said).toContain('Ripple at the mains’ 60 Hz: only one half of the rectifier works.');
    expect(said).toContain('1 times the expected ripple: the reservoir and the load fit together.');
  });

  it('accuses the capacitor by the size', () => {
    expect(accusedBySize(3, 1, 22e-3)).toMatch(/^3 times the expected ripple: about 7\.3 mF is left/);
    expect(accusedBySize(0.5, 1, 22e-3)).toMatch(/the load is less than entered/);
  });

  it('says when the regulator starves, and when the load takes more than there is', () => {
    expect(runSheet(sheet, { ...bench, needVolts: 36 })).toMatchObject({
      headline: expect.stringMatching(/1\.\d+ V too low for the regulator\.$/) as string,
    });
    expect(runSheet(sheet, { ...bench, amps: 500 })).toMatchObject({
      headline: expect.stringContaining('The load takes more than this source can give.') as string,
    });
  });

  it('has no NaN in its answer, and a plot that can be drawn, for any input that the form admits', () => {
    const given = fc.record({
      secondaryVolts: wide(0.11, 9999),
      mainsHertz: wide(10.1, 999),
      rectifier: fc.constantFrom('bridge', 'centre-tap', 'half-wave'),
      diodeVolts: fc.double({ min: 0, max: 50, noNaN: true }),
      sourceOhms: wide(1.1e-3, 9.9e4),
      farads: wide(1.1e-9, 9.9),
      load: fc.constantFrom('steady', 'resistor'),
      amps: fc.option(wide(1.1e-6, 999)),
      loadOhms: fc.option(wide(1.1e-3, 9.9e8)),
      needVolts: fc.option(fc.double({ min: 0, max: 9999, noNaN: true })),
      readRippleVolts: fc.option(wide(1.1e-6, 9999)),
      readHertz: fc.option(wide(0.011, 99e6)),
    });
    fc.assert(
      fc.property(given, (input) => {
        const answer = runSheet(sheet, input);
        expect(JSON.stringify(answer)).not.toMatch(/NaN|Infinity|no value|over range/);
        if (answer.ok) expect(answer.plot === undefined ? ['none'] : plotFaults(answer.plot)).toEqual([]);
      }),
      { numRuns: 60 },
    );
  });

  it.each([
    [{ ...bench, amps: null }, 'amps', 'Load amps are missing.'],
    [{ ...bench, load: 'resistor' }, 'loadOhms', 'Load ohms are missing.'],
    [{ ...bench, secondaryVolts: 1 }, 'secondaryVolts', 'The peak of 1.41 V must be more than the drop of the diodes, 1.8 V.'],
    [{ ...bench, farads: 1e6 }, 'farads', 'Capacitance must be 10 F or less.'],
    [{ ...bench, farads: 0 }, 'farads', 'Capacitance must be 1 nF or more.'],
    [{ ...bench, amps: -1 }, 'amps', 'Load amps must be 1 μA or more.'],
    [{ ...bench, mainsHertz: 'fifty' }, 'mainsHertz', 'Mains frequency must be a number in hertz.'],
  ])('refuses %j at %s', (input, field, say) => {
    expect(runSheet(sheet, input)).toEqual({ ok: false, field, say });
  });
});
