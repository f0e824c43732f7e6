/** Open runs of the workshop that nobody can be led on with: a senior closes them. */
import { useOpenRuns } from '@/shared/ui/api/queries';
import { DataTable } from '@/shared/ui/components/DataTable';
import { runColumns } from '@/shared/ui/screens/bench/OpenRuns';
import { Section } from '@/shared/ui/screens/shell/Section';

/** Nothing is shown while there is none. */
export function StrandedRuns() {
  const runs = useOpenRuns();
  const stranded = (runs.data?.runs ?? []).filter((r) => r.stranded);
  if (stranded.length === 0) return null;
  return (
    <Section title="Runs that cannot go on">
      <DataTable
        caption="Runs that cannot go on"
        columns={runColumns}
        rows={stranded}
        rowKey={(r) => r.id}
        rowTarget={(r) => ({ name: `Close as stopped: ${r.machine.name}, serial ${r.machine.serial}`, href: `/bench/${r.id}` })}
      />
    </Section>
  );
}
