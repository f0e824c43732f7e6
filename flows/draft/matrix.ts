/** A check table as numbers, and the sets of suspects that answers part it into. */
import type { CheckTable } from './table';

/** `answer[check][suspect]` is the index of the expected answer, -1 where it may be any. */
export interface Matrix {
  suspects: number;
  priors: Float64Array;
  minutes: Float64Array;
  answers: Int32Array[];
  /** number of answers of each check */
  arity: number[];
  /** checks with a cell that may be any answer: they may not be asked twice on one way */
  open: boolean[];
}

/** Suspects that are still possible, with the prior of each that comes here; `asked` are the open checks used on the way. */
export interface Possible {
  members: Int32Array;
  weights: Float64Array;
  asked: readonly number[];
}

/** The table's numbers; priors are brought to a sum of 1. */
export function matrixOf(table: CheckTable): Matrix {
  const total = table.suspects.reduce((sum, s) => sum + s.prior, 0);
  const answers = table.checks.map((check, j) => {
    const index = new Map(check.answers.map((a, i) => [a.id, i]));
    return Int32Array.from(table.cells, (row) => {
      const cell = row[j];
      return cell == null ? -1 : (index.get(cell) ?? -1);
    });
  });
  return {
    suspects: table.suspects.length,
    priors: Float64Array.from(table.suspects, (s) => s.prior / total),
    minutes: Float64Array.from(table.checks, (c) => c.minutes),
    answers,
    arity: table.checks.map((c) => c.answers.length),
    open: answers.map((column) => column.includes(-1)),
  };
}

/** Every suspect with its prior, nothing asked. */
export function everything(matrix: Matrix): Possible {
  return { members: Int32Array.from({ length: matrix.suspects }, (_, i) => i), weights: matrix.priors, asked: [] };
}

/** Sum of the weights that come to this place. */
export function weightOf(possible: Possible): number {
  return possible.weights.reduce((sum, w) => sum + w, 0);
}

/** Whether two of the suspects surely answer the check differently, and it may be asked here. */
export function parts(matrix: Matrix, possible: Possible, check: number): boolean {
  const column = matrix.answers[check];
  if (column === undefined || (matrix.open[check] === true && possible.asked.includes(check))) return false;
  let first = -1;
  for (const member of possible.members) {
    const answer = column[member] ?? -1;
    if (answer === -1) continue;
    if (first === -1) first = answer;
    else if (answer !== first) return true;
  }
  return false;
}

/** Where each answer of a check leads; null for an answer that none of them gives. A suspect that may give any answer goes each way with an equal share. */
export function split(matrix: Matrix, possible: Possible, check: number): (Possible | null)[] {
  const column = matrix.answers[check] ?? new Int32Array();
  const arity = matrix.arity[check] ?? 0;
  const asked = matrix.open[check] === true ? [...possible.asked, check].sort((a, b) => a - b) : possible.asked;
  const members: number[][] = Array.from({ length: arity }, () => []);
  const weights: number[][] = Array.from({ length: arity }, () => []);
  possible.members.forEach((member, i) => {
    const answer = column[member] ?? -1;
    const weight = possible.weights[i] ?? 0;
    for (let a = answer === -1 ? 0 : answer; a < (answer === -1 ? arity : answer + 1); a += 1) {
      members[a]?.push(member);
      weights[a]?.push(answer === -1 ? weight / arity : weight);
    }
  });
  return members.map((some, a) => (some.length === 0 ? null : { members: Int32Array.from(some), weights: Float64Array.from(weights[a] ?? []), asked }));
}

/** Bits that a check is expected to tell of the suspects here, times their weight: no set is made for it. */
export function gainBits(matrix: Matrix, possible: Possible, check: number, scratch: Float64Array): number {
  const column = matrix.answers[check] ?? new Int32Array();
  const arity = matrix.arity[check] ?? 0;
  scratch.fill(0, 0, arity + 1);
  let unsure = 0;
  for (let i = 0; i < possible.members.length; i += 1) {
    const answer = column[possible.members[i] ?? 0] ?? -1;
    const weight = possible.weights[i] ?? 0;
    if (answer === -1) unsure += weight;
    else scratch[answer] = (scratch[answer] ?? 0) + weight;
  }
  let total = 0;
  let sum = 0;
  for (let a = 0; a < arity; a += 1) {
    const w = (scratch[a] ?? 0) + unsure / arity;
    total += w;
    if (w > 0) sum += w * Math.log2(w);
  }
  // entropy of the answers, less what stays open of those that may give any
  return total > 0 ? total * Math.log2(total) - sum - unsure * Math.log2(arity) : 0;
}
