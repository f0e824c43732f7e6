/** The numbered ring by which a drawing's key speaks of a place in it. */
import { Text, View } from 'react-native';

import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  number: number;
  /** drawn filled: what the drawing is about */
  strong?: boolean | undefined;
}

/** The same ring as in the drawing. */
export function CallOut({ number, strong = false }: Props) {
  const { colors } = useTheme();
  return (
    <View
      style={{
        minWidth: 26,
        height: 26,
        borderRadius: 13,
        borderWidth: 1.5,
        borderColor: colors.ink,
        backgroundColor: strong ? colors.ink : colors.paper,
        alignItems: 'center',
        justifyContent: 'center',
        marginHorizontal: 7,
      }}
    >
      <Text style={[type.mono, { fontSize: 16, lineHeight: 22, color: strong ? colors.paper : colors.ink }]}>{number}</Text>
    </View>
  );
}
