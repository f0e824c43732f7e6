/** Readings as a person at the bench would take them: a good value for the row, with the instrument of the workshop that reads it best. */
import type { ReadingRow } from '@/flows/machine/rows';
import type { Step } from '@/flows/document/steps';
import { uncertaintyOf } from '@/shared/workings/readingLimit';

import type { DemoInstrument } from './demoInstruments';

export interface DemoReading {
  value: number | 'over';
  typed: string;
  instrument: { id: string; twoPole: boolean; uncertainty: number };
}

/** A value inside the limits of its row; a little off the middle, the same each time for the same row. */
export function goodValue(row: ReadingRow): number {
  const off = 1 + (([...row.id].reduce((sum, letter) => sum + letter.charCodeAt(0), 0) % 9) - 4) * 0.0004;
  if (row.nominal !== null) return significant(row.nominal * off);
  if (row.low !== null && row.high !== null) return significant(((row.low + row.high) / 2) * off);
  return significant((row.low !== null ? row.low * 2 : (row.high ?? 1) * 0.2) * off);
}

/** The reading of `value`; throws when no instrument of the workshop that is in date can take it. */
export function readWith(instruments: readonly DemoInstrument[], step: Step | null, row: ReadingRow, value: number | 'over'): DemoReading {
  const usable = instruments.filter(
    (one) => one.calibratedForDays > 0 && (step?.kind !== 'prove-dead' || one.twoPole) && (step?.kind !== 'prove-insulation' || one.kind === 'insulation-tester' || instruments.length < 3),
  );
  const readings = usable.flatMap((instrument) =>
    instrument.ranges
      .filter((range) => range.quantity === row.quantity && (value === 'over' || Math.abs(value) <= range.fullScale))
      .map((range) => ({ instrument, uncertainty: value === 'over' ? 0 : uncertaintyOf(range, value) })),
  );
  const best = readings.sort((a, b) => a.uncertainty - b.uncertainty)[0];
  if (best === undefined) throw new Error(`no instrument reads ${row.quantity} for “${row.label}”`);
  const { id, twoPole } = best.instrument;
  return { value, typed: value === 'over' ? 'OL' : String(value), instrument: { id, twoPole, uncertainty: best.uncertainty } };
}

function significant(value: number): number {
  return Number(value.toPrecision(4));
}
