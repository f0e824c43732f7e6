/** The readings of a record with the limits that they were judged by. */
import { QUANTITIES } from '@/flows/document/ids';
import { classifyReading } from '@/flows/machine/classify';
import type { Instrument } from '@/shared/contract/instruments';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Unit } from '@/shared/quantity/units';
import type { VerdictMark } from '@/shared/ui/components/Verdict';
import type { ReplayedEntry } from '@/shared/ui/screens/records/replayRecord';
import { decide } from '@/shared/workings/readingLimit';

export interface ReadingLine {
  id: string;
  seq: number;
  /** stud of the step and its title */
  step: string;
  label: string;
  unit: Unit;
  value: number | 'over';
  /** as printed, with its unit */
  reading: string;
  /** as typed at the bench */
  typed: string;
  low: number | null;
  high: number | null;
  nominal: number | null;
  guard: number;
  /** place of the needle: by size where the row is judged by size */
  needle: number | null;
  mark: VerdictMark;
  /** as "in", "in, but close", "low" */
  verdict: string;
  /** judged by a plain "at most": discharging and proving dead */
  plain: boolean;
  /** true where it lies outside its limits, close or not */
  out: boolean;
  instrument: string | null;
  at: string;
}

type Verdict = Pick<ReadingLine, 'mark' | 'verdict' | 'out'>;

const WORDS: Readonly<Record<string, Verdict>> = {
  in: { mark: 'in', verdict: 'in', out: false },
  low: { mark: 'out', verdict: 'low', out: true },
  high: { mark: 'out', verdict: 'high', out: true },
  reversed: { mark: 'out', verdict: 'reversed', out: true },
  falling: { mark: 'unsure', verdict: 'a charge that falls', out: false },
};

const TWIN_READ: Verdict = { mark: 'none', verdict: 'read: the other is held against it', out: false };

/** One line for each reading entry that could be played, in their order. */
export function readingsOf(entries: readonly ReplayedEntry[]): ReadingLine[] {
  return entries.flatMap(({ entry, event, before }) => {
    if (event?.type !== 'READING' || before === null) return [];
    const row = before.rows.find((r) => r.row.id === event.row)?.row;
    if (row?.ask !== 'reading') return [];
    const unit: Unit = QUANTITIES[row.quantity];
    const uncertainty = event.instrument?.uncertainty ?? 0;
    const guard = row.plain ? 0 : Math.hypot(uncertainty, row.twin?.is === 'like' ? row.twin.uncertainty : 0);
    const result = classifyReading(row, event.value, uncertainty, event.falling === true);
    const size = event.value === 'over' ? Infinity : row.bySize ? Math.abs(event.value) : event.value;
    const said: Verdict =
      row.twin?.is === 'twin'
        ? TWIN_READ
        : result === 'close'
          ? decide(size, row, guard) === 'close-in'
            ? { mark: 'close', verdict: 'in, but close', out: false }
            : { mark: 'close', verdict: 'out, but close', out: true }
          : (WORDS[result] ?? { mark: 'none', verdict: result, out: false });
    return [
      {
        id: entry.id,
        seq: entry.seq,
        step: `${before.stud} ${before.title}`.trim(),
        label: row.label,
        unit,
        value: event.value,
        reading: event.value === 'over' ? 'over range' : formatQuantity(event.value, unit, { digits: 4 }),
        typed: event.typed,
        low: finite(row.low),
        high: finite(row.high),
        nominal: row.nominal,
        guard,
        needle: size,
        plain: row.plain,
        instrument: event.instrument?.id ?? null,
        at: entry.at,
        ...said,
      },
    ];
  });
}

/** A twin that is over range leaves no limit that a scale can show. */
function finite(limit: number | null): number | null {
  return limit !== null && Number.isFinite(limit) ? limit : null;
}

/** True when a reading was taken after the last day on which its instrument might be used. */
export function isOutOfDate(line: Pick<ReadingLine, 'instrument' | 'at'>, instruments: readonly Instrument[]): boolean {
  const instrument = instruments.find((i) => i.id === line.instrument);
  // both are written year first, so that their letters sort as their days do
  return instrument !== undefined && line.at.slice(0, 10) > instrument.calibratedUntil;
}
