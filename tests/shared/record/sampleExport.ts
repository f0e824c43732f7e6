/** A small whole record, for the tests of export and verification. */
import { GENESIS, sealEntry } from '@/shared/record/chain';
import type { ExportedRecord } from '@/shared/record/exportFormat';
import type { EntryKind, RecordEntry } from '@/shared/record/recordEntry';

const RUN = '3f0e4f8a-0b1d-4c55-9a6e-2f8f5d3b7c11';
const KINDS: readonly EntryKind[] = ['opened', 'warning-read', 'reading', 'isolated', 'closed'];
const hashOf = (digit: string): string => digit.repeat(64);

/** Five entries of one run with their head. */
export function sampleExport(): ExportedRecord {
  const entries: RecordEntry[] = [];
  for (const [index, kind] of KINDS.entries()) {
    const draft = {
      id: `01890a5d-ac96-774b-bcce-b302099a80${50 + index}`,
      run: RUN,
      seq: index + 1,
      at: `2024-05-01T09:3${index}:00.000Z`,
      monotonic: index * 60_000,
      actor: 'm-4',
      kind,
      body: { step: `s-${index}`, said: '4,7 kΩ – “in”' },
    };
    entries.push(sealEntry(draft, `2024-05-01T09:3${index}:01.000Z`, entries.at(-1)?.hash ?? GENESIS));
  }
  return {
    format: 1,
    record: {
      run: RUN,
      workshop: { id: 'w-1', name: 'Long Bench' },
      machine: { id: 'k-9', name: 'Corvane 12', serial: '00417' },
      tree: { id: 't-1', title: 'Dormant supply: first power', version: 3, hash: hashOf('a') },
      profile: { id: 'p-1', revision: 2, hash: hashOf('b') },
      settings: { hash: hashOf('c'), document: { deadVolts: 5 } },
      engine: { hash: hashOf('d') },
      people: [{ id: 'm-4', name: 'Ada Marlow', roles: ['restorer'] }],
      instruments: [{ id: 'i-2', name: 'Bench meter 2', serial: null, calibrationDue: '2025-01-31' }],
      exportedAt: '2024-05-02T08:00:00.000Z',
      head: entries.at(-1)?.hash ?? GENESIS,
      count: entries.length,
    },
    entries,
  };
}
