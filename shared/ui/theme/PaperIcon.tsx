/** Stands in for the icon font that Paper asks for by name: a few signs drawn on a 24 × 24 grid. */
import Svg, { Path } from 'react-native-svg';

const paths: Readonly<Record<string, string>> = {
  check: 'M4 12.5 9.5 18 20 6.5',
  close: 'M5 5l14 14M19 5L5 19',
  'chevron-down': 'M4 8.5l8 8 8-8',
  'chevron-up': 'M4 15.5l8-8 8 8',
  'chevron-right': 'M8.5 4l8 8-8 8',
  'arrow-left': 'M20 12H4M11 5l-7 7 7 7',
  minus: 'M4 12h16',
  alert: 'M12 4v10M12 18.5v1.5',
  eye: 'M2 12c5-8 15-8 20 0-5 8-15 8-20 0zM12 9a3 3 0 100 6 3 3 0 000-6z',
};

interface Props {
  name: string;
  size: number;
  color: string;
}

/** One of the signs above; a name that is not ours is drawn as a plain square so that it is seen and mended. */
export default function PaperIcon({ name, size, color }: Props) {
  return (
    <Svg width={size} height={size} viewBox="0 0 24 24" aria-hidden>
      <Path d={paths[name] ?? 'M4 4h16v16H4z'} fill="none" stroke={color} strokeWidth={2} strokeLinecap="square" />
    </Svg>
  );
}
