/** The way to the places of the workshop: at the foot of a phone, at the left of a wide screen. */
import { Text, useWindowDimensions, View } from 'react-native';

import { Icon } from '@/shared/ui/components/icons/Icon';
import { placeIcon, placeMarked, placesShown } from '@/shared/ui/components/placesShown';
import type { Place, PlaceName } from '@/shared/ui/components/placesShown';
import { RouteLink } from '@/shared/ui/components/RouteLink';
import { isWide, line, space } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webStyle } from '@/shared/ui/theme/webStyle';

interface Props {
  places: readonly Place[];
  current: PlaceName | null;
}

/** Ruled, square, with the current place in reverse. Not shown during a run. */
export function PlacesBar({ places, current }: Props) {
  const { colors } = useTheme();
  const wide = isWide(useWindowDimensions().width);
  const shown = placesShown(places, wide);
  const marked = placeMarked(shown, current);
  const bar = wide
    ? { width: 188, paddingVertical: space.xl, borderRightWidth: line.rule, borderRightColor: colors.ink }
    : { flexDirection: 'row' as const, borderTopWidth: line.rule, borderTopColor: colors.ink };
  return (
    <View
      role="navigation"
      aria-label="Places"
      style={[bar, { backgroundColor: colors.paper }, webStyle({ paddingBottom: wide ? space.xl : 'env(safe-area-inset-bottom)' })]}
    >
      {wide ? (
        <Text style={[type.section, { color: colors.ink, paddingHorizontal: space.l, paddingBottom: space.l }]}>Lampstep</Text>
      ) : null}
      {shown.map((place, index) => {
        const here = place.name === marked;
        const ink = here ? colors.paper : colors.ink;
        return (
          <RouteLink
            key={place.name}
            href={place.href}
            current={here}
            style={(hovered) => [
              { backgroundColor: here ? colors.ink : hovered ? colors.tint : 'transparent', alignItems: 'center', gap: wide ? space.m : 2 },
              wide
                ? {
                    flexDirection: 'row',
                    minHeight: 52,
                    paddingHorizontal: space.l,
                    borderTopWidth: line.hair,
                    borderTopColor: colors.rule,
                  }
                : {
                    flex: 1,
                    minHeight: 60,
                    justifyContent: 'center',
                    borderLeftWidth: index === 0 ? 0 : line.hair,
                    borderLeftColor: colors.rule,
                  },
            ]}
            ringInside
          >
            <Icon name={placeIcon(place.name)} size={24} color={ink} weight={1.7} />
            <Text style={[wide ? type.sub : type.label, { color: ink, letterSpacing: wide ? 0 : 0.2 }]}>{place.name}</Text>
          </RouteLink>
        );
      })}
    </View>
  );
}
