/** Which kind of record entry an event leaves. */
import type { RunContext } from './context';
import type { MachineEvent } from './events';

export const ENTRY_KINDS_OF_RUN = [
  'answer', 'reading', 'photo', 'part', 'warning-read', 'energised', 'isolated', 'lapsed', 'hold-asked', 'hold-given', 'hold-refused', 'tag', 'paused', 'resumed', 'handed-over', 'taken-over', 'stopped', 'closed', 'addendum',
] as const;
export type RunEntryKind = (typeof ENTRY_KINDS_OF_RUN)[number];

/** The kind of the entry for an event that has been taken; `after` is the context that it led to. */
export function entryKindOf(event: MachineEvent, after: RunContext): RunEntryKind {
  switch (event.type) {
    case 'ROW':
      return after.outcome?.outcome === 'out' ? 'isolated' : 'answer';
    case 'READING':
      return 'reading';
    case 'ANSWER':
      return 'answer';
    case 'PHOTO':
      return 'photo';
    case 'WARNING_READ':
      return 'warning-read';
    case 'GUARD_HELD':
      return 'energised';
    case 'HOLD_ASKED':
      return 'hold-asked';
    case 'HOLD_GIVEN':
      return 'hold-given';
    case 'HOLD_REFUSED':
      return 'hold-refused';
    case 'SECOND_PRESENT':
      return 'answer';
    case 'HANDED_OVER':
      return 'handed-over';
    case 'TAKEN_OVER':
      return 'taken-over';
    case 'ABORT':
    case 'STOP':
      return 'stopped';
    case 'REENTER':
    case 'RESUME':
      return 'resumed';
    case 'PAUSE':
      return 'paused';
    case 'RESTART':
    case 'TICK':
      return 'lapsed';
    case 'CLOSE':
      return 'closed';
    case 'NOTE':
      return 'addendum';
  }
}
