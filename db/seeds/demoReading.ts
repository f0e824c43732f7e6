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

/** A number from 0 to 1 that is the same each time for the same text, and looks like none in particular. */
export function scatter(text: string): number {
  const mixed = [...text].reduce((sum, letter) => (Math.imul(sum ^ letter.charCodeAt(0), 16_777_619) >>> 0), 2_166_136_261);
  return (mixed % 1000) / 999;
}

/** Share of its distance to the nearest limit by which a good reading may lie off the middle. */
const SCATTER_SHARE = 0.3;

/** A value well inside the limits of its row, a little off the middle; the same each time for the same row and salt. */
export function goodValue(row: ReadingRow, salt = ''): number {
  // a dead circuit reads next to nothing, whatever its limit allows
  if (row.plain) return significant((row.high ?? 1) * 0.01 * scatter(`${salt}/${row.id}`));
  const off = (scatter(`${salt}/${row.id}`) - 0.5) * 2 * SCATTER_SHARE;
  if (row.twin?.is === 'twin') return significant(0.6 * (1 + off * 0.02));
  if (row.low !== null && row.high !== null) {
    const middle = row.nominal ?? (row.low + row.high) / 2;
    return significant(middle + off * Math.min(row.high - middle, middle - row.low));
  }
  return significant((row.low !== null ? row.low * 3 : (row.high ?? 1) * 0.2) * (1 + off));
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
