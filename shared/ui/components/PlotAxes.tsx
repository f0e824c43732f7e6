/** The ruled field of a plot with its two axes. */
import { G, Line, Rect, Text as SvgText } from 'react-native-svg';

import type { PlotModel } from '@/shared/ui/components/plotModel';
import { face, smallestTextPx, type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  model: PlotModel;
  width: number;
  height: number;
}

/** Rules at the labelled ticks only, like graph paper that is used at the bench; titles stand level so that nobody tilts the head. */
export function PlotAxes({ model, width, height }: Props) {
  const { colors } = useTheme();
  const { x, y, left, right, top, bottom } = model;
  const words = { fill: colors.inkSoft, fontFamily: type.mono.fontFamily, fontSize: smallestTextPx };
  const title = { fill: colors.ink, fontFamily: face.text, fontSize: smallestTextPx };
  return (
    <G>
      <Rect x={left} y={top} width={right - left} height={bottom - top} fill={colors.paper} />
      {y.ticks.map((tick) => (
        <G key={tick.at}>
          <Line
            x1={tick.label === null ? left - 5 : left - 8}
            x2={tick.label === null ? left : right}
            y1={tick.at}
            y2={tick.at}
            stroke={colors.rule}
            strokeWidth={1}
          />
          {tick.label === null ? null : (
            <SvgText x={left - 11} y={tick.at + 5.5} textAnchor="end" {...words}>
              {tick.label}
            </SvgText>
          )}
        </G>
      ))}
      {x.ticks.map((tick) => (
        <G key={tick.at}>
          <Line
            x1={tick.at}
            x2={tick.at}
            y1={tick.label === null ? bottom : top}
            y2={bottom + (tick.label === null ? 5 : 8)}
            stroke={colors.rule}
            strokeWidth={1}
          />
          {tick.label === null ? null : (
            <SvgText x={Math.min(tick.at, width - tick.label.length * 4.9 - 2)} y={bottom + 24} textAnchor="middle" {...words}>
              {tick.label}
            </SvgText>
          )}
        </G>
      ))}
      <Line x1={left} x2={left} y1={top} y2={bottom} stroke={colors.ink} strokeWidth={2} />
      <Line x1={left - 1} x2={right} y1={bottom} y2={bottom} stroke={colors.ink} strokeWidth={2} />
      <SvgText x={8} y={20} {...title}>
        {y.title}
      </SvgText>
      <SvgText x={right} y={height - 8} textAnchor="end" {...title}>
        {x.title}
      </SvgText>
    </G>
  );
}
