/** The small condensed capitals above a field, a column or a part of a page. */
import type { ReactNode } from 'react';
import { Text } from 'react-native';

import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  children: ReactNode;
  /** makes it a heading of the page's outline */
  level?: 2 | 3 | 4 | undefined;
  id?: string | undefined;
}

/** A caption in capitals; the words themselves stay in the case they were given in for readers. */
export function Label({ children, level, id }: Props) {
  const { colors } = useTheme();
  return (
    <Text
      {...(level ? { role: 'heading', 'aria-level': level } : {})}
      {...(id ? { nativeID: id } : {})}
      style={[type.label, { color: colors.inkSoft, textTransform: 'uppercase' }]}
    >
      {children}
    </Text>
  );
}
