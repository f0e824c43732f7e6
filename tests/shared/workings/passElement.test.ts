import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { sheet } from '@/shared/workings/passElement';
import { plotFaults } from '@/shared/workings/plot';
import { runSheet } from '@/shared/workings/sheet';
import { judgeSwitching } from '@/shared/workings/switchingVerdict';

const wide = (low: number, high: number) => fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);
const plain = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const close = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b));
const maybe = (value: fc.Arbitrary<number>) => fc.option(value);
const asked = fc.record({
  inputVolts: wide(0.011, 9999),
  outputVolts: wide(0.011, 9999),
  amps: wide(1.1e-6, 999),
  style: fc.constantFrom('linear', 'switching'),
  standingAmps: plain(0, 100),
  switchVolts: plain(0, 10),
  diodeVolts: plain(0, 5),
  hertz: plain(0, 10e6),
  edgeSeconds: plain(0, 1e-3),
  alike: fc.integer({ min: 1, max: 64 }),
  junctionToCase: plain(0, 1000),
  caseToSink: plain(0, 1000),
  sinkToAir: plain(0, 1000),
  ambient: plain(-40, 85),
  junctionLimit: plain(50, 250),
  readInputAmps: maybe(plain(0, 1000)),
  lightOutputAmps: maybe(plain(0, 1000)),
  lightInputAmps: maybe(plain(0, 1000)),
  lightOutputVolts: maybe(plain(0, 10_000)),
});
const bench = { inputVolts: 39, outputVolts: 5, amps: 17, style: 'switching' };

describe('pass element', () => {
  it('balances its watts: what goes in comes out at the load, in the device or in the diode', () => {
    fc.assert(
      fc.property(asked, (given) => {
        const answer = runSheet(sheet, { ...given, readInputAmps: null, lightOutputAmps: null, lightInputAmps: null });
        if (!answer.ok) return;
        for (const loss of [answer.result.linear, answer.result.switching]) {
          if (loss === null) continue;
          expect(close(loss.inputWatts, answer.result.outputWatts + loss.deviceWatts + loss.diodeWatts)).toBe(true);
          expect(loss.efficiency > 0 && loss.efficiency <= 1 + 1e-12).toBe(true);
        }
      }),
      { numRuns: 500 },
    );
  });

  it('never gets cooler with more load, more input, warmer air or a smaller heatsink as a linear one', () => {
    const hot = (given: object): number => {
      const answer = runSheet(sheet, { ...bench, style: 'linear', ...given });
      if (!answer.ok) throw new Error(answer.say);
      return answer.result.temperatures.junction;
    };
    fc.assert(
      fc.property(plain(6, 60), plain(0.1, 20), plain(0.1, 5), plain(0, 40), plain(1, 2), (inputVolts, amps, sinkToAir, ambient, times) => {
        const given = { inputVolts, amps, sinkToAir, ambient };
        for (const field of ['inputVolts', 'amps', 'sinkToAir', 'ambient'] as const)
          expect(hot({ ...given, [field]: given[field] * times })).toBeGreaterThanOrEqual(hot(given) - 1e-9);
      }),
    );
  });

  it('scales: ten times the amps burn ten times the watts', () => {
    fc.assert(
      fc.property(plain(12, 100), plain(1, 9), plain(0.01, 50), (inputVolts, outputVolts, amps) => {
        const [one, ten] = [amps, amps * 10].map((load) => runSheet(sheet, { ...bench, inputVolts, outputVolts, amps: load }));
        if (one?.ok !== true || ten?.ok !== true) throw new Error('refused');
        expect(close(ten.result.linear.deviceWatts, 10 * one.result.linear.deviceWatts)).toBe(true);
        expect(close(ten.result.switching?.deviceWatts ?? 1, 10 * (one.result.switching?.deviceWatts ?? 0))).toBe(true);
      }),
    );
  });

  it('has no NaN in its answer, and a plot that can be drawn, for any input that the form admits', () => {
    fc.assert(
      fc.property(asked, (given) => {
        const answer = runSheet(sheet, given);
        expect(JSON.stringify(answer)).not.toMatch(/NaN|Infinity|no value|over range/);
        if (answer.ok) expect(answer.plot === undefined ? ['none'] : plotFaults(answer.plot)).toEqual([]);
        else expect(answer.say).toMatch(/^[A-Z].*\.$/);
      }),
      { numRuns: 500 },
    );
  });

  it.each([
    [{ ...bench, outputVolts: 39 }, 'outputVolts', 'Output volts must be less than the input volts, 39 V.'],
    [
      { ...bench, inputVolts: 6, switchVolts: 2 },
      'switchVolts',
      'Drop when on must be less than 1 V, or switching does not reach 5 V from 6 V.',
    ],
    [{ ...bench, lightInputAmps: 1 }, 'readInputAmps', 'Read: input amps are missing: they must be read at the heavier load too.'],
    [
      { ...bench, readInputAmps: 3, lightInputAmps: 1 },
      'lightOutputAmps',
      'A light load needs both its input amps and its output amps; one is missing.',
    ],
    [
      { ...bench, readInputAmps: 3, lightInputAmps: 1, lightOutputAmps: 16 },
      'lightOutputAmps',
      'The light load must be lighter: less than 90 % of 17 A.',
    ],
    [{ ...bench, amps: 0 }, 'amps', 'Output amps must be 1 μA or more.'],
    [{ ...bench, amps: -17 }, 'amps', 'Output amps must be 1 μA or more.'],
    [{ ...bench, inputVolts: 1e6 }, 'inputVolts', 'Input volts must be 10 kV or less.'],
    [{ ...bench, hertz: '20 kHz' }, 'hertz', 'Frequency must be a number in hertz.'],
  ])('refuses %j at %s', (input, field, say) => {
    expect(runSheet(sheet, input)).toEqual({ ok: false, field, say });
  });
});

describe('judgeSwitching', () => {
  const read = (readInputAmps: number, more: object = {}) =>
    judgeSwitching({ inputVolts: 40, outputVolts: 5, amps: 10, readInputAmps, standingAmps: 0, light: null, ...more }, 1.6).is;

  it.each([
    [1.7, 'switching'],
    [2.4, 'switching'],
    [3, 'between'],
    [9.5, 'not-switching'],
    [10.2, 'not-switching'],
    [14, 'takes-more'],
    [1, 'impossible'],
    [0, 'impossible'],
  ])('%d A into 40 V for 10 A out of 5 V: %s', (amps, is) => {
    expect(read(amps)).toBe(is);
  });

  it('takes standing amps off, and needs none of them known where two loads were read', () => {
    expect(read(3.6)).toBe('between');
    expect(read(3.6, { standingAmps: 2 })).toBe('switching');
    expect(read(3.6, { light: { inputAmps: 2.1, outputAmps: 1, outputVolts: null } })).toBe('switching');
  });

  it('will not tell where the volts lie close together', () => {
    expect(read(9, { outputVolts: 35 })).toBe('cannot-tell');
  });
});
