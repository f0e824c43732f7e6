/** The power band of a run, with its time counting. */
import { useNow } from '@/shared/ui/hooks/useNow';
import { PowerBand } from '@/shared/ui/components/PowerBand';
import { bandDetail } from '@/shared/ui/screens/run/bandWords';
import { studOf } from '@/shared/ui/screens/run/studOf';
import type { Run } from '@/shared/ui/screens/run/Run';

const SECOND_MS = 1_000;

/** Its place opens the way through the tree. */
export function RunBand({ run, onPressPlace }: { run: Run; onPressPlace: () => void }) {
  const now = useNow(SECOND_MS);
  const { view, program, state } = run;
  const stud = studOf(run);
  // the machine's own steps have no number among those of the tree
  const place = view.end !== null ? 'end' : stud === '!' ? 'safe' : `${stud}/${view.total}`;
  return <PowerBand state={view.band} detail={bandDetail(program, state, view, now)} place={place} onPressPlace={onPressPlace} />;
}
