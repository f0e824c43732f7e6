/** The warning that stands before an action: hazard, result and avoidance, to be read before the step goes on. */
import { Text, View } from 'react-native';
import Svg, { Path } from 'react-native-svg';

import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { SafetySign } from '@/shared/ui/components/icons/SafetySign';
import type { SignName } from '@/shared/ui/components/icons/SafetySign';
import { Rule } from '@/shared/ui/components/Rule';
import { signalVisual, worstSignal } from '@/shared/ui/components/warningVisual';
import type { SignalVisual, SignalWord } from '@/shared/ui/components/warningVisual';
import { line, space } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

export interface Hazard {
  id: string;
  signal: SignalWord;
  /** null where nobody can be hurt */
  sign: SignName | null;
  /** what can hurt, as "230 V mains on the inlet" */
  hazard: string;
  /** what it does, as "Shock can kill" */
  result: string;
  /** how not to be hurt; an action a line */
  avoid: readonly string[];
}

interface Props {
  hazards: readonly Hazard[];
  acknowledged: boolean;
  onAcknowledge: () => void;
}

const deferral = 'Local codes, the maker’s data and licensed practice come first.';

/** Shows all hazards of a step under the worst signal word, and asks once that they have been read. */
export function WarningGate({ hazards, acknowledged, onAcknowledge }: Props) {
  const { colors } = useTheme();
  const signal = signalVisual(worstSignal(hazards.map((h) => h.signal)));
  return (
    <View
      role="region"
      aria-label={`${signal.word}: read before you go on`}
      style={{ borderWidth: line.heavy, borderColor: colors.ink, backgroundColor: colors.raised, alignSelf: 'stretch' }}
    >
      <SignalPanel signal={signal} />
      {hazards.map((h, at) => (
        <View key={h.id}>
          {at > 0 ? <Rule /> : null}
          <HazardRow hazard={h} />
        </View>
      ))}
      <View style={{ padding: space.m, paddingTop: 0, gap: space.s }}>
        <BodyText size="small" tone="soft">
          {deferral}
        </BodyText>
        {acknowledged ? (
          <View role="status" style={{ flexDirection: 'row', gap: space.s, alignItems: 'center' }}>
            <Icon name="check" size={22} color={colors.ink} weight={3} />
            <BodyText bold>Read</BodyText>
          </View>
        ) : (
          <BigAnswer kind="primary" label="I have read this" ground={colors.raised} onPress={onAcknowledge} />
        )}
      </View>
    </View>
  );
}

function SignalPanel({ signal }: { signal: SignalVisual }) {
  const { colors } = useTheme();
  return (
    <View
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.m,
        paddingHorizontal: space.l,
        minHeight: 52,
        backgroundColor: signal.ground,
        borderBottomWidth: line.heavy,
        borderBottomColor: colors.ink,
      }}
    >
      {signal.alert ? (
        <Svg width={36} height={33} viewBox="0 0 36 33" aria-hidden>
          <Path d="M18 1 35 32H1z" fill={signal.ink} />
          <Path d="M18 11v11M18 26v2.4" stroke={signal.ground} strokeWidth={3.6} />
        </Svg>
      ) : null}
      <Text role="heading" aria-level={2} style={[type.signal, { color: signal.ink }]}>
        {signal.word}
      </Text>
    </View>
  );
}

function HazardRow({ hazard: h }: { hazard: Hazard }) {
  const [only, ...more] = h.avoid;
  return (
    <View style={{ flexDirection: 'row', gap: space.m, paddingHorizontal: space.m, paddingVertical: space.s }}>
      {h.sign ? <SafetySign name={h.sign} size={48} /> : null}
      <View style={{ flex: 1, minWidth: 0 }}>
        <BodyText size="instruction" bold>
          {h.hazard}
        </BodyText>
        <BodyText>{more.length === 0 && only !== undefined ? `${h.result} ${only}` : h.result}</BodyText>
        {(more.length === 0 ? [] : h.avoid).map((words) => (
          <View key={words} style={{ flexDirection: 'row', gap: space.s }}>
            <BodyText>–</BodyText>
            <View style={{ flex: 1 }}>
              <BodyText>{words}</BodyText>
            </View>
          </View>
        ))}
      </View>
    </View>
  );
}
