/** Running text of the sheet. */
import type { ReactNode } from 'react';
import { Text } from 'react-native';
import type { TextStyle } from 'react-native';

import { face, type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

export type Tone = 'ink' | 'soft' | 'brass' | 'alarm' | 'proved' | 'action';

interface Props {
  children: ReactNode;
  size?: 'instruction' | 'body' | 'small' | undefined;
  tone?: Tone | undefined;
  bold?: boolean | undefined;
  /** takes size and colour of the text around it */
  inline?: boolean | undefined;
  align?: TextStyle['textAlign'] | undefined;
  id?: string | undefined;
}

/** A paragraph, or with `inline` a run of words inside one. `alarm` and `proved` are for hazards and power only. */
export function BodyText({ children, size = 'body', tone, bold = false, inline = false, align, id }: Props) {
  const { colors } = useTheme();
  const color = {
    ink: colors.ink,
    soft: colors.inkSoft,
    brass: colors.brass,
    alarm: colors.alarm,
    proved: colors.proved,
    action: colors.action,
  }[tone ?? 'ink'];
  return (
    <Text
      {...(id ? { nativeID: id } : {})}
      style={[
        inline ? null : type[size],
        inline && tone === undefined ? null : { color },
        bold ? { fontFamily: face.textBold } : null,
        align ? { textAlign: align } : null,
      ]}
    >
      {children}
    </Text>
  );
}
