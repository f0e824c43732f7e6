/** Check tables for tests, from bare figures and from a seed. */
import { checkTableSchema } from '@/flows/draft/table';
import type { CheckTable } from '@/flows/draft/table';

/** A table from rows of figures: one row a suspect, one figure a check (null: any answer). */
export function tableOf(cells: (number | null)[][], priors: number[], minutes?: number[]): CheckTable {
  const checks = cells[0]?.length ?? 0;
  const most = Math.max(1, ...cells.flat().map((c) => c ?? 0));
  return checkTableSchema.parse({
    format: 1,
    title: 'Table of a test',
    suspects: priors.map((prior, i) => ({ id: `s${i}`, part: `Part ${i}`, mode: 'open', prior })),
    checks: Array.from({ length: checks }, (_, j) => ({ id: `t${j + 1}`, title: `Check ${j + 1}`, minutes: minutes?.[j] ?? 1, answers: Array.from({ length: most + 1 }, (_a, a) => ({ id: `a${a}`, label: String(a) })) })),
    cells: cells.map((row) => row.map((c) => (c === null ? null : `a${c}`))),
  });
}

/** Figures from 0 up to 1, the same for the same seed (a linear congruential generator; constants of Numerical Recipes, from memory). */
export function figures(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

/** A random table of yes and no. */
export function randomTable(seed: number, suspects: number, checks: number, dearest = 10): CheckTable {
  const next = figures(seed);
  for (let i = 0; i < 8; i += 1) next();
  const cells = Array.from({ length: suspects }, () => Array.from({ length: checks }, () => (next() < 0.5 ? 0 : 1)));
  return tableOf(cells, Array.from({ length: suspects }, () => 0.05 + next()), Array.from({ length: checks }, () => 1 + Math.floor(next() * dearest)));
}
