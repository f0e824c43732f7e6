/** Where the leads go, drawn, and what they must not touch. */
import { View } from 'react-native';

import type { Row } from '@/flows/machine/rows';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Figure } from '@/shared/ui/components/Figure';
import { figureWords } from '@/shared/ui/components/figureWords';
import type { Run } from '@/shared/ui/screens/run/Run';
import { stripsOf } from '@/shared/ui/screens/run/stripsOf';
import { space } from '@/shared/ui/theme/space';

/** Nothing where the step has no points. */
export function StepFigure({ run, row }: { run: Run; row: Row | null }) {
  const { step } = run.view;
  const shown = step === null ? null : stripsOf(run.program.layout.profile, step, row);
  if (shown === null) return null;
  return (
    <View style={{ gap: space.xs }}>
      {shown.strips.map((strip) => (
        <Figure key={strip.title} title={strip.title} points={strip.points} caption={false} />
      ))}
      <BodyText size="small">{`${sentence(figureWords(shown.strips.flatMap((s) => s.points)))}${shown.neighbours.length > 0 ? ` Do not touch: ${shown.neighbours.join(', ')}.` : ''}`}</BodyText>
    </View>
  );
}

function sentence(words: string): string {
  return `${words.slice(0, 1).toUpperCase()}${words.slice(1)}.`;
}
