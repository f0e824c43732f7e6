/**
 * The best order of checks of a small table: dynamic programming over the sets of suspects that are still possible, cut off by the Huffman bound (the
 * AND/OR search of test sequencing; Pattipati and Alexandridis, IEEE Trans. SMC 20(4), 1990).
 */
import { boundsOf } from './bounds';
import { rankChecks } from './lookAhead';
import { split, weightOf } from './matrix';
import type { Matrix, Possible } from './matrix';

export interface Solved {
  /** least expected minutes from here on, weighted like the suspects here */
  minutes: number;
  /** the check to make first, or null where none parts them */
  check: number | null;
}

/** Larger tables are not tried. */
const MOST_SUSPECTS = 24;
/** Cells that are looked at before the search gives up: about a second. */
const MOST_CELLS = 4_000_000;

/** The optimum of every set that an optimal draft comes to, or null when the table is too large. */
export function solveExactly(matrix: Matrix, root: Possible): ((possible: Possible) => Solved) | null {
  if (root.members.length > MOST_SUSPECTS) return null;
  const known = new Map<string, Solved>();
  let cells = 0;
  const solve = (possible: Possible): Solved | null => {
    if (possible.members.length < 2) return { minutes: 0, check: null };
    const name = nameOf(matrix, possible);
    const found = known.get(name);
    if (found !== undefined) return found;
    cells += possible.members.length * matrix.minutes.length * 4;
    if (cells > MOST_CELLS) return null;
    const best = solveAt(matrix, possible, solve);
    if (best !== null) known.set(name, best);
    return best;
  };
  if (solve(root) === null) return null;
  return (possible) => known.get(nameOf(matrix, possible)) ?? { minutes: 0, check: null };
}

function solveAt(matrix: Matrix, possible: Possible, solve: (possible: Possible) => Solved | null): Solved | null {
  const weight = weightOf(possible);
  let best: Solved = { minutes: Infinity, check: null };
  const seen = new Map<string, number>();
  for (const { check } of rankChecks(matrix, possible)) {
    const minutes = matrix.minutes[check] ?? 0;
    const branches = split(matrix, possible, check).filter((b) => b !== null);
    const parting = branches.map((b) => b.members.join(',')).sort().join('|');
    if (matrix.open[check] !== true) {
      // another check that parts them alike and is no dearer has been tried
      if ((seen.get(parting) ?? Infinity) <= minutes) continue;
      seen.set(parting, minutes);
    }
    const least = branches.map((b) => (b.members.length < 2 ? 0 : boundsOf(matrix, b).huffmanMinutes));
    let cost = minutes * weight + least.reduce((sum, l) => sum + l, 0);
    let at = 0;
    for (; at < branches.length && cost < best.minutes - 1e-12; at += 1) {
      const branch = branches[at];
      const solved = branch === undefined ? null : solve(branch);
      if (solved === null) return null;
      cost += solved.minutes - (least[at] ?? 0);
    }
    if (at === branches.length && cost < best.minutes - 1e-12) best = { minutes: cost, check };
  }
  return best.check === null ? { minutes: 0, check: null } : best;
}

function nameOf(matrix: Matrix, possible: Possible): string {
  const members = possible.members.join(',');
  if (!matrix.open.includes(true)) return members;
  return `${members};${possible.asked.join(',')};${Array.from(possible.weights, (w) => w.toPrecision(12)).join(',')}`;
}
