/** The reading that is being taken, for the workings of the step. Pure. */
import type { ReadingRow } from '@/flows/machine/rows';
import type { ReadingNow } from '@/flows/machine/stepWorkings';
import type { Instrument } from '@/shared/contract/instruments';
import type { Typed } from '@/shared/ui/screens/run/judgeTyped';
import { rangeFor } from '@/shared/ui/screens/run/meters';

/** Null where no instrument is chosen or it does not reach the limits. Without a reading the range is the one that the limits want. */
export function readingNow(row: ReadingRow, typed: Pick<Typed, 'value' | 'range'>, instrument: Instrument | null): ReadingNow | null {
  if (instrument === null || (row.low === null && row.high === null)) return null;
  const range = typed.range ?? rangeFor(instrument, row.quantity, Math.max(Math.abs(row.low ?? 0), Math.abs(row.high ?? 0)));
  if (range === null) return null;
  const { percent, counts, resolution } = range;
  const value = typeof typed.value === 'number' ? (row.bySize ? Math.abs(typed.value) : typed.value) : null;
  return { row: row.id, quantity: row.quantity, low: row.low, high: row.high, accuracy: { percent, counts, resolution }, value };
}
