/** Fields, choices, buttons and the dialog. */
import { useState } from 'react';
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Checkbox } from '@/shared/ui/components/Checkbox';
import { Choice } from '@/shared/ui/components/Choice';
import { Dialog } from '@/shared/ui/components/Dialog';
import { Field } from '@/shared/ui/components/Field';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Select } from '@/shared/ui/components/Select';
import { StopBar } from '@/shared/ui/components/StopBar';
import { Part } from '@/shared/ui/screens/parts/Part';
import { space } from '@/shared/ui/theme/space';

const machines = [
  { value: 'c12', label: 'Corvane 12, serial 0097' },
  { value: 'b80', label: 'Brindle 80, serial 21' },
  { value: 'o16', label: 'Ostrel 16, serial 4410' },
];
const contacts = [
  { value: 'none', label: 'None', detail: 'looking, listening, smelling' },
  { value: 'probe', label: 'Probe', detail: 'one insulated probe, or clips fitted while dead' },
  { value: 'hands', label: 'Hands', detail: 'only proved dead' },
];

/** Everything that is typed, chosen, ticked or pressed outside a run. */
export function FormParts() {
  const [name, setName] = useState('Corvane 12');
  const [machine, setMachine] = useState<string | null>(null);
  const [contact, setContact] = useState<string | null>('probe');
  const [ticked, setTicked] = useState(true);
  const [open, setOpen] = useState(false);
  return (
    <Part title="Forms, buttons, dialog">
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.xl }}>
        <View style={{ flexGrow: 1, flexBasis: 310, maxWidth: 520, gap: space.l }}>
          <Field label="Machine" required value={name} onChangeText={setName} hint="Maker and model, as on the plate." />
          <Field
            label="Mail address"
            required
            value="senior-at-example"
            onChangeText={() => undefined}
            error="A mail address has an @, as in senior@example.org."
          />
          <Field label="Remark" value="" lines={3} onChangeText={() => undefined} />
          <Field label="Serial" required disabled value="0097" onChangeText={() => undefined} />
          <Select label="Run on" options={machines} value={machine} onChange={setMachine} />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 310, maxWidth: 520, gap: space.l }}>
          <Choice label="Contact" options={contacts} value={contact} onChange={setContact} />
          <View>
            <Checkbox label="RCD tested today" detail="tripped by its own button" checked={ticked} onChange={setTicked} />
            <Checkbox label="Second person present" checked={false} onChange={() => undefined} />
            <Checkbox label="Proving unit" detail="none in this workshop" checked={false} disabled onChange={() => undefined} />
          </View>
        </View>
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.m, alignItems: 'center' }}>
        <Button kind="primary" label="Accept and sign" onPress={() => setOpen(true)} />
        <Button label="Return" onPress={() => undefined} />
        <Button kind="quiet" label="Add a remark" icon="plus" onPress={() => undefined} />
        <Button kind="primary" label="Send for check" disabled onPress={() => undefined} />
        <Button label="Rehearse" disabled onPress={() => undefined} />
        <LinkText label="workings" href="/" />
      </View>
      {open ? (
        <Dialog
          title="Accept this record?"
          onClose={() => setOpen(false)}
          foot={<StopBar onPress={() => setOpen(false)} />}
          actions={
            <>
              <Button label="Not yet" onPress={() => setOpen(false)} />
              <Button kind="primary" label="Accept and sign" onPress={() => setOpen(false)} />
            </>
          }
        >
          <BodyText>Your signature says that the supply of serial 0097 is proven at full load and may go back into the machine.</BodyText>
          <Field label="Words for the record" value="" onChangeText={() => undefined} />
        </Dialog>
      ) : null}
    </Part>
  );
}
