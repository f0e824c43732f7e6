/** A heading of the sheet, in the condensed face. */
import type { ReactNode } from 'react';
import { Text } from 'react-native';

import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  children: ReactNode;
  /** place in the outline of the page, 1 to 4; also sets the size */
  level?: 1 | 2 | 3 | 4 | undefined;
  /** size when it should differ from the level's own */
  size?: 'display' | 'title' | 'section' | 'sub' | undefined;
  id?: string | undefined;
}

const sizes = { 1: 'title', 2: 'section', 3: 'sub', 4: 'sub' } as const;

/** Says what the part below it is about; one `level` 1 a page. */
export function Heading({ children, level = 2, size, id }: Props) {
  const { colors } = useTheme();
  return (
    <Text role="heading" aria-level={level} {...(id ? { nativeID: id } : {})} style={[type[size ?? sizes[level]], { color: colors.ink }]}>
      {children}
    </Text>
  );
}
