import { describe, expect, it } from 'vitest';

import { buckCurrents, dutyOf, hystereticHertz, triangleRippleVolts } from '@/shared/workings/buck';
import { runSheet } from '@/shared/workings/sheet';
import { runDown, sheet } from '@/shared/workings/switchingRegulator';

describe('duty and currents', () => {
  // TI SLVA477B, Basic Calculation of a Buck Converter’s Power Stage, with drops: 25 V to 5 V, 1.0 V and 0.4 V, 0.5 A.
  it('25 V to 5 V at 0.5 A: duty 0.2213, diode 0.3893 A on average', () => {
    const volts = { inputVolts: 25, outputVolts: 5, switchVolts: 1, diodeVolts: 0.4 };
    expect(dutyOf(volts)).toBeCloseTo(0.22131, 5);
    expect(buckCurrents(volts, 0.5, 1, 100e3).diodeAverageAmps).toBeCloseTo(0.38934, 5);
  });

  // MC34063A data sheet, formula table, step-down column; the set of inputs is that of AN920/D, from memory.
  it('MC34063A step-down: ton/toff 0.3671, D 0.2685, ton 5.37 μs, toff 14.63 μs, L 848.5 μH at the edge of empty, 10 μF for 25 mV', () => {
    const volts = { inputVolts: 21.6, outputVolts: 5, switchVolts: 0.8, diodeVolts: 0.8 };
    const duty = dutyOf(volts);
    expect(duty / (1 - duty)).toBeCloseTo(0.3671, 4);
    expect(duty).toBeCloseTo(0.2685, 4);
    expect(duty / 50e3).toBeCloseTo(5.37e-6, 8);
    expect((1 - duty) / 50e3).toBeCloseTo(14.63e-6, 8);
    const at = buckCurrents(volts, 0.05, 848.5e-6, 50e3);
    expect(at.rippleAmps).toBeCloseTo(0.1, 5);
    expect(at.emptyBelowAmps).toBeCloseTo(0.05, 5);
    expect(triangleRippleVolts(0.1, duty, 50e3, 10e-6, 0)).toBeCloseTo(0.025, 9);
  });

  // Hart, Power Electronics, example 6-1: 50 V, D 0.4, 400 μH, 100 μF, 20 kHz, 20 Ω. From memory, recomputed.
  it('Hart 6-1: 20 V, choke 0.25 to 1.75 A, ripple 0.469 %', () => {
    const volts = { inputVolts: 50, outputVolts: 20, switchVolts: 0, diodeVolts: 0 };
    const at = buckCurrents(volts, 1, 400e-6, 20e3);
    expect(at.duty).toBe(0.4);
    expect([at.valleyAmps, at.peakAmps]).toEqual([expect.closeTo(0.25, 9), expect.closeTo(1.75, 9)]);
    expect(triangleRippleVolts(at.rippleAmps, 0.4, 20e3, 100e-6, 0) / 20).toBeCloseTo(0.00469, 5);
  });

  // Hart, Power Electronics, example 6-2: 48 V to 18 V into 10 Ω at 40 kHz, L 97.5 μH, C 100 μF. From memory, recomputed.
  it('Hart 6-2: D 0.375, ripple 2.88 A, peak 3.24 A, least choke 78 μH, ripple 0.5 %', () => {
    const volts = { inputVolts: 48, outputVolts: 18, switchVolts: 0, diodeVolts: 0 };
    const at = buckCurrents(volts, 1.8, 97.5e-6, 40e3);
    expect(at.duty).toBe(0.375);
    expect(at.rippleAmps).toBeCloseTo(2.885, 3);
    expect(at.peakAmps).toBeCloseTo(3.24, 2);
    expect(buckCurrents(volts, 1.8, 78.125e-6, 40e3).valleyAmps).toBeCloseTo(0, 9);
    expect(triangleRippleVolts(at.rippleAmps, 0.375, 40e3, 100e-6, 0) / 18).toBeCloseTo(0.005, 4);
  });

  // Public converter calculator with worked example, June 2026: 12 V to 5 V at 2 A, 500 kHz, 30 % ripple, 1 % output ripple.
  it('12 V to 5 V at 2 A: D about 0.42, peak 2.3 A with the 9.72 μH of 30 % ripple (printed: take 10 μH)', () => {
    const volts = { inputVolts: 12, outputVolts: 5, switchVolts: 0, diodeVolts: 0 };
    const at = buckCurrents(volts, 2, (5 * 7) / (12 * 0.6 * 500e3), 500e3);
    expect(at.duty).toBeCloseTo(0.42, 2);
    expect(at.peakAmps).toBeCloseTo(2.3, 9);
    // C = ΔI ÷ (8 f ΔV), as printed there
    expect(triangleRippleVolts(0.6, at.duty, 500e3, 0.6 / (8 * 500e3 * 0.05), 0)).toBeCloseTo(0.05, 9);
  });

  // Public design guide, February 2026: 0.6 A at 400 kHz, 50 mV: 3.75 μF; ESR adds ΔI × ESR.
  it('0.6 A at 400 kHz into 3.75 μF: 50 mV; 50 mΩ into plenty of capacitance: 30 mV', () => {
    expect(triangleRippleVolts(0.6, 0.473, 400e3, 3.75e-6, 0)).toBeCloseTo(0.05, 9);
    expect(triangleRippleVolts(0.6, 0.473, 400e3, 1, 0.05)).toBeCloseTo(0.03, 6);
  });
});

