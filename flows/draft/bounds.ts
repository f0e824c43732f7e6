/** What no order of checks can beat: entropy (Shannon 1948) and the best code (Huffman 1952). */
import type { Matrix, Possible } from './matrix';
import { parts } from './matrix';

export interface Bounds {
  /** entropy of what has to be told apart */
  bits: number;
  /** most answers that one check here has */
  arity: number;
  /** cheapest check that parts anything */
  leastMinutes: number;
  /** expected number of checks that no order beats */
  entropyChecks: number;
  huffmanChecks: number;
  /** the same in minutes, weighted like the suspects that come here */
  entropyMinutes: number;
  huffmanMinutes: number;
}

/** Lower bounds on the expected checks and minutes from here on. Suspects that no check surely tells apart count as one. */
export function boundsOf(matrix: Matrix, possible: Possible, checks: readonly number[] = usefulChecks(matrix, possible)): Bounds {
  const weights = clusterWeights(matrix, possible, checks);
  const total = weights.reduce((sum, w) => sum + w, 0);
  const arity = checks.reduce((most, c) => Math.max(most, matrix.arity[c] ?? 2), 2);
  const leastMinutes = checks.reduce((least, c) => Math.min(least, matrix.minutes[c] ?? Infinity), Infinity);
  const minutes = Number.isFinite(leastMinutes) ? leastMinutes : 0;
  const bits = weights.reduce((sum, w) => (w > 0 ? sum - (w / total) * Math.log2(w / total) : sum), 0);
  const huffmanChecks = huffmanLength(weights, arity) / (total || 1);
  const entropyChecks = bits / Math.log2(arity);
  return { bits, arity, leastMinutes: minutes, entropyChecks, huffmanChecks, entropyMinutes: entropyChecks * minutes * total, huffmanMinutes: huffmanChecks * minutes * total };
}

/** Checks that part the suspects here. */
export function usefulChecks(matrix: Matrix, possible: Possible): number[] {
  return matrix.minutes.length === 0 ? [] : Array.from({ length: matrix.minutes.length }, (_, c) => c).filter((c) => parts(matrix, possible, c));
}

/** Sum of weight × code length of the best code over an alphabet of `arity` letters: the weights of all merged nodes. */
export function huffmanLength(weights: readonly number[], arity = 2): number {
  const heap = weights.filter((w) => w > 0).sort((a, b) => b - a);
  if (heap.length < 2) return 0;
  // filled up with nothing, so that every merge takes a full handful
  while ((heap.length - 1) % (arity - 1) !== 0) heap.push(0);
  let length = 0;
  while (heap.length > 1) {
    let merged = 0;
    for (let i = 0; i < arity; i += 1) merged += heap.pop() ?? 0;
    length += merged;
    let at = heap.length;
    while (at > 0 && (heap[at - 1] ?? 0) < merged) at -= 1;
    heap.splice(at, 0, merged);
  }
  return length;
}

/** Weights of the sets of suspects that every order in the end tells apart: two are in one set when a chain of pairs that no check surely parts links them. */
function clusterWeights(matrix: Matrix, possible: Possible, checks: readonly number[]): number[] {
  const open = checks.some((c) => matrix.open[c] === true);
  return open ? linkedWeights(matrix, possible, checks) : equalWeights(matrix, possible, checks);
}

function equalWeights(matrix: Matrix, possible: Possible, checks: readonly number[]): number[] {
  const byRow = new Map<string, number>();
  possible.members.forEach((member, i) => {
    const row = checks.map((c) => matrix.answers[c]?.[member] ?? -1).join(',');
    byRow.set(row, (byRow.get(row) ?? 0) + (possible.weights[i] ?? 0));
  });
  return [...byRow.values()];
}

function linkedWeights(matrix: Matrix, possible: Possible, checks: readonly number[]): number[] {
  const { members } = possible;
  const root = Array.from(members, (_, i) => i);
  const find = (i: number): number => {
    let at = i;
    while (root[at] !== at) at = root[at] ?? at;
    return at;
  };
  for (let i = 0; i < members.length; i += 1) {
    for (let j = i + 1; j < members.length; j += 1) {
      const apart = checks.some((c) => {
        const a = matrix.answers[c]?.[members[i] ?? 0] ?? -1;
        const b = matrix.answers[c]?.[members[j] ?? 0] ?? -1;
        return a !== -1 && b !== -1 && a !== b;
      });
      if (!apart) root[find(j)] = find(i);
    }
  }
  const weights = new Map<number, number>();
  members.forEach((_, i) => weights.set(find(i), (weights.get(find(i)) ?? 0) + (possible.weights[i] ?? 0)));
  return [...weights.values()];
}
