import { describe, expect, it } from 'vitest';

import { dutyOf } from '@/shared/workings/buck';
import { linearLoss, sheet, switchingLoss } from '@/shared/workings/passElement';
import { runSheet } from '@/shared/workings/sheet';
import { mostSinkToAir, settledTemperatures } from '@/shared/workings/thermal';

const worked = (given: object) => {
  const answer = runSheet(sheet, given);
  if (!answer.ok) throw new Error(answer.say);
  return answer;
};
const computer = { inputVolts: 39, outputVolts: 5, amps: 17, style: 'switching' };

describe('39 V raw to 5 V at 17 A (common practice, no source)', () => {
  it('would put 578 W into a linear pass device', () => {
    expect(linearLoss(39, 5, 17).deviceWatts).toBe(578);
    expect(worked({ ...computer, style: 'linear' }).result.tooHot).toBe(true);
  });

  it('so it has to switch, at a duty near 0.13 without its drops, 0.15 with them', () => {
    expect(dutyOf({ inputVolts: 39, outputVolts: 5, switchVolts: 0, diodeVolts: 0 })).toBeCloseTo(0.128, 3);
    const { result } = worked(computer);
    expect(result.switching?.duty).toBeCloseTo(0.154, 3);
    expect(result.switching?.deviceWatts).toBeLessThan(578 / 30);
    expect(result.tooHot).toBe(false);
  });

  it('a rail that sags steadily while input current follows output current is not switching', () => {
    const answer = worked({
      ...computer,
      outputVolts: 4.3,
      readInputAmps: 17.4,
      lightOutputAmps: 3,
      lightInputAmps: 3.4,
      lightOutputVolts: 4.86,
    });
    expect(answer.result.verdict).toMatchObject({
      is: 'not-switching',
      ratio: expect.closeTo(1, 9) as number,
      sagOhms: expect.closeTo(0.04, 9) as number,
    });
    expect(answer.headline).toMatch(/^It does not switch: input current follows output current/);
  });

  it('one that takes 3.1 A for 17 A is', () => {
    expect(worked({ ...computer, readInputAmps: 3.1 }).result.verdict).toMatchObject({ is: 'switching' });
  });
});

describe('dissipation and junction temperature against published worked examples', () => {
  // Public newsletter “Thermal management”, April 2026: LM7805, 12 V to 5 V, 0.5 A, 5 + 1 + 10 K/W, 25 °C.
  it('12 V to 5 V at 0.5 A: 3.5 W, 81 °C; bare with 65 K/W 252.5 °C (the page prints 252)', () => {
    expect(linearLoss(12, 5, 0.5).deviceWatts).toBe(3.5);
    expect(settledTemperatures(3.5, { junctionToCase: 5, caseToSink: 1, sinkToAir: 10 }, 25).junction).toBe(81);
    expect(settledTemperatures(3.5, { junctionToCase: 0, caseToSink: 0, sinkToAir: 65 }, 25).junction).toBe(252.5);
  });

  // Public heatsink calculator with worked example, June 2026: 3.5 W, 125 °C, 25 °C, 2 and 0.5 K/W.
  it('3.5 W needs a heatsink of 26.07 K/W or less (printed: about 26); with 20 K/W it settles at 103.75 °C (printed: 104)', () => {
    expect(mostSinkToAir(3.5, { junctionToCase: 2, caseToSink: 0.5 }, 25, 125)).toBeCloseTo(26.07, 2);
    expect(settledTemperatures(3.5, { junctionToCase: 2, caseToSink: 0.5, sinkToAir: 20 }, 25).junction).toBe(103.75);
  });

  // The same family of pages: 5 W over 3 + 1 + 8 K/W at 25 °C.
  it('5 W over 3 + 1 + 8 K/W: junction 85 °C, case 70 °C', () => {
    const settled = settledTemperatures(5, { junctionToCase: 3, caseToSink: 1, sinkToAir: 8 }, 25);
    expect([settled.junction, settled.case]).toEqual([85, 70]);
  });

  // Public forum question with its readings: 2.93 V to 1.04 V at 1.53 A; 40 K/W bare, 3 + 26 and 3 + 16 K/W, 25 °C.
  it('2.93 V to 1.04 V at 1.53 A: 2.8917 W; 140.67, 108.86 and 79.94 °C', () => {
    const watts = linearLoss(2.93, 1.04, 1.53).deviceWatts;
    expect(watts).toBeCloseTo(2.8917, 9);
    expect(settledTemperatures(watts, { junctionToCase: 0, caseToSink: 0, sinkToAir: 40 }, 25).junction).toBeCloseTo(140.668, 3);
    expect(settledTemperatures(watts, { junctionToCase: 3, caseToSink: 0, sinkToAir: 26 }, 25).junction).toBeCloseTo(108.8593, 4);
    expect(settledTemperatures(watts, { junctionToCase: 3, caseToSink: 0, sinkToAir: 16 }, 25).junction).toBeCloseTo(79.9423, 3);
  });

  // Public design guide, February 2026: 12 V to 3.3 V at 1 A.
  it('12 V to 3.3 V at 1 A: 8.7 W, 73 % of the input wasted', () => {
    const loss = linearLoss(12, 3.3, 1);
    expect(loss.deviceWatts).toBeCloseTo(8.7, 9);
    expect(1 - loss.efficiency).toBeCloseTo(0.725, 3);
  });

  // PD = (VIN − VOUT) × IOUT + VIN × IGND: maker’s page for a three-terminal regulator; 8 mA ground current from memory.
  it('adds the regulator’s own current: 12 V to 5 V at 0.5 A with 8 mA standing is 3.596 W', () => {
    expect(linearLoss(12, 5, 0.5, 0.008).deviceWatts).toBeCloseTo(3.596, 9);
  });
});

describe('average currents against Maniktala, Switching Power Supplies A to Z, appendix 2', () => {
  it('input for a duty of one half is 2 × V out + V on + V diode: 11.5 V for 5 V, 1 V and 0.5 V', () => {
    expect(dutyOf({ inputVolts: 11.5, outputVolts: 5, switchVolts: 1, diodeVolts: 0.5 })).toBe(0.5);
  });

  it('the switch carries I × D, the diode I × (1 − D): half each there, and so the losses are 0.5 W and 0.25 W at 1 A', () => {
    const loss = switchingLoss({
      inputVolts: 11.5,
      outputVolts: 5,
      amps: 1,
      switchVolts: 1,
      diodeVolts: 0.5,
      standingAmps: 0,
      hertz: 0,
      edgeSeconds: 0,
    });
    expect([loss.inputAmps, loss.deviceWatts, loss.diodeWatts]).toEqual([0.5, 0.5, 0.25]);
  });
});
