/** The check table that a draft is made from: suspects, checks, and what each suspect would make each check answer. */
import { z } from 'zod';

import { idSchema } from '../document/ids';
import { treeShape } from '../document/tree';

const MODES = treeShape.shape.suspects.element.shape.mode;
const text = (max: number) => z.string().trim().min(1).max(max);
const positive = (what: string, most: number) => z.number({ error: `${what} must be a number` }).positive(`${what} must be more than 0`).max(most);

const shape = z.strictObject({
  format: z.literal(1),
  title: text(80),
  suspects: z.array(z.strictObject({ id: idSchema, part: text(80), mode: MODES, prior: positive('a prior', 1e6) })).min(1).max(200),
  checks: z.array(z.strictObject({ id: idSchema, title: text(80), minutes: positive('the minutes of a check', 600), answers: z.array(z.strictObject({ id: idSchema, label: text(60) })).min(2).max(11) })).max(200),
  /** one row a suspect, one cell a check, in their order: the answer's id, or null where it may be any of them */
  cells: z.array(z.array(idSchema.nullable()).max(200)).max(200),
});

/** A check table, `format: 1`, whose cells fit its suspects and checks. */
export const checkTableSchema = shape.superRefine((table, ctx) => {
  const add = (path: (string | number)[], message: string) => ctx.addIssue({ code: 'custom', path, message });
  once(table.suspects, (i) => add(['suspects', i, 'id'], 'this id is there twice'));
  once(table.checks, (i) => add(['checks', i, 'id'], 'this id is there twice'));
  table.checks.forEach((check, i) => once(check.answers, (j) => add(['checks', i, 'answers', j, 'id'], 'this id is there twice')));
  if (table.cells.length !== table.suspects.length) add(['cells'], `${table.cells.length} rows for ${table.suspects.length} suspects`);
  table.cells.forEach((row, i) => {
    if (row.length !== table.checks.length) add(['cells', i], `${row.length} cells for ${table.checks.length} checks`);
    row.forEach((cell, j) => {
      const check = table.checks[j];
      if (cell !== null && check !== undefined && !check.answers.some((a) => a.id === cell)) add(['cells', i, j], `the check "${check.id}" has no answer "${cell}"`);
    });
  });
});

export type CheckTable = z.infer<typeof checkTableSchema>;

function once(items: readonly { id: string }[], twice: (i: number) => void): void {
  const seen = new Set<string>();
  items.forEach(({ id }, i) => {
    if (seen.has(id)) twice(i);
    seen.add(id);
  });
}
