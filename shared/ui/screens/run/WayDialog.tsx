/** The way through the tree and what else can be done with a run, over the step. */
import type { ReactNode } from 'react';

import { mayBeLive } from '@/flows/machine/arrive';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Dialog } from '@/shared/ui/components/Dialog';
import { LinkText } from '@/shared/ui/components/LinkText';
import { RecordSide } from '@/shared/ui/screens/run/RecordSide';
import type { Run } from '@/shared/ui/screens/run/Run';
import { WayList } from '@/shared/ui/screens/run/WayList';

/** Stop stays in reach below it. */
export function WayDialog({ run, onClose, foot }: { run: Run; onClose: () => void; foot: ReactNode }) {
  const { view, state, bundle } = run;
  const live = mayBeLive(state.context);
  const over = view.phase === 'closed' || view.phase === 'ended';
  const pause = () => void run.send({ type: 'PAUSE' }).then((taken) => (taken ? onClose() : undefined));
  return (
    <Dialog
      title={`${bundle.run.machine.name}, serial ${bundle.run.machine.serial}`}
      onClose={onClose}
      foot={foot}
      actions={
        <>
          {over || view.phase === 'paused' || live ? null : <Button label="Pause the run" onPress={pause} />}
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
