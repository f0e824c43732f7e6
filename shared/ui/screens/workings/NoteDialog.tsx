/** Putting a sheet's answer, with its inputs, into the record of one of my open runs. */
import { useEffect, useState } from 'react';

import type { RunSummary } from '@/shared/contract/runSummary';
import type { NoteOutbox } from '@/shared/ui/api/noteOutbox';
import { useBench } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Choice } from '@/shared/ui/components/Choice';
import { Dialog } from '@/shared/ui/components/Dialog';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Notice } from '@/shared/ui/components/Notice';
import { stamp } from '@/shared/ui/hooks/benchClock';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { noteOf } from '@/shared/ui/screens/workings/noteOf';
import type { AnySheet } from '@/shared/workings/list';

interface Props {
  sheet: AnySheet;
  inputs: Record<string, unknown>;
  headline: string;
  /** the chosen run, with the notes on their way to it; they live longer than this dialog */
  run: string | null;
  box: NoteOutbox | null;
  onRun: (run: string) => void;
  /** called with the machine of the run once the note is on the disk */
  onNoted: (machine: string) => void;
  onClose: () => void;
}

/** The run goes on where it stands: a note moves nothing. */
export function NoteDialog({ sheet, inputs, headline, run, box, onRun, onNoted, onClose }: Props) {
  const runs = useBench();
  const [fault, setFault] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const open = runs.data?.runs;
  const only = open?.length === 1 ? open[0]?.id : undefined;
  useEffect(() => {
    // one run alone needs no choosing
    if (run === null && only !== undefined) onRun(only);
  }, [run, only, onRun]);
  const chosen = open?.find((r) => r.id === run);
  const note = async () => {
    if (box === null || chosen === undefined) return;
    setBusy(true);
    const added = await box.add(stamp(noteOf(sheet, inputs, headline)) as Parameters<typeof box.add>[0]);
    setBusy(false);
    if (added.ok) onNoted(nameOf(chosen));
    else setFault(added.say);
  };
  return (
    <Dialog
      title="Note in a record"
      onClose={onClose}
      actions={
        <>
          <Button label="Not now" onPress={onClose} />
          <Button kind="primary" label="Note it" disabled={box === null || chosen === undefined || busy} onPress={() => void note()} />
        </>
      }
    >
      <BodyText>{`${sheet.title}: ${headline}`}</BodyText>
      <Fetched query={runs} what="your open runs">
        {({ runs: all }) =>
          all.length === 0 ? (
            <>
              <BodyText>You have no open run. Start one at the bench and come back: what is typed here stays in the address.</BodyText>
              <LinkText label="To the bench" href="/bench" />
            </>
          ) : (
            <Choice
              label="Your open runs"
              options={all.map((r) => ({
                value: r.id,
                label: nameOf(r),
                detail: `${r.tree.title}${r.step === null ? '' : `, at “${r.step.title}”`}`,
              }))}
              value={run}
              onChange={onRun}
            />
          )
        }
      </Fetched>
      {fault === null ? null : <Notice live>{fault}</Notice>}
    </Dialog>
  );
}

function nameOf({ machine }: RunSummary): string {
  return `${machine.name}, serial ${machine.serial}`;
}
