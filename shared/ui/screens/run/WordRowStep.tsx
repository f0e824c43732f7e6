/** A row that is answered in a word: isolating, the bench opening, taking things out, what is seen at each of several. */
import type { RowView } from '@/flows/machine/view';
import { SAFE } from '@/flows/machine/program';
import type { WordRow } from '@/flows/machine/rows';
import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { Countdown } from '@/shared/ui/screens/run/Countdown';
import { DoneRows } from '@/shared/ui/screens/run/DoneRows';
import { NotReadyNotice } from '@/shared/ui/screens/run/NotReadyNotice';
import { RowTitle } from '@/shared/ui/screens/run/RowTitle';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StepBody } from '@/shared/ui/screens/run/StepBody';
import { useOpen } from '@/shared/ui/screens/run/useOpen';

/** The first word is the plain way on; the others share a row. */
export function WordRowStep({ run, current }: { run: Run; current: RowView & { row: WordRow } }) {
  const { view } = run;
  const { row, opensAt } = current;
  const open = useOpen(opensAt);
  const say = (word: string) => void run.send({ type: 'ROW', step: view.key, row: row.id, word });
  const [first, ...others] = row.words;
  const dock = (
    <>
      <RowTitle rows={view.rows} current={row} />
      {opensAt !== null && !open ? <Countdown opensAt={opensAt} what="until this may be answered" /> : null}
      {first ? <BigAnswer kind="primary" label={first.label} disabled={!open || run.busy} onPress={() => say(first.word)} /> : null}
      <AnswerStack row>
        {others.map((w) => (
          <BigAnswer key={w.word} half label={w.label} disabled={run.busy || (!open && w.result === 'in')} onPress={() => say(w.word)} />
        ))}
      </AnswerStack>
    </>
  );
  return (
    <RunFrame run={run} dock={dock}>
      <StepBody run={run} row={row} />
      {view.key === SAFE.opening ? <NotReadyNotice run={run} /> : null}
      <DoneRows rows={view.rows} />
    </RunFrame>
  );
}
