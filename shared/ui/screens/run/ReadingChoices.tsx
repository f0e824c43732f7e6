/** The readings that an ambiguous entry could mean. */
import type { ReadingChoice } from '@/shared/quantity/parseReading';
import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';

/** One press puts the meant one into the entry. */
export function ReadingChoices({ choices, onChoose }: { choices: readonly ReadingChoice[]; onChoose: (echo: string) => void }) {
  if (choices.length < 2) return null;
  return (
    <AnswerStack row>
      {choices.map((c) => (
        <BigAnswer key={c.echo} half label={c.echo} onPress={() => onChoose(c.echo)} />
      ))}
    </AnswerStack>
  );
}
