/** The run is offered to somebody who has not taken it yet. */
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StepHead } from '@/shared/ui/screens/run/StepHead';
import { personName } from '@/shared/ui/screens/shell/personName';

/** Until then it can be taken back. */
export function OfferedStep({ run, to }: { run: Run; to: string }) {
  const who = personName(run.bundle.people, to);
  return (
    <RunFrame run={run} dock={<BigAnswer label="Take it back and go on" disabled={run.busy} onPress={() => void run.send({ type: 'RESUME' })} />}>
      <StepHead run={run} title={`Offered to ${who}`} />
      <BodyText size="instruction">{`${who} finds it on the bench of their own device and signs there. On this device: sign out, then let them sign in.`}</BodyText>
      <Notice live title="Not taken yet">
        Hands off the machine. What was known of the sources and of stored charge counts no more, whoever goes on.
      </Notice>
    </RunFrame>
  );
}
