/** What is wrong with a field, at the field. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** A sentence with a mark; read out when it appears. */
export function FieldError({ id, text }: { id: string; text: string }) {
  const { colors } = useTheme();
  return (
    <View role="alert" style={{ flexDirection: 'row', gap: space.s, alignItems: 'flex-start' }}>
      <View
        style={{ width: 22, height: 22, borderWidth: line.rule, borderColor: colors.brass, alignItems: 'center', justifyContent: 'center' }}
      >
        <Icon name="exclaim" size={14} color={colors.brass} weight={3.5} />
      </View>
      <View style={{ flex: 1 }}>
        <BodyText id={id} size="small" bold>
          {text}
        </BodyText>
      </View>
    </View>
  );
}
