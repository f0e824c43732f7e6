/** A run's step as it stands on a phone, whole: band, stud, figure, reading, answers, Stop. */
import { useState } from 'react';
import { View } from 'react-native';

import { AnswerDock } from '@/shared/ui/components/AnswerDock';
import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Figure } from '@/shared/ui/components/Figure';
import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';
import { Mono } from '@/shared/ui/components/Mono';
import { Notice } from '@/shared/ui/components/Notice';
import { Page } from '@/shared/ui/components/Page';
import { PowerBand } from '@/shared/ui/components/PowerBand';
import { ReadingEntry } from '@/shared/ui/components/ReadingEntry';
import { ReadingScale } from '@/shared/ui/components/ReadingScale';
import { StopBar } from '@/shared/ui/components/StopBar';
import { StudRail } from '@/shared/ui/components/StudRail';
import { Verdict } from '@/shared/ui/components/Verdict';

const points = [
  { id: 'p12', name: '+12', highlight: null },
  { id: 'g1', name: '0V', highlight: null },
  { id: 'p5', name: '+5', highlight: 'red' },
  { id: 'g2', name: '0V', highlight: 'black' },
  { id: 'm12', name: '−12', highlight: null },
  { id: 'e', name: 'E', highlight: null },
] as const;

/** The heart of the product, with a reading typed in. */
export function StepSheet() {
  const [text, setText] = useState('4.31');
  const value = Number(text.replace(',', '.'));
  const reading = text === '' || Number.isNaN(value) ? null : value;
  const foot = (
    <>
      <AnswerDock>
        <Verdict mark="in" word="In, clear of both guard bands (±0.04 V)" />
        <BigAnswer kind="primary" label={`Record ${text} V`} onPress={() => undefined} />
        <AnswerStack row>
          <BigAnswer half label="Not sure" onPress={() => undefined} />
          <BigAnswer half label="Cannot measure" onPress={() => undefined} />
        </AnswerStack>
      </AnswerDock>
      <StopBar onPress={() => undefined} />
    </>
  );
  return (
    <Page
      bleed
      maxWidth={720}
      head={<PowerBand state="lamp" detail="60 W in series, 230 V · live 01:12" place="14/31" onPressPlace={() => undefined} />}
      foot={foot}
    >
      <StudRail number={14} state="now" above below next grow>
        <View>
          <Label>Dormant three-rail supply</Label>
          <Heading level={1}>Read +5 V at the supply terminals</Heading>
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
            On this lamp expect <Mono inline>4.2–4.7</Mono> V: the supply is held low on purpose.
          </BodyText>
        </Notice>
        <ReadingEntry label="+5 V" value={text} unit="V" meter="Meter A, 60 V" onChangeText={setText} />
        <ReadingScale value={reading} low={4.2} high={4.7} guard={0.04} nominal={4.45} unit="V" />
      </StudRail>
    </Page>
  );
}
