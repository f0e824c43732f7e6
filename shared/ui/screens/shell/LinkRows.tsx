/** Ruled rows that lead somewhere. */
import type { Href } from 'expo-router';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Heading } from '@/shared/ui/components/Heading';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { RouteLink } from '@/shared/ui/components/RouteLink';
import { line, space, target } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

export interface LinkRow {
  href: Href;
  title: string;
  /** what is found there */
  about: string;
}

/** The whole row is the link. */
export function LinkRows({ caption, rows, level = 2 }: { caption: string; rows: readonly LinkRow[]; level?: 2 | 3 }) {
  const { colors } = useTheme();
  return (
    <View role="list" aria-label={caption} style={{ alignSelf: 'stretch' }}>
      {rows.map(({ href, title, about }) => (
        <View key={title} role="listitem" style={{ borderBottomWidth: line.hair, borderBottomColor: colors.rule }}>
          <RouteLink
            href={href}
            ringInside
            style={(hovered) => [
              { flexDirection: 'row', alignItems: 'center', gap: space.m, paddingVertical: space.m, minHeight: target.answer },
              hovered ? { backgroundColor: colors.tint } : null,
            ]}
          >
            <View style={{ flex: 1, minWidth: 0 }}>
              <Heading level={level} size="sub">
                {title}
              </Heading>
              <BodyText>{about}</BodyText>
            </View>
            <Icon name="right" size={22} color={colors.action} />
          </RouteLink>
        </View>
      ))}
    </View>
  );
}
