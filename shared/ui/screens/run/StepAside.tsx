/** Two questions that a novice may ask at any step: why it stands here, and where its figures come from. */
import { useState } from 'react';
import { View } from 'react-native';

import { workingsOf } from '@/flows/machine/stepWorkings';
import type { ReadingNow } from '@/flows/machine/stepWorkings';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Dialog } from '@/shared/ui/components/Dialog';
import { StopBar } from '@/shared/ui/components/StopBar';
import type { Run } from '@/shared/ui/screens/run/Run';
import { SheetGrounds, SheetHeadline } from '@/shared/ui/screens/workings/SheetAnswerView';

type Open = 'why' | 'workings' | null;

/** Quiet buttons; each opens over the step, with Stop in reach. `now` is the reading that is being taken. */
export function StepAside({ run, now = null }: { run: Run; now?: ReadingNow | null }) {
  const [open, setOpen] = useState<Open>(null);
  const { step } = run.view;
  const { profile, settings } = run.program.layout;
  if (step === null) return null;
  const workings = workingsOf(step, profile, settings, now);
  const close = () => setOpen(null);
  const frame = {
    onClose: close,
    actions: <Button label="Back to the step" onPress={close} />,
    foot: <StopBar onPress={() => void run.send({ type: 'STOP' })} />,
  };
  return (
    <View style={{ flexDirection: 'row' }}>
      {workings?.answer.ok ? <Button kind="quiet" label="Workings" onPress={() => setOpen('workings')} /> : null}
      {step.why !== undefined ? <Button kind="quiet" label="Why?" name="Why this step?" onPress={() => setOpen('why')} /> : null}
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
