/** The question that a novice may ask at any step: why it stands here. */
import { useState } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Dialog } from '@/shared/ui/components/Dialog';
import { StopBar } from '@/shared/ui/components/StopBar';
import type { Run } from '@/shared/ui/screens/run/Run';

/** A quiet button; it opens over the step, with Stop in reach. */
export function StepAside({ run }: { run: Run }) {
  const [open, setOpen] = useState(false);
  const why = run.view.step?.why;
  if (why === undefined) return null;
  const close = () => setOpen(false);
  return (
    <View style={{ flexDirection: 'row' }}>
      <Button kind="quiet" label="Why?" name="Why this step?" onPress={() => setOpen(true)} />
      {open ? (
        <Dialog
          title="Why this step?"
          onClose={close}
          actions={<Button label="Back to the step" onPress={close} />}
          foot={<StopBar onPress={() => void run.send({ type: 'STOP' })} />}
        >
          <BodyText size="instruction">{why}</BodyText>
        </Dialog>
      ) : null}
    </View>
  );
}
