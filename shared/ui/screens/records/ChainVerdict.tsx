/** Whether the entries of a record hold together, worked out on this device. */
import { useMemo } from 'react';
import { View } from 'react-native';

import type { RecordView } from '@/shared/contract/records';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { chainWords } from '@/shared/ui/screens/records/chainWords';
import { space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** Read out when it changes. */
export function ChainVerdict({ record }: { record: Pick<RecordView, 'entries' | 'head'> }) {
  const { colors } = useTheme();
  const { whole, verdict, detail } = useMemo(() => chainWords(record), [record]);
  return (
    <View role="status" style={{ flexDirection: 'row', gap: space.s, alignItems: 'flex-start', maxWidth: 460 }}>
      <View style={{ paddingTop: 3 }}>
        <Icon name={whole ? 'check' : 'exclaim'} size={20} color={whole ? colors.ink : colors.brass} weight={3.2} />
      </View>
      <View style={{ flexShrink: 1 }}>
        <BodyText bold tone={whole ? 'ink' : 'brass'}>
          {verdict}
        </BodyText>
        <BodyText size="small" tone="soft">
          {detail}
        </BodyText>
      </View>
    </View>
  );
}
