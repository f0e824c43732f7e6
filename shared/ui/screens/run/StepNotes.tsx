/** What will be seen and heard, what the workings say for this machine, and why the step stands here. */
import { useState } from 'react';
import { View } from 'react-native';

import { workingsOf } from '@/flows/machine/stepWorkings';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Dialog } from '@/shared/ui/components/Dialog';
import { Notice } from '@/shared/ui/components/Notice';
import { StopBar } from '@/shared/ui/components/StopBar';
import type { Run } from '@/shared/ui/screens/run/Run';
import { SheetGrounds, SheetHeadline } from '@/shared/ui/screens/workings/SheetAnswerView';
import { space } from '@/shared/ui/theme/space';

type Open = 'why' | 'workings' | null;

/** Beside a rule, out of the way of the instruction. */
export function StepNotes({ run }: { run: Run }) {
  const [open, setOpen] = useState<Open>(null);
  const { step } = run.view;
  const { profile, settings } = run.program.layout;
  if (step === null) return null;
  const workings = workingsOf(step, profile, settings);
  const headline = workings?.answer.ok ? workings.answer.headline : null;
  if (step.expect === undefined && headline === null && step.why === undefined) return null;
  const close = () => setOpen(null);
  const frame = { onClose: close, actions: <Button label="Back to the step" onPress={close} />, foot: <StopBar onPress={() => void run.send({ type: 'STOP' })} /> };
  return (
    <View style={{ gap: space.xs }}>
      {step.expect !== undefined || headline !== null ? (
        <Notice>
          {step.expect !== undefined ? (
            <BodyText>
              <BodyText inline bold>
                You will see:
              </BodyText>{' '}
              {step.expect}
            </BodyText>
          ) : null}
          {headline !== null ? (
            <BodyText>
              <BodyText inline bold>
                For this machine:
              </BodyText>{' '}
              {headline}
            </BodyText>
          ) : null}
        </Notice>
      ) : null}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.s }}>
        {headline !== null ? <Button kind="quiet" label="Workings" onPress={() => setOpen('workings')} /> : null}
        {step.why !== undefined ? <Button kind="quiet" label="Why this step?" onPress={() => setOpen('why')} /> : null}
      </View>
      {open === 'why' && step.why !== undefined ? (
        <Dialog title="Why this step?" {...frame}>
          <BodyText size="instruction">{step.why}</BodyText>
        </Dialog>
      ) : null}
      {open === 'workings' && workings?.answer.ok ? (
        <Dialog title={workings.sheet.title} {...frame}>
          <SheetHeadline sheet={workings.sheet} answer={workings.answer} />
          <SheetGrounds sheet={workings.sheet} answer={workings.answer} />
        </Dialog>
      ) : null}
    </View>
  );
}
