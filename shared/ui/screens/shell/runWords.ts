/** States and outcomes of runs in words. */
import type { RunState, RunSummary } from '@/shared/contract/runSummary';

export const RUN_STATE_WORDS: Readonly<Record<RunState, string>> = {
  open: 'open',
  closed: 'closed',
  submitted: 'under review',
  returned: 'returned',
  accepted: 'accepted',
};

export const RUN_STATE_TAGS = { open: 'now', closed: 'plain', submitted: 'look', returned: 'look', accepted: 'over' } as const;

const ENDINGS: Readonly<Record<NonNullable<RunSummary['ended']>, string>> = {
  'fault-found': 'fault found',
  'supply-proven': 'supply proven',
  cleared: 'cleared',
  stopped: 'stopped',
  referred: 'referred to a senior',
  'in-service': 'in service',
};

/** How a run ended; an open one has not. */
export function endingWords(ended: RunSummary['ended']): string {
  return ended === null ? 'not ended' : ENDINGS[ended];
}
