/** Filling a sheet from the profile of a machine. */
import { useState } from 'react';

import { defaultSettings } from '@/flows/document/settings';
import { fromProfile, picksOf } from '@/flows/machine/profileInputs';
import { useMachine, useMachines, useSettings } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Dialog } from '@/shared/ui/components/Dialog';
import { Select } from '@/shared/ui/components/Select';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { textsOf } from '@/shared/ui/screens/workings/sheetForm';
import type { AnySheet } from '@/shared/workings/list';
import { inputWords } from '@/shared/workings/inputWords';

interface Props {
  sheet: AnySheet;
  /** texts to fill in, and the machine by name */
  onFill: (texts: Record<string, string>, machine: string) => void;
  onClose: () => void;
}

/** Machine first, then which of its rails or parts; what will be filled in is shown before it is. */
export function TakeDialog({ sheet, onFill, onClose }: Props) {
  const machines = useMachines();
  const [chosen, setChosen] = useState<string | null>(null);
  const [ready, setReady] = useState<{ texts: Record<string, string>; machine: string } | null>(null);
  return (
    <Dialog
      title="Take from a machine"
      onClose={onClose}
      actions={
        <>
          <Button label="Not now" onPress={onClose} />
          <Button
            kind="primary"
            label="Fill in"
            disabled={ready === null}
            onPress={() => (ready === null ? undefined : onFill(ready.texts, ready.machine))}
          />
        </>
      }
    >
      <Fetched query={machines} what="the machines">
        {({ machines: all }) =>
          all.length === 0 ? (
            <BodyText>This workshop has no machine yet. A keeper enters machines under Machines.</BodyText>
          ) : (
            <Select
              label="Machine"
              options={all.map((m) => ({ value: m.id, label: `${m.name}, serial ${m.serial}` }))}
              value={chosen}
              onChange={(id) => {
                setReady(null);
                setChosen(id);
              }}
            />
          )
        }
      </Fetched>
      {chosen === null ? null : <OfMachine key={chosen} sheet={sheet} machine={chosen} onReady={setReady} />}
    </Dialog>
  );
}

interface OfMachineProps {
  sheet: AnySheet;
  machine: string;
  onReady: (ready: { texts: Record<string, string>; machine: string } | null) => void;
}

function OfMachine({ sheet, machine, onReady }: OfMachineProps) {
  const dossier = useMachine(machine);
  const settings = useSettings().data?.settings ?? defaultSettings;
  return (
    <Fetched query={dossier} what="the profile">
      {({ machine: of, profile }) => {
        const name = `${of.name}, serial ${of.serial}, profile revision ${profile.revision}`;
        const ready = (pick: string | null) => {
          const inputs = fromProfile(sheet.id, profile.document, settings, pick);
          onReady(inputs === null ? null : { texts: textsOf(sheet, inputs), machine: name });
          return inputs;
        };
        return <Picked key={profile.hash} sheet={sheet} picks={picksOf(sheet.id, profile.document)} ready={ready} />;
      }}
    </Fetched>
  );
}

interface PickedProps {
  sheet: AnySheet;
  picks: ReturnType<typeof picksOf>;
  ready: (pick: string | null) => Record<string, unknown> | null;
}

const WHICH = { rail: 'Which rail', part: 'Which part', conductor: 'Which conductor' } as const;

function Picked({ sheet, picks, ready }: PickedProps) {
  const [pick, setPick] = useState<string | null>(null);
  const [inputs, setInputs] = useState<Record<string, unknown> | null>(null);
  const [asked, setAsked] = useState(false);
  const show = (id: string | null) => {
    setPick(id);
    setAsked(true);
    setInputs(ready(id));
  };
  if (picks !== null && picks.picks.length === 0) return <BodyText>{`The profile of this machine names no ${picks.what}.`}</BodyText>;
  return (
    <>
      {picks === null ? (
        asked ? null : (
          <Button label="Show what the profile says" onPress={() => show(null)} />
        )
      ) : (
        <Select
          label={WHICH[picks.what]}
          options={picks.picks.map(({ id, name }) => ({ value: id, label: name }))}
          value={pick}
          onChange={show}
        />
      )}
      {inputs === null ? (
        asked ? (
          <BodyText>The profile of this machine does not know enough for this sheet.</BodyText>
        ) : null
      ) : (
        <BodyText>{`Will be filled in: ${inputWords(sheet.inputs, inputs)}. The other fields stay as they are.`}</BodyText>
      )}
    </>
  );
}
