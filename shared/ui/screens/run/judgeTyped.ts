/** What a typed reading comes to before it is sent: understood or asked back, its verdict named. Pure. */
import { classifyReading } from '@/flows/machine/classify';
import type { ReadingRow } from '@/flows/machine/rows';
import type { Instrument, InstrumentRange } from '@/shared/contract/instruments';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { parseReading } from '@/shared/quantity/parseReading';
import type { ReadingChoice } from '@/shared/quantity/parseReading';
import { QUANTITIES } from '@/shared/quantity/quantities';
import { uncertaintyOf } from '@/shared/workings/readingLimit';
import type { VerdictMark } from '@/shared/ui/components/Verdict';
import { rangeFor } from '@/shared/ui/screens/run/meters';

export interface TypedVerdict {
  mark: VerdictMark;
  word: string;
  note: string;
}

export interface Typed {
  value: number | 'over' | null;
  /** as it was understood, `4.31 V`; null while it is not */
  echo: string | null;
  /** expanded uncertainty in SI */
  uncertainty: number;
  range: InstrumentRange | null;
  /** true when the engine would call it falling-capable: above the dead limit of a part that may still discharge */
  high: boolean;
  verdict: TypedVerdict | null;
  /** what to mend; null while nothing is typed */
  fault: string | null;
  /** the readings that an ambiguous entry could mean */
  choices: readonly ReadingChoice[];
  /** asked once before it is recorded: a reading that is more often a slip than true */
  doubt: string | null;
}

const NOTHING: Typed = {
  value: null,
  echo: null,
  uncertainty: 0,
  range: null,
  high: false,
  verdict: null,
  fault: null,
  choices: [],
  doubt: null,
};

/** Reads what was typed at a row, with the instrument in use. `live` is true where a source is in. */
export function judgeTyped(row: ReadingRow, text: string, instrument: Instrument | null, live: boolean): Typed {
  if (text.trim() === '') return NOTHING;
  const parsed = parseReading(text, { quantity: row.quantity });
  if (!parsed.ok) return { ...NOTHING, fault: parsed.say, choices: parsed.choices };
  if (instrument === null) return { ...NOTHING, echo: parsed.echo, fault: 'Choose the instrument first.' };
  if (parsed.kind === 'over-range') return over(row, parsed.echo);
  const { value, echo } = parsed;
  const range = rangeFor(instrument, row.quantity, value);
  if (range === null)
    return { ...NOTHING, fault: `${echo} lies beyond the largest range of ${instrument.tag}. Enter OL, or take another instrument.` };
  const uncertainty = uncertaintyOf(range, value);
  const result = classifyReading(row, value, uncertainty, false);
  return {
    ...NOTHING,
    value,
    echo,
    uncertainty,
    range,
    high: result === 'high',
    verdict: verdictOf(row, value, uncertainty, result),
    doubt: doubtOf(row, value, echo, live),
  };
}

const TWIN_READ = 'the other one is held against it';

/** Over range, from the entry or from its button. */
export function over(row: ReadingRow, echo = 'over range'): Typed {
  const result = classifyReading(row, 'over', 0, false);
  const verdict: TypedVerdict =
    result === 'in'
      ? {
          mark: 'in',
          word: row.twin?.is === 'twin' ? 'Read' : 'In',
          note:
            row.twin === undefined
              ? 'over range, and only a lower limit is asked'
              : row.twin.is === 'twin'
                ? TWIN_READ
                : 'over range, as its twin is',
        }
      : { mark: 'out', word: 'High', note: 'over range' };
  return { ...NOTHING, value: 'over', echo, high: result === 'high', verdict };
}

function verdictOf(row: ReadingRow, value: number, uncertainty: number, result: string): TypedVerdict {
  const { unit } = QUANTITIES[row.quantity];
  const print = (n: number) => formatQuantity(n, unit, { digits: 3 });
  const size = row.bySize ? Math.abs(value) : value;
  const beyond = row.high !== null && size > row.high ? size - row.high : row.low !== null && size < row.low ? row.low - size : 0;
  if (row.twin?.is === 'twin') return { mark: 'in', word: 'Read', note: TWIN_READ };
  if (row.plain)
    return result === 'in'
      ? { mark: 'in', word: 'Dead', note: `at or below ${print(row.high ?? 0)}` }
      : { mark: 'out', word: 'Not dead', note: `above ${print(row.high ?? 0)}` };
  switch (result) {
    case 'cannot':
      return { mark: 'close', word: 'Cannot tell', note: 'the twin reads nothing, so there is no share of it' };
    case 'in':
      return { mark: 'in', word: 'In', note: `clear of the limit (± ${print(uncertainty)})` };
    case 'close':
      return {
        mark: 'close',
        word: beyond > 0 ? 'Out, but close' : 'In, but close',
        note: `the meter’s ± ${print(uncertainty)} cannot tell`,
      };
    case 'reversed':
      return { mark: 'out', word: 'Reversed', note: 'the sign is the wrong way round: leads, or the rail itself' };
    default:
      return {
        mark: 'out',
        word: result === 'low' ? 'Low' : 'High',
        note: Number.isFinite(beyond) ? `${print(beyond)} beyond the limit` : 'its twin is over range',
      };
  }
}

/** How many times a limit a reading may be before it is asked whether it is true. */
const FAR = 20;

function doubtOf(row: ReadingRow, value: number, echo: string, live: boolean): string | null {
  if (value === 0 && live) return 'Exactly 0 on a live bench: do the probes touch, and is the meter on the right range?';
  const most = Math.max(Math.abs(row.high ?? 0), Math.abs(row.low ?? 0));
  const volts = row.quantity === 'volts-dc' || row.quantity === 'volts-ac';
  return volts && !row.plain && most > 0 && Math.abs(value) > FAR * most
    ? `${echo} is more than ${FAR} times what is expected here. Is it what the meter shows?`
    : null;
}

/** Limits in words: `4.75 V to 5.25 V`, `at most 150 mΩ`. */
export function limitWords(row: ReadingRow): string {
  const { unit } = QUANTITIES[row.quantity];
  const print = (n: number) => formatQuantity(n, unit, { digits: 4 });
  if (row.twin?.is === 'twin') return 'none: it is what the next one is held against';
  if (row.low === Infinity) return 'over range, as its twin';
  if (row.low !== null && row.high !== null) {
    const [near, far] = Math.abs(row.low) <= Math.abs(row.high) ? [row.low, row.high] : [row.high, row.low];
    return `${print(near)} to ${print(far)}`;
  }
  if (row.high !== null) return `at most ${print(row.high)}`;
  return row.low === null ? 'no limit' : `at least ${print(row.low)}`;
}
