/** A step that asks for a photo: taken, looked at, and only then put into the record. */
import { useEffect, useState } from 'react';

import { photoKeep } from '@/shared/ui/api/photoKeep';
import { AnswerStack } from '@/shared/ui/components/AnswerStack';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { Notice } from '@/shared/ui/components/Notice';
import { Photo } from '@/shared/ui/components/Photo';
import type { Run } from '@/shared/ui/screens/run/Run';
import { RunFrame } from '@/shared/ui/screens/run/RunFrame';
import { StepBody } from '@/shared/ui/screens/run/StepBody';
import { choosePhoto, preparePhoto } from '@/shared/ui/screens/run/takePhoto';
import type { TakenPhoto } from '@/shared/ui/screens/run/takePhoto';

const NO_ROOM = 'This device has no room left: the photo is not saved. Free some room, then take it again.';

/** The photo is kept on the device before the screen moves, as every answer is; it needs no network. */
export function PhotoStep({ run }: { run: Run }) {
  const { view } = run;
  const [taken, setTaken] = useState<(TakenPhoto & { url: string }) | null>(null);
  const [said, setSaid] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const url = taken?.url ?? null;
  useEffect(() => (url === null ? undefined : () => URL.revokeObjectURL(url)), [url]);

  const choose = async (from: 'camera' | 'device') => {
    const file = await choosePhoto(from);
    if (file === null) return;
    setBusy(true);
    try {
      const prepared = await preparePhoto(file);
      setTaken({ ...prepared, url: URL.createObjectURL(prepared.photo) });
      setSaid(null);
    } catch (error) {
      setSaid(error instanceof Error ? error.message : String(error));
    }
    setBusy(false);
  };
  const keep = async ({ hash, photo }: TakenPhoto) => {
    setBusy(true);
    const kept = await photoKeep.put(hash, run.bundle.run.id, photo);
    // what the engine does not take is not sent either
    if (kept && !(await run.send({ type: 'PHOTO', step: view.key, photo: hash }))) await photoKeep.drop(hash);
    setSaid(kept ? null : NO_ROOM);
    setBusy(false);
  };

  const wait = busy || run.busy;
  const declines = view.answers.filter((a) => a.answer !== 'done');
  const dock = (
    <>
      {taken === null ? (
        <BigAnswer kind="primary" label="Take the photo" disabled={wait} onPress={() => void choose('camera')} />
      ) : (
        <BigAnswer kind="primary" label="Keep this photo" disabled={wait} onPress={() => void keep(taken)} />
      )}
      <AnswerStack row>
        {taken === null ? (
          <BigAnswer half label="Choose a picture" disabled={wait} onPress={() => void choose('device')} />
        ) : (
          <BigAnswer half label="Take it again" disabled={wait} onPress={() => void choose('camera')} />
        )}
        {declines.map((a) => (
          <BigAnswer key={a.answer} half label={a.label} disabled={wait} onPress={() => void run.send({ type: 'ANSWER', step: view.key, answer: a.answer })} />
        ))}
      </AnswerStack>
    </>
  );
  return (
    <RunFrame run={run} dock={dock}>
      <StepBody run={run} row={null} />
      {said === null ? null : <Notice live>{said}</Notice>}
      {taken === null ? null : <Photo source={taken.url} says="The photo that you took" />}
    </RunFrame>
  );
}
