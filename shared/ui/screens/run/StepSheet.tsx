/** The workings of a step for this machine: its headline, and on asking all that it stands on, without leaving the step. */
import { useId, useState } from 'react';
import { View } from 'react-native';

import type { StepWorkings } from '@/flows/machine/stepWorkings';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Heading } from '@/shared/ui/components/Heading';
import type { Run } from '@/shared/ui/screens/run/Run';
import { SheetCaution, SheetDrawings, SheetGrounds } from '@/shared/ui/screens/workings/SheetAnswerView';
import { noteOf } from '@/shared/ui/screens/workings/noteOf';
import { inputWords } from '@/shared/workings/inputWords';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  run: Run;
  workings: StepWorkings;
  /** stands before the headline, as “For this machine:” */
  lead: string;
}

/** Folded at first: the instruction comes before its reasons. A sheet that refuses what the profile says tells so. */
export function StepSheet({ run, workings: { sheet, inputs, answer }, lead }: Props) {
  const { colors } = useTheme();
  const id = useId();
  const [open, setOpen] = useState(false);
  const [noted, setNoted] = useState(false);
  const note = async () => {
    if (answer.ok && (await run.send(noteOf(sheet, inputs, answer.headline)))) setNoted(true);
  };
  return (
    <View style={{ gap: space.s, borderTopWidth: line.hair, borderTopColor: colors.rule, paddingTop: space.s }}>
      <BodyText>
        <BodyText inline bold>
          {lead}
        </BodyText>{' '}
        {answer.ok ? answer.headline : answer.say}
      </BodyText>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.s }}>
        <Button kind="quiet" icon="unfold" label={open ? 'Fold the workings' : 'Show the workings'} onPress={() => setOpen(!open)} />
      </View>
      {open ? (
        <View
          role="region"
          aria-labelledby={id}
          style={{ gap: space.l, borderLeftWidth: line.heavy, borderLeftColor: colors.ink, paddingLeft: space.m }}
        >
          <Heading level={2} size="sub" id={id}>
            {sheet.title}
          </Heading>
          <BodyText size="small" tone="soft">{`From the profile of this machine: ${inputWords(sheet.inputs, inputs)}.`}</BodyText>
          {answer.ok ? (
            <>
              <SheetCaution sheet={sheet} answer={answer} />
              <SheetDrawings answer={answer} />
              <SheetGrounds sheet={sheet} answer={answer} />
              {noted ? (
                <View role="status">
                  <BodyText bold>Noted in the record of this run.</BodyText>
                </View>
              ) : (
                <View style={{ flexDirection: 'row' }}>
                  <Button label="Note in the record" icon="records" disabled={run.busy} onPress={() => void note()} />
                </View>
              )}
            </>
          ) : (
            <SheetGrounds sheet={sheet} answer={null} />
          )}
        </View>
      ) : null}
    </View>
  );
}
