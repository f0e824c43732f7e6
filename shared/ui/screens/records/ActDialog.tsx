/** The frame of every act of a review: what is asked, what went wrong, do or leave. */
import type { ReactNode } from 'react';

import type { ClientProblem } from '@/shared/ui/api/answer';
import { Button } from '@/shared/ui/components/Button';
import { Dialog } from '@/shared/ui/components/Dialog';
import { Notice } from '@/shared/ui/components/Notice';

interface Props {
  title: string;
  /** what the button does, as "Accept and sign" */
  act: string;
  busy: boolean;
  problem: Pick<ClientProblem, 'say'> | null;
  onAct: () => void;
  onClose: () => void;
  children: ReactNode;
}

/** Nothing that was typed is lost when the act is refused. */
export function ActDialog({ title, act, busy, problem, onAct, onClose, children }: Props) {
  return (
    <Dialog
      title={title}
      onClose={onClose}
      actions={
        <>
          <Button label="Leave it" onPress={onClose} />
          <Button kind="primary" label={busy ? 'Writing …' : act} disabled={busy} onPress={onAct} />
        </>
      }
    >
      {children}
      {problem ? <Notice live>{problem.say}</Notice> : null}
    </Dialog>
  );
}
