/** What will be seen and heard, what the step asks beyond its instruction, and what the workings say for this machine. */
import { workingsOf } from '@/flows/machine/stepWorkings';
import type { ReadingNow } from '@/flows/machine/stepWorkings';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';

/** Beside a rule, out of the way of the instruction. `now` is the reading that is being taken. */
export function StepNotes({ run, now = null }: { run: Run; now?: ReadingNow | null }) {
  const { step } = run.view;
  const { profile, settings } = run.program.layout;
  if (step === null) return null;
  const workings = workingsOf(step, profile, settings, now);
  const headline = workings?.answer.ok ? workings.answer.headline : null;
  const { notes } = run.view;
  if (step.expect === undefined && headline === null && notes.length === 0) return null;
  return (
    <Notice>
      {step.expect !== undefined ? (
        <BodyText>
          <BodyText inline bold>
            You will see:
          </BodyText>{' '}
          {step.expect}
        </BodyText>
      ) : null}
      {notes.map((note) => (
        <BodyText key={note.name}>
          <BodyText inline bold>
            {note.name}:
          </BodyText>{' '}
          {note.say}
        </BodyText>
      ))}
      {headline !== null ? (
        <BodyText>
          <BodyText inline bold>
            {now === null || workings?.sheet.id !== 'reading-limit' ? 'For this machine:' : 'With this instrument:'}
          </BodyText>{' '}
          {headline}
        </BodyText>
      ) : null}
    </Notice>
  );
}
