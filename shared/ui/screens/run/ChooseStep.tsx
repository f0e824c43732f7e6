/** After Stop, safe: go on from a place that still holds, or close as stopped. */
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StaysFitted } from '@/shared/ui/screens/run/StaysFitted';
import { StepHead } from '@/shared/ui/screens/run/StepHead';
import { StepLines } from '@/shared/ui/screens/run/StepLines';

/** The machine's own step `~choose`. */
export function ChooseStep({ run }: { run: Run }) {
  const { view } = run;
  const dock = (
    <>
      {view.reentries.map((r, i) => (
        <BigAnswer
          key={r.key}
          kind={i === view.reentries.length - 1 ? 'primary' : 'plain'}
          label={`Go on from: ${r.title}`}
          disabled={run.busy}
          onPress={() => void run.send({ type: 'REENTER', step: r.key })}
        />
      ))}
      <BigAnswer
        kind={view.reentries.length === 0 ? 'primary' : 'plain'}
        label="Close this run as stopped"
        disabled={run.busy}
        onPress={() => void run.send({ type: 'CLOSE' })}
      />
    </>
  );
  return (
    <RunFrame run={run} dock={dock}>
      <StepHead run={run} />
      {view.step ? <StepLines step={view.step} /> : null}
      {view.reentries.length === 0 ? (
        <Notice title="No place to go on from">
          A place is offered only where the run has been, what it stands on still holds, nothing is owed and nothing temporary is in. None
          is left, so this run can only be closed as stopped.
        </Notice>
      ) : null}
      <StaysFitted run={run} />
    </RunFrame>
  );
}
