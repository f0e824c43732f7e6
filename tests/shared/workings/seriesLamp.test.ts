import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { Lamp } from '@/shared/workings/lamp';
import { brightnessInWords, lampAmps, lampFor } from '@/shared/workings/lamp';
import type { LampLoad } from '@/shared/workings/lampPoints';
import { operatingPoints } from '@/shared/workings/lampPoints';
import { reservoirBehind } from '@/shared/workings/reservoirLoad';
import { sheet } from '@/shared/workings/seriesLamp';
import { runSheet } from '@/shared/workings/sheet';

const bench = { supplyVolts: 120, lampVolts: 120, lampWatts: 100 };
const close = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b));

const lamps: fc.Arbitrary<Lamp> = fc.record({
  ratedVolts: fc.double({ min: 6, max: 480, noNaN: true }),
  ratedWatts: fc.double({ min: 1, max: 10_000, noNaN: true }),
  coldRatio: fc.double({ min: 2, max: 25, noNaN: true }),
});
const supply = fc.double({ min: 6, max: 480, noNaN: true });
const wide = (low: number, high: number): fc.Arbitrary<number> =>
  fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);
const loads: fc.Arbitrary<LampLoad> = fc.oneof(
  fc.constant<LampLoad>({ kind: 'short' }),
  wide(0.001, 1e7).map((ohms): LampLoad => ({ kind: 'resistance', ohms })),
  wide(0.01, 1e5).map((watts): LampLoad => ({ kind: 'constant-power', watts })),
);

describe('operatingPoints', () => {
  it('balances volts and watts at every point, for any lamp, supply and load', () => {
    fc.assert(
      fc.property(lamps, supply, loads, (lamp, supplyVolts, load) => {
        for (const point of operatingPoints(lamp, supplyVolts, load)) {
          expect(close(point.lampVolts + point.loadVolts, supplyVolts)).toBe(true);
          expect(close(point.lampWatts + point.loadWatts, supplyVolts * point.amps)).toBe(true);
          expect(close(point.amps, lampAmps(lamp, point.lampVolts))).toBe(true);
          if (load.kind === 'resistance') expect(close(point.loadVolts, point.amps * load.ohms)).toBe(true);
          if (load.kind === 'constant-power') expect(close(point.loadWatts, load.watts)).toBe(true);
        }
      }),
      { numRuns: 500 },
    );
  });

  it('gives a heavier resistance more lamp volts and less load volts', () => {
    fc.assert(
      fc.property(lamps, supply, wide(0.001, 1e7), fc.double({ min: 1.01, max: 100, noNaN: true }), (lamp, supplyVolts, ohms, times) => {
        const [heavy] = operatingPoints(lamp, supplyVolts, { kind: 'resistance', ohms });
        const [light] = operatingPoints(lamp, supplyVolts, { kind: 'resistance', ohms: ohms * times });
        expect((heavy?.lampVolts ?? 0) >= (light?.lampVolts ?? 0)).toBe(true);
        expect((heavy?.amps ?? 0) >= (light?.amps ?? 0)).toBe(true);
      }),
    );
  });

  it('scales: twice the lamp watts into half the ohms gives the same volts and twice the amps', () => {
    fc.assert(
      fc.property(lamps, supply, wide(0.01, 1e6), (lamp, supplyVolts, ohms) => {
        const [one] = operatingPoints(lamp, supplyVolts, { kind: 'resistance', ohms });
        const [two] = operatingPoints({ ...lamp, ratedWatts: lamp.ratedWatts * 2 }, supplyVolts, { kind: 'resistance', ohms: ohms / 2 });
        expect(close(one?.loadVolts ?? 0, two?.loadVolts ?? 1)).toBe(true);
        expect(close((one?.amps ?? 0) * 2, two?.amps ?? 1)).toBe(true);
      }),
    );
  });

  it('gives constant power two points, the stable one with the lower lamp volts, or none when the lamp is too small', () => {
    const lamp: Lamp = { ratedVolts: 120, ratedWatts: 100, coldRatio: 15 };
    const two = operatingPoints(lamp, 120, { kind: 'constant-power', watts: 30 });
    expect(two.map(({ stable }) => stable)).toEqual([true, false]);
    expect((two[0]?.lampVolts ?? 0) < (two[1]?.lampVolts ?? 0)).toBe(true);
    expect(operatingPoints(lamp, 120, { kind: 'constant-power', watts: 37 })).toEqual([]);
  });

  it('is a plain resistance while the filament is cold: most watts V²/4R at half the volts, a quarter less at 3/4 and 1/4', () => {
    // 480 V, 100 W, ratio 2: 1152 Ω cold up to 102 V.
    const lamp: Lamp = { ratedVolts: 480, ratedWatts: 100, coldRatio: 2 };
    const most = (12 * 12) / (4 * 1152);
    const points = operatingPoints(lamp, 12, { kind: 'constant-power', watts: most * 0.75 });
    expect(points.map(({ lampVolts }) => lampVolts)).toEqual([expect.closeTo(3, 9), expect.closeTo(9, 9)]);
    expect(operatingPoints(lamp, 12, { kind: 'constant-power', watts: most * 0.999 })).toHaveLength(2);
    expect(operatingPoints(lamp, 12, { kind: 'constant-power', watts: most * 1.001 })).toHaveLength(0);
  });

  it('marks as stable exactly the points that a load holding its watts returns to after a nudge', () => {
    fc.assert(
      fc.property(lamps, supply, wide(0.01, 1e5), (lamp, supplyVolts, watts) => {
        for (const point of operatingPoints(lamp, supplyVolts, { kind: 'constant-power', watts })) {
          const nudge = point.lampVolts * 1e-4;
          const offered = (volts: number): number => (supplyVolts - volts) * lampAmps(lamp, volts);
          // More lamp volts (more amps) must offer more watts than wanted, so that the reservoir fills and the amps fall back.
          const rises = offered(point.lampVolts + nudge) > offered(point.lampVolts - nudge);
          const nearPeak = Math.abs(offered(point.lampVolts + nudge) / offered(point.lampVolts - nudge) - 1) < 1e-6;
          expect(nearPeak || rises === point.stable).toBe(true);
        }
      }),
    );
  });
});

