/** The address of a run: its restorer is led on, a senior who is wanted countersigns, others see where it stands. */
import { useMe, useRun } from '@/shared/ui/api/queries';
import { Page } from '@/shared/ui/components/Page';
import { HoldSheet } from '@/shared/ui/screens/holds/HoldSheet';
import { OthersRun } from '@/shared/ui/screens/run/OthersRun';
import { RunStage } from '@/shared/ui/screens/run/RunStage';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';

/** `runId` as it stands in the address. */
export function RunScreen({ runId }: { runId: string }) {
  const me = useMe();
  const run = useRun(runId);
  // once led, a run goes on whatever becomes of the session: Stop must work
  if (run.data !== undefined && me.data?.person.id === run.data.run.restorer)
    return <RunStage key={runId} bundle={run.data} person={me.data.person.id} />;
  const countersigns = run.data?.run.awaitsHold === true && me.data?.roles.includes('senior') === true;
  const machine = run.data?.run.machine;
  return (
    <Page title={countersigns ? undefined : machine === undefined ? 'Run' : `${machine.name}, serial ${machine.serial}`}>
      <Fetched query={me} what="who you are">
        {() => (
          <Fetched query={run} what="the run">
            {(bundle) => (countersigns ? <HoldSheet bundle={bundle} /> : <OthersRun bundle={bundle} />)}
          </Fetched>
        )}
      </Fetched>
    </Page>
  );
}
