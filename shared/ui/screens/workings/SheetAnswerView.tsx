/** The answer of a bench calculation, with everything that it stands on. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { CircuitFigure } from '@/shared/ui/components/CircuitFigure';
import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';
import { Mono } from '@/shared/ui/components/Mono';
import { Notice } from '@/shared/ui/components/Notice';
import { PlotFigure } from '@/shared/ui/components/PlotFigure';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webStyle } from '@/shared/ui/theme/webStyle';
import type { AnySheet } from '@/shared/workings/list';
import type { SheetAnswer } from '@/shared/workings/sheet';

interface Props {
  sheet: AnySheet;
  /** null while an input cannot be taken */
  answer: SheetAnswer<unknown> | null;
}

interface HeadlineProps extends Props {
  /** why there is no answer */
  fault?: string | null | undefined;
  /** stays in sight while the form below it is filled in */
  sticks?: boolean | undefined;
}

/** From this many characters on a line set large would fill a phone. */
const LONG = 90;
const TOO_LONG_TO_STICK = 170;

/** The question and one big line. */
export function SheetHeadline({ sheet, answer, fault = null, sticks = false }: HeadlineProps) {
  const { colors } = useTheme();
  const words = answer?.headline ?? `No answer yet. ${fault ?? 'Mend the marked field below.'}`;
  const held = sticks && words.length < TOO_LONG_TO_STICK;
  return (
    <>
      <BodyText tone="soft">{sheet.question}</BodyText>
      <View
        role="status"
        aria-label="Answer"
        style={[
          {
            backgroundColor: colors.paper,
            borderTopWidth: line.heavy,
            borderTopColor: colors.ink,
            borderBottomWidth: line.rule,
            borderBottomColor: colors.ink,
            paddingVertical: space.m,
          },
          held ? webStyle({ position: 'sticky', top: 0, zIndex: 2 }) : null,
        ]}
      >
        <Heading level={2} size={words.length < LONG ? 'section' : 'sub'}>
          {words}
        </Heading>
      </View>
    </>
  );
}

/** What to take care of, where it can hurt. */
export function SheetCaution({ sheet, answer }: Props) {
  const caution = answer?.caution ?? sheet.caution;
  return caution === '' ? null : <Notice title="Caution">{caution}</Notice>;
}

/** The plot and the circuit, where the sheet draws them. */
export function SheetDrawings({ answer }: { answer: SheetAnswer<unknown> }) {
  return (
    <>
      {answer.drawing === undefined ? null : <CircuitFigure circuit={answer.drawing} />}
      {answer.plot === undefined ? null : <PlotFigure plot={answer.plot} />}
    </>
  );
}

/** Formula with numbers, how far it holds, and its source. */
export function SheetGrounds({ sheet, answer }: Props) {
  return (
    <View style={{ gap: space.l }}>
      <Part title={answer ? 'Formula, with these numbers' : 'Formula'}>
        {(answer ? answer.formula : sheet.law).map((words, i) => (
          <Mono key={`${i}${words}`}>{words}</Mono>
        ))}
      </Part>
      {answer ? (
        <Part title="In symbols">
          {sheet.law.map((words) => (
            <Mono key={words} soft>
              {words}
            </Mono>
          ))}
        </Part>
      ) : null}
      <Part title="Holds for">
        <BodyText>{answer?.validity ?? sheet.validity}</BodyText>
      </Part>
      <Part title="Source">
        <BodyText>{answer?.source ?? sheet.source}</BodyText>
      </Part>
    </View>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <View style={{ gap: space.xs }}>
      <Label level={3}>{title}</Label>
      {children}
    </View>
  );
}
