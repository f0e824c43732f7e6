/** The bench calculations. */
import { useState } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { Field } from '@/shared/ui/components/Field';
import { Page } from '@/shared/ui/components/Page';
import { LinkRows } from '@/shared/ui/screens/shell/LinkRows';
import { Section } from '@/shared/ui/screens/shell/Section';
import { sheetGroups, sheetsFor } from '@/shared/ui/screens/workings/groups';
import { space } from '@/shared/ui/theme/space';
import { SHEETS } from '@/shared/workings/list';

/** From this many sheets on a list is searched sooner than read. */
const SEARCHED_FROM = 9;

/** Grouped by what is asked; one ruled row a sheet, with the question that it answers. */
export function WorkingsScreen() {
  const [typed, setTyped] = useState('');
  const found = sheetsFor(SHEETS, typed);
  return (
    <Page title="Workings" maxWidth={860}>
      <BodyText tone="soft">
        Each sheet shows its formula with the numbers in it, how far it holds, and its source. The same sheets stand behind the steps of a
        tree.
      </BodyText>
      {SHEETS.length < SEARCHED_FROM ? null : (
        <Field
          label="Find a sheet"
          hint="A word of its question or of what goes into it, such as ripple, ohms, fuse"
          value={typed}
          onChangeText={setTyped}
          required
          inputMode="search"
        />
      )}
      <View role="status">
        {found.length === 0 ? (
          <EmptyState title="No sheet has these words" text="Try one word, or clear the field to see all sheets." />
        ) : null}
      </View>
      <View style={{ gap: space.xxl }}>
        {sheetGroups(found).map((group) => (
          <Section key={group.title} title={group.title}>
            <LinkRows
              caption={group.title}
              rows={group.sheets.map((sheet) => ({ href: `/workings/${sheet.id}`, title: sheet.title, about: sheet.question }))}
              level={3}
            />
          </Section>
        ))}
      </View>
    </Page>
  );
}
