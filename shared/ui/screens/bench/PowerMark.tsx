/** The supply state of a run in a list: word, symbol, pattern and colour. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { PowerPattern } from '@/shared/ui/components/PowerPattern';
import { powerVisual } from '@/shared/ui/components/powerVisual';
import type { PowerState } from '@/shared/ui/components/powerVisual';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** As last heard of; never a promise. */
export function PowerMark({ state }: { state: PowerState }) {
  const { colors } = useTheme();
  const v = powerVisual(state);
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.s }}>
      <View
        style={{
          width: 44,
          height: 32,
          borderWidth: line.hair,
          borderColor: colors.ink,
          backgroundColor: v.ground,
          overflow: 'hidden',
          alignItems: 'center',
          justifyContent: 'center',
        }}
        aria-hidden
      >
        <View style={{ position: 'absolute', top: 0, left: 0 }}>
          <PowerPattern state={state} width={44} height={32} />
        </View>
        <View style={{ backgroundColor: v.ground, padding: 2 }}>
          <Icon name={v.symbol} size={22} color={v.ink} />
        </View>
      </View>
      <View style={{ flexShrink: 1 }}>
        <BodyText>{v.word}</BodyText>
      </View>
    </View>
  );
}
