/** Numbers and codes, in the face with the slashed zero. */
import type { ReactNode } from 'react';
import { Text } from 'react-native';

import { face, type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webTextStyle } from '@/shared/ui/theme/webStyle';

interface Props {
  children: ReactNode;
  bold?: boolean | undefined;
  soft?: boolean | undefined;
  /** never broken over two lines: a date, a number with its unit */
  whole?: boolean | undefined;
  /** takes the size of the text around it */
  inline?: boolean | undefined;
  size?: 'mono' | 'reading' | undefined;
}

/** A quantity, serial, time or hash. */
export function Mono({ children, bold = false, soft = false, whole = false, inline = false, size = 'mono' }: Props) {
  const { colors } = useTheme();
  return (
    <Text
      style={[
        inline ? { fontFamily: face.mono } : type[size],
        inline && !soft ? null : { color: soft ? colors.inkSoft : colors.ink },
        bold ? { fontFamily: face.monoBold } : null,
        whole ? webTextStyle({ whiteSpace: 'nowrap' }) : null,
      ]}
    >
      {children}
    </Text>
  );
}
