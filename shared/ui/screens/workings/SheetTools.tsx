/** What can be done with a sheet: fill it from a machine, note it in a run's record, copy its link. */
import { useState } from 'react';
import { View } from 'react-native';

import { canTakeFrom } from '@/flows/machine/profileInputs';
import { useMe } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Field } from '@/shared/ui/components/Field';
import { useNoteOutbox, useNotesSaved } from '@/shared/ui/hooks/useNoteOutbox';
import { NoteDialog } from '@/shared/ui/screens/workings/NoteDialog';
import { notedWords } from '@/shared/ui/screens/workings/notedWords';
import { sheetAddress } from '@/shared/ui/screens/workings/sheetAddress';
import { TakeDialog } from '@/shared/ui/screens/workings/TakeDialog';
import type { SheetFormState } from '@/shared/ui/screens/workings/useSheetForm';
import { space, target } from '@/shared/ui/theme/space';
import type { AnySheet } from '@/shared/workings/list';

interface Props {
  sheet: AnySheet;
  form: SheetFormState;
}

/** What was done is said below the buttons. */
export function SheetTools({ sheet, form }: Props) {
  const [open, setOpen] = useState<'take' | 'note' | null>(null);
  const [said, setSaid] = useState<string | null>(null);
  const [link, setLink] = useState<string | null>(null);
  const [run, setRun] = useState<string | null>(null);
  const [noted, setNoted] = useState<string | null>(null);
  const me = useMe();
  const box = useNoteOutbox(run, me.data?.person.id ?? '');
  const saved = useNotesSaved(box);
  const { answer, taken } = form;
  const copy = async () => {
    const address = new URL(sheetAddress(sheet.id, form.texts, taken), window.location.href).href;
    try {
      await navigator.clipboard.writeText(address);
      setLink(null);
      setSaid('The link is copied. Whoever opens it sees these inputs.');
    } catch {
      // on plain http, and where the browser is told to refuse
      setSaid('This browser does not copy by itself. Mark the link and copy it.');
      setLink(address);
    }
  };
  return (
    <View style={{ gap: space.m }}>
      <View role="group" aria-label="With this sheet" style={{ flexDirection: 'row', flexWrap: 'wrap', gap: target.gap }}>
        {canTakeFrom(sheet.id) ? <Button label="Take from a machine" icon="machines" onPress={() => setOpen('take')} /> : null}
        {answer === null ? null : <Button label="Note in a record" icon="records" onPress={() => setOpen('note')} />}
        <Button label="Copy the link" onPress={() => void copy()} />
      </View>
      <View role="status" aria-label="Done">
        {said === null ? null : <BodyText bold>{said}</BodyText>}
        {noted === null ? null : <BodyText bold>{notedWords(noted, saved)}</BodyText>}
      </View>
      {link === null ? null : <Field label="Link to this sheet" value={link} onChangeText={() => undefined} required />}
      {taken === null || taken.names.size === 0 ? null : (
        <BodyText
          size="small"
          tone="soft"
        >{`From the profile of ${taken.machine}; the fields say which. All of it can be changed here, the profile stays as it is.`}</BodyText>
      )}
      {open === 'take' ? (
        <TakeDialog
          sheet={sheet}
          onFill={(texts, machine) => {
            form.fill(texts, machine);
            setSaid(`Filled in from ${machine}.`);
            setOpen(null);
          }}
          onClose={() => setOpen(null)}
        />
      ) : null}
      {open === 'note' && answer !== null ? (
        <NoteDialog
          sheet={sheet}
          inputs={form.inputs}
          headline={answer.headline}
          run={run}
          box={box}
          onRun={setRun}
          onNoted={(machine) => {
            setSaid(null);
            setNoted(machine);
            setOpen(null);
          }}
          onClose={() => setOpen(null)}
        />
      ) : null}
    </View>
  );
}
