/** What makes a table's row lead somewhere: its first cell, with the whole row as its target. */
import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { Pressable, View } from 'react-native';

import { Icon } from '@/shared/ui/components/icons/Icon';
import { RouteLink } from '@/shared/ui/components/RouteLink';
import { space, target } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** An address, or a thing to do. */
export type RowTarget = { name: string; href: Href } | { name: string; onPress: () => void };

/** A link for an address, a button for an action; named for the row. */
export function TableRowLink({ to, children }: { to: RowTarget; children: ReactNode }) {
  const { colors } = useTheme();
  const content = (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.s }}>
      <View style={{ flexShrink: 1 }}>{children}</View>
      <Icon name="right" size={20} color={colors.action} />
    </View>
  );
  const box = { minHeight: target.control, justifyContent: 'center' } as const;
  if ('href' in to) {
    return (
      <RouteLink href={to.href} name={to.name} style={(hovered) => [box, hovered ? { backgroundColor: colors.tint } : null]}>
        {content}
      </RouteLink>
    );
  }
  return (
    <Pressable role="button" aria-label={to.name} onPress={to.onPress} style={box}>
      {content}
    </Pressable>
  );
}
