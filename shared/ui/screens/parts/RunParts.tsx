/** A run's step as it stands on a phone, and the other parts of a run. */
import { useState } from 'react';
import { View } from 'react-native';

import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Figure } from '@/shared/ui/components/Figure';
import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';
import { Mono } from '@/shared/ui/components/Mono';
import { Notice } from '@/shared/ui/components/Notice';
import { PowerBand } from '@/shared/ui/components/PowerBand';
import { ReadingEntry } from '@/shared/ui/components/ReadingEntry';
import { ReadingScale } from '@/shared/ui/components/ReadingScale';
import { StopBar } from '@/shared/ui/components/StopBar';
import { StudRail } from '@/shared/ui/components/StudRail';
import type { StudState } from '@/shared/ui/components/StepStud';
import { Verdict } from '@/shared/ui/components/Verdict';
import { Part } from '@/shared/ui/screens/parts/Part';
import { line } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

const points = [
  { id: 'p12', name: '+12', highlight: null },
  { id: 'g1', name: '0V', highlight: null },
  { id: 'p5', name: '+5', highlight: 'red' },
  { id: 'g2', name: '0V', highlight: 'black' },
  { id: 'm12', name: '−12', highlight: null },
  { id: 'e', name: 'E', highlight: null },
] as const;

const studs: { number: number; state: StudState; text: string }[] = [
  { number: 12, state: 'done', text: 'Clip meter on +5 V' },
  { number: 13, state: 'close', text: 'Lamp after 2 s: dim, but slow' },
  { number: 14, state: 'now', text: 'Read +5 V' },
  { number: 15, state: 'ahead', text: 'Isolate, unplug' },
  { number: 16, state: 'broken', text: 'Swap reservoir capacitor' },
];

/** The heart of the product: one step in its frame, then the stud in each of its states. */
export function RunParts() {
  const { colors } = useTheme();
  const [text, setText] = useState('4.31');
  const value = Number(text.replace(',', '.'));
  const reading = text === '' || Number.isNaN(value) ? null : value;
  return (
    <Part title="A step of a run">
      <View style={{ borderWidth: line.rule, borderColor: colors.ink, maxWidth: 430, width: '100%', alignSelf: 'center' }}>
        <PowerBand state="lamp" detail="60 W in series, 230 V · live 01:12" place="14/31" onPressPlace={() => undefined} />
        <StudRail number={14} state="now" above below neighbours>
          <View>
            <Label>Dormant three-rail supply</Label>
            <Heading level={3} size="title">
              Read +5 V at the supply terminals
            </Heading>
          </View>
          <BodyText size="instruction">
            <BodyText inline bold>
              Hands off:
            </BodyText>{' '}
            the clips stay as fitted. Read for 5 s; note the steady value.
          </BodyText>
          <Figure title="Supply terminals" points={points} />
          <Notice>
            <BodyText>
              On this lamp expect <Mono inline>4.2–4.7 V</Mono>: the supply is held low on purpose.
            </BodyText>
          </Notice>
          <ReadingEntry label="+5 V" value={text} unit="V" meter="Meter A, 60 V" onChangeText={setText} />
          <ReadingScale value={reading} low={4.2} high={4.7} guard={0.04} nominal={4.45} unit="V" />
          <Verdict mark="in" word="In" note="clear of both guard bands (±0.04 V)" />
          <AnswerStack>
            <BigAnswer kind="primary" label={`Record ${text} V`} onPress={() => undefined} />
            <AnswerStack row>
              <BigAnswer half label="Not sure" onPress={() => undefined} />
              <BigAnswer half label="Cannot measure" onPress={() => undefined} />
            </AnswerStack>
          </AnswerStack>
        </StudRail>
        <StopBar onPress={() => undefined} />
      </View>
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
    </Part>
  );
}
