/** The answer to a step: big enough for a glove. */
import { Text } from 'react-native';

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
export function BigAnswer({ label, kind = 'plain', detail, half = false, ...press }: Props) {
  return (
    <Press {...press} kind={kind} minHeight={target.answer} style={half ? { flexGrow: 1, flexShrink: 1, flexBasis: 130, paddingHorizontal: 10 } : { alignSelf: 'stretch' }}>
      {(word) => (
        <Text style={[type.answer, { color: word, textAlign: 'center', flexShrink: 1 }]}>
          {label}
          {detail ? <Text style={[type.small, { color: word }]}>{`\n${detail}`}</Text> : null}
        </Text>
      )}
    </Press>
  );
}
