import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { junctionKind, readJunction } from '@/shared/workings/junctionReading';
import { sheet } from '@/shared/workings/junctionTest';
import { runSheet } from '@/shared/workings/sheet';

const two = (forward: string, reverse: string) => [
  { red: 'anode', black: 'cathode', shown: forward },
  { red: 'cathode', black: 'anode', shown: reverse },
];
const say = (given: Record<string, unknown>): string => {
  const answer = runSheet(sheet, { part: 'diode', ...given });
  return answer.ok ? answer.headline : answer.say;
};
const out = { circuit: 'out-of-circuit' };

describe('readJunction', () => {
  it.each([
    ['0.612', { kind: 'volts', volts: 0.612 }],
    ['0,612', { kind: 'volts', volts: 0.612 }],
    ['612m', { kind: 'volts', volts: 0.612 }],
    ['OL', { kind: 'open' }],
    ['47 Ω', { kind: 'ohms', ohms: 47 }],
    ['4k7', { kind: 'ohms', ohms: 4700 }],
    ['2.2 MΩ', { kind: 'ohms', ohms: 2.2e6 }],
  ])('takes %s', (shown, reading) => {
    expect(readJunction(shown)).toEqual(reading);
  });

  it.each([
    ['1,234', /^Do you mean 1.234 or 1234\?/],
    ['-0.6', /shows no minus sign/],
    ['fine', /is not a number/],
    ['12 mA', /^Enter volts of the diode test, ohms with their Ω, or OL\.$/],
  ])('asks back at %s', (shown, sentence) => {
    const read = readJunction(shown);
    expect('say' in read ? read.say : '').toMatch(sentence);
  });

  it('a reading never looks less joined when it gets smaller', () => {
    const rank = ['short', 'low', 'low-drop', 'silicon', 'high'];
    const volts = fc.double({ min: 0, max: 3, noNaN: true });
    fc.assert(
      fc.property(volts, volts, (a, b) => {
        const [less, more] = [Math.min(a, b), Math.max(a, b)].map((one) => rank.indexOf(junctionKind({ kind: 'volts', volts: one })));
        return (less ?? -1) <= (more ?? -1);
      }),
    );
  });
});

describe('junction test', () => {
  it('says in one line what the readings come to', () => {
    expect(say({ ...out, readings: two('0.55', 'OL') })).toBe('Good, silicon by its drop.');
    expect(say({ ...out, readings: two('0.3', 'OL') })).toBe('Good, Schottky or germanium by its drop, the reading cannot tell which.');
    expect(say({ ...out, readings: two('0.02', '0.02') })).toBe('Shorted: 20 mV with red on anode, black on cathode.');
    expect(say({ readings: two('OL', '0.4') })).toBe(
      'Open: OL with red on anode, black on cathode, where it should conduct. That is true in circuit too.',
    );
    expect(say({ readings: two('0.55', '0.9') })).toBe(
      'Not told yet: 900 mV with red on cathode, black on anode may be the part or what lies beside it. Lift a lead and read again.',
    );
    expect(say({ ...out, readings: two('0.55', '47 Ω') })).toBe('Leaky: 47 Ω with red on cathode, black on anode, where it should block.');
    expect(say({ ...out, readings: two('0.15', 'OL') })).toMatch(
      /^Not told: 150 mV with red on anode, black on cathode is no usual junction\./,
    );
  });

  it('asks for the next reading until all are there, and never calls half a test good', () => {
    expect(say({ ...out, readings: two('0.55', 'OL').slice(0, 1) })).toBe(
      'Nothing wrong so far. Read next: red on cathode, black on anode.',
    );
    const thyristor = { part: 'thyristor', ...out };
    expect(say({ ...thyristor, readings: [{ red: 'gate', black: 'cathode', shown: '0.6' }] })).toBe(
      'Nothing wrong so far. Read next: red on anode, black on cathode.',
    );
  });

  it('knows the resistor inside a thyristor and the volts of a small Zener', () => {
    const rest = [
      { red: 'anode', black: 'cathode', shown: 'OL' },
      { red: 'cathode', black: 'anode', shown: 'OL' },
      { red: 'gate', black: 'anode', shown: 'OL' },
      { red: 'anode', black: 'gate', shown: 'OL' },
    ];
    const gate = [
      { red: 'gate', black: 'cathode', shown: '0.3' },
      { red: 'cathode', black: 'gate', shown: '0.3' },
    ];
    expect(say({ part: 'thyristor', ...out, readings: [...gate, ...rest] })).toMatch(
      /^Its gate conducts and it blocks both ways\. Whether it fires/,
    );
    const low = gate.map((one) => ({ ...one, shown: '0.03' }));
    expect(say({ part: 'thyristor', ...out, readings: [...low, ...rest] })).toMatch(/^Not told: 30 mV with red on gate, black on cathode/);
    expect(say({ part: 'zener', ...out, zenerVolts: 2.4, meterVolts: 3, readings: two('0.7', '2.3') })).toMatch(
      /^Good, silicon by its drop\. Its Zener volts/,
    );
    expect(say({ part: 'zener', ...out, zenerVolts: 6.2, meterVolts: 3, readings: two('0.7', '2.3') })).toMatch(/^Leaky: 2.3 V/);
    expect(say({ part: 'zener', ...out, readings: two('0.7', '2.3') })).toMatch(/^Leaky: 2.3 V/);
  });

  it('takes a Darlington for two junctions', () => {
    const readings = [
      ['base', 'emitter', '1.25'],
      ['base', 'collector', '0.65'],
      ['emitter', 'base', 'OL'],
      ['collector', 'base', 'OL'],
      ['collector', 'emitter', 'OL'],
      ['emitter', 'collector', 'OL'],
    ].map(([red, black, shown]) => ({ red, black, shown }));
    const answer = runSheet(sheet, { part: 'npn-transistor', ...out, readings });
    expect(answer).toMatchObject({
      ok: true,
      result: { says: 'good', junction: null, readings: [{ is: 'high' }, { is: 'silicon' }, {}, {}, {}, {}] },
    });
  });

  it.each([
    [
      { part: 'diode', readings: [{ red: 'base', black: 'anode', shown: '1' }] },
      'readings.0.red',
      'Reading 1: a diode has no base; it has anode, cathode.',
    ],
    [
      { part: 'diode', readings: [{ red: 'anode', black: 'anode', shown: '1' }] },
      'readings.0.black',
      'Reading 1: both probes are on the anode.',
    ],
    [
      { part: 'diode', readings: [...two('0.5', 'OL'), { red: 'anode', black: 'cathode', shown: '0.6' }] },
      'readings.2.red',
      'Reading 3: red on anode, black on cathode stands there already.',
    ],
    [
      { part: 'diode', readings: two('1,234', 'OL') },
      'readings.0.shown',
      'Reading 1: Do you mean 1.234 or 1234? Write it with a decimal point and without a mark for thousands.',
    ],
    [{ part: 'diode', readings: [{ red: 'anode', black: 'cathode', shown: '' }] }, 'readings.0.shown', 'Reading 1: Shows is missing.'],
    [{ part: 'diode', readings: [] }, 'readings', 'Readings must be a list of 1 or more.'],
    [{ readings: two('0.5', 'OL') }, 'part', 'Part must be one of: diode, zener, npn-transistor, pnp-transistor, thyristor.'],
  ])('refuses %j at its field', (given, field, sentence) => {
    expect(runSheet(sheet, given)).toEqual({ ok: false, field, say: sentence });
  });
});
