/** The same circuits in Debian's ngspice, a circuit simulator that shares no line with this project. */
import { describe, expect, it } from 'vitest';

import type { Lamp } from '@/shared/workings/lamp';
import { solve } from '@/shared/workings/network/network';
import { powerBalance } from '@/shared/workings/network/power';
import { sheet as bleedDown } from '@/shared/workings/bleedDown';
import { runSheet } from '@/shared/workings/sheet';
import { sheet as seriesLamp } from '@/shared/workings/seriesLamp';
import { lampDeck } from '@/tests/outside/ngspice/lampDeck';
import { networkDeck, operatingPoints } from '@/tests/outside/ngspice/ngspice';
import { randomCase, seeded } from '@/tests/outside/ngspice/randomNetwork';
import { secondsToReach, transient } from '@/tests/outside/ngspice/transient';

/** 1 mV or 0.1 %, whichever is more. */
const close = (ours: number, theirs: number): boolean => Math.abs(ours - theirs) <= Math.max(1e-3, 1e-3 * Math.abs(theirs));

describe('supply networks against ngspice', () => {
  const cases = Array.from({ length: 220 }, (_, k) => randomCase(k + 1));
  const ours = cases.map(({ network, variation }) => solve(network, variation));

  it('every node of 220 generated supplies lies within 1 mV or 0.1 %', () => {
    const theirs = operatingPoints(cases.map(({ network, variation }) => networkDeck(network, variation)));
    const apart: string[] = [];
    let nodes = 0;
    cases.forEach(({ network }, k) => {
      for (let node = 0; node < network.nodes - 1; node += 1) {
        const [a, b] = [ours[k]?.volts[node] ?? Number.NaN, theirs.get(k)?.get(`n${String(node)}`) ?? Number.NaN];
        nodes += 1;
        if (!close(a, b)) apart.push(`network ${String(k + 1)} node ${String(node)}: ${String(a)} for ${String(b)}`);
      }
    });
    expect(apart).toEqual([]);
    expect(nodes).toBeGreaterThan(2000);
  });

  it('settles in all of them, and power balances to 1e-9', () => {
    cases.forEach(({ network, variation }, k) => {
      const solution = ours[k];
      if (solution === undefined) throw new Error('not solved');
      expect(solution.converged).toBe(true);
      expect(powerBalance(network, variation, solution).imbalance).toBeLessThan(1e-9);
    });
  });

  it('makes networks in which diodes conduct, outputs limit and nodes change sign', () => {
    const conducting = ours.filter(({ diodeAmps }) => diodeAmps.some((amps) => amps > 0.1));
    const limiting = cases.filter(({ network }, k) =>
      network.outputs.some(({ limitAmps }, out) => Math.abs(ours[k]?.outputAmps[out] ?? 0) === limitAmps),
    );
    expect(conducting.length).toBeGreaterThan(20);
    expect(limiting.length).toBeGreaterThan(40);
    expect(cases.filter(({ variation }) => variation.open.length > 0).length).toBeGreaterThan(60);
  });
});

describe('series lamps against ngspice', () => {
  const next = seeded(7);
  const between = (low: number, high: number): number => low * (high / low) ** next();
  const lamps = Array.from({ length: 60 }, () => {
    const supplyVolts = [120, 230][Math.floor(next() * 2)] ?? 230;
    const lamp: Lamp = { ratedVolts: supplyVolts, ratedWatts: between(15, 1000), coldRatio: between(6, 16) };
    const holdsWatts = next() < 0.35;
    // A load that holds its watts settles only below 0.365 of the lamp's own.
    const load = holdsWatts ? { watts: lamp.ratedWatts * between(0.02, 0.3) } : { ohms: between(0.5, 5000) };
    return { supplyVolts, lamp, load };
  });

  it('lamp and load of 60 come out within 1 mV or 0.1 %', () => {
    const answers = lamps.map(({ supplyVolts, lamp, load }) =>
      runSheet(seriesLamp, {
        supplyVolts,
        lampVolts: lamp.ratedVolts,
        lampWatts: lamp.ratedWatts,
        coldRatio: lamp.coldRatio,
        ...('ohms' in load ? { load: 'resistance', loadOhms: load.ohms } : { load: 'switch-mode', loadWatts: load.watts }),
      }),
    );
    const theirs = operatingPoints(
      // Started at the mains volts: the first answer downhill from there is the stable one.
      lamps.map(({ supplyVolts, lamp, load }) => lampDeck(lamp, supplyVolts, load, 'ohms' in load ? supplyVolts / 2 : supplyVolts)),
    );
    answers.forEach((answer, k) => {
      if (!answer.ok) throw new Error(answer.say);
      const load = answer.result.points.find(({ stable }) => stable)?.loadVolts ?? Number.NaN;
      const there = theirs.get(k)?.get('load') ?? Number.NaN;
      expect(close(load, there), `lamp ${String(k)} ${JSON.stringify(lamps[k])}: ${String(load)} for ${String(there)}`).toBe(true);
    });
  });
});

describe('bleed-down against ngspice', () => {
  it.each([
    [4700e-6, 40, 1000, 100],
    [220e-6, 325, 100e3, 2200],
    [68e-3, 20, 470, 22],
  ])('%d F at %d V through %d Ω and %d Ω comes down in the same time within 1 %%', (farads, volts, bleederOhms, toolOhms) => {
    const answer = runSheet(bleedDown, { farads, volts, bleederOhms, toolOhms, tolerancePercent: 0 });
    if (!answer.ok) throw new Error(answer.say);
    const { secondsToSafe } = answer.result;
    const deck = [
      '* bleed-down',
      `C1 c 0 ${String(farads)} IC=${String(volts)}`,
      `R1 c 0 ${String(bleederOhms)}`,
      `R2 c 0 ${String(toolOhms)}`,
    ];
    const curve = transient(deck, 'c', { stepSeconds: secondsToSafe / 500, endSeconds: 1.2 * secondsToSafe });
    expect(Math.abs(secondsToReach(curve, 5) / secondsToSafe - 1)).toBeLessThan(0.01);
  });
});
