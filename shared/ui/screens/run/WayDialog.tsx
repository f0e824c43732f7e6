/** The way through the tree and what else can be done with a run, over the step. */
import { useState } from 'react';
import type { ReactNode } from 'react';

import { mayBeLive } from '@/flows/machine/arrive';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Dialog } from '@/shared/ui/components/Dialog';
import { LinkText } from '@/shared/ui/components/LinkText';
import { HandOverForm } from '@/shared/ui/screens/run/HandOverForm';
import { RecordSide } from '@/shared/ui/screens/run/RecordSide';
import type { Run } from '@/shared/ui/screens/run/Run';
import { WayList } from '@/shared/ui/screens/run/WayList';

/** Stop stays in reach below it. */
export function WayDialog({ run, onClose, foot }: { run: Run; onClose: () => void; foot: ReactNode }) {
  const { view, state, bundle } = run;
  const live = mayBeLive(state.context);
  const over = view.phase === 'closed' || view.phase === 'ended';
  const [handing, setHanding] = useState(false);
  const pause = () => void run.send({ type: 'PAUSE' }).then((taken) => (taken ? onClose() : undefined));
  if (handing) {
    return (
      <Dialog title="Hand this run over" onClose={onClose} foot={foot} actions={<Button kind="primary" label="Back to the step" onPress={onClose} />}>
        <HandOverForm run={run} onDone={onClose} />
      </Dialog>
    );
  }
  return (
    <Dialog
      title={`${bundle.run.machine.name}, serial ${bundle.run.machine.serial}`}
      onClose={onClose}
      foot={foot}
      actions={
        <>
          {over || view.phase === 'paused' || live ? null : <Button label="Pause the run" onPress={pause} />}
          {over || view.handing !== null ? null : <Button label="Hand it over" onPress={() => setHanding(true)} />}
          <Button kind="primary" label="Back to the step" onPress={onClose} />
        </>
      }
    >
      {live ? (
        <BodyText>The bench may be live: nothing waits for a person now. Isolate first, or press Stop.</BodyText>
      ) : (
        <LinkText label="To the bench; the run stays open" href="/bench" />
      )}
      {run.refusal ? <BodyText bold>{run.refusal.say}</BodyText> : null}
      <RecordSide run={run} />
      <WayList run={run} />
    </Dialog>
  );
}
