/** The first thing that keeps a sheet from its answer, in a sentence. */
import type { SheetPart } from '@/shared/ui/screens/workings/sheetPart';

/** Null where nothing is wrong. Which field it is stands in front where the sentence does not name it; a cell of a list is named by its row. */
export function faultWords({ parts, errors }: { parts: readonly SheetPart[]; errors: Readonly<Record<string, string>> }): string | null {
  const [key, say] = Object.entries(errors)[0] ?? [];
  if (key === undefined || say === undefined) return null;
  const [name, row, column] = key.split('.');
  const part = parts.find((p) => p.name === name);
  if (part === undefined) return say;
  if (part.kind !== 'rows') return named(part.title, say);
  if (row === undefined) return named(part.title, say);
  const where = `${part.rowName.slice(0, 1).toUpperCase()}${part.rowName.slice(1)} ${Number(row) + 1}`;
  if (say.startsWith(where)) return say;
  const field = part.columns.find((c) => c.name === column);
  return field === undefined ? `${where}: ${say}` : `${where}: ${named(field.title, say)}`;
}

function named(title: string, say: string): string {
  return say.toLowerCase().includes(title.toLowerCase()) ? say : `${title}: ${say}`;
}
