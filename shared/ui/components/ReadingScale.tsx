/** A reading drawn on a ruled panel-meter scale with its limits, guard bands and a needle in ink. */
import { useId, useState } from 'react';
import { View } from 'react-native';
import Svg, { Defs, G, Line, Path, Pattern, Rect, Text as SvgText } from 'react-native-svg';

import { scaleModel } from '@/shared/ui/components/scaleModel';
import type { ScaleInput, ScaleModel } from '@/shared/ui/components/scaleModel';
import { plainNumber, scaleWords } from '@/shared/ui/components/scaleWords';
import { smallestTextPx, type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props extends ScaleInput {
  unit: string;
  /** prints a number of the label's words; four significant figures unless told */
  format?: ((n: number) => string) | undefined;
}

const height = 82;
const base = 52;
const bandTop = 25;
const bandHeight = 18;
const margin = 26;
/** room for a label of six figures */
const labelPitch = 66;

/** Takes the width it is given; labels keep their size and get fewer when it is narrow. */
export function ReadingScale({ unit, format, ...input }: Props) {
  const [width, setWidth] = useState(320);
  const model = scaleModel(input, Math.floor((width - 2 * margin) / labelPitch));
  const x = (n: number) => margin + ((n - model.min) / (model.max - model.min)) * (width - 2 * margin);
  return (
    <View
      role="img"
      aria-label={scaleWords(input, unit, format)}
      style={{ alignSelf: 'stretch', height }}
      onLayout={(e) => setWidth(e.nativeEvent.layout.width || 320)}
    >
      <Svg width={width} height={height} aria-hidden>
        <Band model={model} x={x} openLow={input.low === null} openHigh={input.high === null} />
        <Ruling model={model} x={x} width={width} />
        <Nominal at={input.nominal ?? null} model={model} x={x} />
        <Needle model={model} x={x} />
      </Svg>
    </View>
  );
}

interface PartProps {
  model: ScaleModel;
  x: (n: number) => number;
}

function Band({ model, x, openLow, openHigh }: PartProps & { openLow: boolean; openHigh: boolean }) {
  const { colors } = useTheme();
  const id = `h${useId().replaceAll(/[^a-z0-9]/gi, '')}`;
  if (!model.band) return null;
  const [from, to] = [x(model.band.from), x(model.band.to)];
  const bottom = bandTop + bandHeight;
  const clear = model.guards.map((g) => ({ from: x(g.from), to: x(g.to) }));
  return (
    <G>
      <Defs>
        <Pattern id={id} width={7} height={7} patternUnits="userSpaceOnUse">
          <Path d="M-1 8 8 -1M-2 2 2 -2M5 9 9 5" stroke={colors.action} strokeWidth={1} />
        </Pattern>
      </Defs>
      <Rect x={from} y={bandTop} width={Math.max(0, to - from)} height={bandHeight} fill={`url(#${id})`} />
      <Path d={`M${from} ${bandTop}H${to}M${from} ${bottom}H${to}`} stroke={colors.action} strokeWidth={1.5} fill="none" />
      {clear.map((g) => (
        <Rect
          key={g.from}
          x={g.from}
          y={bandTop}
          width={Math.max(2, g.to - g.from)}
          height={bandHeight}
          fill={colors.paper}
          stroke={colors.brass}
          strokeWidth={1.5}
          strokeDasharray="3 2.5"
        />
      ))}
      {openLow ? null : <Line x1={from} x2={from} y1={bandTop - 4} y2={base} stroke={colors.action} strokeWidth={2.5} />}
      {openHigh ? null : <Line x1={to} x2={to} y1={bandTop - 4} y2={base} stroke={colors.action} strokeWidth={2.5} />}
    </G>
  );
}

function Ruling({ model, x, width }: PartProps & { width: number }) {
  const { colors } = useTheme();
  return (
    <G>
      <Line x1={margin - 14} x2={width - margin + 14} y1={base} y2={base} stroke={colors.ink} strokeWidth={2} />
      {model.ticks.map((tick) => (
        <Line
          key={tick.at}
          x1={x(tick.at)}
          x2={x(tick.at)}
          y1={base - (tick.major ? 9 : 5)}
          y2={base}
          stroke={colors.ink}
          strokeWidth={tick.major ? 1.6 : 1}
        />
      ))}
      {model.ticks
        .filter((tick) => tick.major)
        .map((tick) => (
          <SvgText
            key={tick.at}
            x={x(tick.at)}
            y={base + 22}
            fill={colors.inkSoft}
            fontFamily={type.mono.fontFamily}
            fontSize={smallestTextPx}
            textAnchor="middle"
          >
            {plainNumber(tick.at, model.decimals)}
          </SvgText>
        ))}
    </G>
  );
}

function Nominal({ at, model, x }: PartProps & { at: number | null }) {
  const { colors } = useTheme();
  if (at === null || at < model.min || at > model.max) return null;
  return <Path d={`M${x(at) - 4} ${base + 8}l4 -7 4 7z`} fill={colors.brass} />;
}

function Needle({ model, x }: PartProps) {
  const { colors } = useTheme();
  if (!model.needle) return null;
  const at = x(model.needle.at);
  const off = model.needle.off;
  if (off) {
    const way = off === 'low' ? -1 : 1;
    // beyond the scale: an arrow at its end instead of a needle that would point at a wrong number
    return <Path d={`M${at - way * 22} 11h${way * 22}v-8l${way * 16} 13 ${-way * 16} 13v-8h${-way * 22}z`} fill={colors.ink} />;
  }
  return <Path d={`M${at - 7} 4h14L${at + 1.2} ${base}h-2.4z`} fill={colors.ink} />;
}
