import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { E24 } from '@/shared/workings/preferred';
import { judgeReforming } from '@/shared/workings/reformCurve';
import type { ReformReading } from '@/shared/workings/reformCurve';
import { reformResistor, STOP_WATTS } from '@/shared/workings/reformPlan';
import type { ReformingResult } from '@/shared/workings/reforming';
import { sheet } from '@/shared/workings/reforming';
import { runSheet } from '@/shared/workings/sheet';

const wide = (low: number, high: number) => fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);
const bench = { farads: 47e-6, ratedVolts: 450, ageYears: 15, storageYears: 5 };
const work = (given: object): ReformingResult => {
  const answer = runSheet(sheet, given);
  if (!answer.ok) throw new Error(`${answer.field}: ${answer.say}`);
  return answer.result;
};

describe('reformResistor', () => {
  it('never lets more than 1 W into the can, whatever it leaks, and is of E24', () => {
    fc.assert(
      fc.property(wide(1e-7, 10), wide(3, 700), wide(3e-6, 1), wide(1e-6, 10), (farads, volts, limit, leak) => {
        const { ohms } = reformResistor(farads, volts, limit);
        const onCan = Math.max(0, volts - leak * ohms);
        expect(onCan * leak).toBeLessThanOrEqual(STOP_WATTS * (1 + 1e-9));
        const mantissa = ohms / 10 ** Math.floor(Math.log10(ohms) + 1e-9);
        expect(E24.some((step) => Math.abs(step - mantissa) < 1e-6)).toBe(true);
      }),
    );
  });

  it('balances: supply watts are resistor watts and can watts', () => {
    fc.assert(
      fc.property(wide(3, 700), wide(1e-6, 1), (volts, share) => {
        const { ohms, shortAmps } = reformResistor(1e-4, volts, 1e-4);
        const amps = shortAmps * Math.min(1, share);
        const can = (volts - amps * ohms) * amps;
        expect(Math.abs(volts * amps - can - amps * amps * ohms)).toBeLessThan(1e-9 * volts * shortAmps);
      }),
    );
  });
});

describe('plan', () => {
  it('never gets shorter with more years without volts, and ends at the target', () => {
    fc.assert(
      fc.property(
        wide(1.1e-7, 1),
        wide(3.1, 600),
        fc.double({ min: 0, max: 50, noNaN: true }),
        fc.double({ min: 0, max: 50, noNaN: true }),
        (farads, ratedVolts, one, more) => {
          const at = (storageYears: number) => work({ farads, ratedVolts, ageYears: 120, storageYears });
          expect(at(one + more).minutes).toBeGreaterThanOrEqual(at(one).minutes);
          const { stages } = at(one);
          expect(stages.length === 0 || stages.at(-1)?.volts === ratedVolts).toBe(true);
          expect(stages.map(({ volts }) => volts)).toEqual([...stages.map(({ volts }) => volts)].sort((a, b) => a - b));
        },
      ),
    );
  });

  it('says it in one line', () => {
    const answer = runSheet(sheet, sheet.example);
    expect(answer.ok && answer.headline).toBe('5 stages to 40 V through 8.2 kΩ, 500 mW: 10 h at least; done at 488 μA.');
  });

  it('refuses a resistor that lets the can cook, or burns itself', () => {
    expect(work({ ...bench, seriesOhms: 1000 }).resistorTrouble).toBe('with 1 kΩ the can may get 50.6 W, more than 1 W');
    expect(work({ ...bench, seriesOhms: 100e3, seriesWatts: 1 }).resistorTrouble).toBe('a shorted can puts 2.03 W into a resistor of 1 W');
    expect(work({ ...bench, seriesOhms: 100e3, seriesWatts: 5 }).resistorTrouble).toBeNull();
  });
});

