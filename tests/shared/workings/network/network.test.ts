import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { couple, emptyMesh, putBack, takeOut } from '@/shared/workings/network/mesh';
import type { Network } from '@/shared/workings/network/network';
import { lay, prepare, solve, solveLaid } from '@/shared/workings/network/network';
import { powerBalance } from '@/shared/workings/network/power';
import { sourceCurrent, sourceState } from '@/shared/workings/network/source';
import { randomCase } from '@/tests/outside/ngspice/randomNetwork';

const output = { volts: 5, limitAmps: 4, takes: false, outputOhms: 0.01 };

describe('sourceCurrent', () => {
  it('holds, limits and is pushed off; takes only where it may', () => {
    expect(sourceCurrent(output, 4.99).amps).toBeCloseTo(1, 9);
    expect(sourceCurrent(output, -3)).toEqual({ amps: 4, siemens: 0 });
    expect(sourceCurrent(output, 6)).toEqual({ amps: 0, siemens: 0 });
    expect(sourceCurrent({ ...output, takes: true }, 5.02).amps).toBeCloseTo(-2, 9);
    expect(sourceCurrent({ ...output, volts: -5 }, -4.99).amps).toBeCloseTo(-1, 9);
    expect(sourceCurrent({ ...output, volts: -5 }, 3)).toEqual({ amps: -4, siemens: 0 });
    expect([4.99, 1, 6].map((volts) => sourceState(output, volts))).toEqual(['holds', 'limits', 'pushed-off']);
  });
});

describe('takeOut', () => {
  it('turns a star into the mesh that does the same, and gives the middle back', () => {
    const mesh = emptyMesh(4);
    couple(mesh, 0, 1, 1);
    couple(mesh, 0, 2, 2);
    couple(mesh, 0, 3, 3);
    const taken = takeOut(mesh, [0]);
    // Star to triangle: g12 = g1 g2 / Σg.
    expect(mesh.siemens[1 * 4 + 2]).toBeCloseTo(2 / 6, 12);
    expect(mesh.siemens[2 * 4 + 3]).toBeCloseTo(6 / 6, 12);
    const volts = Float64Array.from([0, 6, 3, 0]);
    putBack(taken, volts);
    expect(volts[0]).toBeCloseTo((1 * 6 + 2 * 3) / 6, 12);
  });
});

describe('solve', () => {
  const divider: Network = {
    nodes: 3,
    resistors: [
      { from: 0, to: 1, ohms: 2 },
      { from: 1, to: 2, ohms: 3 },
    ],
    diodes: [],
    outputs: [{ ...output, terminal: 0, zero: 2 }],
  };

  it('divides volts as resistors do, and limits into less', () => {
    const { volts, outputAmps, converged } = solve(divider);
    expect(converged).toBe(true);
    expect(outputAmps[0]).toBeCloseTo(5 / 5.01, 2);
    expect(volts[1]).toBeCloseTo(((volts[0] ?? 0) * 3) / 5, 9);
    const shorted = solve(divider, { added: [{ from: 0, to: 2, ohms: 0.1 }] });
    expect(shorted.outputAmps[0]).toBe(4);
    expect(shorted.volts[0]).toBeCloseTo(4 / (10 + 0.2 + 0.0001), 3);
    expect(solve(divider, { off: [0] }).volts[0]).toBe(0);
  });

  it('comes to the same from any start, and laid in once or alone', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), fc.integer({ min: -30, max: 30 }), (seed, volts) => {
        const { network, variation } = randomCase(seed);
        const alone = solve(network, variation);
        const laid = lay(prepare(network, variation.open, variation.added), variation);
        const elsewhere = solveLaid(laid, variation.off, new Float64Array(network.nodes).fill(volts).fill(0, network.nodes - 1));
        expect(alone.converged && elsewhere.converged).toBe(true);
        alone.volts.forEach((value, node) => expect(elsewhere.volts[node]).toBeCloseTo(value, 6));
      }),
      { numRuns: 150 },
    );
  });

  it('settles without NaN and balances its power to 1e-9 in any generated supply', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e9 }), (seed) => {
        const { network, variation } = randomCase(seed, { rails: 8, places: 6 });
        const solution = solve(network, variation);
        expect(solution.converged).toBe(true);
        expect([...solution.volts, ...solution.outputAmps, ...solution.diodeAmps].every(Number.isFinite)).toBe(true);
        expect(powerBalance(network, variation, solution).imbalance).toBeLessThan(1e-9);
      }),
      { numRuns: 300 },
    );
  });

  it('scales: without diodes, volts and limits times a number give volts and amps times that number', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), fc.double({ min: 0.1, max: 10, noNaN: true }), (seed, times) => {
        const { network, variation } = randomCase(seed);
        const outputs = network.outputs.map((one) => ({ ...one, volts: one.volts * times, limitAmps: one.limitAmps * times }));
        const before = solve({ ...network, diodes: [] }, variation);
        const after = solve({ ...network, diodes: [], outputs }, variation);
        before.volts.forEach((volts, node) => expect(after.volts[node]).toBeCloseTo(volts * times, 7));
        before.outputAmps.forEach((amps, k) => expect(after.outputAmps[k]).toBeCloseTo(amps * times, 5));
      }),
      { numRuns: 100 },
    );
  });

  it('passes no less through a diode when the other output may limit higher', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 30, noNaN: true }), fc.double({ min: 1, max: 3, noNaN: true }), (limitAmps, times) => {
        const lost = (limit: number): number =>
          solve({
            nodes: 4,
            resistors: [
              { from: 0, to: 1, ohms: 0.3 },
              { from: 2, to: 1, ohms: 0.1 },
            ],
            diodes: [{ anode: 3, cathode: 0, saturationAmps: 1e-11, emission: 1, seriesOhms: 0.005 }],
            outputs: [{ terminal: 2, zero: 3, volts: -12, limitAmps: limit, takes: false, outputOhms: 0.005 }],
          }).diodeAmps[0] ?? 0;
        expect(lost(limitAmps * times)).toBeGreaterThanOrEqual(lost(limitAmps) - 1e-9);
        expect(lost(limitAmps)).toBeLessThanOrEqual(limitAmps + 1e-9);
      }),
    );
  });
});
