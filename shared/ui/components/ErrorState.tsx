/** Something that should be here and could not be had. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Heading } from '@/shared/ui/components/Heading';
import { Icon } from '@/shared/ui/components/icons/Icon';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  /** what happened, in a sentence without codes */
  happened: string;
  /** what the person can do, and what is not lost */
  todo: string;
  onRetry?: (() => void) | undefined;
}

/** Read out when it appears. */
export function ErrorState({ happened, todo, onRetry }: Props) {
  const { colors } = useTheme();
  return (
    <View
      role="alert"
      style={{
        borderWidth: line.rule,
        borderColor: colors.ink,
        borderLeftWidth: 10,
        borderLeftColor: colors.brass,
        padding: space.xl,
        gap: space.m,
        alignItems: 'flex-start',
        alignSelf: 'stretch',
        backgroundColor: colors.raised,
      }}
    >
      <View style={{ flexDirection: 'row', gap: space.m, alignItems: 'center' }}>
        <Icon name="exclaim" size={26} color={colors.brass} weight={3.5} />
        <View style={{ flexShrink: 1 }}>
          <Heading level={2} size="sub">
            {happened}
          </Heading>
        </View>
      </View>
      <BodyText>{todo}</BodyText>
      {onRetry ? <Button label="Try again" ground={colors.raised} onPress={onRetry} /> : null}
    </View>
  );
}
