/** One reading of a record in a line. Pure. */
import type { RecordEntry } from '@/shared/record/recordEntry';
import { clockWords } from '@/shared/ui/screens/shell/dateWords';

/** Which step and row, and what was typed there. */
export function readingWords(entry: RecordEntry): { name: string; value: string } {
  const { event, title } = entry.body as { event?: { row?: unknown; typed?: unknown; value?: unknown }; title?: unknown };
  const row = typeof event?.row === 'string' && event.row !== 'reading' ? `, ${event.row}` : '';
  const typed = event?.value === 'over' ? 'over range' : typeof event?.typed === 'string' ? event.typed : '';
  return { name: `${entry.seq} · ${clockWords(entry.at)} · ${typeof title === 'string' ? title : ''}${row}`, value: typed };
}
