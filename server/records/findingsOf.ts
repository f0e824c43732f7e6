/** The findings of a record, out of its entries. */
import { gradeSchema } from '@/shared/contract/records';
import type { Finding } from '@/shared/contract/records';
import type { RecordEntry } from '@/shared/record/recordEntry';

/** In the order in which they were made. */
export function findingsOf(entries: readonly RecordEntry[]): Finding[] {
  return entries
    .filter((entry) => entry.kind === 'finding')
    .map((entry) => ({
      id: entry.id,
      entry: String(entry.body['entry']),
      grade: gradeSchema.parse(entry.body['grade']),
      text: String(entry.body['text']),
      by: entry.actor,
      at: entry.at,
    }));
}
