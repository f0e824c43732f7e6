/** A place of one potential: its rule, its name and its volts. */
import { G, Line, Rect, Text as SvgText } from 'react-native-svg';

import { voltsOf } from '@/shared/ui/components/circuitModel';
import type { PlacedNode } from '@/shared/ui/components/circuitModel';
import { face, smallestTextPx } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** Set like a reading; turned over where something is wrong with it. */
export function CircuitNodeRule({ placed: { node, x1, x2, y } }: { placed: PlacedNode }) {
  const { colors } = useTheme();
  const atLeft = node.side === 'supply';
  const x = atLeft ? 6 : x2 + 10;
  const volts = voltsOf(node);
  const wrong = node.trouble !== undefined;
  return (
    <G>
      <Line x1={x1} x2={x2} y1={y} y2={y} stroke={colors.ink} strokeWidth={2.5} />
      <SvgText x={x} y={y - 4} fill={colors.ink} fontFamily={face.text} fontSize={smallestTextPx}>
        {node.label}
      </SvgText>
      {wrong ? <Rect x={x - 3} y={y + 3} width={volts.length * 9.8 + 6} height={21} fill={colors.ink} /> : null}
      <SvgText
        x={x}
        y={y + 19}
        fill={wrong ? colors.paper : colors.ink}
        fontFamily={wrong ? face.monoBold : face.mono}
        fontSize={smallestTextPx}
      >
        {volts}
      </SvgText>
    </G>
  );
}
