/** A terminal strip drawn from its points, with the meter's leads where they belong. */
import { useState } from 'react';
import { View } from 'react-native';
import Svg, { Circle, G, Line, Rect, Text as SvgText } from 'react-native-svg';

import { BodyText } from '@/shared/ui/components/BodyText';
import { figureRows, figureWords } from '@/shared/ui/components/figureWords';
import type { FigurePoint } from '@/shared/ui/components/figureWords';
import { space } from '@/shared/ui/theme/space';
import { face, smallestTextPx } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  /** which strip, as "Supply terminals" */
  title: string;
  /** in the order in which they stand on the machine */
  points: readonly FigurePoint[];
  /** false where the words stand elsewhere on the page */
  caption?: boolean | undefined;
}

const rowHeight = 84;

/** Every screw is drawn; a lead is told by its letter and its ring, not by colour alone. */
export function Figure({ title, points, caption = true }: Props) {
  const [width, setWidth] = useState(320);
  // the names stand below the screws without touching: a mono figure is 10 px wide
  const pitchLeast = Math.max(44, ...points.map((point) => point.name.length * 10 + 8));
  const rows = figureRows(points, Math.max(1, Math.floor((width - 2) / pitchLeast)));
  const widest = Math.max(1, ...rows.map((row) => row.length));
  const pitch = Math.min(84, (width - 2) / widest);
  const words = figureWords(points);
  return (
    <View style={{ alignSelf: 'stretch', gap: space.xs }} onLayout={(e) => setWidth(e.nativeEvent.layout.width || 320)}>
      <View role="img" aria-label={`${title}: ${words}`}>
        <Svg width={width} height={rows.length * rowHeight} aria-hidden>
          {rows.map((row, at) => (
            <Strip key={row[0]?.id ?? at} points={row} pitch={pitch} top={at * rowHeight} />
          ))}
        </Svg>
      </View>
      {caption && points.some((point) => point.highlight) ? (
        <BodyText size="small" tone="soft">
          {words}
        </BodyText>
      ) : null}
    </View>
  );
}

function Strip({ points, pitch, top }: { points: readonly FigurePoint[]; pitch: number; top: number }) {
  const { colors } = useTheme();
  return (
    <G>
      <Rect x={1} y={top + 18} width={points.length * pitch} height={38} fill={colors.raised} stroke={colors.ink} strokeWidth={1.5} />
      {points.map((point, at) => (
        <Terminal key={point.id} point={point} x={1 + pitch * (at + 0.5)} y={top + 37} />
      ))}
    </G>
  );
}

function Terminal({ point, x, y }: { point: FigurePoint; x: number; y: number }) {
  const { colors } = useTheme();
  const lead = point.highlight;
  const leadInk = lead === 'red' ? colors.brass : colors.ink;
  return (
    <G>
      <Circle cx={x} cy={y} r={10.5} fill="none" stroke={lead ? leadInk : colors.ink} strokeWidth={1.5} />
      <Line x1={x - 6.5} y1={y + 6.5} x2={x + 6.5} y2={y - 6.5} stroke={colors.ink} strokeWidth={1.5} />
      {lead ? (
        <G>
          <Circle
            cx={x}
            cy={y}
            r={14}
            fill="none"
            stroke={leadInk}
            strokeWidth={3.5}
            {...(lead === 'black' ? {} : { strokeDasharray: '6 2.5' })}
          />
          <Line x1={x} y1={y - 36} x2={x} y2={y} stroke={leadInk} strokeWidth={3.5} />
          <SvgText x={x + 6} y={y - 23} fill={leadInk} fontFamily={face.textBold} fontSize={smallestTextPx} textAnchor="start">
            {lead === 'red' ? 'R' : 'B'}
          </SvgText>
        </G>
      ) : null}
      <SvgText
        x={x}
        y={y + 40}
        fill={lead ? colors.ink : colors.inkSoft}
        fontFamily={lead ? face.monoBold : face.mono}
        fontSize={smallestTextPx}
        textAnchor="middle"
      >
        {point.name}
      </SvgText>
    </G>
  );
}
