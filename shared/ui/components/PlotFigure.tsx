/** A plot on ruled paper: axes and limits in the drawing, what each line is in a key below it, and what it shows in words. */
import { useId, useState } from 'react';
import { View } from 'react-native';
import Svg from 'react-native-svg';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Label } from '@/shared/ui/components/Label';
import { PlotAxes } from '@/shared/ui/components/PlotAxes';
import { PlotKey } from '@/shared/ui/components/PlotKey';
import { PlotMarks } from '@/shared/ui/components/PlotMarks';
import { plotModel } from '@/shared/ui/components/plotModel';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';
import type { Plot } from '@/shared/workings/plot';

/** A phone's sheet; the first drawing before the real width is known. */
const FIRST_WIDTH = 358;
/** Narrower than this there is no room for the axes. */
const LEAST_WIDTH = 120;
const [LOWEST, TALLEST] = [270, 400];

/** Takes the width that it is given. */
export function PlotFigure({ plot }: { plot: Plot }) {
  const { colors } = useTheme();
  const id = useId();
  const [width, setWidth] = useState(FIRST_WIDTH);
  const height = Math.round(Math.min(TALLEST, Math.max(LOWEST, width * 0.6)));
  const model = plotModel(plot, width, height);
  return (
    <View style={{ alignSelf: 'stretch', gap: space.s }}>
      <Label level={3}>{plot.title}</Label>
      <View
        role="img"
        aria-label={plot.title}
        aria-describedby={id}
        style={{ height, alignSelf: 'stretch', backgroundColor: colors.raised, borderWidth: line.hair, borderColor: colors.rule }}
        // a page on its way out is laid out with no width at all
        onLayout={({ nativeEvent: { layout } }) => setWidth(layout.width > LEAST_WIDTH ? Math.floor(layout.width - 2 * line.hair) : FIRST_WIDTH)}
      >
        <Svg width={width} height={height} aria-hidden>
          <PlotAxes model={model} width={width} height={height} />
          <PlotMarks plot={plot} model={model} />
        </Svg>
      </View>
      <PlotKey plot={plot} />
      <BodyText id={id} size="small" tone="soft">
        {plot.words}
      </BodyText>
    </View>
  );
}
