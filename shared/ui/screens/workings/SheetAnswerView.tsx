/** The answer of a bench calculation, with everything that it stands on. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';
import { Mono } from '@/shared/ui/components/Mono';
import { Notice } from '@/shared/ui/components/Notice';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';
import type { AnySheet } from '@/shared/workings/list';
import type { SheetAnswer } from '@/shared/workings/sheet';

interface Props {
  sheet: AnySheet;
  /** null while an input cannot be taken */
  answer: SheetAnswer<unknown> | null;
}

/** The question, one big line, and the caution. */
export function SheetHeadline({ sheet, answer }: Props) {
  const { colors } = useTheme();
  const caution = answer?.caution ?? sheet.caution;
  return (
    <View style={{ gap: space.l }}>
      <BodyText tone="soft">{sheet.question}</BodyText>
      <View
        role="status"
        aria-label="Answer"
        style={{
          borderTopWidth: line.heavy,
          borderTopColor: colors.ink,
          borderBottomWidth: line.rule,
          borderBottomColor: colors.ink,
          paddingVertical: space.l,
        }}
      >
        <Heading level={2} size="section">
          {answer ? answer.headline : 'No answer yet: mend the marked field below.'}
        </Heading>
      </View>
      {caution !== '' ? <Notice title="Caution">{caution}</Notice> : null}
    </View>
  );
}

/** Formula with numbers, how far it holds, and its source. */
export function SheetGrounds({ sheet, answer }: Props) {
  return (
    <View style={{ gap: space.l }}>
      <Part title={answer ? 'Formula, with these numbers' : 'Formula'}>
        {(answer ? answer.formula : sheet.law).map((words) => (
          <Mono key={words}>{words}</Mono>
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