describe('judgeReforming', () => {
  const log = (volts: number, ...pairs: (readonly [number, number])[]): ReformReading[] =>
    pairs.map(([minutes, microamps]) => ({ minutes, volts, amps: microamps * 1e-6 }));
  const says = (readings: ReformReading[]) =>
    judgeReforming(readings, { ohms: 91e3, timeConstantSeconds: 4, targetVolts: 450, doneAt: () => 200e-6 })?.says ?? null;

  it.each<[string, ReformReading[], string | null]>([
    ['nothing', [], null],
    ['one reading that counts', log(112, [0, 2000], [1, 900]), 'too-early'],
    ['a fall', log(112, [0, 2000], [10, 900], [20, 700], [30, 560]), 'falling'],
    ['a stage that is done', log(112, [0, 2000], [10, 300], [20, 190]), 'next-stage'],
    ['the last stage done', log(450, [0, 2000], [10, 300], [20, 190]), 'formed'],
    ['a leakage that stays', log(225, [0, 2000], [10, 800], [20, 790], [30, 785]), 'stalled'],
    ['a leakage that rises', log(225, [0, 2000], [10, 800], [20, 700], [25, 900]), 'rising'],
    ['a rise that stays far below the limit', log(450, [0, 2000], [10, 8], [20, 12]), 'formed'],
    ['new volts after a done stage', [...log(112, [0, 500], [10, 150], [20, 100]), ...log(225, [21, 900])], 'too-early'],
  ])('%s: %s', (_, readings, expected) => {
    expect(says(readings)).toBe(expected);
  });

  it('stops at a watt in the can, even while it charges', () => {
    const hot = [
      { minutes: 0, volts: 450, amps: 20e-3 },
      { minutes: 1, volts: 450, amps: 20e-3 },
    ];
    expect(judgeReforming(hot, { ohms: 1000, timeConstantSeconds: 4, targetVolts: 450, doneAt: () => 1e-4 })?.says).toBe('too-hot');
  });

  it('foretells a power law to the minute: I = 2 mA ÷ minutes reaches 200 μA after 10', () => {
    const readings = [1, 2, 4].map((minutes) => ({ minutes, volts: 450, amps: 2e-3 / minutes }));
    const verdict = judgeReforming([{ minutes: 0, volts: 450, amps: 4e-3 }, ...readings], {
      ohms: 91e3,
      timeConstantSeconds: 4,
      targetVolts: 450,
      doneAt: () => 200e-6,
    });
    expect(verdict?.says).toBe('falling');
    expect(verdict?.minutesToGo).toBeCloseTo(6, 6);
  });
});

describe('sheet', () => {
  const two = (more: object) => [
    { minutes: 0, volts: 100, amps: 1e-3 },
    { minutes: 5, volts: 100, amps: 1e-3, ...more },
  ];

  it.each([
    [{ ...bench, targetVolts: 500 }, 'targetVolts', 'Target volts must be no more than the rated 450 V.'],
    [{ ...bench, storageYears: 16 }, 'storageYears', 'Without volts must be no longer than the age.'],
    [{ ...bench, ratedVolts: 600, rule: 'period' }, 'rule', 'Leakage rule must be another one: JAN-C-62 ends at 500 V.'],
    [{ ...bench, log: two({ minutes: 0 }) }, 'log.1.minutes', 'Reading 2: minutes must be more than those of the reading before.'],
    [
      { ...bench, log: two({ volts: 600 }) },
      'log.1.volts',
      'Reading 2: volts must be no more than the rated 450 V. If that was really set, stop: volts off.',
    ],
    [{ ...bench, log: two({ amps: -1 }) }, 'log.1.amps', 'Reading 2: Leakage must be 0 A or more.'],
    [{ ...bench, log: two({}).slice(1) }, 'log', 'A curve needs two readings; there must be one more.'],
    [{ ...bench, farads: 1e6 }, 'farads', 'Capacitance must be 10 F or less.'],
    [{ ...bench, farads: 0 }, 'farads', 'Capacitance must be 100 nF or more.'],
    [{ ...bench, ratedVolts: undefined }, 'ratedVolts', 'Rated volts is missing.'],
  ])('refuses %j at %s', (input, field, say) => {
    expect(runSheet(sheet, input)).toEqual({ ok: false, field, say });
  });
});