describe('hysteretic frequency', () => {
  const tps = {
    inputVolts: 5,
    outputVolts: 1.8,
    farads: 680e-6,
    esrOhms: 0.04,
    henries: 6e-6,
    windowVolts: 0.0097,
    divider: 1,
    delaySeconds: 1.5e-6,
  };

  // TPS5103 data sheet, p. 22, prints 122 kHz ± 30 %; its own formula gives 121.5 kHz without the ESL and 126.9 kHz with it.
  it('TPS5103 example: between 115 and 130 kHz', () => {
    expect(hystereticHertz(tps)).toBeGreaterThan(115e3);
    expect(hystereticHertz(tps)).toBeLessThan(130e3);
    expect(hystereticHertz(tps)).toBeCloseTo(121.5e3, -2);
  });

  // LM3475 data sheet, equation 4: f = (Vo/Vin)·(Vin − Vo)·ESR ÷ (Vhyst·α·L + Vin·delay·ESR); the set of inputs is ours.
  it('LM3475, equation 4: 5 V to 2.5 V, 10 μH, 80 mΩ, 21 mV, 90 ns: 406.5 kHz by hand', () => {
    const hertz = hystereticHertz({
      inputVolts: 5,
      outputVolts: 2.5,
      henries: 10e-6,
      farads: 1e9,
      esrOhms: 0.08,
      windowVolts: 0.021,
      divider: 1,
      delaySeconds: 90e-9,
    });
    expect(hertz / ((2.5 / 5) * ((2.5 * 0.08) / (0.021 * 10e-6 + 5 * 90e-9 * 0.08)))).toBeCloseTo(1, 9);
    expect(hertz).toBeCloseTo(406.5e3, -2);
  });

  // LM3485 data sheet, equation 3: 10 mV window, 33 kΩ over 20 kΩ: 26.6 mV (the product is 26.5 mV).
  it('LM3485: the window times the divider is the least ripple, 26.5 mV', () => {
    const answer = runSheet(sheet, {
      inputVolts: 12,
      outputVolts: 3.3,
      amps: 2,
      henries: 22e-6,
      farads: 100e-6,
      esrOhms: 0.05,
      control: 'hysteretic',
      windowVolts: 0.01,
      divider: 53 / 20,
    });
    if (!answer.ok) throw new Error(answer.say);
    expect(answer.result.rippleVolts).toBeGreaterThanOrEqual(0.0265);
    expect(0.01 * (53 / 20)).toBeCloseTo(0.0266, 3);
  });
});

describe('energy of the choke', () => {
  it('½LI² shares itself between diode and load as their volts (any textbook): 200 μH at 17.6 A, 31 mJ', () => {
    const down = runDown(200e-6, 17.6, 5, 0.9);
    expect(down.chokeJoules).toBeCloseTo(0.030976, 9);
    expect(down.diodeJoules / down.loadJoules).toBeCloseTo(0.9 / 5, 9);
    expect(down.diodeJoules + down.loadJoules).toBeCloseTo(down.chokeJoules, 12);
  });

  // Littelfuse, Fuseology, table of pulses: triangle ⅓ I² t; 10 A, 4 ms: 0.1333 A²s.
  it('I²t of the falling triangle: 10 A over 4 ms is 0.1333 A²s', () => {
    expect(runDown(4e-3, 10, 9, 1).seconds).toBeCloseTo(4e-3, 12);
    expect(runDown(4e-3, 10, 9, 1).ampsSquaredSeconds).toBeCloseTo(0.13333, 5);
  });
});
