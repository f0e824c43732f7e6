/** What the supply did over a run, drawn along time. */
import { Text, View } from 'react-native';

import { PowerPattern } from '@/shared/ui/components/PowerPattern';
import { powerTotals, powerVisual, spanWords } from '@/shared/ui/components/powerVisual';
import type { PowerSegment } from '@/shared/ui/components/powerVisual';
import { line, space } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  /** what is drawn, as "Power at the bench, 09:12 to 10:52" */
  title: string;
  /** in the order in which they happened */
  segments: readonly PowerSegment[];
}

/** A ruled strip of power states with a legend of those that occur, and the time spent in each. */
export function PowerStrip({ title, segments }: Props) {
  const { colors } = useTheme();
  const totals = powerTotals(segments);
  const words = totals.map(({ state, seconds }) => `${powerVisual(state).word.toLowerCase()} ${spanWords(seconds)}`).join('; ');
  return (
    <View style={{ gap: space.s, alignSelf: 'stretch' }}>
      <View
        role="img"
        aria-label={`${title}: ${words || 'nothing recorded'}`}
        style={{ flexDirection: 'row', height: 44, borderWidth: line.rule, borderColor: colors.ink, backgroundColor: colors.raised }}
      >
        {segments.map(({ state, seconds }, at) => (
          <View
            key={`${at}-${state}`}
            style={{
              flexGrow: Math.max(seconds, 0),
              flexBasis: 3,
              flexShrink: 0,
              borderRightWidth: at < segments.length - 1 ? line.hair : 0,
              borderRightColor: colors.ink,
              overflow: 'hidden',
            }}
          >
            <PowerPattern state={state} width="100%" height="100%" />
          </View>
        ))}
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.xl, rowGap: space.s }} aria-hidden>
        {totals.map(({ state, seconds }) => (
          <View key={state} style={{ flexDirection: 'row', alignItems: 'center', gap: space.s }}>
            <View style={{ width: 28, height: 18, borderWidth: line.hair, borderColor: colors.ink }}>
              <PowerPattern state={state} width="100%" height="100%" />
            </View>
            <Text style={[type.small, { color: colors.ink }]}>{`${powerVisual(state).word.toLowerCase()}, ${spanWords(seconds)}`}</Text>
          </View>
        ))}
      </View>
    </View>
  );
}
