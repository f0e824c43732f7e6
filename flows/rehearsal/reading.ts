/** A reading that comes to a wanted result, found by trying and judged as the machine judges it. */
import { classifyReading } from '../machine/classify';
import type { ReadingRow } from '../machine/rows';

export interface GivenReading {
  value: number | 'over';
  /** expanded uncertainty that is given with it, in the unit of the row */
  uncertainty: number;
  falling: boolean;
}

/** What the twin reads in a rehearsal, whatever is read. */
export const TWIN = 1;

/** A reading of this row that is judged `result`, or null where its limits leave none (no upper limit, no sign). */
export function readingGiving(row: ReadingRow, result: string): GivenReading | null {
  const { low, high, nominal } = row;
  // a twin can read anything, so long as there is something to hold the other reading against
  if (row.twin?.is === 'twin') return result === 'in' ? { value: TWIN, uncertainty: TWIN * 1e-6, falling: false } : null;
  const scale = Math.max(Math.abs(low ?? 0), Math.abs(high ?? 0), Math.abs(nominal ?? 0), 1e-12);
  const uncertainty = scale * 1e-6;
  const span = low !== null && high !== null ? high - low : scale;
  const values: (number | 'over')[] = [
    ...(nominal === null ? [] : [nominal]),
    ...(low !== null && high !== null ? [(low + high) / 2] : []),
    ...(high === null ? [] : [high * 0.2, high - span / 2]),
    ...(low === null ? [] : [low * 2, low + span / 2]),
    ...(low === null ? [] : [low]),
    ...(high === null ? [] : [high]),
    ...(low === null ? [] : [low - span, low - scale / 4, low / 2]),
    ...(high === null ? [] : [high + span, high + scale / 4]),
    ...(nominal === null ? [] : [-nominal, nominal / 2, nominal * 2]),
    0,
    'over',
  ];
  for (const falling of result === 'falling' ? [true] : [false]) {
    for (const value of values) if (classifyReading(row, value, uncertainty, falling) === result) return { value, uncertainty, falling };
  }
  return null;
}
