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

/** How volts of nodes taken out follow from those that stayed: one row for each, in the order of their going. */
export interface TakenOut {
  readonly nodes: readonly number[];
  readonly shares: readonly Float64Array[];
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
 * @param mesh is left as it was
 * @param nodes none of them 0 V, each with some coupling
 * @returns a mesh of the same numbering in which those nodes have no part, and how their volts follow
 */
export function takeOut(mesh: Mesh, nodes: readonly number[]): { mesh: Mesh; taken: TakenOut } {
  const { size } = mesh;
  const siemens = mesh.siemens.slice();
  const shares: Float64Array[] = [];
  const near: number[] = [];
  for (const node of nodes) {
    const share = new Float64Array(size);
    const row = node * size;
    let sum = 0;
    near.length = 0;
    for (let j = 0; j < size; j += 1) {
      const g = siemens[row + j] ?? 0;
      if (j === node || g === 0) continue;
      near.push(j);
      sum += g;
    }
    for (const j of near) share[j] = (siemens[row + j] ?? 0) / sum;
    for (const i of near) {
      const g = siemens[row + i] ?? 0;
      for (const j of near) {
        if (j !== i) siemens[i * size + j] = (siemens[i * size + j] ?? 0) + g * (share[j] ?? 0);
      }
    }
    shares.push(share);
    for (const j of near) {
      siemens[row + j] = 0;
      siemens[j * size + node] = 0;
    }
  }
  return { mesh: { size, siemens }, taken: { nodes, shares } };
}

/** Fills in the volts of the nodes taken out, last one first. */
export function putBack({ nodes, shares }: TakenOut, volts: Float64Array): void {
  for (let k = nodes.length - 1; k >= 0; k -= 1) {
    const share = shares[k];
    const node = nodes[k];
    if (share === undefined || node === undefined) continue;
    let sum = 0;
    for (let j = 0; j < share.length; j += 1) {
      const part = share[j] ?? 0;
      if (part !== 0) sum += part * (volts[j] ?? 0);
    }
    volts[node] = sum;
  }
}