describe('a rectifier with its reservoir', () => {
  it('balances: what the source gives, pulse by pulse, is heat in the lamp and watts in the load', () => {
    fc.assert(
      fc.property(supply, wide(0.05, 1e5), wide(1, 1e4), (volts, seriesOhms, loadOhms) => {
        const { halfAngle, seriesWatts, loadWatts } = reservoirBehind(volts, seriesOhms, loadOhms);
        fc.pre(halfAngle > 0.05);
        const given = ((2 * volts * volts) / (Math.PI * seriesOhms)) * (halfAngle - Math.sin(halfAngle) * Math.cos(halfAngle));
        expect(close(given, seriesWatts + loadWatts)).toBe(true);
      }),
      { numRuns: 500 },
    );
  });

  it('settles on the lamp’s own law, lower with more plate watts and higher with a larger lamp', () => {
    fc.assert(
      fc.property(lamps, supply, wide(0.1, 1e4), fc.double({ min: 1.1, max: 10, noNaN: true }), (lamp, supplyVolts, watts, times) => {
        const at = (one: Lamp, plate: number) => operatingPoints(one, supplyVolts, { kind: 'reservoir', watts: plate })[0];
        const point = at(lamp, watts);
        expect(point !== undefined && close(point.amps, lampAmps(lamp, point.lampVolts))).toBe(true);
        const share = point?.reservoirShare ?? 0;
        expect(at(lamp, watts * times)?.reservoirShare ?? 1).toBeLessThanOrEqual(share + 1e-12);
        expect(at({ ...lamp, ratedWatts: lamp.ratedWatts * times }, watts)?.reservoirShare ?? 0).toBeGreaterThanOrEqual(share - 1e-12);
      }),
    );
  });
});

