/** What will be seen and heard, what the step asks beyond its instruction, and what the workings say for this machine. */
import { workingsOf } from '@/flows/machine/stepWorkings';
import type { ReadingNow } from '@/flows/machine/stepWorkings';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';
import { StepSheet } from '@/shared/ui/screens/run/StepSheet';

/** Beside a rule, out of the way of the instruction. `now` is the reading that is being taken. */
export function StepNotes({ run, now = null }: { run: Run; now?: ReadingNow | null }) {
  const { step, notes, key } = run.view;
  const { profile, settings } = run.program.layout;
  if (step === null) return null;
  const workings = workingsOf(step, profile, settings, now, { key, counters: run.state.context.counters });
  const withInstrument = now !== null && workings?.sheet.id === 'reading-limit';
  return (
    <>
      {step.expect === undefined && notes.length === 0 ? null : (
        <Notice>
          {step.expect === undefined ? null : (
            <BodyText>
              <BodyText inline bold>
                You will see:
              </BodyText>{' '}
              {step.expect}
            </BodyText>
          )}
          {notes.map((note) => (
            <BodyText key={note.name}>
              <BodyText inline bold>
                {note.name}:
              </BodyText>{' '}
              {note.say}
            </BodyText>
          ))}
        </Notice>
      )}
      {workings === null ? null : (
        <StepSheet key={key} run={run} workings={workings} lead={withInstrument ? 'With this instrument:' : 'For this machine:'} />
      )}
    </>
  );
}
