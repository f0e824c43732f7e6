import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { chanceWithin, clearOf, decide, errorLimitOf, sheet, uncertaintyOf } from '@/shared/workings/readingLimit';
import { runSheet } from '@/shared/workings/sheet';

const rail = { low: 4.75, high: 5.25 };

describe('decide', () => {
  it.each([
    [5, 'in'],
    [4.8, 'in'],
    [4.79, 'close-in'],
    [4.75, 'close-in'],
    [4.74, 'close-out'],
    [4.7, 'close-out'],
    [4.69, 'low'],
    [-5, 'low'],
    [5.2, 'in'],
    [5.21, 'close-in'],
    [5.25, 'close-in'],
    [5.26, 'close-out'],
    [5.3, 'close-out'],
    [5.31, 'high'],
    [Number.POSITIVE_INFINITY, 'high'],
    [Number.NEGATIVE_INFINITY, 'low'],
  ] as const)('puts %d V with a guard band of 0.05 V as %s', (value, decision) => {
    expect(decide(value, rail, 0.05)).toBe(decision);
  });

  it('is a plain in or out without uncertainty', () => {
    expect([4.75, 4.7499, 5.25, 5.2501].map((value) => decide(value, rail, 0))).toEqual(['in', 'low', 'in', 'high']);
  });

  it('keeps a reading on a computed limit in', () => {
    // 15 × 0.93 is 13.950000000000001 in a double.
    expect(decide(13.95, { low: 15 * 0.93, high: 15 * 1.07 }, 0)).toBe('in');
  });

  it('takes over range as in where there is only a low limit, as with insulation', () => {
    expect(decide(Number.POSITIVE_INFINITY, { low: 1e6, high: null }, 0)).toBe('in');
  });

  it('refuses what can only be a fault of the caller', () => {
    expect(() => decide(Number.NaN, rail, 0.1)).toThrow(RangeError);
    expect(() => decide(5, rail, -0.1)).toThrow(RangeError);
    expect(() => decide(5, { low: 6, high: 5 }, 0.1)).toThrow(RangeError);
  });

  const value = fc.double({ min: -100, max: 100, noNaN: true });
  const guard = fc.double({ min: 0, max: 20, noNaN: true });

  it('mirrors: a negative band decides as the positive one with low and high changed over', () => {
    const swap = { low: 'high', high: 'low', in: 'in', 'close-in': 'close-in', 'close-out': 'close-out' } as const;
    fc.assert(fc.property(value, guard, (v, w) => decide(-v, { low: -rail.high, high: -rail.low }, w) === swap[decide(v, rail, w)]));
  });

  it('never gets better as the value moves away from the middle', () => {
    const rank = { in: 0, 'close-in': 1, 'close-out': 2, low: 3, high: 3 } as const;
    fc.assert(
      fc.property(fc.double({ min: 0, max: 50, noNaN: true }), fc.double({ min: 0, max: 50, noNaN: true }), guard, (a, b, w) => {
        const [near, far] = [Math.min(a, b), Math.max(a, b)];
        return (
          rank[decide(5 + near, rail, w)] <= rank[decide(5 + far, rail, w)] &&
          rank[decide(5 - near, rail, w)] <= rank[decide(5 - far, rail, w)]
        );
      }),
    );
  });

  it('a larger uncertainty only ever makes it less sure', () => {
    fc.assert(
      fc.property(value, guard, guard, (v, a, b) => {
        const sure = decide(v, rail, Math.min(a, b));
        const unsure = decide(v, rail, Math.max(a, b));
        if (sure === 'in') return unsure === 'in' || unsure === 'close-in';
        if (sure === 'low' || sure === 'high') return unsure === sure || unsure === 'close-out';
        return unsure === sure;
      }),
    );
  });
});

describe('uncertaintyOf', () => {
  const spec = { percent: 0.5, counts: 3, resolution: 0.001 };

  it('is the error limit as a rectangular distribution, doubled', () => {
    expect(uncertaintyOf(spec, 4.77)).toBeCloseTo((2 * errorLimitOf(spec, 4.77)) / Math.sqrt(3), 15);
    expect(uncertaintyOf(spec, -4.77)).toBe(uncertaintyOf(spec, 4.77));
    expect(uncertaintyOf(spec, Number.POSITIVE_INFINITY)).toBe(0);
  });
});

