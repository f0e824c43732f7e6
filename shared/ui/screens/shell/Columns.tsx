/** Two columns on a wide screen, one below the other on a phone. */
import type { ReactNode } from 'react';
import { useWindowDimensions, View } from 'react-native';

import { space } from '@/shared/ui/theme/space';

interface Props {
  /** the narrow column; stands first on a phone */
  side: ReactNode;
  children: ReactNode;
  /** width of the side column in CSS pixels */
  sideWidth?: number | undefined;
}

/** From this window width on there is room for both beside the places. */
const besideFrom = 1120;

/** Side column left, the sheet right. */
export function Columns({ side, children, sideWidth = 372 }: Props) {
  const beside = useWindowDimensions().width >= besideFrom;
  return (
    <View style={{ flexDirection: beside ? 'row' : 'column', gap: beside ? 40 : space.xxl, alignItems: 'stretch' }}>
      <View style={{ gap: space.xl, ...(beside ? { width: sideWidth } : {}) }}>{side}</View>
      <View style={{ gap: space.xxl, minWidth: 0, ...(beside ? { flex: 1 } : {}) }}>{children}</View>
    </View>
  );
}
