/** Runs that somebody wants to hand to the person signed in. */
import { useBench } from '@/shared/ui/api/queries';
import { DataTable } from '@/shared/ui/components/DataTable';
import { runColumns } from '@/shared/ui/screens/bench/OpenRuns';
import { Section } from '@/shared/ui/screens/shell/Section';

/** Nothing is shown while nobody asks. */
export function OfferedToMe({ person }: { person: string | null }) {
  const runs = useBench();
  const offered = (runs.data?.runs ?? []).filter((r) => r.offeredTo !== null && r.offeredTo === person);
  if (offered.length === 0) return null;
  return (
    <Section title="Offered to you">
      <DataTable
        caption="Runs offered to you"
        columns={runColumns}
        rows={offered}
        rowKey={(r) => r.id}
        rowTarget={(r) => ({ name: `Read and take over: ${r.machine.name}, serial ${r.machine.serial}`, href: `/bench/${r.id}` })}
      />
    </Section>
  );
}
