/** The machines of the workshop. */
import { View } from 'react-native';

import type { Machine } from '@/shared/contract/machines';
import { useMachines } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { Mono } from '@/shared/ui/components/Mono';
import { Page } from '@/shared/ui/components/Page';
import { Tag } from '@/shared/ui/components/Tag';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { releaseWord } from '@/shared/ui/screens/machines/releaseWord';

const columns: Column<Machine>[] = [
  { key: 'name', title: 'Machine', grow: 1.6, cell: (m) => m.name },
  { key: 'serial', title: 'Serial', cell: (m) => <Mono>{m.serial}</Mono> },
  { key: 'class', title: 'Kind', grow: 1.6, cell: (m) => <BodyText>{m.machineClass}</BodyText> },
  { key: 'revision', title: 'Profile', cell: (m) => <BodyText>{`revision ${m.revision}`}</BodyText> },
  {
    key: 'state',
    title: 'State',
    grow: 1.6,
    cell: (m) => (
      <View style={{ gap: 4 }}>
        {m.openRun ? <Tag word="run open" kind="now" /> : null}
        {m.tags > 0 ? <Tag word={`${m.tags} left from runs`} kind="look" /> : null}
        {m.openRun || m.tags > 0 ? null : <BodyText tone="soft">at rest</BodyText>}
      </View>
    ),
  },
  {
    key: 'release',
    title: 'Release',
    grow: 1.8,
    cell: (m) => <BodyText tone={m.release?.valid ? 'ink' : 'soft'}>{releaseWord(m.release)}</BodyText>,
  },
];

/** One row a machine. */
export function MachinesScreen() {
  const machines = useMachines();
  return (
    <Page title="Machines">
      <Fetched query={machines} what="the machines">
        {({ machines: all }) => (
          <DataTable
            caption="Machines"
            columns={columns}
            rows={all}
            rowKey={(m) => m.id}
            rowTarget={(m) => ({ name: `${m.name}, serial ${m.serial}`, href: `/machines/${m.id}` })}
            empty={
              <EmptyState
                title="No machines yet"
                text="A machine stands here with its electrical description once a senior has entered it."
              />
            }
          />
        )}
      </Fetched>
    </Page>
  );
}
