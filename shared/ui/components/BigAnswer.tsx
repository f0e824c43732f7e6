/** The answer to a step: big enough for a glove. */
import { Text, View } from 'react-native';

import { Press } from '@/shared/ui/components/Press';
import type { PressProps } from '@/shared/ui/components/Press';
import { target } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';

interface Props extends Omit<PressProps, 'kind'> {
  label: string;
  /** the one expected next; its corner is notched */
  kind?: 'primary' | 'plain' | undefined;
  /** a second line of smaller words */
  detail?: string | undefined;
  /** shares a row with another answer */
  half?: boolean | undefined;
}

/** One answer; stack them with `AnswerStack`, which keeps the gap between them. */
export function BigAnswer({ label, kind = 'plain', detail, half = false, name, ...press }: Props) {
  return (
    <Press
      {...press}
      name={name ?? (detail ? `${label}: ${detail}` : undefined)}
      kind={kind}
      minHeight={target.answer}
      style={half ? { flexGrow: 1, flexShrink: 1, flexBasis: 130, paddingHorizontal: 10 } : { alignSelf: 'stretch' }}
    >
      {(word) => (
        <View style={{ flexShrink: 1 }}>
          <Text style={[type.answer, { color: word, textAlign: 'center' }]}>{label}</Text>
          {detail ? <Text style={[type.small, { color: word, textAlign: 'center' }]}>{detail}</Text> : null}
        </View>
      )}
    </Press>
  );
}
