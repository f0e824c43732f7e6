/** The records of the workshop. */
import { useRouter } from 'expo-router';
import { View } from 'react-native';

import type { RunSummary } from '@/shared/contract/runSummary';
import { usePeople, useRecords } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { Mono } from '@/shared/ui/components/Mono';
import { Page } from '@/shared/ui/components/Page';
import { Select } from '@/shared/ui/components/Select';
import { Tag } from '@/shared/ui/components/Tag';
import { dateTimeWords } from '@/shared/ui/screens/shell/dateWords';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { personCode, personName } from '@/shared/ui/screens/shell/personName';
import { endingWords, RUN_STATE_TAGS, RUN_STATE_WORDS } from '@/shared/ui/screens/shell/runWords';
import { recordStateOf, STATE_FILTERS } from '@/shared/ui/screens/records/stateFilter';

interface Props {
  /** from the address: a state, or nothing for all */
  show: string | undefined;
}

/** Newest first; the filter stands in the address, so that it can be kept and sent. */
export function RecordsScreen({ show }: Props) {
  const router = useRouter();
  const chosen = recordStateOf(show);
  const records = useRecords(chosen === null ? {} : { state: chosen });
  const people = usePeople().data?.people;
  return (
    <Page title="Records">
      <View style={{ maxWidth: 340 }}>
        <Select
          label="Show"
          options={STATE_FILTERS}
          value={chosen ?? 'all'}
          onChange={(value) => router.setParams({ show: value === 'all' ? '' : value })}
        />
      </View>
      <Fetched query={records} what="the records">
        {({ records: rows }) => (
          <DataTable<RunSummary>
            caption="Records"
            rows={rows}
            rowKey={(r) => r.id}
            rowTarget={(r) => ({
              name: `${r.machine.name} ${r.machine.serial}, ${dateTimeWords(r.startedAt)}, ${RUN_STATE_WORDS[r.state]}`,
              href: `/records/${r.id}`,
            })}
            empty={
              chosen === null ? (
                <EmptyState
                  title="No records yet"
                  text="A run that is closed at the bench becomes a record here: what was checked, with which meter, at what reading, and who countersigned."
                />
              ) : (
                <EmptyState title={`No record is ${RUN_STATE_WORDS[chosen]}`} text="Choose another state above to see the others." />
              )
            }
            columns={[
              {
                key: 'machine',
                title: 'Machine',
                grow: 1.5,
                cell: (r) => (
                  <View>
                    <BodyText bold>{r.machine.name}</BodyText>
                    <BodyText size="small" tone="soft">
                      {r.machine.serial}
                    </BodyText>
                  </View>
                ),
              },
              { key: 'tree', title: 'Tree', grow: 2.4, cell: (r) => <BodyText>{`${r.tree.title}, version ${r.tree.version}`}</BodyText> },
              {
                key: 'restorer',
                title: 'Restorer',
                grow: 0.9,
                cell: (r) => <Person code={personCode(people, r.restorer)} name={personName(people, r.restorer)} />,
              },
              { key: 'when', title: 'When', grow: 1.7, cell: (r) => <Mono whole>{dateTimeWords(r.startedAt)}</Mono> },
              { key: 'outcome', title: 'Outcome', grow: 1.3, cell: (r) => <BodyText>{endingWords(r.ended)}</BodyText> },
              {
                key: 'state',
                title: 'State',
                grow: 1.1,
                cell: (r) => <Tag word={RUN_STATE_WORDS[r.state]} kind={RUN_STATE_TAGS[r.state]} />,
              },
            ]}
          />
        )}
      </Fetched>
    </Page>
  );
}

function Person({ code, name }: { code: string; name: string }) {
  return (
    <View role="group" aria-label={name}>
      <Mono>{code}</Mono>
    </View>
  );
}
