/** The strip across the top of every run screen that says what the supply is doing. */
import { Pressable, Text, View } from 'react-native';

import { Icon } from '@/shared/ui/components/icons/Icon';
import { PowerPattern } from '@/shared/ui/components/PowerPattern';
import { powerVisual } from '@/shared/ui/components/powerVisual';
import type { PowerState } from '@/shared/ui/components/powerVisual';
import { line, space, stud, target } from '@/shared/ui/theme/space';
import { face, type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webProps } from '@/shared/ui/theme/webStyle';

interface Props {
  state: PowerState;
  /** what is in circuit, since when */
  detail?: string | undefined;
  /** where the run stands, as "14/31" */
  place?: string | undefined;
  /** shows the way through the tree; without it the place is only printed */
  onPressPlace?: (() => void) | undefined;
}

const height = 60;

/** Supply state as word, symbol, pattern and colour; a change is read out at once. */
export function PowerBand({ state, detail, place, onPressPlace }: Props) {
  const { colors } = useTheme();
  const v = powerVisual(state);
  return (
    <View
      style={{
        flexDirection: 'row',
        minHeight: height,
        backgroundColor: v.ground,
        borderBottomWidth: line.rule,
        borderBottomColor: colors.ink,
      }}
    >
      <View style={{ width: stud.column, borderRightWidth: line.rule, borderRightColor: v.ink, overflow: 'hidden' }}>
        <View style={{ position: 'absolute', top: 0, bottom: 0, left: 0, right: 0 }}>
          <PowerPattern state={state} width="100%" height="100%" />
        </View>
        <View style={{ flex: 1, alignItems: 'center', justifyContent: 'center' }}>
          <View style={{ backgroundColor: v.ground, padding: 5 }}>
            <Icon name={v.symbol} size={30} color={v.ink} />
          </View>
        </View>
      </View>
      <View
        role="status"
        aria-label="Supply"
        aria-live="assertive"
        style={{ flex: 1, justifyContent: 'center', paddingHorizontal: space.m, paddingVertical: space.xs }}
      >
        <Text style={[type.section, { color: v.ink, textTransform: 'uppercase', letterSpacing: 0.8, lineHeight: 28 }]}>{v.word}</Text>
        {detail ? <Text style={[type.small, { color: v.ink, lineHeight: 20 }]}>{detail}</Text> : null}
      </View>
      {place ? <Place place={place} ink={v.ink} onPress={onPressPlace} /> : null}
    </View>
  );
}

function Place({ place, ink, onPress }: { place: string; ink: string; onPress: (() => void) | undefined }) {
  const [step, of] = place.split('/');
  const words = `Step ${step ?? place}${of ? ` of ${of}` : ''}`;
  const printed = (
    <Text style={{ fontFamily: face.monoBold, fontSize: 22, lineHeight: 28, color: ink }} aria-hidden>
      {step}
      {of ? <Text style={{ fontFamily: face.mono }}>{`/${of}`}</Text> : null}
    </Text>
  );
  const box = { justifyContent: 'center', paddingHorizontal: 10, minWidth: target.control } as const;
  if (!onPress) {
    return (
      <View role="img" aria-label={words} style={box}>
        {printed}
      </View>
    );
  }
  return (
    <Pressable
      role="button"
      aria-label={`${words}: show the way`}
      onPress={onPress}
      style={[box, { borderLeftWidth: line.rule, borderLeftColor: ink }]}
      {...webProps({ dataSet: { ring: 'inside' } })}
    >
      {printed}
    </Pressable>
  );
}
