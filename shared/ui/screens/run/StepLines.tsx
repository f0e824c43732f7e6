/** What is to be done: where the hands may be, then one action a line. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { contactWords } from '@/shared/ui/screens/run/contactWords';
import type { Step } from '@/flows/document/steps';
import { space } from '@/shared/ui/theme/space';

/** Set large: it is read at arm's length. */
export function StepLines({ step }: { step: Step }) {
  return (
    <View style={{ gap: space.xs }}>
      <BodyText size="instruction" bold>
        {contactWords(step.contact)}
      </BodyText>
      {step.lines.map((words) => (
        <BodyText key={words} size="instruction">
          {words}
        </BodyText>
      ))}
    </View>
  );
}
