/** The cut corner of things that can be picked up. */
import { View } from 'react-native';
import Svg, { Path } from 'react-native-svg';

import { line, notch } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  /** colour behind the thing, which shows where the corner is cut away; the page's paper unless told */
  ground?: string | undefined;
  /** colour of the line along the cut; none draws no line */
  edge?: string | undefined;
  /** width of the border of the thing that it sits in */
  border?: number | undefined;
}

/** Cuts the top right corner of the positioned box that it is placed in. */
export function NotchCorner({ ground, edge, border = line.rule }: Props) {
  const { colors } = useTheme();
  const side = notch + 2;
  return (
    <View style={{ position: 'absolute', top: -border, right: -border, width: side, height: side, pointerEvents: 'none' }} aria-hidden>
      <Svg width={side} height={side} viewBox={`0 0 ${side} ${side}`}>
        <Path d={`M0 -1H${side + 1}V${side}z`} fill={ground ?? colors.paper} />
        {edge ? <Path d={`M0 1L${side - 1} ${side}`} stroke={edge} strokeWidth={line.rule} /> : null}
      </Svg>
    </View>
  );
}
