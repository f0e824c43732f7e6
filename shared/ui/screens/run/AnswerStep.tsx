/** A step that is answered in one word: done, what was seen, whether it is on. */
import { OUTCOMES } from '@/flows/document/outcomes';
import type { AnswerView } from '@/flows/machine/view';
import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { Heading } from '@/shared/ui/components/Heading';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StepBody } from '@/shared/ui/screens/run/StepBody';

/** Authored answers one below the other; "not sure" and "cannot" share a row. */
export function AnswerStep({ run }: { run: Run }) {
  const { view } = run;
  const { step } = view;
  const say = (answer: string) => void run.send({ type: 'ANSWER', step: view.key, answer });
  const declines = (a: AnswerView) => !a.primary && (OUTCOMES as readonly string[]).includes(a.answer);
  const answers = view.answers.filter((a) => !declines(a));
  const first = answers[0];
  const dock = (
    <>
      {step?.kind === 'observe' ? (
        <Heading level={2} size="sub">
          {step.asks}
        </Heading>
      ) : null}
      {answers.map((a) => (
        <BigAnswer
          key={a.answer}
          kind={a === first ? 'primary' : 'plain'}
          label={a.label}
          disabled={run.busy}
          onPress={() => say(a.answer)}
        />
      ))}
      <AnswerStack row>
        {view.answers.filter(declines).map((a) => (
          <BigAnswer key={a.answer} half label={a.label} disabled={run.busy} onPress={() => say(a.answer)} />
        ))}
      </AnswerStack>
    </>
  );
  return (
    <RunFrame run={run} dock={dock}>
      <StepBody run={run} row={null} />
    </RunFrame>
  );
}
