/** What stands in the field of a plot: bands, limits, curves, and numbered points. */
import { line as lineThrough } from 'd3-shape';
import { Fragment, useId } from 'react';
import { Circle, ClipPath, Defs, G, Line, Path, Pattern, Rect, Text as SvgText } from 'react-native-svg';

import { limitStroke, strokedCurves } from '@/shared/ui/components/plotLook';
import type { PlotModel } from '@/shared/ui/components/plotModel';
import { smallestTextPx, type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';
import type { Plot, PlotBand, PlotPair } from '@/shared/workings/plot';

interface Props {
  plot: Plot;
  model: PlotModel;
}

const STUD = 12;

/** Points are call-outs with the number under which the key tells of them. */
export function PlotMarks({ plot, model }: Props) {
  const { colors } = useTheme();
  const id = `p${useId().replaceAll(/[^a-z0-9]/gi, '')}`;
  const { x, y, left, right, top, bottom } = model;
  const path = lineThrough<PlotPair>(
    (pair) => x.px(pair[0]),
    (pair) => y.px(pair[1]),
  );
  const limit = limitStroke(colors);
  return (
    <G>
      <Defs>
        <ClipPath id={`${id}c`}>
          <Rect x={left} y={top} width={right - left} height={bottom - top} />
        </ClipPath>
      </Defs>
      {plot.bands.map((band) => (
        <Band key={band.label} band={band} model={model} id={`${id}${band.role}`} />
      ))}
      {plot.limits.map((at) => {
        const place =
          at.axis === 'x'
            ? { x1: x.px(at.at), x2: x.px(at.at), y1: top, y2: bottom }
            : { x1: left, x2: right, y1: y.px(at.at), y2: y.px(at.at) };
        return <Line key={at.label} {...place} stroke={limit.color} strokeWidth={limit.width} strokeDasharray={limit.dash} />;
      })}
      <G clipPath={`url(#${id}c)`}>
        {strokedCurves(plot, colors).map(({ curve, stroke }) => (
          <Path
            key={curve.label}
            d={path(curve.points) ?? ''}
            fill="none"
            stroke={stroke.color}
            strokeWidth={stroke.width}
            strokeDasharray={stroke.dash}
          />
        ))}
      </G>
      {plot.points.map((point, i) => {
        const [px, py] = [x.px(point.x), y.px(point.y)];
        // the call-out stands where there is room for it
        const sx = px > right - 40 ? px - 26 : px + 26;
        const sy = py < top + 34 ? py + 24 : py - 24;
        return (
          <Fragment key={point.label}>
            <Line x1={px} y1={py} x2={sx} y2={sy} stroke={colors.ink} strokeWidth={1.5} />
            <Circle cx={px} cy={py} r={6} fill={point.role === 'answer' ? colors.ink : colors.paper} stroke={colors.ink} strokeWidth={2} />
            {point.role === 'reading' ? <Circle cx={px} cy={py} r={2} fill={colors.ink} /> : null}
            <Circle cx={sx} cy={sy} r={STUD} fill={colors.paper} stroke={colors.ink} strokeWidth={1.5} />
            <SvgText x={sx} y={sy + 5.5} textAnchor="middle" fill={colors.ink} fontFamily={type.mono.fontFamily} fontSize={smallestTextPx}>
              {i + 1}
            </SvgText>
          </Fragment>
        );
      })}
    </G>
  );
}

function Band({ band, model, id }: { band: PlotBand; model: PlotModel; id: string }) {
  const { colors } = useTheme();
  const { x, y, left, right, top, bottom } = model;
  const across = band.axis === 'x';
  const axis = across ? x : y;
  const [from, to] = [axis.px(band.from ?? axis.from), axis.px(band.to ?? axis.to)];
  const low = Math.min(from, to);
  const size = Math.max(1, Math.abs(to - from));
  const box = across ? { x: low, y: top, width: size, height: bottom - top } : { x: left, y: low, width: right - left, height: size };
  const color = { good: colors.action, close: colors.brass, bad: colors.inkSoft }[band.role];
  return (
    <G>
      <Defs>
        <Pattern id={id} width={9} height={9} patternUnits="userSpaceOnUse">
          <Path d={BAND_PATHS[band.role]} stroke={color} strokeWidth={band.role === 'close' ? 1.6 : 0.9} />
        </Pattern>
      </Defs>
      <Rect {...box} fill={`url(#${id})`} />
      <Rect {...box} fill="none" stroke={color} strokeWidth={1.2} />
    </G>
  );
}

/** Good is hatched, close is dotted, bad is cross-hatched. */
export const BAND_PATHS: Readonly<Record<PlotBand['role'], string>> = {
  good: 'M-1 10 10 -1M-2 2 2 -2M7 11 11 7',
  close: 'M4 4h1.6',
  bad: 'M-1 10 10 -1M-1 -1 10 10',
};
