/** The time for a power-up is over: the way out is laid over the step. */
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Dialog } from '@/shared/ui/components/Dialog';
import { StopBar } from '@/shared/ui/components/StopBar';
import { useNow } from '@/shared/ui/hooks/useNow';
import type { Run } from '@/shared/ui/screens/run/Run';

const SECOND_MS = 1_000;

/** Only isolating, breaking off and Stop are taken then. */
export function OverdueNotice({ run }: { run: Run }) {
  const { live } = run.state.context;
  const now = useNow(SECOND_MS);
  if (live === null || now <= live.until || run.view.step?.kind === 'isolate') return null;
  const abort = run.program.layout.steps.get(live.abort)?.step.title ?? 'Isolate';
  return (
    <Dialog
      title="Time is up: isolate now"
      actions={<Button kind="primary" label={abort} onPress={() => void run.send({ type: 'ABORT' })} />}
      foot={<StopBar onPress={() => void run.send({ type: 'STOP' })} />}
    >
      <BodyText size="instruction">
        The power has been on for as long as this step allows. Nothing else is taken until every source is out.
      </BodyText>
    </Dialog>
  );
}
