/** A place where there is nothing yet, and what to do about it. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Heading } from '@/shared/ui/components/Heading';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  title: string;
  text: string;
  action?: ReactNode;
}

/** A ruled frame with dashes, like the outline of a part that is not fitted. */
export function EmptyState({ title, text, action }: Props) {
  const { colors } = useTheme();
  return (
    <View
      style={{
        borderWidth: line.rule,
        borderStyle: 'dashed',
        borderColor: colors.inkSoft,
        padding: space.xl,
        gap: space.m,
        alignItems: 'flex-start',
        alignSelf: 'stretch',
      }}
    >
      <Heading level={2} size="sub">
        {title}
      </Heading>
      <BodyText>{text}</BodyText>
      {action}
    </View>
  );
}
