/** What each line, band and numbered point of a plot is. */
import type { ReactNode } from 'react';
import { useId } from 'react';
import { View } from 'react-native';
import Svg, { Defs, Line, Path, Pattern, Rect } from 'react-native-svg';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Mono } from '@/shared/ui/components/Mono';
import { CallOut } from '@/shared/ui/components/CallOut';
import { limitStroke, strokedCurves } from '@/shared/ui/components/plotLook';
import type { Stroke } from '@/shared/ui/components/plotLook';
import { BAND_PATHS } from '@/shared/ui/components/PlotMarks';
import { space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Plot, PlotAxis, PlotBand } from '@/shared/workings/plot';

/** Points first: they are what is asked for. */
export function PlotKey({ plot }: { plot: Plot }) {
  const { colors } = useTheme();
  const curves = strokedCurves(plot, colors).reverse();
  return (
    <View
      role="list"
      aria-label={`Key of ${plot.title}`}
      style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.xl, rowGap: space.xs }}
    >
      {plot.points.map((point, i) => (
        <Entry
          key={`p${point.label}`}
          sample={<CallOut number={i + 1} />}
          label={point.label}
          value={`${shown(plot.x, point.x)}; ${shown(plot.y, point.y)}`}
        />
      ))}
      {curves.map(({ curve, stroke }) => (
        <Entry key={`c${curve.label}`} sample={<LineSample stroke={stroke} />} label={curve.label} />
      ))}
      {plot.limits.map((limit) => (
        <Entry
          key={`l${limit.label}`}
          sample={<LineSample stroke={limitStroke(colors)} />}
          label={limit.label}
          value={shown(plot[limit.axis], limit.at)}
        />
      ))}
      {plot.bands.map((band) => (
        <Entry key={`b${band.label}`} sample={<BandSample role={band.role} />} label={band.label} />
      ))}
    </View>
  );
}

function shown({ unit }: PlotAxis, value: number): string {
  return unit === '' ? formatNumber(value, 3) : formatQuantity(value, unit, { digits: 3 });
}

function Entry({ sample, label, value }: { sample: ReactNode; label: string; value?: string }) {
  return (
    <View role="listitem" style={{ flexDirection: 'row', alignItems: 'center', gap: space.s, maxWidth: '100%' }}>
      <View aria-hidden>{sample}</View>
      <View style={{ flexShrink: 1 }}>
        <BodyText size="small">
          {label}
          {value === undefined ? null : (
            <>
              {': '}
              <Mono inline whole>
                {value}
              </Mono>
            </>
          )}
        </BodyText>
      </View>
    </View>
  );
}

function LineSample({ stroke }: { stroke: Stroke }) {
  return (
    <Svg width={40} height={24}>
      <Line
        x1={0}
        x2={40}
        y1={12}
        y2={12}
        stroke={stroke.color}
        strokeWidth={stroke.width}
        strokeDasharray={stroke.dash}
      />
    </Svg>
  );
}

function BandSample({ role }: { role: PlotBand['role'] }) {
  const { colors } = useTheme();
  const id = `k${useId().replaceAll(/[^a-z0-9]/gi, '')}`;
  const color = { good: colors.action, close: colors.brass, bad: colors.inkSoft }[role];
  return (
    <Svg width={40} height={24}>
      <Defs>
        <Pattern id={id} width={9} height={9} patternUnits="userSpaceOnUse">
          <Path d={BAND_PATHS[role]} stroke={color} strokeWidth={role === 'close' ? 1.6 : 0.9} />
        </Pattern>
      </Defs>
      <Rect x={1} y={3} width={38} height={18} fill={`url(#${id})`} stroke={color} strokeWidth={1.2} />
    </Svg>
  );
}
