/** Finds the volts of a network of resistors and of currents that rise with their volts, by damped Newton steps. */
import { LuDecomposition, Matrix } from 'ml-matrix';

import type { BranchCurrent } from '@/shared/workings/network/diode';
import type { Mesh } from '@/shared/workings/network/mesh';

/** A branch whose current never falls as its volts rise. */
export interface Branch {
  readonly from: number;
  readonly to: number;
  /** Current from `from` to `to` at the volts between them, and its slope, zero or more. */
  readonly current: (volts: number) => BranchCurrent;
}

/** How a search ended. */
export interface Settled {
  readonly converged: boolean;
  readonly steps: number;
  /** The largest sum of currents left at a node, in amps. */
  readonly leftAmps: number;
}

const MOST_STEPS = 200;
const MOST_CUTS = 60;
/** A step ends near enough to the least along its line when the slope there has fallen to this share. */
const NEAR_LEAST = 0.05;
/** The currents of a node balance when they sum to no more than this share of their sizes (and of a nanoamp). */
const BALANCED = 1e-12;
/** Nor can they balance better than the last figure of the volts allows; a few of those are let pass. */
const LAST_FIGURE = 4 * Number.EPSILON;

/** The nodes and branches of one search, with room for its steps. */
class Search {
  readonly count: number;
  readonly residual: Float64Array;
  readonly sizes: Float64Array;
  readonly rounding: Float64Array;
  readonly slopes: Matrix;
  private readonly place: Int32Array;
  private readonly mesh: Mesh;
  private readonly nodes: readonly number[];
  private readonly branches: readonly Branch[];

  constructor(mesh: Mesh, nodes: readonly number[], branches: readonly Branch[]) {
    this.mesh = mesh;
    this.nodes = nodes;
    this.branches = branches;
    this.count = nodes.length;
    this.residual = new Float64Array(this.count);
    this.sizes = new Float64Array(this.count);
    this.rounding = new Float64Array(this.count);
    this.slopes = Matrix.zeros(this.count, this.count);
    this.place = new Int32Array(mesh.size).fill(-1);
    nodes.forEach((node, k) => (this.place[node] = k));
  }

  /** Sums of currents at `volts`, and how they change. */
  look(volts: Float64Array): void {
    const { mesh, nodes, residual, sizes, rounding, slopes } = this;
    const zero = mesh.size - 1;
    for (let k = 0; k < this.count; k += 1) {
      const i = nodes[k] ?? 0;
      const here = volts[i] ?? 0;
      const toZero = mesh.siemens[i * mesh.size + zero] ?? 0;
      let [sum, size, slope] = [toZero * here, Math.abs(toZero * here), toZero];
      let weighed = size;
      for (let m = 0; m < this.count; m += 1) {
        if (m === k) continue;
        const j = nodes[m] ?? 0;
        const g = mesh.siemens[i * mesh.size + j] ?? 0;
        const there = volts[j] ?? 0;
        const amps = g * (here - there);
        sum += amps;
        size += Math.abs(amps);
        slope += g;
        weighed += g * (Math.abs(here) + Math.abs(there));
        slopes.set(k, m, -g);
      }
      residual[k] = sum;
      sizes[k] = size;
      rounding[k] = weighed;
      slopes.set(k, k, slope);
    }
    for (const { from, to, current } of this.branches) {
      const [before, behind] = [volts[from] ?? 0, volts[to] ?? 0];
      const { amps, siemens } = current(before - behind);
      const weighed = siemens * (Math.abs(before) + Math.abs(behind));
      const [a, b] = [this.place[from] ?? -1, this.place[to] ?? -1];
      if (a >= 0) this.add(a, b, amps, siemens, weighed);
      if (b >= 0) this.add(b, a, -amps, siemens, weighed);
    }
  }

  private add(at: number, other: number, amps: number, siemens: number, weighed: number): void {
    this.residual[at] = (this.residual[at] ?? 0) + amps;
    this.sizes[at] = (this.sizes[at] ?? 0) + Math.abs(amps);
    this.rounding[at] = (this.rounding[at] ?? 0) + weighed;
    this.slopes.set(at, at, this.slopes.get(at, at) + siemens);
    if (other >= 0) this.slopes.set(at, other, this.slopes.get(at, other) - siemens);
  }

  balanced(): boolean {
    for (let k = 0; k < this.count; k += 1) {
      const allowed = BALANCED * ((this.sizes[k] ?? 0) + 1e-9) + LAST_FIGURE * (this.rounding[k] ?? 0);
      // Not a number is not balanced either.
      if (!(Math.abs(this.residual[k] ?? 0) <= allowed)) return false;
    }
    return true;
  }

  left(): number {
    return this.residual.reduce((most, amps) => Math.max(most, Math.abs(amps)), 0);
  }

  /** Downhill along a step: negative before the least of the convex potential, positive past it. */
  along(step: Float64Array): number {
    let sum = 0;
    for (let k = 0; k < this.count; k += 1) sum += (this.residual[k] ?? 0) * (step[k] ?? 0);
    return sum;
  }
}

/**
 * Solves for the volts of `nodes`. Such a network has a convex potential whose least is the one answer, so a Newton step that is
 * cut back where it passes the least along its line cannot run away.
 * @param volts start and result, all nodes of the mesh, the last one 0 V
 */
export function settle(mesh: Mesh, nodes: readonly number[], branches: readonly Branch[], volts: Float64Array): Settled {
  const search = new Search(mesh, nodes, branches);
  const { count } = search;
  const step = new Float64Array(count);
  const trial = volts.slice();
  const move = (share: number): void => {
    for (let k = 0; k < count; k += 1) {
      const node = nodes[k] ?? 0;
      trial[node] = (volts[node] ?? 0) + share * (step[k] ?? 0);
    }
  };
  search.look(volts);
  for (let steps = 0; steps < MOST_STEPS; steps += 1) {
    if (search.balanced()) return { converged: true, steps, leftAmps: search.left() };
    const solved = new LuDecomposition(search.slopes).solve(Matrix.columnVector(search.residual));
    for (let k = 0; k < count; k += 1) step[k] = -solved.get(k, 0);
    const start = search.along(step);
    // Up to the least along the line and not past it, or steps could go round in a circle between kinks.
    let [low, lowSlope, high, highSlope, share] = [0, start, 1, 0, 1];
    let looked = -1;
    for (let cut = 0; cut < MOST_CUTS; cut += 1) {
      move(share);
      search.look(trial);
      looked = share;
      const slope = search.along(step);
      if ((share === 1 && slope <= 0) || Math.abs(slope) <= NEAR_LEAST * Math.abs(start)) break;
      if (slope > 0) [high, highSlope] = [share, slope];
      else [low, lowSlope] = [share, slope];
      const straight = lowSlope / (lowSlope - highSlope);
      share = low + (high - low) * Math.min(0.9, Math.max(0.1, straight));
    }
    if (looked !== share) {
      move(share);
      search.look(trial);
    }
    volts.set(trial);
  }
  return { converged: search.balanced(), steps: MOST_STEPS, leftAmps: search.left() };
}
