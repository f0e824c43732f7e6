/** What the supply did over a run, from the entries played again. */
import type { PowerSegment } from '@/shared/ui/components/powerVisual';
import type { ReplayedEntry } from '@/shared/ui/screens/records/replayRecord';

export interface PowerCourse {
  segments: PowerSegment[];
  /** epoch milliseconds of the first and last entry at the bench; null when nothing was done */
  from: number | null;
  to: number | null;
}

const timeOf = ({ entry }: ReplayedEntry) => Date.parse(entry.at);

/** Neighbouring entries of one state make one segment; the review afterwards is not part of it. */
export function powerSegments(entries: readonly ReplayedEntry[]): PowerCourse {
  const bench = entries.filter((e) => e.after !== null && (e.event !== null || e.entry.kind === 'opened'));
  const first = bench[0];
  const last = bench.at(-1);
  if (first === undefined || last === undefined) return { segments: [], from: null, to: null };
  const segments: PowerSegment[] = [];
  bench.forEach((here, at) => {
    const next = bench[at + 1];
    const state = here.after?.band;
    if (next === undefined || state === undefined) return;
    // clocks may have been put back in between; a strip cannot run backwards
    const seconds = Math.max(0, (timeOf(next) - timeOf(here)) / 1000);
    const open = segments.at(-1);
    if (open?.state === state) open.seconds += seconds;
    else segments.push({ state, seconds });
  });
  return { segments, from: timeOf(first), to: timeOf(last) };
}
