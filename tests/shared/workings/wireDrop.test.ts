import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { runSheet } from '@/shared/workings/sheet';
import type { WireDropResult } from '@/shared/workings/wireDrop';
import { sheet } from '@/shared/workings/wireDrop';

function work(given: Record<string, unknown>): WireDropResult {
  const answer = runSheet(sheet, given);
  if (!answer.ok) throw new Error(answer.say);
  return answer.result;
}

const base = { squareMillimetres: 1, metres: 1, amps: 5 };
const metres = fc.double({ min: 0.01, max: 1000, noNaN: true });
const amps = fc.double({ min: 0.001, max: 1000, noNaN: true });
const area = fc.double({ min: 0.01, max: 500, noNaN: true });
const celsius = fc.double({ min: -40, max: 200, noNaN: true });

describe('wire drop', () => {
  it('scales: twice the length or the current is twice the drop, twice the area or the wires half of it', () => {
    fc.assert(
      fc.property(metres, amps, area, celsius, (length, current, size, degrees) => {
        const one = work({ metres: length, amps: current, squareMillimetres: size, celsius: degrees });
        const close = (value: number, wanted: number) => Math.abs(value / wanted - 1) < 1e-12;
        return (
          close(work({ metres: 2 * length, amps: current, squareMillimetres: size, celsius: degrees }).volts, 2 * one.volts) &&
          (current > 500 ||
            close(work({ metres: length, amps: 2 * current, squareMillimetres: size, celsius: degrees }).watts, 4 * one.watts)) &&
          (size > 250 ||
            close(work({ metres: length, amps: current, squareMillimetres: 2 * size, celsius: degrees }).volts, one.volts / 2)) &&
          close(work({ metres: length, amps: current, squareMillimetres: size, celsius: degrees, inParallel: 2 }).volts, one.volts / 2) &&
          close(
            work({ metres: length, amps: current, squareMillimetres: size, celsius: degrees, path: 'there-and-back' }).volts,
            2 * one.volts,
          )
        );
      }),
    );
  });

  it('rises with temperature and falls with the gauge number’s size', () => {
    fc.assert(
      fc.property(celsius, celsius, (a, b) => b - a < 1e-9 || work({ ...base, celsius: a }).ohms < work({ ...base, celsius: b }).ohms),
    );
    for (let awg = -3; awg < 40; awg += 1)
      expect(work({ awg, metres: 1, amps: 1 }).ohms).toBeLessThan(work({ awg: awg + 1, metres: 1, amps: 1 }).ohms);
  });

  it('keeps copper itself below the most that the standard allows', () => {
    for (const kind of ['solid', 'flexible', 'flexible-tinned'])
      for (const squareMillimetres of [0.5, 0.75, 1, 1.5, 2.5, 4, 6]) {
        const { ohms, worstOhms } = work({ squareMillimetres, kind, metres: 10, amps: 1 });
        expect(ohms).toBeLessThan(worstOhms ?? 0);
        expect(worstOhms ?? Infinity).toBeLessThan(1.25 * ohms);
      }
    expect(work({ squareMillimetres: 0.8, metres: 1, amps: 1 }).worstOhms).toBeNull();
  });

  it('shares the watts out: what the path takes is wire and contacts together', () => {
    const { watts, volts, wattsPerMetre, contactOhms } = work({ ...base, metres: 3, contacts: 2, contactOhms: 0.02, inParallel: 2 });
    expect(watts).toBeCloseTo(5 * volts, 12);
    expect(wattsPerMetre * 3 * 2 + 25 * contactOhms).toBeCloseTo(watts, 12);
  });

  it('accuses a contact and says what it burns', () => {
    const answer = runSheet(sheet, sheet.example);
    expect(answer.ok && answer.headline).toBe(
      '110 mΩ read where 33.79 mΩ is expected: look for a bad contact. At 3 A it takes 229 mV and burns 686 mW.',
    );
    expect(answer.ok && answer.result.fourWire).toBe(true);
  });

  it('knows a reading that is less than the wire alone', () => {
    expect(work({ ...base, metres: 3, readOhms: 0.02 }).reading?.says).toBe('less-than-wire');
    expect(work({ ...base, metres: 3, readOhms: 0.055 }).reading?.says).toBe('as-expected');
  });

  it('judges the drop against what is allowed, worst case', () => {
    expect(work({ ...base, allowedVolts: 0.09 }).allowed).toBe(false);
    expect(work({ ...base, allowedVolts: 0.1 }).allowed).toBe(true);
    expect(work(base).allowed).toBeNull();
  });

  it.each([
    [{ metres: 1, amps: 1 }, 'squareMillimetres', 'Give the size: AWG or square millimetres.'],
    [{ ...base, awg: 18 }, 'awg', 'Give the size once: AWG or square millimetres, and leave the other empty.'],
    [{ awg: 18.5, metres: 1, amps: 1 }, 'awg', 'AWG must be a whole number; 1/0 is 0, 2/0 is −1, 4/0 is −3.'],
    [{ ...base, contacts: 1.5 }, 'contacts', 'Contacts must be a whole number.'],
    [{ ...base, inParallel: 1.5 }, 'inParallel', 'In parallel must be a whole number.'],
    [
      { ...base, readOhms: 0.1, leadOhms: 0.3 },
      'leadOhms',
      'The leads alone must not read more than leads and wire together. Hold the probes together and read again.',
    ],
    [{ ...base, metres: 0 }, 'metres', 'Length must be 0.005 m or more.'],
    [{ ...base, amps: -1 }, 'amps', 'Current must be 0 A or more.'],
    [{ ...base, squareMillimetres: 1e6 }, 'squareMillimetres', 'Area must be 500 mm² or less.'],
    [{ squareMillimetres: 1, amps: 1 }, 'metres', 'Length is missing.'],
  ])('refuses %j at its field', (given, field, say) => {
    expect(runSheet(sheet, given)).toEqual({ ok: false, field, say });
  });
});
