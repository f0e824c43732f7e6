/** Tables, states of a page, remarks, tags, type and icons. */
import { useState } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { ErrorState } from '@/shared/ui/components/ErrorState';
import { Heading } from '@/shared/ui/components/Heading';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { iconPaths } from '@/shared/ui/components/icons/iconPaths';
import type { IconName } from '@/shared/ui/components/icons/iconPaths';
import { Label } from '@/shared/ui/components/Label';
import { Loading } from '@/shared/ui/components/Loading';
import { Mono } from '@/shared/ui/components/Mono';
import { Notice } from '@/shared/ui/components/Notice';
import type { TableSort } from '@/shared/ui/components/tableSort';
import { Tag } from '@/shared/ui/components/Tag';
import { Part } from '@/shared/ui/screens/parts/Part';
import { space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Meter {
  name: string;
  ranges: string;
  until: string;
  state: string;
}

const meters: Meter[] = [
  { name: 'Meter A', ranges: '60 V DC, ±(0.5 % + 2)', until: '2027-03-01', state: 'in date' },
  { name: 'Meter B', ranges: '60 kΩ, ±(0.9 % + 2)', until: '2026-01-15', state: 'out of date' },
  { name: 'Insulation tester', ranges: '250, 500 V', until: '2027-06-30', state: 'in date' },
];
const columns: Column<Meter>[] = [
  { key: 'name', title: 'Instrument', sortable: true, cell: (m) => m.name },
  { key: 'ranges', title: 'Range, accuracy', grow: 1.4, cell: (m) => m.ranges },
  { key: 'until', title: 'Calibrated to', sortable: true, cell: (m) => <Mono>{m.until}</Mono> },
  { key: 'state', title: 'State', cell: (m) => <Tag word={m.state} kind={m.state === 'in date' ? 'plain' : 'look'} /> },
];

/** What a page is made of when it is not a run. */
export function SheetParts() {
  const { colors } = useTheme();
  const [sort, setSort] = useState<TableSort>({ column: 'name', direction: 'ascending' });
  const rows = meters.toSorted(
    (a, b) =>
      a[sort.column === 'until' ? 'until' : 'name'].localeCompare(b[sort.column === 'until' ? 'until' : 'name']) *
      (sort.direction === 'ascending' ? 1 : -1),
  );
  return (
    <>
      <Part title="Table">
        <DataTable
          caption="Instruments"
          columns={columns}
          rows={rows}
          rowKey={(m) => m.name}
          rowTarget={(m) => ({ name: `${m.name}: open`, onPress: () => undefined })}
          sort={sort}
          onSort={setSort}
        />
      </Part>
      <Part title="States of a page">
        <Loading what="the record" />
        <EmptyState
          title="No run is open"
          text="Choose a machine and an issued tree to start one."
          action={<Button kind="primary" label="Start a run" onPress={() => undefined} />}
        />
        <ErrorState
          happened="The record could not be fetched"
          todo="The server did not answer. Nothing that you recorded is lost: it is kept on this device until the server has it."
          onRetry={() => undefined}
        />
        <Notice kind="note" title="Tree version 3">
          Issued 2026-11-02, checked by a second senior.
        </Notice>
        <Notice title="Nine entries wait on this device">They are sent when the network is back.</Notice>
        <Notice kind="alarm" title="H1 broken">
          You could reach 19 with the supply on the lamp and its charge unproved.
        </Notice>
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.m }}>
          <Tag word="open" kind="now" />
          <Tag word="issued" />
          <Tag word="version 4, draft" kind="look" />
          <Tag word="withdrawn" kind="over" />
        </View>
      </Part>
      <Part title="Type and icons">
        <Label>Label in capitals</Label>
        <Heading level={3} size="display">
          Cleared: three rails at full load
        </Heading>
        <BodyText size="instruction">Instruction: clip the black lead on 0 V, then the red one.</BodyText>
        <BodyText>Body: the reservoir held 19.6 J at the last reading.</BodyText>
        <BodyText size="small" tone="soft">
          Small: 184 entries, checked on this device
        </BodyText>
        <Mono>0.07 Ω −12.11 V 68 000 μF ± 0.5 % ≤ 0.1 Ω</Mono>
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.l }} aria-hidden>
          {(Object.keys(iconPaths) as IconName[]).map((name) => (
            <Icon key={name} name={name} size={36} color={colors.ink} weight={1.7} />
          ))}
        </View>
      </Part>
    </>
  );
}
