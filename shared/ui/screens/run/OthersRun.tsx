/** A run of somebody else. */
import { LinkText } from '@/shared/ui/components/LinkText';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { powerVisual } from '@/shared/ui/components/powerVisual';
import type { RunBundle } from '@/shared/contract/runs';
import { personName } from '@/shared/ui/screens/shell/personName';
import { dateTimeWords } from '@/shared/ui/screens/shell/dateWords';

/** Where it stood when it was last heard of; only its restorer answers its steps. */
export function OthersRun({ bundle }: { bundle: RunBundle }) {
  const { run, people } = bundle;
  const who = personName(people, run.restorer);
  const stands = run.step === null ? 'It has reached its end.' : `It stands at step ${run.step.stud}, “${run.step.title}”.`;
  return (
    <EmptyState
      title={`This run is led by ${who}`}
      text={`${run.tree.title}. ${stands} Supply when last heard of, ${dateTimeWords(run.heardAt)}: ${powerVisual(run.band).word.toLowerCase()}. Only ${who} can answer its steps.`}
      action={<LinkText label="To the bench" href="/bench" />}
    />
  );
}
