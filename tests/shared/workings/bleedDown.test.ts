import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { sheet } from '@/shared/workings/bleedDown';
import { chooseResistor, judgeResistor, needsDischarge, PEAK_OVERLOAD, secondsToFall } from '@/shared/workings/discharge';
import { plotFaults } from '@/shared/workings/plot';
import { E24, nextE24 } from '@/shared/workings/preferred';
import { runSheet } from '@/shared/workings/sheet';

const wide = (low: number, high: number): fc.Arbitrary<number> =>
  fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);
const farads = wide(1.1e-12, 9.9);
const volts = wide(0.11, 29_000);
const ohms = wide(0.11, 9.9e8);
const close = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b));

describe('secondsToFall', () => {
  it('scales with capacitance and with resistance, and adds up over stages', () => {
    fc.assert(
      fc.property(farads, ohms, wide(61, 29_000), (c, r, from) => {
        expect(close(secondsToFall(2 * c, r, from, 5), 2 * secondsToFall(c, r, from, 5))).toBe(true);
        expect(close(secondsToFall(c, 2 * r, from, 5), 2 * secondsToFall(c, r, from, 5))).toBe(true);
        expect(close(secondsToFall(c, r, from, 60) + secondsToFall(c, r, 60, 5), secondsToFall(c, r, from, 5))).toBe(true);
      }),
    );
  });

  it('is nothing where the capacitor is already safe', () => {
    expect(secondsToFall(1, 1000, 5, 5)).toBe(0);
    expect(secondsToFall(1, 1000, 4, 5)).toBe(0);
  });
});

describe('needsDischarge', () => {
  it.each([
    [100e-6, 60, false],
    [100e-6, 84, true],
    [100e-6, 83, false],
    [4700e-6, 40, false],
    [22_000e-6, 40, true],
    [0.1e-6, 450, false],
  ])('%d F at %d V: %s', (c, v, needs) => {
    expect(needsDischarge(c, v)).toBe(needs);
  });
});

describe('nextE24', () => {
  it.each([
    [4.7, 4.7],
    [4.71, 5.1],
    [4700, 4700],
    [9.2, 10],
    [9100.1, 10_000],
    [0.33, 0.33],
    [0.95, 1],
    [1e6, 1e6],
    [2.6e5, 2.7e5],
  ])('takes %d Ω up to %d Ω', (from, to) => {
    expect(nextE24(from)).toBe(to);
  });

  it('is never below, never more than the next step above, and always in the series', () => {
    fc.assert(
      fc.property(wide(1e-3, 1e9), (value) => {
        const next = nextE24(value);
        expect(next >= value * (1 - 1e-12) && next <= value * 1.16).toBe(true);
        const mantissa = next / 10 ** Math.floor(Math.log10(next) + 1e-9);
        expect(E24.some((step) => Math.abs(step - mantissa) < 1e-6)).toBe(true);
      }),
    );
  });
});

describe('chooseResistor', () => {
  it('always suggests one that its own rule passes, and the next smaller value would not', () => {
    fc.assert(
      fc.property(farads, volts, wide(0.11, 990), (c, v, watts) => {
        const choice = chooseResistor(c, v, 5, watts);
        const joules = (c * v * v) / 2;
        if (choice === null) {
          expect(joules).toBeGreaterThan(25 * Math.max(watts, 200) * (1 - 1e-9));
          return;
        }
        expect(judgeResistor((v * v) / choice.ohms, joules, choice.watts)).not.toBe('too-small');
        expect((v * v) / (choice.ohms / 1.17)).toBeGreaterThan(PEAK_OVERLOAD * choice.watts * (1 - 1e-9));
      }),
    );
  });
});

