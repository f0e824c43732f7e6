/** An entry of a record in words: what was done. */
import { SHOWN } from '@/flows/document/outcomes';
import { TEST_CONDITIONS } from '@/flows/document/testConditions';
import type { Instrument } from '@/shared/contract/instruments';
import type { RecordEntry } from '@/shared/record/recordEntry';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';
import { noteWords } from '@/shared/ui/screens/records/noteWords';
import type { ReplayedEntry } from '@/shared/ui/screens/records/replayRecord';

export interface EntryWords {
  what: string;
  /** what was said, or with what it was done; null where there is no more to say */
  detail: string | null;
}

interface Known {
  entries: readonly RecordEntry[];
  readings: ReadonlyMap<string, ReadingLine>;
  instruments: readonly Instrument[];
}

const WORDS: Readonly<Record<string, string>> = {
  done: 'done',
  'not-sure': 'not sure',
  cannot: 'cannot',
  on: 'it is on',
  out: 'out',
  'not-out': 'not out',
};

/** What was done, told from the machine's event where there is one and from the entry's body otherwise. */
export function entryWords({ entry, event, before }: ReplayedEntry, known: Known): EntryWords {
  const says = (what: string, detail: unknown = null): EntryWords => ({
    what,
    detail: typeof detail === 'string' && detail !== '' ? detail : null,
  });
  const { body } = entry;
  switch (entry.kind) {
    case 'opened':
      return says('Run opened');
    case 'warning-read':
      return says('Warning read');
    case 'energised':
      return says(
        'Switched on',
        event?.type === 'GUARD_HELD' ? [`guard held for ${(event.heldMs / 1000).toFixed(1)} s`, ...conditionsOf(before)].join('; ') : null,
      );
    case 'hold-asked':
      return says('Countersign asked for');
    case 'hold-given':
      return says('Countersigned', event?.type === 'HOLD_GIVEN' ? event.note : null);
    case 'hold-refused':
      return says('Countersign refused', event?.type === 'HOLD_REFUSED' ? event.reason : null);
    case 'paused':
      return says('Paused', event?.type === 'PAUSE' ? event.reason : null);
    case 'resumed':
      return says(event?.type === 'REENTER' ? 'Went on after Stop' : 'Went on');
    case 'stopped':
      return says(event?.type === 'ABORT' ? 'Broken off' : 'Stop, make safe');
    case 'lapsed':
      return says(event?.type === 'RESTART' ? 'The page was loaded anew' : 'Time passed: what had lapsed was taken back');
    case 'closed':
      return body['by'] === 'senior'
        ? says('Closed as stopped by a senior, signed', `${String(body['reason'])}\n${String(body['meaning'])}`)
        : says('Run closed');
    case 'submitted':
      return says('Submitted for review', body['remark']);
    case 'returned':
      return says(
        'Returned with questions',
        Array.isArray(body['questions']) ? body['questions'].map((q, i) => `${i + 1}. ${String(q)}`).join('\n') : null,
      );
    case 'reply':
      return says('Answered, under review again', body['text']);
    case 'finding':
      return says(`Finding (${String(body['grade'])}) on entry ${seqOf(known.entries, body['entry'])}`, body['text']);
    case 'accepted':
      return says('Accepted and signed', body['meaning']);
    case 'released':
      return says('Released', body['says']);
    case 'void':
      return says('Release void', body['reason']);
    case 'photo':
      return says('Photo taken');
    case 'reading':
      return reading(entry, known) ?? says('Reading');
    case 'answer':
    case 'isolated':
      return answer({ entry, event, before, after: null }) ?? says(entry.kind === 'isolated' ? 'Isolated' : 'Answered');
    case 'handed-over':
      return says(
        'Handed over, signed',
        event?.type === 'HANDED_OVER'
          ? [event.meaning, ...(event.note === undefined ? [] : [`Left word: ${event.note}`])].join('\n')
          : body['text'],
      );
    case 'taken-over':
      return says('Taken over, signed', event?.type === 'TAKEN_OVER' ? event.meaning : body['text']);
    case 'part':
    case 'tag':
    case 'deviation':
    case 'conflict':
    case 'correction':
    case 'addendum':
      if (event?.type === 'NOTE') return noteWords(event);
      return says(
        {
          part: 'Part replaced',
          tag: 'Tag written',
          deviation: 'Deviation',
          conflict: 'Conflict',
          correction: 'Reading corrected',
          addendum: 'Addendum',
        }[entry.kind],
        body['text'],
      );
  }
}

function seqOf(entries: readonly RecordEntry[], id: unknown): string {
  return String(entries.find((e) => e.id === id)?.seq ?? '?');
}

function reading(entry: RecordEntry, { readings, instruments }: Known): EntryWords | null {
  const line = readings.get(entry.id);
  if (line === undefined) return null;
  const meter = instruments.find((i) => i.id === line.instrument)?.name;
  return {
    what: `${line.label}: ${line.reading}, ${line.verdict}`,
    detail: [`typed “${line.typed}”`, ...(meter ? [meter] : [])].join(', '),
  };
}

/** Test conditions that a step confirms, or that it states as confirmed before. */
function conditionsOf(before: ReplayedEntry['before']): string[] {
  const step = before?.step;
  const ids = step?.kind === 'do' ? step.confirms : step != null && 'asInService' in step ? step.asInService : undefined;
  return (ids ?? []).map((id) => TEST_CONDITIONS[id].name.toLowerCase());
}

function answer({ event, before }: ReplayedEntry): EntryWords | null {
  if (event?.type === 'ROW') {
    const row = before?.rows.find((r) => r.row.id === event.row)?.row;
    const word = row?.ask === 'word' ? row.words.find((w) => w.word === event.word)?.label : undefined;
    // what hangs on the row is worth its place only where the row is not as it should be
    const good = before?.step?.exits.find((e) => e.id === event.word)?.verdict;
    return {
      what: `${row?.label ?? event.row}: ${word ?? WORDS[event.word] ?? event.word}`,
      detail: good === 'fail' || good === 'find' ? (row?.note ?? null) : null,
    };
  }
  if (event?.type === 'ANSWER') {
    const given = before?.answers.find((a) => a.answer === event.answer);
    const shows = given?.shows == null ? [] : [`${SHOWN[given.shows].name}: ${SHOWN[given.shows].say}`];
    const confirmed = event.answer === 'done' ? conditionsOf(before) : [];
    const detail = [...confirmed, ...shows, ...(event.note === undefined ? [] : [event.note])].join('\n');
    return { what: given?.label ?? WORDS[event.answer] ?? event.answer, detail: detail === '' ? null : detail };
  }
  if (event?.type === 'SECOND_PRESENT') return { what: 'Second person present', detail: null };
  return null;
}
