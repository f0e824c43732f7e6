/** A step that asks for a photo. */
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StepBody } from '@/shared/ui/screens/run/StepBody';

/** This device cannot keep photos, so the step can only be declined; its exit says where that leads. */
export function PhotoStep({ run }: { run: Run }) {
  const { view } = run;
  const decline = view.answers.find((a) => a.answer === 'cannot');
  return (
    <RunFrame
      run={run}
      dock={
        decline ? (
          <BigAnswer
            label={decline.label}
            disabled={run.busy}
            onPress={() => void run.send({ type: 'ANSWER', step: view.key, answer: decline.answer })}
          />
        ) : undefined
      }
    >
      <StepBody run={run} row={null} />
      <Notice>This workshop keeps no photos yet, so none can be taken here.</Notice>
    </RunFrame>
  );
}
