/** One row of a list on a line. */
import { choiceWords } from '@/shared/ui/screens/workings/choiceWords';
import type { SheetList, SheetTexts } from '@/shared/ui/screens/workings/sheetPart';
import { cellName } from '@/shared/ui/screens/workings/sheetRows';

/** Its name, or its place where it has none, and what else is typed, each with its unit. */
export function rowWords(list: SheetList, row: number, texts: SheetTexts): { title: string; detail: string } {
  const filled = list.columns.flatMap((column) => {
    const text = (texts[cellName(list, row, column)] ?? '').trim();
    if (text === '') return [];
    const words =
      column.choices === null ? `${text}${column.unit === null || text.endsWith(column.unit) ? '' : ` ${column.unit}`}` : choiceWords(text);
    return [{ column, words }];
  });
  const [first, ...rest] = filled;
  const named = first?.column.kind === 'text';
  return {
    title: named ? first.words : `${list.rowName} ${row + 1}`,
    detail: (named ? rest : filled).map(({ column, words }) => `${column.title.toLowerCase()} ${words}`).join(', '),
  };
}
