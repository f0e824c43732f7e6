/** Plays a record through the machine again, so that a page shows what the entries say and not what somebody says about them. */
import { advance, startRun } from '@/flows/machine/advance';
import type { RunState } from '@/flows/machine/advance';
import { compile } from '@/flows/machine/compile';
import { machineEventSchema } from '@/flows/machine/events';
import type { MachineEvent } from '@/flows/machine/events';
import { view } from '@/flows/machine/view';
import type { RunView } from '@/flows/machine/view';
import type { RecordView } from '@/shared/contract/records';
import type { RecordEntry } from '@/shared/record/recordEntry';

/** What the replay needs of a record. */
export type Replayable = Pick<RecordView, 'start' | 'tree' | 'callees' | 'profile' | 'settings' | 'entries'>;

export interface ReplayedEntry {
  entry: RecordEntry;
  /** the machine's event, or null in an entry of the review */
  event: MachineEvent | null;
  /** what stood on the bench's screen when it was answered; null where the replay has stopped */
  before: RunView | null;
  after: RunView | null;
}

export interface Replay {
  entries: ReplayedEntry[];
  /** where the entries and the machine part company, or null */
  broken: { seq: number; say: string } | null;
  /** the view at the end of what could be played */
  end: RunView | null;
}

/** The machine's event in an entry, or null in one that is about something else. */
export function eventOf(entry: RecordEntry): MachineEvent | null {
  const parsed = machineEventSchema.safeParse(entry.body['event']);
  return parsed.success ? parsed.data : null;
}

/** Every entry with the view before and after it. An entry that the machine does not take ends the replay, not the list. */
export function replayRecord({ start, tree, callees, profile, settings, entries }: Replayable): Replay {
  const compiled = compile({ tree, callees, profile, settings });
  const bare = (): ReplayedEntry[] => entries.map((entry) => ({ entry, event: eventOf(entry), before: null, after: null }));
  if (!compiled.ok)
    return {
      entries: bare(),
      broken: { seq: 1, say: `The tree cannot be played with this profile: ${compiled.faults[0]?.message ?? 'it does not hold'}.` },
      end: null,
    };
  const { program } = compiled;
  let state: RunState = startRun(program, start);
  let seen = view(program, state);
  let broken: Replay['broken'] = null;
  const played = entries.map((entry): ReplayedEntry => {
    const event = eventOf(entry);
    if (broken !== null) return { entry, event, before: null, after: null };
    if (event === null) return { entry, event, before: seen, after: seen };
    const taken = advance(program, state, event);
    if (!taken.ok) {
      broken = { seq: entry.seq, say: taken.refusal.say };
      return { entry, event, before: null, after: null };
    }
    const before = seen;
    state = taken.state;
    seen = view(program, state);
    return { entry, event, before, after: seen };
  });
  return { entries: played, broken, end: seen };
}