describe('sheet', () => {
  it('answers the example in one line', () => {
    const answer = runSheet(sheet, sheet.example);
    expect(answer.ok && answer.headline).toBe('3.76 J: 1.4 s to 5 V, worst case.');
    expect(answer).toMatchObject({ ok: true, result: { toolVerdict: 'pulse', needsDischarge: false } });
  });

  it('says that a tool resistor is too small and which to take', () => {
    const answer = runSheet(sheet, { farads: 1000e-6, volts: 450, toolOhms: 100, toolWatts: 5 });
    expect(answer).toMatchObject({ ok: true, result: { toolVerdict: 'too-small', needsDischarge: true } });
    expect(answer.ok && answer.headline).toBe(
      '101 J: 709 ms to 5 V, worst case. The tool resistor is too small. Take 3 kΩ, 7 W, wire-wound.',
    );
  });

  it('gives up on a single resistor where none is large enough', () => {
    const answer = runSheet(sheet, { farads: 1, volts: 400, toolOhms: 1000, toolWatts: 10 });
    expect(answer.ok && answer.headline).toMatch(/in stages with a proper discharge set/);
  });

  it('takes several capacitors one after the other with the same tool, and names those for which it is too small', () => {
    const answer = runSheet(sheet, {
      ...sheet.example,
      others: [
        { name: 'C2', farads: 1e-3, volts: 450 },
        { name: 'C3', farads: 1e-6, volts: 40, bleederOhms: 1e4 },
      ],
    });
    if (!answer.ok) throw new Error(answer.say);
    expect(answer.headline).toBe('3.76 J: 1.4 s to 5 V, worst case. All 3: 105 J, 2.11 s one after the other. Too small for C2.');
    const { allJoules, allSeconds, joules, worstSecondsToSafe, others } = answer.result;
    expect(
      close(
        allJoules,
        others.reduce((sum, one) => sum + one.joules, joules),
      ),
    ).toBe(true);
    expect(
      close(
        allSeconds,
        others.reduce((sum, one) => sum + one.worstSeconds, worstSecondsToSafe),
      ),
    ).toBe(true);
    expect(others.map(({ needsDischarge: needs }) => needs)).toEqual([true, false]);
  });

  it('lets the tool cool where each alone is well but all together are not', () => {
    const others = Array.from({ length: 3 }, (_, n) => ({ name: `C${String(n)}`, farads: 0.08, volts: 40 }));
    expect(runSheet(sheet, { farads: 0.08, volts: 40, toolOhms: 100, toolWatts: 10, others })).toMatchObject({
      headline: expect.stringMatching(/Let the tool cool between them\.$/) as string,
    });
  });

  it('says how far it comes back by its kind, and to discharge again where that is too much', () => {
    const said = (kind: string) => {
      const answer = runSheet(sheet, { ...sheet.example, kind });
      return answer.ok ? answer.formula.join(' ') : '';
    };
    expect(said('electrolytic')).toContain('may come back to 6 V, above 5 V: wait, read, discharge again, leave the link on');
    expect(said('film')).toContain('may come back to 800 mV: wait, read again, leave the link on');
  });

  it('draws its fall, straight on a logarithmic scale, to the safe volts', () => {
    const answer = runSheet(sheet, sheet.example);
    const plot = answer.ok ? answer.plot : undefined;
    expect(plot === undefined ? ['none'] : plotFaults(plot)).toEqual([]);
    for (const curve of plot?.curves ?? []) expect(curve.points.at(-1)?.[1]).toBeCloseTo(5, 9);
    const below = runSheet(sheet, { ...sheet.example, volts: 3 });
    expect(below.ok && below.plot).toBeUndefined();
  });

  it('shares the energy between bleeder and tool without a remainder', () => {
    fc.assert(
      fc.property(farads, volts, ohms, ohms, (c, v, bleederOhms, toolOhms) => {
        const answer = runSheet(sheet, { farads: c, volts: v, bleederOhms, toolOhms });
        if (!answer.ok) throw new Error(answer.say);
        const { toolJoules, worstJoules, ohms: both } = answer.result;
        expect(close((toolJoules ?? 0) + (worstJoules * both) / bleederOhms, worstJoules)).toBe(true);
      }),
    );
  });

  it('never gets quicker with more capacitance, more volts, more ohms, more tolerance or a lower safe voltage', () => {
    const input = fc.record({
      farads: wide(1e-9, 1),
      volts: wide(1, 5000),
      toolOhms: wide(1, 1e6),
      tolerancePercent: fc.double({ min: 0, max: 100, noNaN: true }),
      safeVolts: wide(2, 30),
    });
    const seconds = (given: object): number => {
      const answer = runSheet(sheet, given);
      if (!answer.ok) throw new Error(answer.say);
      return answer.result.worstSecondsToSafe;
    };
    fc.assert(
      fc.property(input, fc.double({ min: 1, max: 2, noNaN: true }), (given, times) => {
        const base = seconds(given) * (1 - 1e-12);
        for (const field of ['farads', 'volts', 'toolOhms', 'tolerancePercent'] as const)
          expect(seconds({ ...given, [field]: given[field] * times })).toBeGreaterThanOrEqual(base);
        expect(seconds({ ...given, safeVolts: given.safeVolts / times })).toBeGreaterThanOrEqual(base);
      }),
    );
  });

  it('has no NaN in its answer for any input that the form admits', () => {
    const input = fc.record({
      farads,
      volts,
      safeVolts: wide(0.11, 59),
      bleederOhms: fc.option(ohms),
      toolOhms: fc.option(ohms),
      toolWatts: wide(0.11, 990),
      tolerancePercent: fc.double({ min: 0, max: 200, noNaN: true }),
    });
    fc.assert(
      fc.property(input, (given) => {
        const answer = runSheet(sheet, given);
        if (!answer.ok) {
          expect(answer.field).toBe('toolOhms');
          return;
        }
        const { joules, secondsToSafe, worstSecondsToSafe, ohms: both, coulombs } = answer.result;
        for (const value of [joules, secondsToSafe, worstSecondsToSafe, both, coulombs]) expect(Number.isFinite(value)).toBe(true);
        expect(JSON.stringify(answer)).not.toMatch(/NaN|Infinity|no value|over range|without end/);
      }),
      { numRuns: 500 },
    );
  });

  it.each([
    [{ farads: 1e6, volts: 40, toolOhms: 100 }, 'farads', 'Capacitance must be 10 F or less.'],
    [{ farads: 0, volts: 40, toolOhms: 100 }, 'farads', 'Capacitance must be 1 pF or more.'],
    [{ farads: 1e-6, volts: -40, toolOhms: 100 }, 'volts', 'Volts must be 100 mV or more.'],
    [{ farads: 1e-6, volts: 40 }, 'toolOhms', 'Without a bleeder and without a tool resistor the charge has no way out: give one of them.'],
    [{ volts: 40, toolOhms: 100 }, 'farads', 'Capacitance is missing.'],
    [
      { farads: 1e-6, volts: 40, bleederOhms: 1000, others: [{ name: 'C2', farads: 1e-6, volts: 9 }] },
      'toolOhms',
      'Tool resistor is missing: without it and without a bleeder C2 has no way out.',
    ],
    [
      { farads: 1e-6, volts: 40, toolOhms: 100, others: [{ name: 'C2', farads: -1, volts: 9 }] },
      'others.0.farads',
      'Capacitor 1: Capacitance must be 1 pF or more.',
    ],
    [{ farads: 1e-6, volts: 40, toolOhms: 100, safeVolts: 80 }, 'safeVolts', 'Safe volts must be 60 V or less.'],
  ])('refuses %j at %s', (input, field, say) => {
    expect(runSheet(sheet, input)).toEqual({ ok: false, field, say });
  });
});
