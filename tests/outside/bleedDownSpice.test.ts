import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { sheet } from '@/shared/workings/bleedDown';
import { runSheet } from '@/shared/workings/sheet';

import { spiceMeasures } from './ngspice/measures';

const wide = (low: number, high: number) => fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);

describe('discharge against ngspice by transient analysis, within 1 %', { timeout: 60_000 }, () => {
  it('holds for 12 generated capacitors with bleeder and tool', () => {
    const drawn = fc.sample(
      fc.record({ farads: wide(1e-7, 0.1), volts: wide(20, 1000), bleederOhms: wide(100, 1e5), toolOhms: wide(10, 1e4) }),
      { numRuns: 12, seed: 3 },
    );
    for (const given of drawn) {
      const answer = runSheet(sheet, { ...given, tolerancePercent: 0, resistorTolerancePercent: 0 });
      if (!answer.ok) throw new Error(answer.say);
      const { secondsToSafe } = answer.result;
      const deck = [
        `c n 0 ${String(given.farads)} ic=${String(given.volts)}`,
        `rb n 0 ${String(given.bleederOhms)}`,
        `rt n 0 ${String(given.toolOhms)}`,
        `.tran ${String(secondsToSafe / 500)} ${String(secondsToSafe * 1.5)} 0 ${String(secondsToSafe / 500)} uic`,
      ];
      const spice = spiceMeasures(deck, ['meas tran safe when v(n)=5 fall=1']);
      expect(Math.abs((spice.get('safe') ?? 0) / secondsToSafe - 1), JSON.stringify(given)).toBeLessThan(0.01);
    }
  });
});
