/** Something that is on its way. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  /** what is being fetched, as "the record" */
  what: string;
}

const marks = [0, 1, 2, 3, 4, 5, 6, 7];

/** Words and an empty ruled scale; nothing moves. */
export function Loading({ what }: Props) {
  const { colors } = useTheme();
  return (
    <View role="status" style={{ paddingVertical: space.xl, gap: space.m, alignSelf: 'stretch' }}>
      <BodyText tone="soft">{`Fetching ${what} …`}</BodyText>
      <View
        style={{
          flexDirection: 'row',
          justifyContent: 'space-between',
          borderBottomWidth: line.rule,
          borderBottomColor: colors.rule,
          maxWidth: 320,
        }}
        aria-hidden
      >
        {marks.map((mark) => (
          <View key={mark} style={{ width: line.rule, height: mark % 7 === 0 ? 12 : 7, backgroundColor: colors.rule }} />
        ))}
      </View>
    </View>
  );
}
