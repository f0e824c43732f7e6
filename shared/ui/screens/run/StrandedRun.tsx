/** A run that was begun under rules which the server no longer runs: nobody is led on with it, a senior closes it. */
import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';

import type { RunBundle } from '@/shared/contract/runs';
import { CLOSES } from '@/shared/contract/strandedRun';
import { client } from '@/shared/ui/api/client';
import { queryKeyOf } from '@/shared/ui/api/queries';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Field } from '@/shared/ui/components/Field';
import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Notice } from '@/shared/ui/components/Notice';
import { personName } from '@/shared/ui/screens/shell/personName';
import { Section } from '@/shared/ui/screens/shell/Section';
import { space } from '@/shared/ui/theme/space';

interface Props {
  bundle: RunBundle;
  /** a senior ends it here; everybody else is told to fetch one */
  senior: boolean;
  onClosed: () => Promise<unknown>;
}

/** Says first what keeps people safe, then how the run ends. */
export function StrandedRun({ bundle, senior, onClosed }: Props) {
  const { run, people } = bundle;
  return (
    <View style={{ gap: space.xl, maxWidth: 720 }}>
      <View style={{ gap: space.xs }}>
        <Label>{`${run.machine.name}, serial ${run.machine.serial} · ${run.tree.title}`}</Label>
        <Heading level={1}>This run cannot go on</Heading>
        <BodyText tone="soft">{`Led by ${personName(people, run.restorer)}. It was begun under older rules of this application, which are no longer in force. Its record is kept as it was written.`}</BodyText>
      </View>
      <Notice kind="alarm" title="Make the bench safe now">
        Take every source as live: switch off, pull the plug and keep it in sight, discharge what stores energy, and prove dead with a
        two-pole tester. Local codes, the maker’s data and licensed practice come first.
      </Notice>
      {senior ? <Closing bundle={bundle} onClosed={onClosed} /> : <BodyText>A senior has to close this run. Until then no other run starts on this machine.</BodyText>}
      <LinkText label="To the bench" href="/bench" />
    </View>
  );
}

function Closing({ bundle, onClosed }: Pick<Props, 'bundle' | 'onClosed'>) {
  const queries = useQueryClient();
  const [id] = useState(() => uuidv7());
  const [reason, setReason] = useState('');
  const [password, setPassword] = useState('');
  const [faults, setFaults] = useState<{ reason?: string; password?: string; other?: string }>({});
  const [busy, setBusy] = useState(false);
  const close = async () => {
    const missing = {
      ...(reason.trim() === '' ? { reason: 'Say why, and what you found at the bench.' } : {}),
      ...(password === '' ? { password: 'Your password signs this.' } : {}),
    };
    setFaults(missing);
    if (Object.keys(missing).length > 0) return;
    setBusy(true);
    const { run } = bundle;
    const signed = await client.call('closeStranded', { params: { run: run.id }, body: { id, seq: run.head.seq + 1, reason: reason.trim(), password } });
    setBusy(false);
    setPassword('');
    if (signed.kind === 'problem') {
      setFaults(signed.code === 'wrong-password' ? { password: signed.say } : { other: signed.say });
      return;
    }
    void queries.invalidateQueries({ queryKey: queryKeyOf('runs') });
    await onClosed();
  };
  return (
    <Section title="Close it as stopped">
      <Field label="Why, and what you found" value={reason} onChangeText={setReason} lines={3} required error={faults.reason} disabled={busy} />
      <BodyText>{CLOSES}</BodyText>
      <Field label="Your password" value={password} onChangeText={setPassword} secret required autoComplete="current-password" error={faults.password} disabled={busy} onSubmit={() => void close()} />
      {faults.other === undefined ? null : <Notice live>{faults.other}</Notice>}
      <BigAnswer kind="primary" label={busy ? 'Closing …' : 'Sign and close the run'} disabled={busy} onPress={() => void close()} />
    </Section>
  );
}
