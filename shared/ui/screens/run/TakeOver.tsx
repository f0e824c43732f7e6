/** A run that is offered to the person signed in: what they would take, and their signature. */
import { useQueryClient } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';

import { compile } from '@/flows/machine/compile';
import { readBackRows } from '@/flows/machine/handOver';
import { TAKES } from '@/shared/contract/handOver';
import type { RunBundle } from '@/shared/contract/runs';
import { client } from '@/shared/ui/api/client';
import { eventOf, eventsOf } from '@/shared/ui/api/ledger';
import { queryKeyOf } from '@/shared/ui/api/queries';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Field } from '@/shared/ui/components/Field';
import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Notice } from '@/shared/ui/components/Notice';
import { play } from '@/shared/ui/hooks/play';
import { personName } from '@/shared/ui/screens/shell/personName';
import { Section } from '@/shared/ui/screens/shell/Section';
import { space } from '@/shared/ui/theme/space';

/** `onTaken` fetches the run anew, and with it who leads it. */
export function TakeOver({ bundle, onTaken }: { bundle: RunBundle; onTaken: () => Promise<unknown> }) {
  const queries = useQueryClient();
  const { run, people, entries } = bundle;
  const [id] = useState(() => uuidv7());
  const [password, setPassword] = useState('');
  const [fault, setFault] = useState<{ password?: string; other?: string }>({});
  const [busy, setBusy] = useState(false);
  const known = useMemo(() => whatIsThere(bundle), [bundle]);
  const offer = entries.map(eventOf).findLast((event) => event?.type === 'HANDED_OVER');
  const word = offer?.type === 'HANDED_OVER' ? offer.note : undefined;
  const giver = personName(people, run.restorer);
  const sign = async () => {
    if (password === '') {
      setFault({ password: 'Your password signs this.' });
      return;
    }
    setBusy(true);
    setFault({});
    const signed = await client.call('takeOver', { params: { run: run.id }, body: { id, seq: run.head.seq + 1, password } });
    setBusy(false);
    setPassword('');
    if (signed.kind === 'problem') setFault(signed.code === 'wrong-password' ? { password: signed.say } : { other: signed.say });
    if (signed.kind === 'problem' && signed.code !== 'not-offered' && signed.code !== 'out-of-sequence') return;
    void queries.invalidateQueries({ queryKey: queryKeyOf('runs') });
    await onTaken();
  };
  return (
    <View style={{ gap: space.xl, maxWidth: 720 }}>
      <View style={{ gap: space.xs }}>
        <Label>{`${run.machine.name}, serial ${run.machine.serial} · ${run.tree.title}`}</Label>
        <Heading level={1}>{`${giver} offers you this run`}</Heading>
        <BodyText tone="soft">{run.step === null ? 'It has reached its end.' : `It was paused at “${known.at ?? run.step.title}”.`}</BodyText>
      </View>
      {word === undefined ? null : <Notice title={`Word from ${giver}`}>{word}</Notice>}
      <Notice kind="alarm" title="Take every source as live">
        Nothing that was proved dead counts for you. The run leads you through the opening of the bench, isolating, discharging and proving
        dead before anything else.
      </Notice>
      <Section title="You will read this back at the machine">
        {known.rows.map((row) => (
          <BodyText key={row}>{row}</BodyText>
        ))}
      </Section>
      <Section title="Your signature">
        <BodyText>{TAKES}</BodyText>
        <Field label="Your password" value={password} onChangeText={setPassword} secret required autoComplete="current-password" error={fault.password} disabled={busy} onSubmit={() => void sign()} />
        {fault.other === undefined ? null : <Notice live>{fault.other}</Notice>}
        <BigAnswer kind="primary" label={busy ? 'Signing …' : 'Sign and take the run over'} disabled={busy} onPress={() => void sign()} />
        <LinkText label="Not now: to the bench" href="/bench" />
      </Section>
    </View>
  );
}

/** What the record says is connected and fitted, in the very words in which it will be read back, and the step that waits. */
function whatIsThere(bundle: RunBundle): { at: string | null; rows: string[] } {
  const compiled = compile(bundle);
  if (!compiled.ok) return { at: null, rows: ['This page cannot tell what is there. Load it again before you sign.'] };
  const { layout } = compiled.program;
  const { context } = play(compiled.program, bundle.start, eventsOf({ held: bundle.entries, waiting: [] })).state;
  return {
    at: layout.steps.get(context.key)?.step.title ?? null,
    rows: readBackRows(layout, { ...context, purpose: { is: 'mend', to: context.key } }).map((row) => row.label),
  };
}
