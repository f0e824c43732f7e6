/** The stud in each of its states, answers, and the way to a whole step. */
import { View } from 'react-native';

import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { LinkText } from '@/shared/ui/components/LinkText';
import type { StudState } from '@/shared/ui/components/StepStud';
import { StudRail } from '@/shared/ui/components/StudRail';
import { Part } from '@/shared/ui/screens/parts/Part';

const studs: { number: number; state: StudState; text: string }[] = [
  { number: 12, state: 'done', text: 'Clip meter on +5 V' },
  { number: 13, state: 'close', text: 'Lamp after 2 s: dim, but slow' },
  { number: 14, state: 'now', text: 'Read +5 V' },
  { number: 15, state: 'ahead', text: 'Isolate, unplug' },
  { number: 16, state: 'broken', text: 'Swap reservoir capacitor' },
];

/** Studs on their rule, and answers of each kind. */
export function RunParts() {
  return (
    <Part title="Studs and answers">
      <LinkText label="A whole step, as on a phone" href="/parts?view=step" />
      <View>
        {studs.map((row, at) => (
          <StudRail key={row.number} number={row.number} state={row.state} above={at > 0} below={at < studs.length - 1}>
            <View style={{ minHeight: 44, justifyContent: 'center' }}>
              <BodyText tone={row.state === 'broken' ? 'alarm' : row.state === 'close' ? 'brass' : 'ink'} bold={row.state === 'now'}>
                {row.text}
              </BodyText>
            </View>
          </StudRail>
        ))}
      </View>
      <View style={{ maxWidth: 430 }}>
        <AnswerStack>
          <BigAnswer kind="primary" label="Bright" detail="stays bright after 2 s" onPress={() => undefined} />
          <BigAnswer label="Dim" detail="bright for a moment, then dim" onPress={() => undefined} />
          <BigAnswer label="Flickers" disabled onPress={() => undefined} />
        </AnswerStack>
      </View>
    </Part>
  );
}
