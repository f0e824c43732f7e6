/** A page with the places bar at its side or foot. */
import type { ReactNode } from 'react';
import { useWindowDimensions, View } from 'react-native';

import { PlacesBar } from '@/shared/ui/components/PlacesBar';
import type { Place, PlaceName } from '@/shared/ui/components/placesShown';
import { isWide } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  places: readonly Place[];
  current: PlaceName | null;
  /** no bar, as during a run */
  bare?: boolean | undefined;
  children: ReactNode;
}

/** Lays the bar left on a wide screen, at the foot on a phone. */
export function PlacesFrame({ places, current, bare = false, children }: Props) {
  const { colors } = useTheme();
  const wide = isWide(useWindowDimensions().width);
  return (
    <View style={{ flex: 1, minHeight: 0, flexDirection: wide ? 'row' : 'column-reverse', backgroundColor: colors.paper }}>
      {bare ? null : <PlacesBar places={places} current={current} />}
      <View style={{ flex: 1, minWidth: 0, minHeight: 0 }}>{children}</View>
    </View>
  );
}
