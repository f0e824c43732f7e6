/** The bench: countersigns that are wanted, runs that are offered to me or cannot go on, my open runs, and starting one. */
import { useBench, useMe } from '@/shared/ui/api/queries';
import { Page } from '@/shared/ui/components/Page';
import { HoldsWanted } from '@/shared/ui/screens/bench/HoldsWanted';
import { OfferedToMe } from '@/shared/ui/screens/bench/OfferedToMe';
import { OpenRuns } from '@/shared/ui/screens/bench/OpenRuns';
import { StrandedRuns } from '@/shared/ui/screens/bench/StrandedRuns';
import { StartRun } from '@/shared/ui/screens/bench/StartRun';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { Section } from '@/shared/ui/screens/shell/Section';

/** What a person sees first; a `machine` in the address is chosen already. */
export function BenchScreen({ machine }: { machine?: string | undefined }) {
  const me = useMe();
  const runs = useBench();
  const roles = me.data?.roles ?? [];
  const leads = roles.includes('restorer') || roles.includes('senior');
  return (
    <Page title="Bench" eyebrow={me.data?.workshop.name}>
      {roles.includes('senior') ? <HoldsWanted /> : null}
      {leads ? <OfferedToMe person={me.data?.person.id ?? null} /> : null}
      {roles.includes('senior') ? <StrandedRuns /> : null}
      <Section title="My open runs">
        <Fetched query={runs} what="your open runs">
          {({ runs: open }) => <OpenRuns runs={open.filter((r) => r.restorer === me.data?.person.id)} mayStart={leads} />}
        </Fetched>
      </Section>
      {leads ? (
        <Section title="Start a run">
          <StartRun key={machine ?? ''} machine={machine} />
        </Section>
      ) : null}
    </Page>
  );
}
