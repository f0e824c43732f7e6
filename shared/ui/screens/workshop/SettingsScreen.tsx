/** The settings of the workshop, as they stand. */
import { View } from 'react-native';

import { useSettings } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Mono } from '@/shared/ui/components/Mono';
import { Notice } from '@/shared/ui/components/Notice';
import { Page } from '@/shared/ui/components/Page';
import { Tag } from '@/shared/ui/components/Tag';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { settingRows } from '@/shared/ui/screens/workshop/settingRows';
import type { SettingRow } from '@/shared/ui/screens/workshop/settingRows';
import { space } from '@/shared/ui/theme/space';

const columns: Column<SettingRow>[] = [
  { key: 'name', title: 'Setting', grow: 2.2, cell: (r) => <BodyText>{r.name}</BodyText> },
  {
    key: 'value',
    title: 'Here',
    grow: 1.8,
    cell: (r) => (
      <View style={{ gap: space.xs }}>
        <Mono bold>{r.value}</Mono>
        {r.stricter ? <Tag word="stricter" /> : null}
      </View>
    ),
  },
  { key: 'loosest', title: 'House rule', grow: 1.8, cell: (r) => <Mono soft>{r.loosest}</Mono> },
];

/** Read-only: a workshop may be stricter than the house rules, never looser. */
export function SettingsScreen() {
  const settings = useSettings();
  return (
    <Page title="Settings of the workshop" eyebrow="Workshop" maxWidth={980}>
      <Notice kind="note">
        A workshop may set stricter values than these rules start from, never looser ones. Local codes, the maker’s data and licensed
        practice come first.
      </Notice>
      <Fetched query={settings} what="the settings">
        {({ settings: given }) => <DataTable caption="Settings" columns={columns} rows={settingRows(given)} rowKey={(r) => r.key} />}
      </Fetched>
      <LinkText label="Workshop" href="/workshop" />
    </Page>
  );
}
