/** The screen for where the run stands. */
import { SAFE } from '@/flows/machine/program';
import type { ReadingRow, WordRow } from '@/flows/machine/rows';
import type { RowView } from '@/flows/machine/view';
import { AnswerStep } from '@/shared/ui/screens/run/AnswerStep';
import { ChooseStep } from '@/shared/ui/screens/run/ChooseStep';
import { EndStep } from '@/shared/ui/screens/run/EndStep';
import { GuardStep } from '@/shared/ui/screens/run/GuardStep';
import { HoldStep } from '@/shared/ui/screens/run/HoldStep';
import { OfferedStep } from '@/shared/ui/screens/run/OfferedStep';
import { PausedStep } from '@/shared/ui/screens/run/PausedStep';
import { PhotoStep } from '@/shared/ui/screens/run/PhotoStep';
import { ReadingRowStep } from '@/shared/ui/screens/run/ReadingRowStep';
import type { Run } from '@/shared/ui/screens/run/Run';
import { WarningStep } from '@/shared/ui/screens/run/WarningStep';
import { WordRowStep } from '@/shared/ui/screens/run/WordRowStep';

/** One of the phases of the machine. */
export function RunStep({ run }: { run: Run }) {
  const { view } = run;
  const { current, step } = view;
  switch (view.phase) {
    case 'warning':
      return <WarningStep key={view.key} run={run} />;
    case 'hold':
    case 'hold-wait':
      return <HoldStep run={run} />;
    case 'guard':
      return <GuardStep key={view.key} run={run} />;
    case 'paused':
      return view.handing === null ? <PausedStep run={run} /> : <OfferedStep run={run} to={view.handing.to} />;
    case 'ended':
    case 'closed':
      return <EndStep run={run} />;
    case 'opening':
    case 'act': {
      if (view.key === SAFE.choose) return <ChooseStep run={run} />;
      const at = `${view.key}/${current?.row.id ?? ''}/${run.state.context.enteredAt}`;
      if (current?.row.ask === 'reading') return <ReadingRowStep key={at} run={run} current={current as RowView & { row: ReadingRow }} />;
      if (current?.row.ask === 'word') return <WordRowStep key={at} run={run} current={current as RowView & { row: WordRow }} />;
      if (step?.kind === 'hold') return <HoldStep run={run} />;
      return step?.kind === 'photo' ? <PhotoStep run={run} /> : <AnswerStep key={view.key} run={run} />;
    }
  }
}
