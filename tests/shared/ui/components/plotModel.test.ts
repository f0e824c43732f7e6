import { describe, expect, it } from 'vitest';

import { extentOf, plotModel } from '@/shared/ui/components/plotModel';
import type { Plot } from '@/shared/workings/plot';

const plot: Plot = {
  title: 'Decay',
  x: { title: 'Time', unit: 's', scale: 'linear' },
  y: { title: 'Volts', unit: 'V', scale: 'linear' },
  curves: [
    {
      label: 'marked',
      role: 'main',
      points: [
        [0, 300],
        [40, 5],
      ],
    },
  ],
  points: [],
  bands: [],
  limits: [],
  words: 'It falls.',
};

describe('plotModel', () => {
  it('puts small values right of and below large ones, all inside the field', () => {
    const model = plotModel(plot, 358, 300);
    expect(model.y.px(300)).toBeLessThan(model.y.px(5));
    expect(model.x.px(40)).toBeGreaterThan(model.x.px(0));
    expect(model.x.px(1e9)).toBeCloseTo(model.right, 6);
    expect(model.y.px(-1e9)).toBeCloseTo(model.bottom, 6);
  });

  it('prints ticks of an axis in one unit, said in its title', () => {
    const small: Plot = {
      ...plot,
      x: { title: 'Capacitance', unit: 'F', scale: 'linear' },
      curves: [
        {
          label: 'c',
          role: 'main',
          points: [
            [0, 1],
            [470e-6, 2],
          ],
        },
      ],
    };
    const { x } = plotModel(small, 358, 300);
    expect(x.title).toBe('Capacitance, μF');
    expect(x.ticks.map((tick) => tick.label)).toContain('200');
  });

  it('leaves labels their room on a phone', () => {
    const { x, y } = plotModel(plot, 320, 280);
    for (const { ticks } of [x, y]) {
      const labelled = ticks
        .filter((tick) => tick.label !== null)
        .map((tick) => tick.at)
        .sort((a, b) => a - b);
      expect(labelled.length).toBeGreaterThan(1);
      labelled.slice(1).forEach((at, i) => expect(at - (labelled[i] ?? 0)).toBeGreaterThan(28));
    }
  });

  it('labels a logarithmic axis at its decades, each with its own prefix', () => {
    const log: Plot = {
      ...plot,
      y: { title: 'Ohms', unit: 'Ω', scale: 'log' },
      curves: [
        {
          label: 'r',
          role: 'main',
          points: [
            [0, 10],
            [1, 1e6],
          ],
        },
      ],
    };
    const labels = plotModel(log, 358, 320).y.ticks.flatMap((tick) => tick.label ?? []);
    expect(labels).toContain('10 Ω');
    expect(labels).toContain('100 kΩ');
    expect(labels.length).toBeLessThan(8);
  });

  it('gives a single value room on both sides and starts at zero where that is near', () => {
    expect(extentOf(plot.x, [5, 5])).toEqual([2.5, 7.5]);
    expect(extentOf(plot.x, [0, 0])).toEqual([-0.5, 0.5]);
    expect(extentOf(plot.x, [1, 10])).toEqual([0, 10]);
    expect(extentOf(plot.x, [-10, -1])).toEqual([-10, 0]);
    expect(extentOf(plot.x, [4.75, 5.25])).toEqual([4.75, 5.25]);
    expect(extentOf({ ...plot.x, from: 0, to: 100 }, [4, 5])).toEqual([0, 100]);
    expect(extentOf({ ...plot.x, scale: 'log' }, [9, 9])).toEqual([3, 27]);
  });
});