describe('sheet', () => {
  it('answers the example in one line', () => {
    const answer = runSheet(sheet, sheet.example);
    expect(answer.ok && answer.headline).toBe(
      'Lamp 33.5 V, yellow, clearly lit; the reservoir comes to 64 % of its volts, 413 mA, 30.4 W.',
    );
  });

  it('gives the lamp everything in a dead short', () => {
    expect(runSheet(sheet, { ...bench, load: 'short' })).toMatchObject({
      ok: true,
      result: { deadShort: { lampVolts: 120, lampWatts: 100, loadWatts: 0 } },
    });
  });

  it('says that a switch-mode supply will tick on too small a lamp, and names the lamp to take', () => {
    const answer = runSheet(sheet, { ...bench, load: 'switch-mode', loadWatts: 60 });
    expect(answer).toMatchObject({ ok: true, result: { willTick: true, settled: null } });
    expect(answer.ok && answer.headline).toBe(
      'Will tick: 100 W of lamp cannot carry a switch-mode supply of 60 W. Take a lamp of 200 W or more.',
    );
    expect(runSheet(sheet, { ...bench, lampWatts: 200, load: 'switch-mode', loadWatts: 60 })).toMatchObject({
      result: { willTick: false },
    });
  });

  it('names a lamp for a plain resistance too, by the watts that it has on the mains', () => {
    expect(runSheet(sheet, { ...bench, load: 'resistance', loadOhms: 240 })).toMatchObject({
      result: { recommended: { leastWatts: 60, totalWatts: 60 } },
    });
    expect(runSheet(sheet, { ...bench, load: 'short' })).toMatchObject({ result: { recommended: null } });
  });

  it('says what a plate rating of a small or a huge supply needs', () => {
    expect(lampFor(30, 'switch-mode')).toMatchObject({ count: 1, totalWatts: 100 });
    expect(lampFor(1200, 'linear')).toMatchObject({ count: 3, eachWatts: 500 });
  });

  it.each([
    [{ ...bench, load: 'resistance' }, 'loadOhms', 'Load ohms are missing.'],
    [{ ...bench, load: 'rectifier' }, 'loadWatts', 'Load watts are missing.'],
    [{ ...bench, load: 'resistance', loadOhms: 0 }, 'loadOhms', 'Load ohms must be 1 mΩ or more.'],
    [{ ...bench, lampWatts: -5, load: 'short' }, 'lampWatts', 'Lamp watts must be 1 W or more.'],
    [{ ...bench, supplyVolts: 1e6, load: 'short' }, 'supplyVolts', 'Mains volts must be 480 V or less.'],
    [{ ...bench, supplyVolts: Number.NaN, load: 'short' }, 'supplyVolts', 'Mains volts must be a number in volts.'],
    [{ lampVolts: 120, lampWatts: 100, load: 'short' }, 'supplyVolts', 'Mains volts is missing.'],
    [{ ...bench, load: 'fridge' }, 'load', 'Load must be one of: resistance, rectifier, switch-mode, short.'],
  ])('refuses %j at %s', (input, field, say) => {
    expect(runSheet(sheet, input)).toEqual({ ok: false, field, say });
  });

  it('refuses a lamp that a dead short would burn out', () => {
    expect(runSheet(sheet, { ...bench, lampVolts: 60, load: 'short' })).toMatchObject({ ok: false, field: 'lampVolts' });
  });

  it('has no NaN in its answer for any input that the form admits', () => {
    const input = fc.record({
      supplyVolts: supply,
      lampVolts: supply,
      lampWatts: fc.double({ min: 1, max: 10_000, noNaN: true }),
      coldRatio: fc.double({ min: 2, max: 25, noNaN: true }),
      load: fc.constantFrom('resistance', 'rectifier', 'switch-mode', 'short'),
      loadOhms: wide(0.0011, 9.9e6),
      loadWatts: wide(0.011, 9.9e4),
    });
    fc.assert(
      fc.property(input, (given) => {
        const answer = runSheet(sheet, given);
        // JSON writes NaN and the infinities as null.
        if (answer.ok)
          for (const point of [...answer.result.points, answer.result.deadShort]) expect(JSON.stringify({ ...point, reservoirShare: 0 })).not.toContain('null');
        expect(JSON.stringify(answer)).not.toMatch(/NaN|Infinity|no value|over range/);
      }),
      { numRuns: 500 },
    );
  });
});

describe('brightnessInWords', () => {
  it('never gets darker with more volts', () => {
    const steps = ['dark', 'dull red', 'dim orange', 'yellow, clearly lit', 'full, or nearly'];
    const lamp: Lamp = { ratedVolts: 120, ratedWatts: 100, coldRatio: 15 };
    const seen = Array.from({ length: 241 }, (_, half) => steps.indexOf(brightnessInWords(lamp, half / 2)));
    expect(seen).toEqual([...seen].sort((a, b) => a - b));
    expect(new Set(seen).size).toBe(5);
  });
});

describe('lampFor', () => {
  it('gives a linear supply 1 to 2 times its plate and a switch-mode one 3 times or more, whatever the plate', () => {
    fc.assert(
      fc.property(fc.double({ min: 3.5, max: 50_000, noNaN: true }), (plate) => {
        const linear = lampFor(plate, 'linear').totalWatts / plate;
        expect(linear >= 1 && linear <= 2.2).toBe(true);
        expect(lampFor(plate, 'switch-mode').totalWatts >= 3 * plate).toBe(true);
      }),
    );
  });
});
