/** A wait that is not over yet. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { Mono } from '@/shared/ui/components/Mono';
import { useNow } from '@/shared/ui/hooks/useNow';
import { clockOf } from '@/shared/ui/screens/run/bandWords';
import { space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

const SECOND_MS = 1_000;

/** Counts down to `opensAt` (epoch milliseconds); afterwards it says for how long it has been open. */
export function Countdown({ opensAt, what }: { opensAt: number; what: string }) {
  const { colors } = useTheme();
  const left = opensAt - useNow(SECOND_MS);
  const over = left <= 0;
  return (
    <View
      role="timer"
      aria-label={over ? `${what}: the wait is over` : what}
      style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'center', gap: space.s }}
    >
      <Icon name="clock" size={24} color={over ? colors.inkSoft : colors.brass} />
      {over ? <BodyText tone="soft">{`The wait is over, since ${clockOf(-left)}.`}</BodyText> : <Mono bold>{clockOf(left + 999)}</Mono>}
      {over ? null : (
        <View style={{ flexShrink: 1 }}>
          <BodyText>{what}</BodyText>
        </View>
      )}
    </View>
  );
}
