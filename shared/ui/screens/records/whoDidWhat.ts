/** Each person's part in a record: what they did, when, and with which instruments. */
import type { Instrument } from '@/shared/contract/instruments';
import type { EntryKind } from '@/shared/record/recordEntry';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';
import type { ReplayedEntry } from '@/shared/ui/screens/records/replayRecord';

export interface PersonsPart {
  person: string;
  did: string;
  /** instants of the first and last entry */
  from: string;
  to: string;
  with: string;
}

const COUNTED: readonly { kinds: readonly EntryKind[]; one: string; many: string }[] = [
  { kinds: ['answer', 'isolated'], one: 'answer', many: 'answers' },
  { kinds: ['reading'], one: 'reading', many: 'readings' },
  { kinds: ['photo'], one: 'photo', many: 'photos' },
  { kinds: ['energised'], one: 'switching on', many: 'switchings on' },
  { kinds: ['stopped'], one: 'Stop', many: 'Stops' },
  { kinds: ['hold-given'], one: 'countersign', many: 'countersigns' },
  { kinds: ['hold-refused'], one: 'refusal', many: 'refusals' },
  { kinds: ['handed-over'], one: 'handing over', many: 'handings over' },
  { kinds: ['taken-over'], one: 'taking over', many: 'takings over' },
  { kinds: ['finding'], one: 'finding', many: 'findings' },
  { kinds: ['returned'], one: 'return', many: 'returns' },
  { kinds: ['reply'], one: 'reply', many: 'replies' },
  { kinds: ['accepted'], one: 'acceptance', many: 'acceptances' },
  { kinds: ['released'], one: 'release', many: 'releases' },
];

/** In the order in which the people first appear. */
export function whoDidWhat(
  entries: readonly ReplayedEntry[],
  readings: readonly ReadingLine[],
  instruments: readonly Instrument[],
): PersonsPart[] {
  const people = [...new Set(entries.map(({ entry }) => entry.actor))];
  return people.map((person) => {
    const own = entries.filter(({ entry }) => entry.actor === person);
    const did = COUNTED.flatMap(({ kinds, one, many }) => {
      const n = own.filter(({ entry }) => kinds.includes(entry.kind)).length;
      return n === 0 ? [] : [`${n} ${n === 1 ? one : many}`];
    });
    const ids = new Set(own.map(({ entry }) => entry.id));
    const used = new Set(readings.flatMap((line) => (ids.has(line.id) && line.instrument !== null ? [line.instrument] : [])));
    const names = instruments.filter((i) => used.has(i.id)).map((i) => `${i.name}, calibrated until ${i.calibratedUntil}`);
    return {
      person,
      did: did.join(', ') || 'opened the record',
      from: own[0]?.entry.at ?? '',
      to: own.at(-1)?.entry.at ?? '',
      with: names.join('; ') || 'no instrument',
    };
  });
}
