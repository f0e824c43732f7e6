/** What a reviewer looks at first in a record. */
import type { Instrument } from '@/shared/contract/instruments';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Settings } from '@/flows/document/settings';
import { isOutOfDate, readingsOf } from '@/shared/ui/screens/records/readingsOf';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';
import type { ReplayedEntry } from '@/shared/ui/screens/records/replayRecord';

export type ExceptionKind = 'stopped' | 'out' | 'close' | 'hold-refused' | 'unsure' | 'instrument' | 'lapsed' | 'hurried' | 'other';

export interface RecordException {
  kind: ExceptionKind;
  /** the entry that it leads to */
  entry: string;
  seq: number;
  title: string;
  detail: string;
}

/** An answer sooner than this after the one before cannot have been looked for. */
const SOONEST_MS = 1500;

const ORDER: readonly ExceptionKind[] = ['stopped', 'out', 'hold-refused', 'close', 'instrument', 'unsure', 'lapsed', 'other', 'hurried'];

/**
 * The exceptions of a record, the gravest kind first, in the order of the entries within a kind. Neighbours of one kind that
 * say the same are told once, with their number.
 */
export function exceptionsOf(
  entries: readonly ReplayedEntry[],
  instruments: readonly Instrument[],
  settings: Pick<Settings, 'deadLapseMinutes'>,
): RecordException[] {
  const found = [...readings(readingsOf(entries), instruments), ...words(entries, settings), ...hurried(entries)];
  return found.sort((a, b) => ORDER.indexOf(a.kind) - ORDER.indexOf(b.kind) || a.seq - b.seq);
}

function readings(lines: readonly ReadingLine[], instruments: readonly Instrument[]): RecordException[] {
  const found: RecordException[] = [];
  for (const line of lines) {
    const at = { entry: line.id, seq: line.seq };
    if (line.mark === 'out' || line.mark === 'close')
      found.push({ ...at, kind: line.mark, title: `${line.label}: ${line.verdict}`, detail: `${line.reading}${marginWords(line)}` });
  }
  for (const instrument of instruments) {
    const late = lines.filter((line) => line.instrument === instrument.id && isOutOfDate(line, [instrument]));
    const first = late[0];
    if (first)
      found.push({
        kind: 'instrument',
        entry: first.id,
        seq: first.seq,
        title: `${instrument.name} was out of date`,
        detail: `calibrated until ${instrument.calibratedUntil}; ${late.length} ${late.length === 1 ? 'reading' : 'readings'}`,
      });
  }
  return found;
}

/** `, 0.03 V inside its limit, meter ± 0.05 V`. */
function marginWords({ needle, low, high, unit, guard }: ReadingLine): string {
  if (needle === null || !Number.isFinite(needle)) return '';
  const inside = Math.min(low === null ? Infinity : needle - low, high === null ? Infinity : high - needle);
  if (!Number.isFinite(inside)) return '';
  const meter = guard > 0 ? `, meter ± ${formatQuantity(guard, unit, { digits: 2 })}` : '';
  return `, ${formatQuantity(Math.abs(inside), unit, { digits: 2 })} ${inside < 0 ? 'outside' : 'inside'} its limit${meter}`;
}

const UNSURE: Readonly<Record<string, string>> = { 'not-sure': 'not sure', cannot: 'cannot', 'not-out': 'not out' };

function words(entries: readonly ReplayedEntry[], { deadLapseMinutes }: Pick<Settings, 'deadLapseMinutes'>): RecordException[] {
  return entries.flatMap(({ entry, event, before, after }): RecordException[] => {
    const at = { entry: entry.id, seq: entry.seq };
    const place = before?.title ?? String(entry.body['title'] ?? 'a step');
    switch (entry.kind) {
      case 'stopped':
        return [{ ...at, kind: 'stopped', title: event?.type === 'ABORT' ? 'Broken off' : 'Stop pressed', detail: `at “${place}”` }];
      case 'closed':
        return entry.body['by'] === 'senior' ? [{ ...at, kind: 'stopped', title: 'Closed by a senior: it could not go on', detail: `“${String(entry.body['reason'])}”` }] : [];
      case 'hold-refused':
        return [
          { ...at, kind: 'hold-refused', title: 'Hold refused', detail: event?.type === 'HOLD_REFUSED' ? `“${event.reason}”` : place },
        ];
      case 'lapsed':
        // time alone that changes nothing is no lapse
        if (event?.type === 'TICK' && before?.band === after?.band) return [];
        return [
          {
            ...at,
            kind: 'lapsed',
            title: event?.type === 'RESTART' ? 'The page was loaded anew' : '“Proved dead” lapsed',
            detail:
              event?.type === 'RESTART'
                ? `at “${place}”; everything proved was taken back`
                : `after ${deadLapseMinutes} min, at “${place}”`,
          },
        ];
      case 'deviation':
      case 'conflict':
      case 'correction':
      case 'handed-over':
      case 'taken-over':
        return [
          {
            ...at,
            kind: 'other',
            title: {
              deviation: 'Deviation',
              conflict: 'Conflict',
              correction: 'Reading corrected',
              'handed-over': 'Handed over',
              'taken-over': 'Taken over',
            }[entry.kind],
            detail: `at “${place}”`,
          },
        ];
      default: {
        const word = event?.type === 'ROW' ? event.word : event?.type === 'ANSWER' ? event.answer : null;
        const said = word === null ? undefined : UNSURE[word];
        if (said === undefined) return [];
        const row = event?.type === 'ROW' ? before?.rows.find((r) => r.row.id === event.row)?.row.label : undefined;
        return [{ ...at, kind: 'unsure', title: `Answered “${said}”`, detail: row ? `${row}, at “${place}”` : `at “${place}”` }];
      }
    }
  });
}

const BY_HAND = ['ROW', 'READING', 'ANSWER', 'PHOTO', 'WARNING_READ'];

/** Answers that came sooner than the act can be done; a row of them is told once. */
function hurried(entries: readonly ReplayedEntry[]): RecordException[] {
  const found: (RecordException & { count: number; last: number; place: string; soonestMs: number })[] = [];
  const played = entries.filter((e) => e.event !== null && e.event.type !== 'NOTE');
  played.forEach((here, i) => {
    const earlier = played[i - 1];
    if (!here.event || !earlier?.event || !BY_HAND.includes(here.event.type)) return;
    const same = here.event.boot === earlier.event.boot;
    const ms = same ? here.event.monotonic - earlier.event.monotonic : here.event.at - earlier.event.at;
    if (ms < 0 || ms >= SOONEST_MS) return;
    const open = found.at(-1);
    const place = here.before?.title ?? String(here.entry.body['title'] ?? 'a step');
    if (open && open.place === place && open.last === i - 1) {
      open.count += 1;
      open.last = i;
      open.soonestMs = Math.min(open.soonestMs, ms);
      return;
    }
    found.push({
      kind: 'hurried',
      entry: here.entry.id,
      seq: here.entry.seq,
      title: '',
      detail: '',
      count: 1,
      last: i,
      place,
      soonestMs: ms,
    });
  });
  return found.map(({ count, last: _, place, soonestMs, ...rest }) => ({
    ...rest,
    title: count === 1 ? 'Answered in a hurry' : `${count} answers in a hurry`,
    detail: `${(soonestMs / 1000).toFixed(1)} s after the one before, at “${place}”`,
  }));
}
