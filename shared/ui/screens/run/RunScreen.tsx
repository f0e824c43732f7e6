/** The address of a run: its restorer is led on, one who is asked takes it over, a senior who is wanted countersigns, others see where it stands. */
import { useMe, useRun } from '@/shared/ui/api/queries';
import { Page } from '@/shared/ui/components/Page';
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
  // once led, a run goes on whatever becomes of the session: Stop must work
  const stranded = run.data?.run.stranded === true;
  const offered = run.data?.run.offeredTo != null && run.data.run.offeredTo === me.data?.person.id;
  if (run.data !== undefined && !stranded && me.data?.person.id === run.data.run.restorer)
    return <RunStage key={runId} bundle={run.data} person={me.data.person.id} />;
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
