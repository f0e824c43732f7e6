/** What a reading is against its limit: a word with a mark, in ink; brass when it is close. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Icon } from '@/shared/ui/components/icons/Icon';
import type { IconName } from '@/shared/ui/components/icons/iconPaths';
import { space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

export type VerdictMark = 'in' | 'out' | 'close' | 'unsure' | 'none';

interface Props {
  mark: VerdictMark;
  /** as "in", "in, but close", "low" */
  word: string;
  /** what stands behind it, as "clear of both guard bands (±0.04 V)" */
  note?: string | undefined;
}

const icons: Readonly<Record<VerdictMark, IconName>> = { in: 'check', out: 'cross', close: 'close', unsure: 'question', none: 'none' };

/** Read out when it changes. */
export function Verdict({ mark, word, note }: Props) {
  const { colors } = useTheme();
  const close = mark === 'close';
  return (
    <View role="status" style={{ flexDirection: 'row', alignItems: 'flex-start', gap: space.s }}>
      <View style={{ paddingTop: 3 }}>
        <Icon name={icons[mark]} size={20} color={close ? colors.brass : colors.ink} weight={3.2} />
      </View>
      <View style={{ flexShrink: 1 }}>
        <BodyText tone={close ? 'brass' : 'ink'} bold>
          {word}
        </BodyText>
        {note ? (
          <BodyText size="small" tone="soft">
            {note}
          </BodyText>
        ) : null}
      </View>
    </View>
  );
}
