import { describe, expect, it } from 'vitest';

import type { ReservoirCircuit, ReservoirState } from '@/shared/workings/reservoir';
import { settledReservoir } from '@/shared/workings/reservoir';
import { rippleFrom } from '@/shared/workings/rippleAccuses';
import { runSheet } from '@/shared/workings/sheet';
import { sheet, simpleRipple } from '@/shared/workings/smoothingRipple';

const settled = (circuit: ReservoirCircuit): ReservoirState => {
  const state = settledReservoir(circuit);
  if (state === null) throw new Error('no state');
  return state;
};

describe('simple formula, ripple = I ÷ (f × C)', () => {
  // f here is that of the ripple: twice the mains for full wave.
  it.each([
    // Public ripple calculator, worked example: 2 A, 60 Hz mains, 1000 μF full wave; shows the formula breaking down too.
    ['2 A, 120 Hz, 1000 μF: 16.67 V', 2, 120, 1000e-6, 16.667],
    // Own figures: 1 A, 50 Hz mains, 4700 μF.
    ['1 A, 100 Hz, 4700 μF: 2.128 V', 1, 100, 4700e-6, 2.1277],
    // A public calculator prints 16.7 mF for 1 A, 1 V, 60 Hz full wave, which is the half-wave value: 8.33 mF is right.
    ['1 A, 120 Hz, 8.333 mF: 1 V', 1, 120, 8.3333e-3, 1],
    ['half wave, 1 A, 60 Hz, 16.67 mF: 1 V', 1, 60, 16.6667e-3, 1],
  ])('%s', (_, amps, hertz, farads, volts) => {
    expect(simpleRipple(100, amps, hertz, farads).rippleVolts).toBeCloseTo(volts, 3);
  });

  // Published homework with answer: 12.0 V, two 0.8 V diodes, 100 Ω, 60 Hz, 1 V: 15.37 V peak, 0.154 A, 1283 μF.
  it('12 V, two 0.8 V diodes, 100 Ω: 15.37 V peak, and 1283 μF give 1 V', () => {
    const answer = runSheet(sheet, {
      secondaryVolts: 12,
      mainsHertz: 60,
      rectifier: 'bridge',
      diodeVolts: 0.8,
      sourceOhms: 0.01,
      farads: 1283e-6,
      load: 'resistor',
      loadOhms: 100,
    });
    if (!answer.ok) throw new Error(answer.say);
    expect(answer.result.simple.highVolts).toBeCloseTo(15.37, 2);
    expect(answer.result.simple.highVolts / 100).toBeCloseTo(0.154, 3);
    expect(answer.result.simple.rippleVolts).toBeCloseTo(1, 2);
    // The formula overstates: exactly it is some 13 % less, for the capacitor feeds the load for nine tenths of the time only.
    expect(answer.result.exact.rippleVolts).toBeGreaterThan(0.85);
    expect(answer.result.exact.rippleVolts).toBeLessThan(1);
  });
});

describe('stepped circuit against Sedra & Smith, Microelectronic Circuits, peak rectifier: 100 V peak, 60 Hz, 10 kΩ, 83.3 μF, 2 V (from memory)', () => {
  const state = settled({
    peakVolts: 100,
    mainsHertz: 60,
    fullWave: false,
    dropVolts: 0,
    sourceOhms: 0.01,
    farads: 83.3e-6,
    loadAmps: 0,
    loadSiemens: 1e-4,
  });

  it('2 V of ripple (theirs takes the whole period for the fall)', () => {
    expect(Math.abs(state.rippleVolts / 2 - 1)).toBeLessThan(0.05);
  });

  it('conducts for 0.2 rad, 3.18 % of the period', () => {
    expect(Math.abs(state.conductionShare / 0.0318 - 1)).toBeLessThan(0.03);
  });

  it('peak diode current 638 mA, average while it conducts 324 mA', () => {
    expect(Math.abs(state.peakDiodeAmps / 0.638 - 1)).toBeLessThan(0.05);
    expect(Math.abs(state.meanAmps / state.conductionShare / 0.324 - 1)).toBeLessThan(0.05);
  });
});

describe('stepped circuit with a large reservoir against the closed form, tan θ − θ = π Rs ÷ 2R (Schade 1943, any textbook; from memory)', () => {
  it.each([
    // θ, half the angle of conduction of each pulse, and so V = peak × cos θ
    [0.1, 1],
    [0.5, 1],
    [2, 10],
  ])('source %d Ω, load %d Ω', (sourceOhms, loadOhms) => {
    let [low, high] = [0, Math.PI / 2 - 1e-9];
    for (let i = 0; i < 80; i += 1) {
      const theta = (low + high) / 2;
      if (Math.tan(theta) - theta < (Math.PI * sourceOhms) / (2 * loadOhms)) low = theta;
      else high = theta;
    }
    const state = settled({
      peakVolts: 20,
      mainsHertz: 50,
      fullWave: true,
      dropVolts: 0,
      sourceOhms,
      farads: 9,
      loadAmps: 0,
      loadSiemens: 1 / loadOhms,
    });
    expect(state.meanVolts).toBeCloseTo(20 * Math.cos(low), 3);
  });
});

describe('what a frequency accuses (common practice, no source)', () => {
  it.each([
    [60, 60, 'one-half'],
    [120, 60, 'both-halves'],
    [100, 50, 'both-halves'],
    [50.5, 50, 'one-half'],
    [360, 60, 'three-phase'],
    [20e3, 60, 'faster'],
    [3, 50, 'slower'],
    [80, 50, 'between'],
  ])('%d Hz on %d Hz mains: %s', (ripple, mains, from) => {
    expect(rippleFrom(ripple, mains)).toBe(from);
  });
});
