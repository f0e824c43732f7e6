/** The rows of a list in a form, as texts: counting, adding and taking out. */
import type { SheetField, SheetList, SheetTexts } from '@/shared/ui/screens/workings/sheetPart';

/** Name under which a cell is typed: `rails.0.volts`. */
export function cellName(list: Pick<SheetList, 'name'>, row: number, column: Pick<SheetField, 'name'>): string {
  return `${list.name}.${row}.${column.name}`;
}

/** Rows of a list, never more than the sheet takes. */
export function rowCount({ name, most }: Pick<SheetList, 'name' | 'most'>, texts: SheetTexts): number {
  const count = Number(texts[name] ?? 0);
  return Number.isInteger(count) && count > 0 ? Math.min(count, most) : 0;
}

/** One row more, alike the last in what is chosen and empty in what is typed. */
export function withRow(list: SheetList, texts: SheetTexts): Record<string, string> {
  const count = rowCount(list, texts);
  if (count >= list.most) return { ...texts };
  const fresh = list.columns.map((column): [string, string] => {
    const above = count > 0 ? texts[cellName(list, count - 1, column)] : undefined;
    return [cellName(list, count, column), column.choices === null ? '' : (above ?? column.choices[0] ?? '')];
  });
  return { ...texts, ...Object.fromEntries(fresh), [list.name]: String(count + 1) };
}

/** Without that row; the rows below it move up. */
export function withoutRow(list: SheetList, texts: SheetTexts, gone: number): Record<string, string> {
  const count = rowCount(list, texts);
  if (gone < 0 || gone >= count) return { ...texts };
  const next: Record<string, string> = { ...texts, [list.name]: String(count - 1) };
  for (const column of list.columns) {
    for (let row = gone; row < count - 1; row += 1) next[cellName(list, row, column)] = texts[cellName(list, row + 1, column)] ?? '';
    delete next[cellName(list, count - 1, column)];
  }
  return next;
}
