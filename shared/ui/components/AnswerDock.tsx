/** The answers of a step, kept in the thumb's reach above Stop however long the step is. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** Goes into the foot of a `Page`, above the `StopBar`; holds rows of `BigAnswer`s, and above them the `Verdict` of what was typed. */
export function AnswerDock({ children }: { children: ReactNode }) {
  const { colors } = useTheme();
  return (
    <View
      role="group"
      aria-label="Answers"
      style={{
        backgroundColor: colors.paper,
        borderTopWidth: line.rule,
        borderTopColor: colors.ink,
        padding: space.s,
        alignItems: 'center',
      }}
    >
      <View style={{ width: '100%', maxWidth: 720 }}>
        <AnswerStack>{children}</AnswerStack>
      </View>
    </View>
  );
}
