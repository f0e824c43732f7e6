/** The entries of a record, put together by the step that they belong to. */
import type { ReplayedEntry } from '@/shared/ui/screens/records/replayRecord';

export interface TimelineGroup {
  id: string;
  /** label of the stud; a dot for what is not at the bench */
  stud: string;
  title: string;
  entries: ReplayedEntry[];
}

const REVIEW = '~review';

/** Neighbouring entries of one step make one group; what comes after the bench makes the review. */
export function timelineOf(entries: readonly ReplayedEntry[]): TimelineGroup[] {
  const groups: (TimelineGroup & { key: string })[] = [];
  for (const replayed of entries) {
    const atBench = replayed.event !== null || replayed.entry.kind === 'opened';
    const key = atBench ? (replayed.before?.key ?? String(replayed.entry.body['step'] ?? '')) : REVIEW;
    const open = groups.at(-1);
    if (open?.key === key) {
      open.entries.push(replayed);
      continue;
    }
    const stud = atBench ? replayed.before?.stud || '·' : '·';
    const title = atBench ? replayed.before?.title || String(replayed.entry.body['title'] ?? 'At the bench') : 'Review';
    groups.push({ id: replayed.entry.id, key, stud, title, entries: [replayed] });
  }
  return groups.map(({ key: _, ...group }) => group);
}
