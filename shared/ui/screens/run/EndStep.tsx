/** The end of a run: its verdict, what is to be replaced and tested again, what stays; then closing and handing in. */
import { useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';

import { client } from '@/shared/ui/api/client';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Heading } from '@/shared/ui/components/Heading';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Notice } from '@/shared/ui/components/Notice';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { savedWords } from '@/shared/ui/screens/run/savedWords';
import { useLongWait } from '@/shared/ui/screens/run/useLongWait';
import { StaysFitted } from '@/shared/ui/screens/run/StaysFitted';
import { StepHead } from '@/shared/ui/screens/run/StepHead';
import { endingWords } from '@/shared/ui/screens/shell/runWords';
import { space } from '@/shared/ui/theme/space';

/** Phases `ended` and `closed`. */
export function EndStep({ run }: { run: Run }) {
  const { view, bundle, program } = run;
  const { end } = view;
  const closed = view.phase === 'closed';
  const [handedIn, setHandedIn] = useState(bundle.run.state === 'submitted' || bundle.run.state === 'accepted');
  const step = end?.key == null ? undefined : program.layout.steps.get(end.key)?.step;
  return (
    <RunFrame
      run={run}
      stop={!closed}
      dock={
        closed ? (
          <HandIn run={run} handedIn={handedIn} onHandedIn={() => setHandedIn(true)} />
        ) : (
          <BigAnswer kind="primary" label="Close the record" disabled={run.busy} onPress={() => void run.send({ type: 'CLOSE' })} />
        )
      }
    >
      <StepHead run={run} title={end?.title ?? 'Stopped'} />
      <Heading level={2} size="section">{`The run ends: ${endingWords(end?.says ?? 'stopped')}`}</Heading>
      {step ? (
        <View style={{ gap: space.xs }}>
          {step.lines.map((words) => (
            <BodyText key={words} size="instruction">
              {words}
            </BodyText>
          ))}
        </View>
      ) : null}
      {end?.replace ? <Notice title="Replace">{end.replace}</Notice> : null}
      {end?.retest ? <Notice title="Test again">{end.retest}</Notice> : null}
      <StaysFitted run={run} />
      {closed ? null : (
        <BodyText tone="soft">Closing ends the work at the bench. Nothing can be added after it but what the review asks.</BodyText>
      )}
      {closed ? (
        <View>
          <LinkText label="To the record" href={`/records/${bundle.run.id}`} />
          <LinkText label="To the bench" href="/bench" />
        </View>
      ) : null}
    </RunFrame>
  );
}

function HandIn({ run, handedIn, onHandedIn }: { run: Run; handedIn: boolean; onHandedIn: () => void }) {
  const [id] = useState(() => uuidv7());
  const [fault, setFault] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const waiting = run.saved.waiting > 0;
  const long = useLongWait(run.saved);
  if (handedIn) return <BodyText bold>Submitted for review.</BodyText>;
  const submit = async () => {
    setBusy(true);
    const answer = await client.call('submit', { params: { run: run.bundle.run.id }, body: { id } });
    setBusy(false);
    if (answer.kind === 'ok') onHandedIn();
    else setFault(answer.say);
  };
  return (
    <>
      {long ? <Notice live>{`Not yet: ${savedWords(run.saved)}.`}</Notice> : null}
      {fault === null ? null : <Notice live>{fault}</Notice>}
      <BigAnswer
        kind="primary"
        label={busy ? 'Submitting …' : 'Submit for review'}
        disabled={busy || waiting}
        onPress={() => void submit()}
      />
    </>
  );
}
