/** A run that is paused. */
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StepHead } from '@/shared/ui/screens/run/StepHead';

/** Going on leads through isolating and proving dead where the step needs it. */
export function PausedStep({ run }: { run: Run }) {
  return (
    <RunFrame
      run={run}
      dock={<BigAnswer kind="primary" label="Go on" disabled={run.busy} onPress={() => void run.send({ type: 'RESUME' })} />}
    >
      <StepHead run={run} />
      <BodyText size="instruction">
        Nobody was watching the bench. What was known of the sources and of stored charge counts no more.
      </BodyText>
      <Notice title="When you go on">
        The run leads through isolating and proving dead again, then back to the step at which you paused.
      </Notice>
    </RunFrame>
  );
}
