/** From a check table to an ordered draft: which check first, and after each answer which next. */
import { boundsOf, usefulChecks } from './bounds';
import { solveExactly } from './exact';
import { lookAheadCheck } from './lookAhead';
import { everything, matrixOf, split } from './matrix';
import type { Matrix, Possible } from './matrix';
import type { CheckTable } from './table';

/** A place of the draft: a check with what follows each answer that occurs, or the suspects that are left. */
export type DraftNode = { check: string; minutes: number; answers: { answer: string; next: DraftNode }[] } | { suspects: { id: string; share: number }[] };

export interface DraftReport {
  expectedMinutes: number;
  expectedChecks: number;
  worstMinutes: number;
  /** entropy of the suspects that the checks can tell apart */
  entropyBits: number;
  /** no order of these checks takes less, by the entropy and by the best code */
  bounds: { entropyMinutes: number; huffmanMinutes: number; huffmanChecks: number };
  /** least expected minutes of any order, or null where the table is too large to work it out */
  optimumMinutes: number | null;
  /** how far the draft lies above the optimum, or above the Huffman bound where there is none; 0.05 is 5 % */
  gap: number;
  gapTo: 'optimum' | 'bound';
  /** suspects that no check tells apart */
  groups: string[][];
  /** checks that the draft does not use */
  unused: string[];
}

export interface Draft {
  root: DraftNode;
  report: DraftReport;
}

/** Orders the checks. `exact: false` keeps the exact solver off, also where the table is small enough for it. */
export function draft(table: CheckTable, options: { exact?: boolean } = {}): Draft {
  const matrix = matrixOf(table);
  const all = everything(matrix);
  const solved = options.exact === false ? null : solveExactly(matrix, all);
  const choose = (possible: Possible) => (solved === null ? lookAheadCheck(matrix, possible) : solved(possible).check);
  const sums: Sums = { minutes: 0, checks: 0, worst: 0, used: new Set(), groups: [] };
  const root = grow(table, matrix, all, choose, sums, 0, 0);
  const bounds = boundsOf(matrix, all, usefulChecks(matrix, all));
  const optimumMinutes = solved === null ? null : solved(all).minutes;
  const floor = optimumMinutes ?? bounds.huffmanMinutes;
  return {
    root,
    report: {
      expectedMinutes: sums.minutes,
      expectedChecks: sums.checks,
      worstMinutes: sums.worst,
      entropyBits: bounds.bits,
      bounds: { entropyMinutes: bounds.entropyMinutes, huffmanMinutes: bounds.huffmanMinutes, huffmanChecks: bounds.huffmanChecks },
      optimumMinutes,
      gap: floor > 0 ? Math.max(0, sums.minutes / floor - 1) : 0,
      gapTo: optimumMinutes === null ? 'bound' : 'optimum',
      groups: sums.groups,
      unused: table.checks.filter((c) => !sums.used.has(c.id)).map((c) => c.id),
    },
  };
}

interface Sums {
  minutes: number;
  checks: number;
  worst: number;
  used: Set<string>;
  groups: string[][];
}

function grow(table: CheckTable, matrix: Matrix, possible: Possible, choose: (possible: Possible) => number | null, sums: Sums, spent: number, made: number): DraftNode {
  const at = possible.members.length < 2 ? null : choose(possible);
  const check = at === null ? undefined : table.checks[at];
  const ids = Array.from(possible.members, (m) => table.suspects[m]?.id ?? '');
  if (at === null || check === undefined) {
    possible.weights.forEach((weight) => {
      sums.minutes += weight * spent;
      sums.checks += weight * made;
    });
    sums.worst = Math.max(sums.worst, spent);
    if (ids.length > 1 && !sums.groups.some((g) => g.join() === ids.join())) sums.groups.push(ids);
    return { suspects: ids.map((id, i) => ({ id, share: possible.weights[i] ?? 0 })) };
  }
  sums.used.add(check.id);
  const answers = split(matrix, possible, at).flatMap((branch, a) => {
    const answer = check.answers[a];
    return branch === null || answer === undefined ? [] : [{ answer: answer.id, next: grow(table, matrix, branch, choose, sums, spent + check.minutes, made + 1) }];
  });
  return { check: check.id, minutes: check.minutes, answers };
}
