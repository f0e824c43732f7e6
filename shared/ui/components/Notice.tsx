/** A remark set beside a rule, inside the run of a page. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  children: ReactNode;
  title?: string | undefined;
  /** `note` is for reference; `look` wants attention; `alarm` is a broken safety rule or a hazard, nothing else */
  kind?: 'note' | 'look' | 'alarm' | undefined;
  /** read out when it appears */
  live?: boolean | undefined;
}

/** Words are set as running text; anything else is drawn as it is. */
export function Notice({ children, title, kind = 'look', live = false }: Props) {
  const { colors } = useTheme();
  const edge = { note: colors.rule, look: colors.brass, alarm: colors.alarm }[kind];
  const tone = kind === 'alarm' ? 'alarm' : 'ink';
  return (
    <View
      {...(live ? { role: kind === 'alarm' ? 'alert' : 'status' } : {})}
      style={{
        borderLeftWidth: line.heavy + 1,
        borderLeftColor: edge,
        paddingLeft: space.m,
        paddingVertical: space.xs,
        gap: space.xs,
        alignSelf: 'stretch',
      }}
    >
      {title ? (
        <BodyText bold tone={tone}>
          {title}
        </BodyText>
      ) : null}
      {typeof children === 'string' ? <BodyText>{children}</BodyText> : children}
    </View>
  );
}
