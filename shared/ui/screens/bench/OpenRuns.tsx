/** Runs that are open, each with where it stands. */
import { View } from 'react-native';

import type { RunSummary } from '@/shared/contract/runSummary';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { Mono } from '@/shared/ui/components/Mono';
import { PowerMark } from '@/shared/ui/screens/bench/PowerMark';
import { Tag } from '@/shared/ui/components/Tag';
import { dateTimeWords } from '@/shared/ui/screens/shell/dateWords';

export const runColumns: Column<RunSummary>[] = [
  {
    key: 'machine',
    title: 'Machine',
    grow: 2,
    cell: (r) => (
      <View>
        <BodyText bold>{`${r.machine.name}, serial ${r.machine.serial}`}</BodyText>
        <BodyText size="small" tone="soft">
          {r.tree.title}
        </BodyText>
      </View>
    ),
  },
  {
    key: 'stands',
    title: 'Stands at',
    grow: 2,
    cell: (r) => (
      <View style={{ gap: 4 }}>
        <BodyText>
          {r.step === null ? 'the end: close the record' : r.step.stud === '' ? r.step.title : `${r.step.stud} ${r.step.title}`}
        </BodyText>
        {r.awaitsHold && !r.stranded ? <Tag word="waits for a countersign" kind="look" /> : null}
        {r.offeredTo === null ? null : <Tag word="offered to the next restorer" kind="look" />}
        {r.stranded ? <Tag word="cannot go on: a senior closes it" kind="look" /> : null}
      </View>
    ),
  },
  { key: 'supply', title: 'Supply', grow: 1.3, cell: (r) => <PowerMark state={r.band} /> },
  { key: 'heard', title: 'Last heard', cell: (r) => <Mono>{dateTimeWords(r.heardAt)}</Mono> },
];

/** A run is gone on with by its row. */
export function OpenRuns({ runs, mayStart }: { runs: readonly RunSummary[]; mayStart: boolean }) {
  return (
    <DataTable
      caption="My open runs"
      columns={runColumns}
      rows={runs}
      rowKey={(r) => r.id}
      rowTarget={(r) => ({ name: `Go on with ${r.machine.name}, serial ${r.machine.serial}`, href: `/bench/${r.id}` })}
      empty={
        <EmptyState
          title="No run is open"
          text={
            mayStart
              ? 'Nothing of yours is on the bench. Start a run below: choose the machine, then the tree.'
              : 'Runs are led by restorers; here you would see your own.'
          }
        />
      }
    />
  );
}
