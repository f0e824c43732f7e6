/** A hold point as a senior reads and answers it, on their own device. */
import { useMemo, useState } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';

import { compile } from '@/flows/machine/compile';
import type { Program } from '@/flows/machine/compile';
import type { Hold } from '@/shared/contract/holds';
import type { RunBundle } from '@/shared/contract/runs';
import { client } from '@/shared/ui/api/client';
import { queryKeyOf, useHolds } from '@/shared/ui/api/queries';
import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { Field } from '@/shared/ui/components/Field';
import { Heading } from '@/shared/ui/components/Heading';
import { Label } from '@/shared/ui/components/Label';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Notice } from '@/shared/ui/components/Notice';
import { powerVisual } from '@/shared/ui/components/powerVisual';
import { readingWords } from '@/shared/ui/screens/holds/readingWords';
import { dateTimeWords } from '@/shared/ui/screens/shell/dateWords';
import { FactRows } from '@/shared/ui/screens/shell/FactRows';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { personName } from '@/shared/ui/screens/shell/personName';
import { Section } from '@/shared/ui/screens/shell/Section';
import { space } from '@/shared/ui/theme/space';

/** What has been done so far, then give or refuse. */
export function HoldSheet({ bundle }: { bundle: RunBundle }) {
  const holds = useHolds();
  const compiled = useMemo(() => compile(bundle), [bundle]);
  return (
    <Fetched query={holds} what="the hold point">
      {({ holds: all }) => {
        const hold = all.find((h) => h.run.id === bundle.run.id);
        return hold === undefined ? (
          <NoHold />
        ) : (
          <Answering key={hold.entry} hold={hold} bundle={bundle} program={compiled.ok ? compiled.program : null} />
        );
      }}
    </Fetched>
  );
}

function NoHold() {
  return (
    <View style={{ gap: space.l }}>
      <Heading level={1}>Countersign</Heading>
      <EmptyState
        title="No countersign is awaited here"
        text="It was answered, or the run has gone on or was stopped."
        action={<LinkText label="To the bench" href="/bench" />}
      />
    </View>
  );
}

interface Props {
  hold: Hold;
  bundle: RunBundle;
  /** null where this page cannot lead the run; its readings are then not told */
  program: Program | null;
}

function Answering({ hold, bundle, program }: Props) {
  const queries = useQueryClient();
  const [id] = useState(() => uuidv7());
  const [reason, setReason] = useState('');
  const [password, setPassword] = useState('');
  const [faults, setFaults] = useState<{ reason?: string; password?: string; other?: string }>({});
  const [busy, setBusy] = useState(false);
  const answer = async (given: boolean) => {
    const missing = {
      ...(!given && reason.trim() === '' ? { reason: 'Say why you refuse; the restorer reads it.' } : {}),
      ...(password === '' ? { password: 'Your password signs this.' } : {}),
    };
    setFaults(missing);
    if (Object.keys(missing).length > 0) return;
    setBusy(true);
    const body = {
      id,
      seq: hold.nextSeq,
      answer: given ? ('given' as const) : ('refused' as const),
      password,
      ...(reason.trim() === '' ? {} : { reason: reason.trim() }),
    };
    const signed = await client.call('answerHold', { params: { run: hold.run.id }, body });
    setBusy(false);
    setPassword('');
    if (signed.kind === 'problem') setFaults(signed.code === 'wrong-password' ? { password: signed.say } : { other: signed.say });
    if (signed.kind === 'ok' || signed.code === 'no-hold' || signed.code === 'out-of-sequence')
      await queries.invalidateQueries({ queryKey: queryKeyOf('holds') });
  };
  return (
    <View style={{ gap: space.xl, maxWidth: 720 }}>
      <View style={{ gap: space.xs }}>
        <Label>{`${hold.run.machine.name}, serial ${hold.run.machine.serial} · ${hold.run.tree.title}`}</Label>
        <Heading level={1}>{`Countersign wanted: ${hold.step.title}`}</Heading>
        <BodyText tone="soft">{`Asked by ${personName(bundle.people, hold.askedBy)}, ${dateTimeWords(hold.askedAt)}. Supply: ${powerVisual(hold.band).word.toLowerCase()}.`}</BodyText>
      </View>
      <Notice title={hold.reason}>{hold.step.asks}</Notice>
      <Section title="Bench facts">
        <FactRows caption="Bench facts" rows={hold.facts} />
      </Section>
      <Section title="Last readings">
        {program === null ? (
          <BodyText>This page cannot tell the readings of this run. Load it again before you sign.</BodyText>
        ) : hold.readings.length === 0 ? (
          <BodyText>No reading has been taken yet.</BodyText>
        ) : (
          <FactRows caption="Last readings" rows={hold.readings.map((entry) => readingWords(program, entry))} />
        )}
      </Section>
      {hold.mayAnswer ? (
        <Section title="Your answer">
          <BodyText>
            Local electrical codes, the maker’s data and licensed practice come first. Your countersign is good for one power-up of this
            step.
          </BodyText>
          <Field
            label="Reason or remark"
            value={reason}
            onChangeText={setReason}
            lines={2}
            error={faults.reason}
            hint="Needed to refuse."
          />
          <Field
            label="Your password"
            value={password}
            onChangeText={setPassword}
            secret
            required
            autoComplete="current-password"
            error={faults.password}
          />
          {faults.other === undefined ? null : <Notice live>{faults.other}</Notice>}
          <AnswerStack>
            <BigAnswer
              kind="primary"
              label={busy ? 'Signing …' : 'Give the countersign'}
              disabled={busy}
              onPress={() => void answer(true)}
            />
            <BigAnswer label="Refuse" disabled={busy} onPress={() => void answer(false)} />
          </AnswerStack>
        </Section>
      ) : (
        <Notice>This is your own run: another senior has to countersign it.</Notice>
      )}
    </View>
  );
}
