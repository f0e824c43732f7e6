/** What a sheet draws: a plot with its axes, or a circuit with its volts and amps. Data only; no pixel, colour or number format in it. */
import type { Unit } from '@/shared/quantity/units';

/** One axis. Values are in SI; the unit says how ticks are printed, with prefixes. */
export interface PlotAxis {
  readonly title: string;
  readonly unit: Unit;
  readonly scale: 'linear' | 'log';
  /** Ends of the axis where the sheet knows them better than the data do. */
  readonly from?: number;
  readonly to?: number;
}

/** A pair of x and y in SI. */
export type PlotPair = readonly [x: number, y: number];

/** A line through its points in the order given. */
export interface PlotCurve {
  readonly label: string;
  readonly points: readonly PlotPair[];
  /** `main` is what the answer comes from, `other` a second case, `bound` a worst case. */
  readonly role: 'main' | 'other' | 'bound';
}

/** One marked place. */
export interface PlotPoint {
  readonly label: string;
  readonly x: number;
  readonly y: number;
  /** `answer` is drawn filled; `reading` is what a meter said; `other` is an answer that does not hold, such as an unstable point. */
  readonly role: 'answer' | 'reading' | 'other';
}

/** A stretch across the whole plot, from one value of an axis to another; null is the end of the axis. */
export interface PlotBand {
  readonly label: string;
  readonly axis: 'x' | 'y';
  readonly from: number | null;
  readonly to: number | null;
  /** `good` is where it should lie, `close` a guard band, `bad` where it must not. */
  readonly role: 'good' | 'close' | 'bad';
}

/** A line across the whole plot at one value of an axis. */
export interface PlotLimit {
  readonly label: string;
  readonly axis: 'x' | 'y';
  readonly at: number;
}

/** A plot. At least one curve or point. */
export interface Plot {
  readonly title: string;
  readonly x: PlotAxis;
  readonly y: PlotAxis;
  readonly curves: readonly PlotCurve[];
  readonly points: readonly PlotPoint[];
  readonly bands: readonly PlotBand[];
  readonly limits: readonly PlotLimit[];
  /** What it shows, in one to three sentences, for who does not see it: the shape, the marked points, on which side of a limit they lie. */
  readonly words: string;
}

/** A place of one potential in a circuit. */
export interface CircuitNode {
  readonly id: string;
  readonly label: string;
  /** Against the reference; null where it is not known, absent where the drawing is not about volts. */
  readonly volts?: number | null;
  /** At the supply it is drawn left, at the load right. Nodes are drawn from top to bottom in the order given. */
  readonly side: 'supply' | 'load';
  /** What is wrong with it, in a word or two, such as "reversed". */
  readonly trouble?: string;
}

/** What a branch is drawn as. */
export type CircuitKind = 'source' | 'conductor' | 'load' | 'diode' | 'resistor' | 'lamp' | 'capacitor' | 'inductor' | 'fuse' | 'switch';

/** What joins two nodes. */
export interface CircuitBranch {
  readonly id: string;
  readonly kind: CircuitKind;
  readonly label: string;
  /** A diode's anode, a source's plus. */
  readonly from: string;
  readonly to: string;
  /** Inside the branch from `from` to `to`, negative the other way; null where it is not known, absent where the drawing is not about amps. */
  readonly amps?: number | null;
  /** The branch that was taken out, or that a search accuses. */
  readonly mark?: 'opened' | 'accused';
  /** What is wrong with it, in a few words, such as "3 times its rating" or "in limit". */
  readonly trouble?: string;
  /** True along the way that the current in question takes. */
  readonly lit?: boolean;
}

/** A circuit with what flows in it. */
export interface Circuit {
  readonly title: string;
  readonly nodes: readonly CircuitNode[];
  readonly branches: readonly CircuitBranch[];
  /** What it shows, in words: what is open, which way the current takes, what it does. */
  readonly words: string;
}

/**
 * Points of a curve for a plot.
 * @param scale `log` spreads the places evenly over the decades; `from` must then be more than zero
 * @param count how many points, two or more
 */
export function sampleCurve(
  of: (x: number) => number,
  from: number,
  to: number,
  scale: PlotAxis['scale'] = 'linear',
  count = 61,
): readonly PlotPair[] {
  return Array.from({ length: count }, (_, i): PlotPair => {
    const share = i / (count - 1);
    const x = i === count - 1 ? to : scale === 'log' ? from * (to / from) ** share : from + (to - from) * share;
    return [x, of(x)];
  });
}

/** A sentence for each thing that cannot be drawn; a test holds every sheet's plot to this. */
export function plotFaults(plot: Plot): readonly string[] {
  const faults: string[] = [];
  const onAxis = (name: 'x' | 'y', value: number, of: string): void => {
    if (!Number.isFinite(value)) faults.push(`${of}: ${name} is not a finite number.`);
    else if (plot[name].scale === 'log' && value <= 0) faults.push(`${of}: ${name} has no place on a logarithmic axis.`);
  };
  if (plot.curves.length + plot.points.length === 0) faults.push('Nothing is drawn.');
  if (plot.words.trim() === '') faults.push('It has no words.');
  for (const curve of plot.curves) {
    if (curve.points.length < 2) faults.push(`${curve.label}: a curve needs two points.`);
    for (const [x, y] of curve.points) {
      onAxis('x', x, curve.label);
      onAxis('y', y, curve.label);
    }
  }
  for (const point of plot.points) {
    onAxis('x', point.x, point.label);
    onAxis('y', point.y, point.label);
  }
  for (const limit of plot.limits) onAxis(limit.axis, limit.at, limit.label);
  for (const band of plot.bands) for (const end of [band.from, band.to]) if (end !== null) onAxis(band.axis, end, band.label);
  return [...new Set(faults)];
}

/** A sentence for each thing in a circuit that cannot be drawn. */
export function circuitFaults(circuit: Circuit): readonly string[] {
  const ids = new Set(circuit.nodes.map((node) => node.id));
  const faults: string[] = [];
  if (ids.size !== circuit.nodes.length) faults.push('Two nodes have the same id.');
  if (new Set(circuit.branches.map((branch) => branch.id)).size !== circuit.branches.length) faults.push('Two branches have the same id.');
  if (circuit.words.trim() === '') faults.push('It has no words.');
  for (const branch of circuit.branches) {
    for (const end of [branch.from, branch.to]) if (!ids.has(end)) faults.push(`${branch.label}: there is no node ${end}.`);
    if (!Number.isFinite(branch.amps ?? 0)) faults.push(`${branch.label}: amps are not a finite number.`);
  }
  for (const node of circuit.nodes)
    if (!Number.isFinite(node.volts ?? 0)) faults.push(`${node.label}: volts are not a finite number.`);
  return faults;
}
