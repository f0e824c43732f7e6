/** The filter of the list of records. */
import type { RunState } from '@/shared/contract/runSummary';
import { RUN_STATE_WORDS } from '@/shared/ui/screens/shell/runWords';

/** A run that is still open has no record to read. */
export type RecordState = Exclude<RunState, 'open'>;

const STATES: readonly RecordState[] = ['submitted', 'returned', 'closed', 'accepted'];

/** The state that an address asks for; null for all, also where it asks for something that is none. */
export function recordStateOf(asked: string | undefined): RecordState | null {
  return STATES.find((state) => state === asked) ?? null;
}

export const STATE_FILTERS = [
  { value: 'all', label: 'All records' },
  ...STATES.map((state) => ({
    value: state,
    label: `${RUN_STATE_WORDS[state][0]?.toUpperCase() ?? ''}${RUN_STATE_WORDS[state].slice(1)}`,
  })),
];
