import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { sheet } from '@/shared/workings/smoothingRipple';
import { runSheet } from '@/shared/workings/sheet';

import { spiceMeasures } from './ngspice/measures';

interface Supply {
  secondaryVolts: number;
  mainsHertz: number;
  rectifier: 'bridge' | 'centre-tap' | 'half-wave';
  diodeVolts: number;
  sourceOhms: number;
  farads: number;
  load: 'steady' | 'resistor';
  amps: number;
  loadOhms: number;
}

const between = (low: number, high: number) => fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);
const supplies: fc.Arbitrary<Supply> = fc.record({
  secondaryVolts: between(8, 60),
  mainsHertz: fc.constantFrom(50, 60),
  rectifier: fc.constantFrom('bridge', 'centre-tap', 'half-wave'),
  diodeVolts: fc.double({ min: 0.6, max: 1.1, noNaN: true }),
  sourceOhms: between(0.1, 1),
  farads: between(500e-6, 10e-3),
  load: fc.constantFrom('steady', 'resistor'),
  amps: between(0.1, 1.5),
  loadOhms: between(15, 200),
});

/** With an almost ideal diode (N = 0.1) the drop sits in a source in series; `real` takes a silicon one that drops it at the peak current by itself. */
function deckOf(given: Supply, peakAmps: number, real: boolean): readonly string[] {
  const peak = given.secondaryVolts * Math.SQRT2;
  const thermal = 0.025865;
  const n = real ? 1.7 : 0.1;
  const is = real ? peakAmps / Math.expm1(given.diodeVolts / (n * thermal)) : 1e-12;
  const battery = real ? 0 : given.diodeVolts - n * thermal * Math.log(peakAmps / is / 2);
  const diode = (name: string, from: string, to: string) => [`d${name} ${from} m${name} dm`, `v${name} m${name} ${to} ${String(battery)}`];
  const sine = `sin(0 ${String(peak)} ${String(given.mainsHertz)})`;
  const windings =
    given.rectifier === 'bridge'
      ? [
          `vs s b ${sine}`,
          `rs s a ${String(given.sourceOhms)}`,
          ...diode('1', 'a', 'out'),
          ...diode('2', 'b', 'out'),
          ...diode('3', '0', 'a'),
          ...diode('4', '0', 'b'),
          'rb b 0 1meg',
        ]
      : given.rectifier === 'centre-tap'
        ? [
            `vs s 0 ${sine}`,
            `rs s a ${String(given.sourceOhms)}`,
            `vt 0 t ${sine}`,
            `rt t b ${String(given.sourceOhms)}`,
            ...diode('1', 'a', 'out'),
            ...diode('2', 'b', 'out'),
          ]
        : [`vs s 0 ${sine}`, `rs s a ${String(given.sourceOhms)}`, ...diode('1', 'a', 'out')];
  const load = given.load === 'steady' ? `il out 0 ${String(given.amps)}` : `rl out 0 ${String(given.loadOhms)}`;
  return [
    ...windings,
    `c out 0 ${String(given.farads)} ic=${String(peak * 0.85)}`,
    load,
    `.model dm d(is=${String(is)} n=${String(n)})`,
    '.options reltol=1e-4 method=gear',
    `.tran 20u 0.6 0.5 20u uic`,
  ];
}

const MEASURES = ['high max', 'low min', 'mean avg'].map((pair) => `meas tran ${pair} v(out) from=0.5 to=0.6`);

function compare(given: Supply, real: boolean): void {
  const answer = runSheet(sheet, given);
  if (!answer.ok) throw new Error(answer.say);
  const { exact } = answer.result;
  const spice = spiceMeasures(deckOf(given, exact.peakDiodeAmps, real), MEASURES);
  const [high, low, mean] = ['high', 'low', 'mean'].map((name) => spice.get(name) ?? Number.NaN) as [number, number, number];
  const about = `${JSON.stringify(given)}: ${String(exact.rippleVolts)} against ${String(high - low)}`;
  expect(Math.abs(exact.rippleVolts / (high - low) - 1), about).toBeLessThan(0.01);
  expect(Math.abs(exact.meanVolts / mean - 1), about).toBeLessThan(0.01);
}

describe('stepped reservoir against ngspice by transient analysis, within 1 %', { timeout: 300_000 }, () => {
  it('holds for generated supplies of all three rectifiers and both loads', () => {
    const drawn = fc.sample(supplies, { numRuns: 24, seed: 20 });
    expect(new Set(drawn.map(({ rectifier }) => rectifier)).size).toBe(3);
    for (const given of drawn) compare(given, false);
  });

  it('holds with silicon diodes that drop the entered volts at the peak current', () => {
    for (const given of fc.sample(supplies, { numRuns: 6, seed: 7 }))
      compare({ ...given, secondaryVolts: given.secondaryVolts + 20 }, true);
  });
});
