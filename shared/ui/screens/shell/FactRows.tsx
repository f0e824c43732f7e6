/** Names and values in ruled rows, like the plate at the back of a machine. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

export interface FactRow {
  name: string;
  /** words are set as running text; anything else is drawn as it is */
  value: ReactNode;
}

/** A list of terms with what each is. */
export function FactRows({ caption, rows }: { caption: string; rows: readonly FactRow[] }) {
  const { colors } = useTheme();
  return (
    <View role="list" aria-label={caption} style={{ alignSelf: 'stretch' }}>
      {rows.map(({ name, value }) => (
        <View
          key={name}
          role="listitem"
          style={{
            flexDirection: 'row',
            gap: space.m,
            paddingVertical: space.s,
            borderBottomWidth: line.hair,
            borderBottomColor: colors.rule,
          }}
        >
          <View style={{ flexGrow: 2, flexShrink: 1, flexBasis: 0, minWidth: 0 }}>
            <BodyText tone="soft">{name}</BodyText>
          </View>
          <View style={{ flexGrow: 3, flexShrink: 1, flexBasis: 0, minWidth: 0 }}>
            {typeof value === 'string' ? <BodyText>{value}</BodyText> : value}
          </View>
        </View>
      ))}
    </View>
  );
}
