import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { RefitTripResult } from '@/shared/workings/refitTrip';
import { sheet } from '@/shared/workings/refitTrip';
import { runSheet } from '@/shared/workings/sheet';

function work(given: Record<string, unknown>): RefitTripResult {
  const answer = runSheet(sheet, given);
  if (!answer.ok) throw new Error(answer.say);
  return answer.result;
}
const say = (given: Record<string, unknown>): string => {
  const answer = runSheet(sheet, given);
  return answer.ok ? answer.headline : answer.say;
};

const base = { nominalVolts: 5, lastAmps: 2, boardAmps: 1, spreadPercent: 20, meterAmps: 0.02 };

describe('refit trip', () => {
  it('says where to set the limit', () => {
    expect(say(base)).toBe('Set the limit to 3.22 A: 2 A so far, 1 A for this board.');
    expect(say({ ...base, railAmps: 3 })).toBe('Do not fit: with this board the rail may have to give 3.2 A, it is rated 3 A.');
    expect(say({ ...base, boardOhms: 0.8 })).toBe('Do not fit: 800 mΩ read dead would draw 6.25 A. Find the short on the board first.');
    expect(say({ ...base, boardOhms: 0 })).toMatch(/^Do not fit: 0 Ω read dead would draw 5 kA\./);
    expect(say({ ...base, boardOhms: 30, twinOhms: 50 })).toMatch(
      /Its dead reading is less than 0.7 of its twin: look why before you fit it\.$/,
    );
    expect(say({ ...base, boardAmps: 0.01 })).toMatch(/The meter cannot tell this board from none: take a better one\.$/);
  });

  it('judges the total once the board is in', () => {
    expect(say({ ...base, newAmps: 3.05 })).toBe('3.05 A is as expected (2.8 A to 3.2 A). It is the total for the next board.');
    expect(say({ ...base, newAmps: 3.21 })).toMatch(/^3.21 A is too close to 2.8 A to 3.2 A to say with this meter\./);
    expect(say({ ...base, newAmps: 2 })).toMatch(
      /^2 A is too little .* the board does not draw\. Power off; look at its feed, its return and its seat\.$/,
    );
    expect(say({ ...base, newAmps: 3.6 })).toMatch(/^3.6 A is too much .* power off at once, prove dead, take this board out again\.$/);
  });

  it('works a negative rail by size', () => {
    expect(work({ ...base, nominalVolts: -5 })).toEqual(work(base));
  });

  it('never sets the limit below what the good board may draw, nor above the rail, and rises with the board', () => {
    const amps = fc.double({ min: 0.01, max: 50, noNaN: true });
    const spread = fc.double({ min: 0, max: 100, noNaN: true });
    fc.assert(
      fc.property(amps, amps, spread, amps, (lastAmps, boardAmps, spreadPercent, more) => {
        const given = { nominalVolts: 12, lastAmps, boardAmps, spreadPercent, railAmps: 100, ownLimitAmps: 120 };
        const one = work(given);
        const two = work({ ...given, boardAmps: boardAmps + more });
        return (
          (one.fits ? one.limitAmps >= one.highAmps : one.limitAmps === 100) &&
          one.limitAmps <= 100 &&
          two.limitAmps >= one.limitAmps &&
          one.faultWatts <= (one.ownLimitWatts ?? 0) &&
          (one.caughtOhms === null || Math.abs(12 / one.caughtOhms + one.expectedAmps - one.limitAmps) < 1e-9)
        );
      }),
    );
  });

  it.each([
    [{ ...base, nominalVolts: 0 }, 'nominalVolts', 'Nominal volts must be 0.5 V or more, either sign.'],
    [{ ...base, boardAmps: 0 }, 'boardAmps', 'Next board must be 1 mA or more.'],
    [{ ...base, lastAmps: -1 }, 'lastAmps', 'Total so far must be 0 A or more.'],
    [{ ...base, railAmps: 1 }, 'lastAmps', 'The total so far must not be more than the rail is rated for, 1 A.'],
    [{ ...base, ownLimitAmps: 1 }, 'ownLimitAmps', 'The supply’s own limit must not be below the total so far.'],
    [{ ...base, twinOhms: 10 }, 'boardOhms', 'Give the board’s own dead reading beside that of its twin.'],
    [{ nominalVolts: 5, lastAmps: 1 }, 'boardAmps', 'Next board is missing.'],
  ])('refuses %j at its field', (given, field, sentence) => {
    expect(runSheet(sheet, given)).toEqual({ ok: false, field, say: sentence });
  });
});
