/** The address of a run: its restorer is led on, one who is asked takes it over, a senior who is wanted countersigns, others see where it stands. */
import { useEffect, useState } from 'react';

import { keepRun } from '@/shared/ui/api/runStore';
import type { KeptRun } from '@/shared/ui/api/runStore';
import { useMe, useRun } from '@/shared/ui/api/queries';
import { Page } from '@/shared/ui/components/Page';
import { useKeptRun } from '@/shared/ui/hooks/useKeptRun';
import { HoldSheet } from '@/shared/ui/screens/holds/HoldSheet';
import { OthersRun } from '@/shared/ui/screens/run/OthersRun';
import { RunStage } from '@/shared/ui/screens/run/RunStage';
import { StrandedRun } from '@/shared/ui/screens/run/StrandedRun';
import { TakeOver } from '@/shared/ui/screens/run/TakeOver';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';

/** `runId` as it stands in the address. */
export function RunScreen({ runId }: { runId: string }) {
  const me = useMe();
  const run = useRun(runId);
  const person = me.data?.person.id;
  const problems = [me, run].map((q) => q.failureReason?.problem.code ?? null);
  const failed = problems.includes('no-network');
  // what the server says no to, this device does not say yes to
  const wanting = (run.data === undefined || person === undefined) && problems.every((code) => code === null || code === 'no-network');
  const kept = useKeptRun(runId, { wanting, failed });
  const stranded = run.data?.run.stranded === true;
  const offered = run.data?.run.offeredTo != null && run.data.run.offeredTo === person;
  const fetched = run.data !== undefined && person !== undefined && !stranded && person === run.data.run.restorer ? { bundle: run.data, person } : null;
  const own = kept !== null && wanting && (person === undefined || person === kept.person) ? kept : null;
  // once led, a run goes on whatever becomes of session and network: Stop must work, and nothing is taken from under the hands
  const [led, setLed] = useState<KeptRun | null>(null);
  if (led === null && (fetched ?? own) !== null) setLed(fetched ?? own);
  useEffect(() => {
    // one that came from this device is kept already
    if (led !== null && led.bundle === run.data && led.bundle.run.state === 'open') void keepRun(led);
  }, [led, run.data]);
  if (led !== null && (person === undefined || person === led.person)) return <RunStage key={runId} bundle={led.bundle} person={led.person} />;
  const senior = me.data?.roles.includes('senior') === true;
  const countersigns = run.data?.run.awaitsHold === true && !stranded && senior;
  const machine = run.data?.run.machine;
  return (
    <Page title={countersigns || stranded || offered ? undefined : machine === undefined ? 'Run' : `${machine.name}, serial ${machine.serial}`}>
      <Fetched query={me} what="who you are">
        {() => (
          <Fetched query={run} what="the run">
            {(bundle) =>
              stranded ? (
                <StrandedRun bundle={bundle} senior={senior} onClosed={run.refetch} />
              ) : offered ? (
                <TakeOver key={bundle.run.head.seq} bundle={bundle} onTaken={run.refetch} />
              ) : countersigns ? (
                <HoldSheet bundle={bundle} />
              ) : (
                <OthersRun bundle={bundle} />
              )
            }
          </Fetched>
        )}
      </Fetched>
    </Page>
  );
}
