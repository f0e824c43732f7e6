/** The bench calculations. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Heading } from '@/shared/ui/components/Heading';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { Page } from '@/shared/ui/components/Page';
import { RouteLink } from '@/shared/ui/components/RouteLink';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { SHEETS } from '@/shared/workings/list';

/** One ruled row a sheet, with the question that it answers. */
export function WorkingsScreen() {
  const { colors } = useTheme();
  return (
    <Page title="Workings" maxWidth={860}>
      <BodyText tone="soft">
        Each sheet shows its formula with the numbers in it, how far it holds, and its source. The same sheets stand behind the steps of a
        tree.
      </BodyText>
      <View role="list" aria-label="Workings" style={{ borderTopWidth: line.rule, borderTopColor: colors.ink }}>
        {SHEETS.map((sheet) => (
          <View key={sheet.id} role="listitem" style={{ borderBottomWidth: line.hair, borderBottomColor: colors.rule }}>
            <RouteLink
              href={`/workings/${sheet.id}`}
              style={(hovered) => [
                { flexDirection: 'row', alignItems: 'center', gap: space.m, paddingVertical: space.m, minHeight: 64 },
                hovered ? { backgroundColor: colors.tint } : null,
              ]}
            >
              <View style={{ flex: 1, minWidth: 0 }}>
                <Heading level={2} size="sub">
                  {sheet.title}
                </Heading>
                <BodyText>{sheet.question}</BodyText>
              </View>
              <Icon name="right" size={22} color={colors.action} />
            </RouteLink>
          </View>
        ))}
      </View>
    </Page>
  );
}
