/** Answers above each other, or two in a row, with the gap that a thumb needs. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { target } from '@/shared/ui/theme/space';

interface Props {
  children: ReactNode;
  /** sets `half` answers side by side as long as they fit */
  row?: boolean | undefined;
}

/** Holds `BigAnswer`s. */
export function AnswerStack({ children, row = false }: Props) {
  return (
    <View style={{ flexDirection: row ? 'row' : 'column', flexWrap: row ? 'wrap' : 'nowrap', gap: target.gap, alignSelf: 'stretch' }}>
      {children}
    </View>
  );
}
