/** The bench opening was answered with a No. */
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';

/** Says what has to be put right before the opening can be gone through. */
export function NotReadyNotice({ run }: { run: Run }) {
  const last = run.account.lines.at(-1);
  if (last === undefined || last.type !== 'ROW' || run.state.context.rows.length > 0) return null;
  return (
    <Notice live title="The bench is not ready">
      {`You said No: ${last.words.replace(/: No$/, '')}. Put it right, then open the bench from the top. No power goes in before.`}
    </Notice>
  );
}
