import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { classifyRail, railLimits, sheet } from '@/shared/workings/railLimits';
import { runSheet } from '@/shared/workings/sheet';

describe('classifyRail', () => {
  const plus = railLimits(5, 5);
  const minus = railLimits(-12, 10);

  it.each([
    [5, plus, 'in'],
    [4.76, plus, 'close-in'],
    [4.74, plus, 'close-out'],
    [4.6, plus, 'low'],
    [0, plus, 'low'],
    [-0.04, plus, 'low'],
    [-0.3, plus, 'reversed'],
    [-5, plus, 'reversed'],
    [5.4, plus, 'high'],
    [Number.POSITIVE_INFINITY, plus, 'high'],
    [Number.NEGATIVE_INFINITY, plus, 'reversed'],
    [-12, minus, 'in'],
    [-10.5, minus, 'low'],
    [-10.81, minus, 'close-in'],
    [-10.79, minus, 'close-out'],
    [-13.5, minus, 'high'],
    [0, minus, 'low'],
    [0.7, minus, 'reversed'],
    [12, minus, 'reversed'],
  ] as const)('%d V against %j is %s', (reading, limits, answer) => {
    expect(classifyRail(reading, limits, 0.03)).toBe(answer);
  });

  it('judges a negative rail like its mirror', () => {
    const value = fc.double({ min: -40, max: 40, noNaN: true });
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 24, noNaN: true }),
        fc.double({ min: 0, max: 20, noNaN: true }),
        value,
        fc.double({ min: 0, max: 1, noNaN: true }),
        (nominal, tolerance, reading, guard) => {
          expect(classifyRail(-reading, railLimits(-nominal, tolerance), guard)).toBe(
            classifyRail(reading, railLimits(nominal, tolerance), guard),
          );
        },
      ),
    );
  });

  it('gives one answer to every reading there is', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (reading, guard) => {
        expect(['in', 'close-in', 'close-out', 'low', 'high', 'reversed']).toContain(classifyRail(reading, plus, guard));
      }),
    );
  });
});

describe('sheet', () => {
  it('answers the example in one line', () => {
    const answer = runSheet(sheet, sheet.example);
    expect(answer.ok && answer.headline).toBe('−10.8 V to −13.2 V; −11.6 V is in.');
  });

  it('warns when a rail is reversed', () => {
    const answer = runSheet(sheet, { nominalVolts: 5, tolerancePercent: 5, readingVolts: -0.7 });
    expect(answer.ok && answer.headline).toMatch(/reversed: the sign is wrong/);
    expect(answer.ok && answer.caution).toMatch(/lifted return/);
  });

  it('says when the meter is too coarse for the rail', () => {
    const answer = runSheet(sheet, { nominalVolts: 5, tolerancePercent: 1, guardVolts: 0.1 });
    expect(answer).toMatchObject({ ok: true, result: { acceptLowVolts: null, acceptHighVolts: null } });
    expect(answer.ok && answer.formula[2]).toMatch(/wider than the tolerance/);
  });

  it('refuses a rail of nothing', () => {
    expect(runSheet(sheet, { nominalVolts: 0, tolerancePercent: 5 })).toEqual({
      ok: false,
      field: 'nominalVolts',
      say: 'Nominal volts must be 0.1 V or more, either sign.',
    });
  });
});
