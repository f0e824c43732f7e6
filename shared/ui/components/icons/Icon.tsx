/** One drawing of our own set. */
import Svg, { Path } from 'react-native-svg';

import { iconPaths } from '@/shared/ui/components/icons/iconPaths';
import type { Drawing, IconName } from '@/shared/ui/components/icons/iconPaths';

interface Props {
  name: IconName;
  /** side in CSS pixels */
  size: number;
  color: string;
  /** line weight on the 24 grid */
  weight?: number | undefined;
}

/** Always beside a word: hidden from screen readers, which read the word. */
export function Icon({ name, size, color, weight = 2 }: Props) {
  const drawing: Drawing = iconPaths[name];
  return (
    <Svg width={size} height={size} viewBox="0 0 24 24" aria-hidden>
      {drawing.fill ? <Path d={drawing.fill} fill={color} /> : null}
      <Path d={drawing.stroke} fill="none" stroke={color} strokeWidth={weight} strokeLinecap="square" strokeLinejoin="miter" />
    </Svg>
  );
}
