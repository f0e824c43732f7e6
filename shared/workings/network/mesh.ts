/** Resistive networks as couplings between nodes, and the star-mesh transform that takes nodes out of them. */

/**
 * Couplings in siemens between `size` nodes, row by row and symmetric; the last node is 0 V. What stands on the diagonal is
 * not used: a node's own sum follows from its row, so that nothing is ever subtracted and no figure is lost, however far
 * apart milliohms and kilohms lie.
 */
export interface Mesh {
  readonly size: number;
  readonly siemens: Float64Array;
}

/** A node that was taken out, and its volts as shares of those of its neighbours at that moment. */
export interface TakenNode {
  readonly node: number;
  readonly near: readonly number[];
  readonly shares: readonly number[];
}

/** A mesh without couplings. */
export function emptyMesh(size: number): Mesh {
  return { size, siemens: new Float64Array(size * size) };
}

/** Puts a conductance between two nodes, beside what is there; a branch from a node to itself does nothing. */
export function couple({ size, siemens }: Mesh, a: number, b: number, conductance: number): void {
  if (a === b) return;
  siemens[a * size + b] = (siemens[a * size + b] ?? 0) + conductance;
  siemens[b * size + a] = (siemens[b * size + a] ?? 0) + conductance;
}

/**
 * Takes nodes out one by one, each star turned into the mesh that does the same (Kron reduction).
 * @param mesh is changed: the nodes lose their couplings, the others gain
 * @param nodes none of them 0 V, each with some coupling
 * @returns how their volts follow, in the order of their going
 */
export function takeOut({ size, siemens }: Mesh, nodes: readonly number[]): readonly TakenNode[] {
  return nodes.map((node) => {
    const row = node * size;
    const near: number[] = [];
    let sum = 0;
    for (let j = 0; j < size; j += 1) {
      const g = siemens[row + j] ?? 0;
      if (j === node || g === 0) continue;
      near.push(j);
      sum += g;
    }
    const shares = near.map((j) => (siemens[row + j] ?? 0) / sum);
    for (const i of near) {
      const g = siemens[row + i] ?? 0;
      near.forEach((j, k) => {
        if (j !== i) siemens[i * size + j] = (siemens[i * size + j] ?? 0) + g * (shares[k] ?? 0);
      });
    }
    for (const j of near) {
      siemens[row + j] = 0;
      siemens[j * size + node] = 0;
    }
    return { node, near, shares };
  });
}

/** Fills in the volts of the nodes taken out, last one first. */
export function putBack(taken: readonly TakenNode[], volts: Float64Array): void {
  for (let k = taken.length - 1; k >= 0; k -= 1) {
    const out = taken[k];
    if (out === undefined) continue;
    const { node, near, shares } = out;
    let sum = 0;
    for (let m = 0; m < near.length; m += 1) sum += (shares[m] ?? 0) * (volts[near[m] ?? 0] ?? 0);
    volts[node] = sum;
  }
}

/**
 * The same couplings between fewer nodes.
 * @param kept nodes by their old numbers in the order of the new ones; those left out have no couplings any more
 */
export function compact({ size, siemens }: Mesh, kept: readonly number[]): Mesh {
  const mesh = emptyMesh(kept.length);
  kept.forEach((old, k) => kept.forEach((other, m) => (mesh.siemens[k * kept.length + m] = siemens[old * size + other] ?? 0)));
  return mesh;
}
