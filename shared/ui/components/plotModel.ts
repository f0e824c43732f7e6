/** The geometry of a plot: where its axes, ticks and marks stand for a given size. Pure. */
import { scaleLinear, scaleLog } from 'd3-scale';

import { formatNumber, formatQuantity, scaleQuantity } from '@/shared/quantity/formatQuantity';
import type { Prefix } from '@/shared/quantity/units';
import { PREFIXES } from '@/shared/quantity/units';
import type { Plot, PlotAxis } from '@/shared/workings/plot';

export interface PlotTick {
  /** pixels */
  at: number;
  /** null for a small tick */
  label: string | null;
}

export interface AxisModel {
  /** title with the unit in which the ticks are printed */
  title: string;
  /** pixels of a value in SI, held inside the plot */
  px(value: number): number;
  ticks: PlotTick[];
  /** ends of the axis in SI */
  from: number;
  to: number;
}

export interface PlotModel {
  x: AxisModel;
  y: AxisModel;
  /** the ruled field, in pixels */
  left: number;
  right: number;
  top: number;
  bottom: number;
}

/** Width of a figure of the mono face at the smallest size. */
const FIGURE_PX = 9.8;
const X_PITCH_PX = 74;
const Y_PITCH_PX = 46;

type Scale = ReturnType<typeof scaleLinear<number, number>> | ReturnType<typeof scaleLog<number, number>>;

function valuesOn(plot: Plot, name: 'x' | 'y'): number[] {
  const at = name === 'x' ? 0 : 1;
  return [
    ...plot.curves.flatMap((curve) => curve.points.map((pair) => pair[at])),
    ...plot.points.map((point) => point[name]),
    ...plot.limits.flatMap((limit) => (limit.axis === name ? [limit.at] : [])),
    ...plot.bands.flatMap((band) => (band.axis === name ? [band.from, band.to].filter((end) => end !== null) : [])),
  ];
}

/** What the axis has to show; one value alone is given room around it. */
export function extentOf(axis: PlotAxis, values: readonly number[]): [number, number] {
  let [low, high] = [Math.min(...values), Math.max(...values)];
  if (axis.scale === 'linear' && low > 0 && low < 0.4 * high) low = 0;
  if (axis.scale === 'linear' && high < 0 && high > 0.4 * low) high = 0;
  low = axis.from ?? low;
  high = axis.to ?? high;
  if (high - low > Math.abs(high) * 1e-9) return [low, high];
  return axis.scale === 'log' ? [low / 3, low * 3] : [low - (Math.abs(low) || 1) * 0.5, low + (Math.abs(low) || 1) * 0.5];
}

function prefixOf(axis: PlotAxis, from: number, to: number): Prefix {
  return scaleQuantity(Math.max(Math.abs(from), Math.abs(to)), axis.unit, { digits: 3 }).prefix;
}

function ticksOf(scale: Scale, axis: PlotAxis, count: number, prefix: Prefix): { at: number; label: string | null }[] {
  if (axis.scale === 'linear') {
    const shift = PREFIXES[prefix].exponent;
    return scale.ticks(count).map((at) => ({ at, label: formatNumber(at / Number(`1e${shift}`), 6) }));
  }
  const all = scale.ticks();
  const [low = 1, high = 1] = scale.domain();
  const decades = Math.log10(high / low);
  // a label at each decade, at each second or third where they are many, and at 2 and 5 where they are few
  const every = Math.max(1, Math.ceil(decades / count));
  const figures = decades <= count / 3 ? [1, 2, 5] : [1];
  return all.map((at) => {
    const exponent = Math.floor(Math.log10(at) + 1e-9);
    const labelled = figures.includes(Math.round(at / 10 ** exponent)) && (figures.length > 1 || exponent % every === 0);
    return { at, label: labelled ? formatQuantity(at, axis.unit, { digits: 3 }) : null };
  });
}

interface Drawn {
  scale: Scale;
  ticks: { at: number; label: string | null }[];
  title: string;
}

function drawnAxis(axis: PlotAxis, values: readonly number[], count: number): Drawn {
  const scale = axis.scale === 'log' ? scaleLog<number, number>() : scaleLinear<number, number>();
  const [low, high] = extentOf(axis, values);
  scale.domain([low, high]).nice(count);
  const [roundLow = low, roundHigh = high] = scale.domain();
  // an end that the sheet gives stays; the other one is rounded, so that no curve runs along the edge
  scale.domain([axis.from ?? roundLow, axis.to ?? roundHigh]);
  const [from = 0, to = 1] = scale.domain();
  const prefix = axis.scale === 'log' ? '' : prefixOf(axis, from, to);
  const unit = axis.scale === 'log' ? '' : `${prefix}${axis.unit}`;
  return { scale, ticks: ticksOf(scale, axis, count, prefix), title: unit === '' ? axis.title : `${axis.title}, ${unit}` };
}

function placed({ scale, ticks, title }: Drawn, from: number, to: number): AxisModel {
  scale.range([from, to]).clamp(true);
  const [low = 0, high = 1] = scale.domain();
  return { title, px: (value) => scale(value), ticks: ticks.map(({ at, label }) => ({ at: scale(at), label })), from: low, to: high };
}

/** Lays out a plot in a box of this many pixels; labels keep their size and get fewer when it is small. */
export function plotModel(plot: Plot, width: number, height: number): PlotModel {
  const [top, foot] = [34, 56];
  const bottom = height - foot;
  const yDrawn = drawnAxis(plot.y, valuesOn(plot, 'y'), Math.max(2, Math.floor((bottom - top) / Y_PITCH_PX)));
  const longest = Math.max(...yDrawn.ticks.map(({ label }) => label?.length ?? 0));
  const left = Math.max(34, Math.ceil(longest * FIGURE_PX) + 14);
  const right = width - 18;
  const xDrawn = drawnAxis(plot.x, valuesOn(plot, 'x'), Math.max(2, Math.floor((right - left) / X_PITCH_PX)));
  return { x: placed(xDrawn, left, right), y: placed(yDrawn, bottom, top), left, right, top, bottom };
}
