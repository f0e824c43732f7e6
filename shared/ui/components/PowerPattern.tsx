/** The pattern that tells a power state apart without colour. */
import { useId } from 'react';
import Svg, { Circle, Defs, Path, Pattern, Rect } from 'react-native-svg';

import { powerVisual } from '@/shared/ui/components/powerVisual';
import type { PowerPatternName, PowerState } from '@/shared/ui/components/powerVisual';

interface Props {
  state: PowerState;
  width: number | `${number}%`;
  height: number | `${number}%`;
}

/** Side of the repeating tile of each pattern, in CSS pixels. */
const tiles: Readonly<Record<PowerPatternName, number>> = { plain: 12, dashes: 12, dots: 12, ticks: 11, diagonal: 16, chequer: 20 };

/** A patch of a power state's ground and pattern. Never laid under words. */
export function PowerPattern({ state, width, height }: Props) {
  const { ground, pattern, patternInk } = powerVisual(state);
  // two drawings with one id would share the first one's tile, and lose it when that one is hidden
  const id = `p${useId().replaceAll(/[^a-z0-9]/gi, '')}`;
  const tile = tiles[pattern];
  return (
    <Svg width={width} height={height} aria-hidden>
      <Defs>
        <Pattern id={id} width={tile} height={tile} patternUnits="userSpaceOnUse">
          <Tile pattern={pattern} ink={patternInk} />
        </Pattern>
      </Defs>
      <Rect width="100%" height="100%" fill={ground} />
      {pattern === 'plain' ? null : <Rect width="100%" height="100%" fill={`url(#${id})`} />}
    </Svg>
  );
}

function Tile({ pattern, ink }: { pattern: PowerPatternName; ink: string }) {
  if (pattern === 'dots') return <Circle cx={6} cy={6} r={1.9} fill={ink} />;
  if (pattern === 'dashes') return <Path d="M6 1.5v9" stroke={ink} strokeWidth={3} />;
  if (pattern === 'ticks') return <Path d="M5.5 0v11" stroke={ink} strokeWidth={2} />;
  if (pattern === 'diagonal') return <Path d="M-4 12 4 20M-4 -4 20 20M12 -4 20 4" stroke={ink} strokeWidth={4.5} />;
  if (pattern === 'chequer') return <Path d="M0 0h10v10H0zM10 10h10v10H10z" fill={ink} />;
  return null;
}
