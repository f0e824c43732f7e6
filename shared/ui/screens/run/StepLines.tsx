/** What is to be done: where the hands may be, then one action a line. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { contactWords } from '@/shared/ui/screens/run/contactWords';
import type { Step } from '@/flows/document/steps';
import { space } from '@/shared/ui/theme/space';

/** Set large: it is read at arm's length. */
export function StepLines({ step, aside }: { step: Step; aside?: ReactNode }) {
  return (
    <View style={{ gap: space.xs }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', gap: space.s }}>
        <View style={{ flexShrink: 1 }}>
          <BodyText size="instruction" bold>
            {contactWords(step.contact)}
          </BodyText>
        </View>
        {aside}
      </View>
      {step.lines.map((words) => (
        <BodyText key={words} size="instruction">
          {words}
        </BodyText>
      ))}
    </View>
  );
}
