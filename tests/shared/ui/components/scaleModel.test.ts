import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { roundStep, scaleModel } from '@/shared/ui/components/scaleModel';

const finite = fc.double({ min: -1e4, max: 1e4, noNaN: true, noDefaultInfinity: true });

describe('roundStep', () => {
  it.each([
    [0.9, 1],
    [1, 1],
    [1.1, 2],
    [2.2, 2.5],
    [3, 5],
    [6, 10],
    [0.012, 0.02],
    [0, 1],
  ])('makes of %s the step %s', (asked, step) => {
    expect(roundStep(asked)).toBeCloseTo(step, 12);
  });
});

describe('scaleModel', () => {
  const five = { low: 4.75, high: 5.25, guard: 0.03, nominal: 5 };

  it('shows both limits with room beside them', () => {
    const m = scaleModel({ ...five, value: 5.02 }, 5);
    expect(m.min).toBeLessThan(4.75 - 0.03);
    expect(m.max).toBeGreaterThan(5.25 + 0.03);
    expect(m.band).toEqual({ from: 4.75, to: 5.25 });
    expect(m.guards).toEqual([
      { from: 4.72, to: 4.78 },
      { from: 5.22, to: 5.28 },
    ]);
    expect(m.needle).toEqual({ at: 5.02, off: null });
  });

  it('puts the needle at the end, with its direction, when the reading is far outside', () => {
    const high = scaleModel({ ...five, value: 17.8 }, 5);
    expect(high.needle).toEqual({ at: high.max, off: 'high' });
    const low = scaleModel({ ...five, value: -4.9 }, 5);
    expect(low.needle).toEqual({ at: low.min, off: 'low' });
    expect(scaleModel({ ...five, value: Infinity }, 5).needle?.off).toBe('high');
  });

  it('keeps a negative rail the right way round', () => {
    const m = scaleModel({ value: -12.11, low: -12.6, high: -11.4, guard: 0.05, nominal: -12 }, 5);
    expect(m.min).toBeLessThan(m.max);
    expect(m.band).toEqual({ from: -12.6, to: -11.4 });
    expect(m.needle).toEqual({ at: -12.11, off: null });
  });

  it('runs the band to the end of the scale on an open side', () => {
    const most = scaleModel({ value: 0.07, low: null, high: 0.1, guard: 0.01 }, 5);
    expect(most.min).toBe(0);
    expect(most.band).toEqual({ from: 0, to: 0.1 });
    expect(most.guards).toHaveLength(1);
    const least = scaleModel({ value: 2.4, low: 1, high: null, guard: 0 }, 5);
    expect(least.band).toEqual({ from: 1, to: least.max });
    expect(least.guards).toEqual([]);
  });

  it('draws no needle without a reading and no band without a limit', () => {
    expect(scaleModel({ ...five, value: null }, 5).needle).toBeNull();
    expect(scaleModel({ value: 37, low: null, high: null, guard: 0 }, 5).band).toBeNull();
  });

  it('for any reading and limits: rising ticks, few labels, band and needle on the scale', () => {
    fc.assert(
      fc.property(
        fc.option(finite),
        fc.option(finite),
        fc.option(finite),
        fc.double({ min: 0, max: 100, noNaN: true }),
        fc.integer({ min: 2, max: 9 }),
        (value, a, b, guard, labels) => {
          const [low, high] = a !== null && b !== null && a > b ? [b, a] : [a, b];
          const m = scaleModel({ value, low, high, guard }, labels);
          expect(m.max).toBeGreaterThan(m.min);
          expect(m.ticks.filter((t) => t.major).length).toBeLessThanOrEqual(labels);
          expect(m.ticks.length).toBeLessThan(labels * 8 + 8);
          for (const n of [m.needle?.at, m.band?.from, m.band?.to, ...m.guards.flatMap((g) => [g.from, g.to])]) {
            if (n === undefined) continue;
            expect(n).toBeGreaterThanOrEqual(m.min);
            expect(n).toBeLessThanOrEqual(m.max);
          }
        },
      ),
      { numRuns: 500 },
    );
  });
});
