/** The lamp's curve and the load's curve over the lamp's volts; they agree where they cross. */
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Lamp } from '@/shared/workings/lamp';
import { lampAmps } from '@/shared/workings/lamp';
import type { LampLoad, OperatingPoint } from '@/shared/workings/lampPoints';
import { reservoirOhms } from '@/shared/workings/lampPoints';
import type { Plot, PlotPair } from '@/shared/workings/plot';
import { sampleCurve } from '@/shared/workings/plot';
import { reservoirBehind } from '@/shared/workings/reservoirLoad';

function loadCurve(supplyVolts: number, load: LampLoad, mostAmps: number): readonly PlotPair[] {
  const onPaper = (pairs: readonly PlotPair[]): readonly PlotPair[] => pairs.filter(([, amps]) => amps <= mostAmps);
  switch (load.kind) {
    case 'short':
      return [
        [supplyVolts, 0],
        [supplyVolts, mostAmps],
      ];
    case 'resistance':
      // From where it leaves the paper, so that a stiff load is drawn too.
      return sampleCurve(
        (volts) => (supplyVolts - volts) / load.ohms,
        Math.max(0, supplyVolts - mostAmps * load.ohms),
        supplyVolts,
        'linear',
        2,
      );
    case 'constant-power':
      return onPaper(sampleCurve((volts) => load.watts / (supplyVolts - volts), 0, supplyVolts * 0.999));
    case 'reservoir': {
      const loadOhms = reservoirOhms(supplyVolts, load.watts);
      return onPaper(
        sampleCurve((series) => series, loadOhms * 1e-4, loadOhms * 1e4, 'log').map(([series]): PlotPair => {
          const { seriesVolts, amps } = reservoirBehind(supplyVolts, series, loadOhms);
          return [seriesVolts, amps];
        }),
      );
    }
  }
}

/** Lamp and load, with the points at which they agree. */
export function lampPlot(lamp: Lamp, supplyVolts: number, load: LampLoad, points: readonly OperatingPoint[]): Plot {
  const most = lampAmps(lamp, supplyVolts) * 1.2;
  const curve = loadCurve(supplyVolts, load, most);
  const v = (value: number): string => formatQuantity(value, 'V', { digits: 3 });
  const met = points.map((point) => `${v(point.lampVolts)} on the lamp${point.stable ? '' : ' (not stable)'}`);
  return {
    title: 'Lamp and load',
    x: { title: 'Volts on the lamp', unit: 'V', scale: 'linear', from: 0, to: supplyVolts },
    y: { title: 'Current', unit: 'A', scale: 'linear', from: 0, to: most },
    curves: [
      { label: 'lamp', role: 'main', points: sampleCurve((volts) => lampAmps(lamp, volts), 0, supplyVolts) },
      ...(curve.length >= 2 ? [{ label: 'load', role: 'other' as const, points: curve }] : []),
    ],
    points: points.map((point) => ({
      label: v(point.lampVolts),
      x: point.lampVolts,
      y: point.amps,
      role: point.stable ? 'answer' : 'other',
    })),
    bands: [],
    limits: [],
    words:
      met.length === 0
        ? 'The load wants more current than the lamp lets through at any volts: the two curves do not meet.'
        : `The curves of lamp and load meet at ${met.join(' and at ')}.`,
  };
}
