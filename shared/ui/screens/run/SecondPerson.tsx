/** Live work above the limits: a second person who is present signs in on this device. */
import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';

import { client } from '@/shared/ui/api/client';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Field } from '@/shared/ui/components/Field';
import { Notice } from '@/shared/ui/components/Notice';
import { Select } from '@/shared/ui/components/Select';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import type { Run } from '@/shared/ui/screens/run/Run';
import { StepHead } from '@/shared/ui/screens/run/StepHead';

/** Stands before a reading by hand on a live point above the limits. */
export function SecondPerson({ run }: { run: Run }) {
  const { bundle, program } = run;
  const { secondPersonVoltsDc, secondPersonVoltsAc } = program.layout.settings;
  const [person, setPerson] = useState<string | null>(null);
  const [password, setPassword] = useState('');
  const [id] = useState(() => uuidv7());
  const [fault, setFault] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const people = bundle.people.filter((p) => p.id !== bundle.run.restorer);
  const sign = async () => {
    if (person === null) return;
    setBusy(true);
    setFault(null);
    // what waits here comes first: the sign-in takes the next place in the record
    await run.poll();
    const answer = await client.call('secondPerson', {
      params: { run: bundle.run.id },
      body: { id, seq: run.headSeq() + 1, person, password },
    });
    if (answer.kind === 'problem') setFault(answer.say);
    else await run.poll();
    setPassword('');
    setBusy(false);
  };
  return (
    <RunFrame
      run={run}
      dock={
        <BigAnswer
          kind="primary"
          label={busy ? 'Signing in …' : 'I am here, and I watch'}
          disabled={busy || person === null || password === ''}
          onPress={() => void sign()}
        />
      }
    >
      <StepHead run={run} />
      <Notice kind="alarm" title="A second person has to be here">
        {`This reading is taken by hand on a live point above ${secondPersonVoltsDc} V DC or ${secondPersonVoltsAc} V AC. Somebody else stays in the room, knows where the emergency-off is, and signs in now.`}
      </Notice>
      <BodyText>Hands off until then. Stop works as always.</BodyText>
      <Select
        label="Second person"
        options={people.map((p) => ({ value: p.id, label: `${p.name}, ${p.code}` }))}
        value={person}
        onChange={setPerson}
      />
      <Field
        label="Their password"
        value={password}
        onChangeText={setPassword}
        secret
        required
        autoComplete="off"
        error={fault ?? undefined}
        onSubmit={() => void sign()}
      />
    </RunFrame>
  );
}
