/** The warning before a step: read first, then the step itself is shown. */
import { WarningGate } from '@/shared/ui/components/WarningGate';
import { hazardsShown } from '@/shared/ui/screens/run/hazardsShown';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StepHead } from '@/shared/ui/screens/run/StepHead';

/** Phase `warning`. */
export function WarningStep({ run }: { run: Run }) {
  const { view, program } = run;
  const read = () => void run.send({ type: 'WARNING_READ', step: view.key });
  return (
    <RunFrame run={run}>
      <StepHead run={run} />
      <WarningGate
        hazards={hazardsShown(view.hazards, program.layout.profile, program.layout.settings)}
        acknowledged={false}
        onAcknowledge={read}
      />
    </RunFrame>
  );
}
