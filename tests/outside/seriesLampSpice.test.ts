import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { Lamp } from '@/shared/workings/lamp';
import { coldOhms, hotOhms, lampOhms } from '@/shared/workings/lamp';
import type { LampLoad } from '@/shared/workings/lampPoints';
import { operatingPoints, reservoirOhms } from '@/shared/workings/lampPoints';

import { spiceMeasures } from './ngspice/measures';

interface Network {
  lamp: Lamp;
  supplyVolts: number;
  load: LampLoad;
}

const wide = (low: number, high: number) => fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);
const lamp: fc.Arbitrary<Lamp> = fc.record({
  ratedVolts: wide(24, 240),
  ratedWatts: wide(5, 500),
  coldRatio: fc.double({ min: 5, max: 16, noNaN: true }),
});
const networks: fc.Arbitrary<Network> = fc
  .record({
    lamp,
    share: fc.double({ min: 0.5, max: 1.1, noNaN: true }),
    relative: wide(0.01, 100),
    small: fc.double({ min: 0.02, max: 0.33, noNaN: true }),
    kind: fc.constantFrom('resistance', 'constant-power', 'short'),
  })
  .map(({ lamp: one, share, relative, small, kind }): Network => {
    const supplyVolts = one.ratedVolts * share;
    const load: LampLoad =
      kind === 'resistance'
        ? { kind, ohms: hotOhms(one) * relative }
        : kind === 'constant-power'
          ? { kind, watts: one.ratedWatts * share ** 1.55 * small }
          : { kind: 'short' };
    return { lamp: one, supplyVolts, load };
  });

/** The same algebra in d.c.: r.m.s. volts of a resistive circuit obey the same laws. */
function branch({ lamp: one, supplyVolts, load }: Network, n: number): readonly string[] {
  const [source, node] = [`s${String(n)}`, `n${String(n)}`];
  const law = `${String(hotOhms(one))}*pow(max(abs(v(${source},${node})),1e-12)/${String(one.ratedVolts)},0.45)`;
  return [
    `v${String(n)} ${source} 0 ${String(supplyVolts)}`,
    `blamp${String(n)} ${source} ${node} i=v(${source},${node})/max(${String(coldOhms(one))},${law})`,
    load.kind === 'resistance'
      ? `r${String(n)} ${node} 0 ${String(load.ohms)}`
      : load.kind === 'constant-power'
        ? `bload${String(n)} ${node} 0 i=${String(load.watts)}/max(v(${node}),${String(supplyVolts / 1000)})`
        : `r${String(n)} ${node} 0 1n`,
    // A constant-power load has two places to settle; ngspice is set off where it wakes up, near the full mains.
    ...(load.kind === 'constant-power' ? [`.nodeset v(${node})=${String(supplyVolts * 0.98)}`] : []),
  ];
}

describe('operating points against ngspice, every node within 1 mV or 0.1 %', { timeout: 120_000 }, () => {
  it('holds for 120 generated networks of resistance, constant power and dead short', () => {
    const drawn = fc.sample(networks, { numRuns: 120, seed: 4 });
    expect(new Set(drawn.map(({ load }) => load.kind)).size).toBe(3);
    const deck = [...drawn.flatMap(branch), '.options reltol=1e-6 abstol=1e-10 itl1=500', '.op'];
    const spice = spiceMeasures(
      deck,
      drawn.map((_, n) => `print v(n${String(n)})`),
    );
    for (const [n, network] of drawn.entries()) {
      const [point] = operatingPoints(network.lamp, network.supplyVolts, network.load);
      const volts = spice.get(`v(n${String(n)})`) ?? Number.NaN;
      const off = Math.abs((point?.loadVolts ?? Number.NaN) - volts);
      expect(off, `${JSON.stringify(network)}: ${String(point?.loadVolts)} against ${String(volts)}`).toBeLessThan(
        Math.max(1e-3, 1e-3 * Math.abs(volts)),
      );
    }
  });
});

describe('rectifier and reservoir behind the lamp against ngspice by transient analysis, within 1 %', { timeout: 120_000 }, () => {
  it.each([
    // lamp watts on 120 V, plate watts
    [100, 75],
    [60, 200],
    [150, 20],
    [40, 40],
  ])('%d W lamp, %d W plate', (ratedWatts, watts) => {
    const one: Lamp = { ratedVolts: 120, ratedWatts, coldRatio: 15 };
    const [point] = operatingPoints(one, 120, { kind: 'reservoir', watts });
    if (point === undefined) throw new Error('no point');
    const loadOhms = reservoirOhms(120, watts);
    // Ten cycles of reservoir against two hundred of run; set off near where it settles.
    const farads = 0.1 / loadOhms;
    const diode = (name: string, from: string, to: string) => `d${name} ${from} ${to} dm`;
    const deck = [
      `vs s b sin(0 ${String(120 * Math.SQRT2)} 60)`,
      `rlamp s a ${String(lampOhms(one, point.lampVolts))}`,
      diode('1', 'a', 'out'),
      diode('2', 'b', 'out'),
      diode('3', '0', 'a'),
      diode('4', '0', 'b'),
      `c out 0 ${String(farads)} ic=${String(120 * Math.SQRT2 * 0.9 * (point.reservoirShare ?? 0))}`,
      `rl out 0 ${String(loadOhms)}`,
      'rb b 0 10meg',
      'elamp lampvolts 0 s a 1',
      'einlet inletvolts 0 a b 1',
      '.model dm d(is=1e-9 n=0.2)',
      '.options reltol=1e-4 method=gear',
      '.tran 40u 1.2 1 40u uic',
    ];
    const spice = spiceMeasures(deck, [
      'meas tran lamp rms v(lampvolts) from=1 to=1.2',
      'meas tran dc avg v(out) from=1 to=1.2',
      'meas tran inlet rms v(inletvolts) from=1 to=1.2',
    ]);
    expect(Math.abs((spice.get('lamp') ?? 0) / point.lampVolts - 1)).toBeLessThan(0.01);
    expect(Math.abs((spice.get('inlet') ?? 0) / point.loadVolts - 1)).toBeLessThan(0.01);
    expect(Math.abs((spice.get('dc') ?? 0) / (120 * Math.SQRT2 * (point.reservoirShare ?? 0)) - 1)).toBeLessThan(0.01);
  });
});
