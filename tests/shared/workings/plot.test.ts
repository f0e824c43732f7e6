import { describe, expect, it } from 'vitest';

import { SHEETS } from '@/shared/workings/list';
import type { Circuit, Plot } from '@/shared/workings/plot';
import { circuitFaults, plotFaults, sampleCurve } from '@/shared/workings/plot';
import { runSheet } from '@/shared/workings/sheet';

const plot: Plot = {
  title: 'Decay',
  x: { title: 'Time', unit: 's', scale: 'linear' },
  y: { title: 'Volts left', unit: 'V', scale: 'log' },
  curves: [{ label: 'marked value', role: 'main', points: sampleCurve((t) => 100 * Math.exp(-t), 0, 5) }],
  points: [{ label: 'safe to touch', role: 'answer', x: 3, y: 5 }],
  bands: [{ label: 'safe', axis: 'y', from: null, to: 5, role: 'good' }],
  limits: [{ label: '5 V', axis: 'y', at: 5 }],
  words: 'Volts fall from 100 V and pass 5 V after 3 s.',
};
const circuit: Circuit = {
  title: 'One loop',
  nodes: [
    { id: 'a', label: '+5 V', volts: 5, side: 'supply' },
    { id: 'b', label: '0 V', volts: 0, side: 'supply' },
  ],
  branches: [{ id: 'l', kind: 'load', label: 'load', from: 'a', to: 'b', amps: 1 }],
  words: 'One load.',
};

describe('a sampled curve', () => {
  it('starts and ends exactly where it was asked to', () => {
    expect(sampleCurve((x) => 2 * x, 0, 10, 'linear', 5)).toEqual([
      [0, 0],
      [2.5, 5],
      [5, 10],
      [7.5, 15],
      [10, 20],
    ]);
  });

  it('spreads evenly over the decades on a logarithmic axis', () => {
    const xs = sampleCurve((x) => x, 1, 1000, 'log', 4).map(([x]) => x);
    [1, 10, 100, 1000].forEach((x, i) => expect(xs[i]).toBeCloseTo(x, 9));
  });
});

describe('what cannot be drawn', () => {
  it('is said of no sound plot and of no sound circuit', () => {
    expect(plotFaults(plot)).toEqual([]);
    expect(circuitFaults(circuit)).toEqual([]);
  });

  it('is a zero on a logarithmic axis, a number that is none, an empty plot, a plot without words', () => {
    expect(plotFaults({ ...plot, limits: [{ label: 'nought', axis: 'y', at: 0 }] })).toEqual([
      'nought: y has no place on a logarithmic axis.',
    ]);
    expect(plotFaults({ ...plot, points: [{ label: 'lost', role: 'answer', x: Number.NaN, y: 1 }] })).toEqual([
      'lost: x is not a finite number.',
    ]);
    expect(plotFaults({ ...plot, curves: [], points: [], words: ' ' })).toEqual(['Nothing is drawn.', 'It has no words.']);
  });

  it('is a branch to a node that is not there, and amps without a value', () => {
    const bad = { ...circuit, branches: [{ id: 'l', kind: 'load' as const, label: 'load', from: 'a', to: 'z', amps: Infinity }] };
    expect(circuitFaults(bad)).toEqual(['load: there is no node z.', 'load: amps are not a finite number.']);
  });
});

describe.each(SHEETS.map((sheet) => [sheet.id, sheet] as const))('%s', (_, sheet) => {
  it('draws nothing that cannot be drawn', () => {
    const answer = runSheet(sheet, sheet.example);
    expect(answer.ok).toBe(true);
    if (!answer.ok) return;
    expect(answer.plot === undefined ? [] : plotFaults(answer.plot)).toEqual([]);
    expect(answer.drawing === undefined ? [] : circuitFaults(answer.drawing)).toEqual([]);
  });
});
