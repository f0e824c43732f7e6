/** The fault trees of the workshop. */
import { View } from 'react-native';

import type { TreeVersion } from '@/shared/contract/trees';
import { useTrees } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { Heading } from '@/shared/ui/components/Heading';
import { Mono } from '@/shared/ui/components/Mono';
import { Page } from '@/shared/ui/components/Page';
import { Tag } from '@/shared/ui/components/Tag';
import { groupedByPurpose } from '@/shared/ui/screens/trees/groupedByPurpose';
import { space } from '@/shared/ui/theme/space';
import { dateWords } from '@/shared/ui/screens/shell/dateWords';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { leadingVersion, VERSION_STATE_TAGS, VERSION_STATE_WORDS } from '@/shared/ui/screens/trees/versionShown';

const columns: Column<TreeVersion>[] = [
  {
    key: 'title',
    title: 'Tree',
    grow: 3,
    cell: (v) => (
      <View>
        <BodyText bold>{v.title}</BodyText>
        <BodyText size="small" tone="soft">
          {v.symptom}
        </BodyText>
      </View>
    ),
  },
  { key: 'version', title: 'Version', grow: 0.7, cell: (v) => <Mono>{v.version}</Mono> },
  { key: 'state', title: 'State', grow: 0.9, cell: (v) => <Tag word={VERSION_STATE_WORDS[v.state]} kind={VERSION_STATE_TAGS[v.state]} /> },
  { key: 'steps', title: 'Steps', grow: 0.6, cell: (v) => <Mono>{v.steps}</Mono> },
  {
    key: 'issued',
    title: 'Issued',
    cell: (v) => (v.issuedAt ? <Mono whole>{dateWords(v.issuedAt)}</Mono> : <BodyText tone="soft">not yet</BodyText>),
  },
];

/** One row a tree, in the version that leads it; grouped by what the trees are for. */
export function TreesScreen() {
  const trees = useTrees();
  return (
    <Page title="Fault trees">
      <Fetched query={trees} what="the fault trees">
        {({ trees: all }) => {
          const groups = groupedByPurpose(all.flatMap(({ versions }) => leadingVersion(versions) ?? []));
          return groups.length === 0 ? (
            <EmptyState
              title="No fault trees yet"
              text="A senior writes the procedure of the workshop down as a tree; once it is checked and issued it stands here and can be run at the bench."
            />
          ) : (
            <View style={{ gap: space.xl }}>
              {groups.map(({ purpose, name, trees: rows }) => (
                <View key={purpose} style={{ gap: space.s }}>
                  <Heading level={2}>{name}</Heading>
                  <DataTable
                    caption={name}
                    columns={columns}
                    rows={rows}
                    rowKey={(v) => v.tree}
                    rowTarget={(v) => ({
                      name: `${v.title}, version ${v.version}, ${VERSION_STATE_WORDS[v.state]}`,
                      href: `/trees/${v.tree}`,
                    })}
                  />
                </View>
              ))}
            </View>
          );
        }}
      </Fetched>
    </Page>
  );
}
