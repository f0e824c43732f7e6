/** Sheets by what they answer, in the words in which it is asked at the bench. */
import type { AnySheet } from '@/shared/workings/list';

export interface SheetGroup {
  title: string;
  sheets: readonly AnySheet[];
}

const GROUPS: readonly { title: string; ids: readonly string[] }[] = [
  { title: 'Before the first power', ids: ['series-lamp', 'reforming', 'fuse-inrush', 'wire-drop'] },
  { title: 'Safe to touch', ids: ['bleed-down'] },
  {
    title: 'What should I read',
    ids: [
      'rail-limits',
      'reading-limit',
      'rail-load',
      'rail-load-plan',
      'over-voltage-trip',
      'refit-trip',
      'switching-regulator',
      'smoothing-ripple',
    ],
  },
  { title: 'What is wrong', ids: ['lost-return', 'pass-element', 'junction-test'] },
];
const REST = 'Other workings';

/** Every sheet once; a group that has none is left out, and what no group names stands at the end. */
export function sheetGroups(sheets: readonly AnySheet[]): SheetGroup[] {
  const named = GROUPS.map(({ title, ids }) => ({ title, sheets: ids.flatMap((id) => sheets.find((sheet) => sheet.id === id) ?? []) }));
  const rest = sheets.filter((sheet) => !GROUPS.some(({ ids }) => ids.includes(sheet.id)));
  return [...named, { title: REST, sheets: rest }].filter((group) => group.sheets.length > 0);
}

/** Sheets whose title, question or inputs hold every word of `typed`, in any case. */
export function sheetsFor(sheets: readonly AnySheet[], typed: string): AnySheet[] {
  const words = typed.toLowerCase().split(/\s+/).filter(Boolean);
  return sheets.filter((sheet) => {
    const text = [sheet.title, sheet.question, sheet.id, ...Object.values(sheet.inputs.shape).map((input) => input.meta()?.title ?? '')]
      .join(' ')
      .toLowerCase();
    return words.every((word) => text.includes(word));
  });
}
