/** One reading of a record in a line. Pure. */
import type { Program } from '@/flows/machine/compile';
import type { RecordEntry } from '@/shared/record/recordEntry';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { QUANTITIES } from '@/shared/quantity/quantities';
import { eventOf } from '@/shared/ui/api/ledger';
import { clockWords } from '@/shared/ui/screens/shell/dateWords';

/** Where it was read, as the restorer was asked for it, and what was read. */
export function readingWords({ layout }: Program, entry: RecordEntry): { name: string; value: string } {
  const event = eventOf(entry);
  if (event?.type !== 'READING') return { name: `Entry ${entry.seq}`, value: '' };
  const placed = layout.steps.get(event.step);
  const row = placed?.rows.find((r) => r.id === event.row);
  const value =
    event.value === 'over'
      ? 'over range'
      : row?.ask === 'reading'
        ? formatQuantity(event.value, QUANTITIES[row.quantity].unit)
        : event.typed;
  return { name: `${row?.label ?? event.row} (${placed?.step.title ?? event.step}, ${clockWords(entry.at)})`, value };
}
