/** The restorer offers the run to somebody else, and signs. */
import { useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';

import { mayBeLive } from '@/flows/machine/arrive';
import { GIVES } from '@/shared/contract/handOver';
import { client } from '@/shared/ui/api/client';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Button } from '@/shared/ui/components/Button';
import { Field } from '@/shared/ui/components/Field';
import { Notice } from '@/shared/ui/components/Notice';
import { Select } from '@/shared/ui/components/Select';
import { handOverBar } from '@/shared/ui/screens/run/handOverBar';
import type { Run } from '@/shared/ui/screens/run/Run';
import { space } from '@/shared/ui/theme/space';

/** What bars it is said in place of the form. `onDone` once the server has the offer. */
export function HandOverForm({ run, onDone }: { run: Run; onDone: () => void }) {
  const { bundle, view } = run;
  const [to, setTo] = useState<string | null>(null);
  const [note, setNote] = useState('');
  const [password, setPassword] = useState('');
  const [id] = useState(() => uuidv7());
  const [faults, setFaults] = useState<{ to?: string; password?: string; other?: string }>({});
  const [busy, setBusy] = useState(false);
  const bar = handOverBar({ live: mayBeLive(run.state.context), online: globalThis.navigator.onLine, saved: run.saved });
  if (bar !== null) return <Notice title="Not now">{bar}</Notice>;
  const people = bundle.people.filter((p) => p.id !== view.restorer && (p.roles.includes('restorer') || p.roles.includes('senior')));
  const sign = async () => {
    const missing = { ...(to === null ? { to: 'Choose who takes the run.' } : {}), ...(password === '' ? { password: 'Your password signs this.' } : {}) };
    setFaults(missing);
    if (to === null || password === '') return;
    setBusy(true);
    // what waits here comes first: the offer takes the next place in the record
    await run.poll();
    const body = { id, seq: run.headSeq() + 1, to, password, ...(note.trim() === '' ? {} : { note: note.trim() }) };
    const signed = await client.call('handOver', { params: { run: bundle.run.id }, body });
    setBusy(false);
    setPassword('');
    if (signed.kind === 'problem') {
      setFaults(signed.code === 'wrong-password' ? { password: signed.say } : { other: signed.say });
      return;
    }
    await run.poll();
    onDone();
  };
  return (
    <View style={{ gap: space.m }}>
      <BodyText>
        Until they take it the run is paused and stays yours. They open the bench, make it dead and prove it, and read back what is
        connected and fitted, before it goes on.
      </BodyText>
      <Select label="Who takes it" options={people.map((p) => ({ value: p.id, label: `${p.name}, ${p.code}` }))} value={to} onChange={setTo} error={faults.to} disabled={busy} />
      <Field label="Word for them, if you like" value={note} onChangeText={setNote} lines={2} disabled={busy} />
      <Notice kind="note" title="You sign">{GIVES}</Notice>
      <Field label="Your password" value={password} onChangeText={setPassword} secret required autoComplete="current-password" error={faults.password} disabled={busy} onSubmit={() => void sign()} />
      {faults.other === undefined ? null : <Notice live>{faults.other}</Notice>}
      <Button label={busy ? 'Signing …' : 'Sign and offer the run'} disabled={busy} onPress={() => void sign()} />
    </View>
  );
}
