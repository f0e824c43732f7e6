/** The number in the stud of where the run stands. Pure. */
import type { Run } from '@/shared/ui/screens/run/Run';

/** The step's own; that of the end once the run is there; 0 at the opening of the bench, `!` where the machine makes safe. */
export function studOf({ view, program }: Pick<Run, 'view' | 'program'>): string {
  if (view.end !== null) return (view.end.key === null ? undefined : program.layout.steps.get(view.end.key)?.stud) ?? '!';
  return view.stud === '' ? '0' : view.stud;
}
