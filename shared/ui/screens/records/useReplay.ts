/** The record of a page, played through the machine once for each time that it is fetched. */
import { useMemo } from 'react';

import type { RecordView } from '@/shared/contract/records';
import { replayRecord } from '@/shared/ui/screens/records/replayRecord';
import type { Replay } from '@/shared/ui/screens/records/replayRecord';

/** Null until there is a record. */
export function useReplay(record: RecordView | undefined): Replay | null {
  return useMemo(() => (record === undefined ? null : replayRecord(record)), [record]);
}
