import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { chooseLoad } from '@/shared/workings/loadChoice';
import type { RailLoadPlanResult } from '@/shared/workings/railLoadPlan';
import { sheet } from '@/shared/workings/railLoadPlan';
import { runSheet } from '@/shared/workings/sheet';

const close = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b), 1e-12);
const plain = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const wide = (low: number, high: number) => plain(Math.log(low), Math.log(high)).map(Math.exp);
const work = (given: object): RailLoadPlanResult => {
  const answer = runSheet(sheet, given);
  if (!answer.ok) throw new Error(`${answer.field}: ${answer.say}`);
  return answer.result;
};
const five = { name: '+5 V', nominalVolts: 5, maxAmps: 17 };
const owned = fc.array(fc.record({ ohms: wide(0.1, 1000), watts: wide(1, 500), count: fc.integer({ min: 1, max: 4 }) }), {
  minLength: 1,
  maxLength: 5,
});

describe('chooseLoad', () => {
  it('works no piece above half its rating and never draws more than allowed', () => {
    fc.assert(
      fc.property(owned, wide(1, 100), wide(0.01, 20), (pieces, volts, amps) => {
        const choice = chooseLoad(pieces, volts, amps, amps * 1.2);
        if (choice === null) return;
        expect(choice.share).toBeLessThanOrEqual(0.5 * (1 + 1e-9));
        expect(volts / choice.ohms).toBeLessThanOrEqual(amps * 1.2 * (1 + 1e-9));
        const siemens = choice.pieces.reduce((sum, { resistor, count }) => sum + count / resistor.ohms, 0);
        expect(close(choice.ohms * siemens, 1)).toBe(true);
        for (const { resistor, count } of choice.pieces) expect(count).toBeLessThanOrEqual(resistor.count);
      }),
    );
  });

  it('finds the nearest of all choices, as counting them one by one does', () => {
    const pieces = [
      { ohms: 10, watts: 50, count: 3 },
      { ohms: 22, watts: 50, count: 2 },
      { ohms: 47, watts: 50, count: 4 },
    ];
    for (const wanted of [0.1, 0.5, 0.9, 1.3, 2]) {
      let nearest = Infinity;
      for (let a = 0; a <= 3; a += 1)
        for (let b = 0; b <= 2; b += 1)
          for (let c = 0; c <= 4; c += 1) {
            const amps = (5 * a) / 10 + (5 * b) / 22 + (5 * c) / 47;
            if (amps > 0) nearest = Math.min(nearest, Math.abs(amps - wanted));
          }
      const choice = chooseLoad(pieces, 5, wanted, 100);
      expect(Math.abs(5 / (choice?.ohms ?? Infinity) - wanted)).toBeCloseTo(nearest, 9);
    }
  });
});

describe('sheet', () => {
  it('balances: what the terminals give is heat in the load and in the leads', () => {
    const rails = fc.record({
      nominalVolts: fc.oneof(
        wide(1, 500),
        wide(1, 500).map((size) => -size),
      ),
      maxAmps: wide(0.01, 50),
      sense: fc.constantFrom('terminals', 'remote'),
    });
    fc.assert(
      fc.property(rails, plain(0, 0.05), fc.constantFrom('electronic', 'resistors'), owned, (one, leadOhms, load, resistors) => {
        const { rails: plans } = work({ rails: [{ name: 'rail', ...one }], load, leadOhms, owned: resistors });
        for (const step of plans[0]?.steps ?? []) {
          expect(close(Math.abs(step.terminalVolts) * step.amps, step.loadWatts + step.leadWatts)).toBe(true);
          expect(Math.sign(step.terminalVolts)).toBe(Math.sign(one.nominalVolts));
          expect(step.amps).toBeLessThanOrEqual(one.maxAmps * 1.002);
        }
      }),
    );
  });

  it('raises the load step by step and never below the minimum', () => {
    const { rails } = work({ rails: [{ ...five, minimumAmps: 3 }], load: 'electronic' });
    expect(rails[0]?.steps.map(({ amps }) => amps)).toEqual([3, 4.25, 8.5, expect.closeTo(13.6, 9), 17]);
  });

  it('loads first what others need, then what has a minimum load, then by watts', () => {
    const rails = [
      five,
      { name: '+12 V', nominalVolts: 12, maxAmps: 2, minimumAmps: 0.2 },
      { name: '−5 V', nominalVolts: -5, maxAmps: 20, first: 'yes' },
      { name: '−12 V', nominalVolts: -12, maxAmps: 0.3 },
    ];
    expect(work({ rails, load: 'electronic' }).rails.map(({ name }) => name)).toEqual(['−5 V', '+12 V', '−12 V', '+5 V']);
  });

  it('says where the load or the resistors do not do', () => {
    expect(runSheet(sheet, { rails: [five], load: 'electronic', loadWatts: 50 })).toMatchObject({
      ok: true,
      headline: expect.stringContaining('2 of 5 steps cannot be done like this.') as string,
    });
    const small = work({ rails: [five], load: 'resistors', owned: [{ ohms: 10, watts: 10 }] });
    expect(small.rails[0]?.steps.at(-1)?.trouble).toBe('the nearest that is owned draws 500 mA');
    expect(work({ rails: [five], load: 'resistors', owned: [{ ohms: 1, watts: 1 }] }).rails[0]?.steps[0]?.trouble).toBe(
      'no owned resistor stands these volts',
    );
    expect(work({ rails: [five], load: 'electronic', leadOhms: 1 }).rails[0]?.steps.at(-1)?.trouble).toMatch(
      /^the leads eat all the volts/,
    );
  });

  it.each([
    [
      { rails: [{ ...five, nominalVolts: 0 }], load: 'electronic' },
      'rails.0.nominalVolts',
      '+5 V: nominal volts must be 0.1 V or more, either sign.',
    ],
    [
      { rails: [{ ...five, minimumAmps: 20 }], load: 'electronic' },
      'rails.0.minimumAmps',
      '+5 V: minimum load must be no more than the rated 17 A.',
    ],
    [{ rails: [five, five], load: 'electronic' }, 'rails.1.name', 'There are two rails “+5 V”.'],
    [{ rails: [five], load: 'resistors' }, 'owned', 'Owned resistors are missing: list at least one.'],
    [{ rails: [], load: 'electronic' }, 'rails', 'Rails must be a list of 1 or more.'],
    [{ rails: [{ ...five, maxAmps: -1 }], load: 'electronic' }, 'rails.0.maxAmps', 'Rail 1: Rated amps must be 1 mA or more.'],
    [{ rails: [{ ...five, maxAmps: '17 A' }], load: 'electronic' }, 'rails.0.maxAmps', 'Rail 1: Rated amps must be a number in amps.'],
  ])('refuses %j at %s', (input, field, say) => {
    expect(runSheet(sheet, input)).toEqual({ ok: false, field, say });
  });
});
