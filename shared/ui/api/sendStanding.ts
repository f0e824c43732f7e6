/** What a problem means for an answer that was being sent. */
import type { ClientProblemCode } from '@/shared/ui/api/answer';

/** `later`: kept and tried again; `out-of-step`: the record has moved on; `refused`: this answer will never be taken. */
export type Standing = 'later' | 'out-of-step' | 'refused';

/** The standing for each code. What a person can mend (signing in again) is tried again, never thrown away. */
export function standingOf(code: ClientProblemCode): Standing {
  switch (code) {
    case 'out-of-sequence':
      return 'out-of-step';
    case 'refused':
    case 'instrument':
    case 'bad-input':
    case 'id-taken':
    case 'wrong-state':
    case 'handed-over':
    case 'other-engine':
    case 'too-large':
    case 'bad-file':
    // photos are sent before their entries: one that is missing is on no device any more
    case 'photo-missing':
    case 'not-found':
    case 'bad-json':
      return 'refused';
    default:
      return 'later';
  }
}

const FIRST_MS = 1_000;
const MOST_MS = 30_000;

/** Back-off in milliseconds after that many failures in a row: doubling from one second to half a minute. */
export function retryDelayMs(failures: number): number {
  return Math.min(MOST_MS, FIRST_MS * 2 ** Math.max(0, failures - 1));
}
