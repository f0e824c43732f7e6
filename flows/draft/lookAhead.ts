/** A good order of checks for tables of any size: most bits a minute, bettered by looking ahead. */
import { gainBits, parts, split, weightOf } from './matrix';
import type { Matrix, Possible } from './matrix';

/** Up to so many suspects checks are tried two deep, above it one deep. */
const SMALL = 16;
/** Cells that may be looked at for one choice: it says how many of the most telling checks are tried. */
const CELLS = { one: 2_000_000, two: 60_000 };
const FEWEST_TRIED = 3;

interface Ranked {
  check: number;
  bitsPerMinute: number;
}

/** Checks that part the suspects here, by expected bits a minute (weights of this place), best first; equal ones in the order of the table. */
export function rankChecks(matrix: Matrix, possible: Possible): Ranked[] {
  const scratch = new Float64Array(16);
  const ranked: Ranked[] = [];
  for (let check = 0; check < matrix.minutes.length; check += 1) {
    if (!parts(matrix, possible, check)) continue;
    ranked.push({ check, bitsPerMinute: gainBits(matrix, possible, check, scratch) / (matrix.minutes[check] ?? 1) });
  }
  return ranked.sort((a, b) => b.bitsPerMinute - a.bitsPerMinute || a.check - b.check);
}

/** Expected minutes from here on, weighted like the suspects here, when always the check with most bits a minute is taken. */
export function greedyMinutes(matrix: Matrix, possible: Possible): number {
  if (possible.members.length < 2) return 0;
  if (possible.members.length === 2) return cheapestParting(matrix, possible) * weightOf(possible);
  const scratch = new Float64Array(16);
  let best = -1;
  let most = -1;
  for (let check = 0; check < matrix.minutes.length; check += 1) {
    const rate = gainBits(matrix, possible, check, scratch) / (matrix.minutes[check] ?? 1);
    if (rate > most + 1e-15 && parts(matrix, possible, check)) {
      most = rate;
      best = check;
    }
  }
  if (best === -1) return 0;
  return split(matrix, possible, best).reduce((sum, branch) => sum + (branch === null ? 0 : greedyMinutes(matrix, branch)), (matrix.minutes[best] ?? 0) * weightOf(possible));
}

/** The check to make here, or null when none parts the suspects: each candidate is tried, and what follows it is taken to be ordered as one that looks less far would. */
export function lookAheadCheck(matrix: Matrix, possible: Possible): number | null {
  const { length } = possible.members;
  const cells = length * matrix.minutes.length;
  const deep = length <= SMALL;
  const width = deep ? Math.sqrt(CELLS.two / cells) : CELLS.one / (cells * Math.log2(length));
  return tried(matrix, possible, deep ? 2 : 1, Math.max(FEWEST_TRIED, Math.floor(width)))?.check ?? null;
}

function tried(matrix: Matrix, possible: Possible, depth: number, width: number): { check: number; minutes: number } | null {
  const candidates = rankChecks(matrix, possible).slice(0, width);
  const weight = weightOf(possible);
  let best: { check: number; minutes: number } | null = null;
  for (const { check } of candidates) {
    let minutes = (matrix.minutes[check] ?? 0) * weight;
    for (const branch of split(matrix, possible, check)) {
      if (branch !== null && branch.members.length > 1) minutes += depth > 1 ? (tried(matrix, branch, depth - 1, width)?.minutes ?? 0) : greedyMinutes(matrix, branch);
      if (best !== null && minutes >= best.minutes) break;
    }
    if (best === null || minutes < best.minutes - 1e-12) best = { check, minutes };
  }
  return best;
}

/** Of two suspects every check that parts them tells the same: the cheapest will do. 0 where none does. */
function cheapestParting(matrix: Matrix, possible: Possible): number {
  const [a = 0, b = 0] = possible.members;
  let least = Infinity;
  for (let check = 0; check < matrix.minutes.length; check += 1) {
    const minutes = matrix.minutes[check] ?? 0;
    const column = matrix.answers[check];
    if (minutes >= least || column === undefined || column[a] === column[b] || column[a] === -1 || column[b] === -1) continue;
    if (matrix.open[check] === true && possible.asked.includes(check)) continue;
    least = minutes;
  }
  return Number.isFinite(least) ? least : 0;
}
