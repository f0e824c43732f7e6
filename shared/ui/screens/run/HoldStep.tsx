/** A hold point: asking a senior, and waiting for the answer. */
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Notice } from '@/shared/ui/components/Notice';
import { useNow } from '@/shared/ui/hooks/useNow';
import { clockOf } from '@/shared/ui/screens/run/bandWords';
import { holdAsks, seniorsFor } from '@/shared/ui/screens/run/holdWords';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StepHead } from '@/shared/ui/screens/run/StepHead';
import { useLongWait } from '@/shared/ui/screens/run/useLongWait';

/** Phases `hold` and `hold-wait`, and a hold point of the tree. */
export function HoldStep({ run }: { run: Run }) {
  const { view, program, bundle } = run;
  const waits = view.phase === 'hold-wait';
  const ask = () => void run.send({ type: 'HOLD_ASKED', step: view.key });
  const dock = waits ? (
    <BigAnswer label="Look for the answer now" onPress={() => void run.poll()} />
  ) : (
    <BigAnswer kind="primary" label="Ask for the countersign" disabled={run.busy} onPress={ask} />
  );
  return (
    <RunFrame run={run} dock={dock}>
      <StepHead run={run} />
      <BodyText size="instruction">{holdAsks(view, program)}</BodyText>
      {waits ? <Waiting run={run} /> : <Notice title="Who is asked">{seniorsFor(bundle)}</Notice>}
      <Notice kind="note" title="What happens next">
        Given, the guard of this step opens and is good for one power-up. Refused, the run is led to make-safe, with the senior’s reason.
        You can stop at any time.
      </Notice>
    </RunFrame>
  );
}

const SECOND_MS = 1_000;

function Waiting({ run }: { run: Run }) {
  const now = useNow(SECOND_MS);
  const unsent = useLongWait(run.saved);
  const asked = run.account.lines.findLast((line) => line.type === 'HOLD_ASKED');
  return (
    <>
      <Notice live title="Waiting for a senior">
        {seniorsFor(run.bundle)}
      </Notice>
      <BodyText tone="soft">
        {asked === undefined
          ? ''
          : `Asked ${clockOf(now - asked.at)} ago. Their answer appears here by itself; every source stays out until then.`}
      </BodyText>
      {unsent ? <Notice kind="look">The question has not left this device yet: there is no network. No senior has seen it.</Notice> : null}
    </>
  );
}
