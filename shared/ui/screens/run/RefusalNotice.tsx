/** Why the last answer was not taken, at the place where it was given. */
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';

/** With the house rule where one is at stake. */
export function RefusalNotice({ run }: { run: Pick<Run, 'refusal'> }) {
  if (run.refusal === null) return null;
  const { rule, say } = run.refusal;
  return (
    <Notice live kind={rule === null ? 'look' : 'alarm'} title={rule === null ? 'Not taken' : `House rule ${rule}`}>
      {say}
    </Notice>
  );
}