describe('chanceWithin', () => {
  const guard = fc.double({ min: 0, max: 20, noNaN: true });
  it('is one half on a limit, all or nothing without uncertainty, and falls as the reading leaves the middle', () => {
    expect(chanceWithin(5.25, { low: null, high: 5.25 }, 0.05)).toBeCloseTo(0.5, 12);
    expect([4.7, 4.75, 5, 5.26].map((value) => chanceWithin(value, rail, 0))).toEqual([0, 1, 1, 0]);
    fc.assert(
      fc.property(fc.double({ min: 0, max: 2, noNaN: true }), fc.double({ min: 0, max: 2, noNaN: true }), guard, (a, b, w) => {
        const [near, far] = [Math.min(a, b), Math.max(a, b)];
        const chance = chanceWithin(5 + near, rail, w);
        return chance >= chanceWithin(5 + far, rail, w) - 1e-12 && chance >= 0 && chance <= 1;
      }),
    );
  });
});

describe('clearOf', () => {
  it('is the reading that just keeps its own guard band from the limit', () => {
    const spec = { percent: 0.5, counts: 3, resolution: 0.001 };
    const [low, high] = [clearOf(spec, 4.75, 1), clearOf(spec, 5.25, -1)];
    expect([low, low - 1e-6, high, high + 1e-6].map((reading) => decide(reading, rail, uncertaintyOf(spec, reading)))).toEqual([
      'in',
      'close-in',
      'in',
      'close-in',
    ]);
  });
});

describe('sheet', () => {
  it('says that a reading inside the guard band is close', () => {
    const answer = runSheet(sheet, sheet.example);
    expect(answer).toMatchObject({ ok: true, result: { decision: 'close-in' } });
    expect(answer.ok ? answer.headline : '').toBe(
      'In, but close: this instrument cannot be sure. 4.77 V ± 31 mV; the chance that it is the other way round is 9.8 %.',
    );
  });

  it('gives the limits alone while nothing is read', () => {
    const answer = runSheet(sheet, { ...sheet.example, reading: null });
    expect(answer).toMatchObject({ ok: true, result: { decision: null, chanceIn: null, chanceWrong: null } });
    expect(answer.ok ? answer.headline : '').toBe('Clearly in from 4.7811 V to 5.2164 V with this instrument.');
  });

  it('says when the instrument is too coarse for the limits', () => {
    const answer = runSheet(sheet, { ...sheet.example, reading: null, percent: 10 });
    expect(answer.ok ? answer.headline : '').toBe('Too coarse: with this instrument no reading can be clearly in.');
  });

  it('counts an analogue meter from its full scale', () => {
    const needle = { reading: 5, low: 4.75, high: 5.25, percent: 0, counts: 0, resolution: 0.1, rangePercent: 2.5, fullScale: 10 };
    expect(runSheet(sheet, needle)).toMatchObject({ ok: true, result: { errorLimit: 0.25, decision: 'close-in' } });
    expect(runSheet(sheet, { ...needle, fullScale: null })).toEqual({
      ok: false,
      field: 'fullScale',
      say: 'Percent of full scale needs the full scale of the range.',
    });
    expect(runSheet(sheet, { ...needle, reading: 12 })).toMatchObject({ ok: false, field: 'reading' });
  });

  it('names the field that is wrong', () => {
    expect(runSheet(sheet, { ...sheet.example, low: 6 })).toEqual({
      ok: false,
      field: 'high',
      say: 'The high limit must not be below the low limit.',
    });
    expect(runSheet(sheet, { ...sheet.example, low: null, high: null })).toMatchObject({ ok: false, field: 'low' });
    expect(runSheet(sheet, { ...sheet.example, reading: 'five' })).toEqual({
      ok: false,
      field: 'reading',
      say: 'Reading must be a number.',
    });
    expect(runSheet(sheet, { ...sheet.example, resolution: 0 })).toEqual({
      ok: false,
      field: 'resolution',
      say: 'Resolution must be more than 0.',
    });
    expect(runSheet(sheet, { ...sheet.example, range: 2 })).toEqual({
      ok: false,
      field: 'range',
      say: 'Reading against a limit has no input “range”.',
    });
    expect(runSheet(sheet, null)).toMatchObject({ ok: false, field: '' });
  });
});
