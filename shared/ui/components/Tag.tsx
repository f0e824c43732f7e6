/** A state in a word, in a small ruled box. */
import { Text, View } from 'react-native';

import { line, space } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  word: string;
  /** `look` wants attention, `over` is done with, `now` is under way */
  kind?: 'plain' | 'now' | 'look' | 'over' | undefined;
}

/** Never pressable. */
export function Tag({ word, kind = 'plain' }: Props) {
  const { colors } = useTheme();
  const ink = { plain: colors.ink, now: colors.paper, look: colors.brass, over: colors.inkSoft }[kind];
  return (
    <View
      style={{
        borderWidth: line.rule,
        borderStyle: kind === 'over' ? 'dashed' : 'solid',
        borderColor: kind === 'now' ? colors.ink : ink,
        backgroundColor: kind === 'now' ? colors.ink : 'transparent',
        paddingHorizontal: space.s,
        paddingVertical: 1,
        alignSelf: 'flex-start',
      }}
    >
      <Text style={[type.label, { color: ink, textTransform: 'uppercase' }]}>{word}</Text>
    </View>
  );
}
