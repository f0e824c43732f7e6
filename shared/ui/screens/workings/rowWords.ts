/** One row of a list on a line. */
import { choiceWords } from '@/shared/ui/screens/workings/choiceWords';
import type { SheetList, SheetTexts } from '@/shared/ui/screens/workings/sheetPart';
import { cellName } from '@/shared/ui/screens/workings/sheetRows';

/** Its name, or its place where it has none, and what else is typed, each with its unit. */
export function rowWords(list: SheetList, row: number, texts: SheetTexts, echoes: SheetTexts = {}): { title: string; detail: string } {
  const filled = list.columns.flatMap((column) => {
    const key = cellName(list, row, column);
    const text = (texts[key] ?? '').trim();
    if (text === '') return [];
    // as it was understood, where it was
    const echo = echoes[key];
    if (echo !== undefined && echo !== '') return [{ column, words: echo }];
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
