/** The verdict on a record's chain of entries, worked out on this device. */
import type { RecordView } from '@/shared/contract/records';
import { verifyChain } from '@/shared/record/chain';

export interface ChainWords {
  whole: boolean;
  /** as "Chain whole" */
  verdict: string;
  detail: string;
}

/** Every hash and link is worked out again; the head that the server states is what a cut-off tail is seen by. */
export function chainWords({ entries, head }: Pick<RecordView, 'entries' | 'head'>): ChainWords {
  const verdict = verifyChain(entries, { head: head.hash, count: head.seq });
  if (verdict.ok)
    return {
      whole: true,
      verdict: 'Chain whole',
      detail: `${verdict.count} ${verdict.count === 1 ? 'entry' : 'entries'}, checked on this device`,
    };
  return { whole: false, verdict: 'Chain broken', detail: verdict.what };
}
