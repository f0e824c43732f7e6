import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { FuseInrushResult } from '@/shared/workings/fuseInrush';
import { sheet } from '@/shared/workings/fuseInrush';
import { runSheet } from '@/shared/workings/sheet';

function work(given: Record<string, unknown>): FuseInrushResult {
  const answer = runSheet(sheet, given);
  if (!answer.ok) throw new Error(answer.say);
  return answer.result;
}
const say = (given: Record<string, unknown>): string => {
  const answer = runSheet(sheet, given);
  return answer.ok ? answer.headline : answer.say;
};

const base = { ratedAmps: 1, loadAmps: 0.5 };

describe('fuse and inrush', () => {
  it('says in one line what it comes to', () => {
    expect(say(sheet.example)).toBe(
      'Holds: the start takes 24 % of its melting value, good for 10000 starts. Blows from 2.1 A on, within 2 min.',
    );
    expect(say({ ...base, loadAmps: 1.2 })).toBe(
      'Too small: it may carry 1 A for good, the load draws 1.2 A. The least usual rating is 1.25 A.',
    );
    expect(say({ ...base, loadAmps: 50 })).toMatch(/No usual miniature fuse carries that\.$/);
    expect(say({ ...base, faultAmps: 500 })).toMatch(/^Cannot break it safely: a short draws 500 A, this fuse breaks 35 A\./);
    expect(say({ ...base, peakAmps: 20, pulseSeconds: 0.01, melting: 1 })).toBe(
      'May blow at the first start: the start takes 200 % of its melting value.',
    );
    expect(say({ ...base, peakAmps: 20, pulseSeconds: 0.01, melting: 5 })).toMatch(/^Will tire: .* good for 100 starts only\.$/);
    expect(say({ ...base, peakAmps: 20, pulseSeconds: 0.01 })).toMatch(/wants a melting value of 6.9 A²s or more/);
  });

  it('does not take the same amps of two standards for the same fuse', () => {
    expect(work({ ...base, loadAmps: 0.9 }).carries).toBe(true);
    expect(work({ ...base, loadAmps: 0.9, standard: 'ul-248-14' }).carries).toBe(false);
    expect(work(base).blowsFromAmps).toBeGreaterThan(work({ ...base, standard: 'ul-248-14' }).blowsFromAmps);
  });

  it('a pulse scales with its time and with the square of its peak, and never gets kinder', () => {
    const amps = fc.double({ min: 1, max: 1000, noNaN: true });
    const seconds = fc.double({ min: 1e-5, max: 1, noNaN: true });
    const melting = fc.double({ min: 1e-3, max: 1e5, noNaN: true });
    fc.assert(
      fc.property(
        amps,
        seconds,
        melting,
        fc.constantFrom('square', 'half-sine', 'triangle', 'exponential', 'parabola'),
        (peakAmps, pulseSeconds, value, shape) => {
          const one = work({ ...base, peakAmps, pulseSeconds, melting: value, shape }).pulse;
          const two = work({ ...base, peakAmps: 2 * peakAmps, pulseSeconds, melting: value, shape }).pulse;
          const long = work({ ...base, peakAmps, pulseSeconds: 2 * pulseSeconds, melting: value, shape }).pulse;
          if (one === null || two === null || long === null) return false;
          return (
            Math.abs(two.ampSquaredSeconds / one.ampSquaredSeconds - 4) < 1e-9 &&
            Math.abs(long.ampSquaredSeconds / one.ampSquaredSeconds - 2) < 1e-9 &&
            (two.starts ?? 0) <= (one.starts ?? 0) &&
            (one.stands === true || two.stands === false)
          );
        },
      ),
    );
  });

  it('between the numbers of the chart it takes the careful side', () => {
    const pulse = (starts: number) => work({ ...base, peakAmps: 10, pulseSeconds: 0.01, melting: 2, starts }).pulse?.leastMelting ?? 0;
    expect(pulse(5000)).toBe(pulse(10_000));
    expect(pulse(1)).toBe(pulse(100));
    expect(pulse(100)).toBeLessThan(pulse(101));
  });

  it.each([
    [{ ...base, peakAmps: 5 }, 'pulseSeconds', 'A peak without its time says nothing: give both or neither.'],
    [{ ...base, pulseSeconds: 0.01 }, 'peakAmps', 'A pulse time without its peak says nothing: give both or neither.'],
    [{ ...base, peakAmps: 0.1, pulseSeconds: 0.01 }, 'peakAmps', 'The peak at switch-on must not be below the steady current.'],
    [{ ...base, ratedAmps: 0 }, 'ratedAmps', 'Rated current must be 10 mA or more.'],
    [{ ...base, loadAmps: -1 }, 'loadAmps', 'Steady current must be 0 A or more.'],
    [{ ...base, volts: 400 }, 'volts', 'Circuit volts must be 250 V or less.'],
    [{ ratedAmps: 1 }, 'loadAmps', 'Steady current is missing.'],
    [{ ...base, speed: 'medium' }, 'speed', 'Speed must be one of: fast, slow.'],
  ])('refuses %j at its field', (given, field, sentence) => {
    expect(runSheet(sheet, given)).toEqual({ ok: false, field, say: sentence });
  });
});
