/** The outbox of a run on this page: opened once, woken when the network or the person comes back, closed with the screen. */
import { useEffect, useRef, useState } from 'react';

import type { Program } from '@/flows/machine/compile';
import type { RunBundle } from '@/shared/contract/runs';
import { client } from '@/shared/ui/api/client';
import { eventsOf } from '@/shared/ui/api/ledger';
import type { Ledger } from '@/shared/ui/api/ledger';
import { createOutbox } from '@/shared/ui/api/outbox';
import type { Outbox } from '@/shared/ui/api/outbox';
import { openOutboxStore } from '@/shared/ui/api/outboxStore';
import { longerOf } from '@/shared/ui/api/recordPart';
import { readKeptRun } from '@/shared/ui/api/runStore';
import { photoKeep } from '@/shared/ui/api/photoKeep';
import { makeSendPhoto } from '@/shared/ui/api/sendPhoto';
import { BOOT, stamp } from '@/shared/ui/hooks/benchClock';
import { pause } from '@/shared/ui/hooks/pause';
import { play } from '@/shared/ui/hooks/play';

export interface RunOutbox {
  outbox: Outbox;
  /** counts how often the run had to be played anew: whatever stands on it is made anew too */
  epoch: number;
  /** plays the run anew from what the outbox holds */
  again(): void;
}

/** Null until the device's store is open and the run has come back from an earlier load of the page. */
export function useRunOutbox(bundle: RunBundle, program: Program, person: string): RunOutbox | null {
  const [outbox, setOutbox] = useState<Outbox | null>(null);
  const [epoch, setEpoch] = useState(0);
  // the bundle is where the run was when the page opened it; what comes later comes through the outbox
  const first = useRef({ bundle, program, person });

  useEffect(() => {
    const opened: { box: Outbox | null; over: boolean } = { box: null, over: false };
    const waked = () => {
      if (document.visibilityState === 'visible') void opened.box?.poll();
    };
    const online = () => opened.box?.kick();
    void (async () => {
      const store = await openOutboxStore();
      const box = createOutbox({
        run: first.current.bundle.run.id,
        person: first.current.person,
        store,
        client,
        sendPhoto: makeSendPhoto(client, photoKeep, first.current.bundle.run.id),
        ...engineOf(first.current.program, first.current.bundle),
        pause,
      });
      // a copy of the run that the page had from before may be older than what this device has heard since
      const kept = await readKeptRun(first.current.bundle.run.id);
      await box.open(longerOf(first.current.bundle.entries, kept?.bundle.entries ?? []));
      await comeBack(box, first.current.program, first.current.bundle);
      if (opened.over) {
        box.close();
        return;
      }
      opened.box = box;
      box.onRecord((change) => {
        if (change.is === 'other') setEpoch((n) => n + 1);
      });
      setOutbox(box);
    })();
    window.addEventListener('online', online);
    window.addEventListener('focus', waked);
    document.addEventListener('visibilitychange', waked);
    return () => {
      opened.over = true;
      opened.box?.close();
      window.removeEventListener('online', online);
      window.removeEventListener('focus', waked);
      document.removeEventListener('visibilitychange', waked);
    };
  }, []);

  return outbox === null ? null : { outbox, epoch, again: () => setEpoch((n) => n + 1) };
}

/** What the outbox asks of the engine. */
function engineOf(program: Program, { start }: RunBundle) {
  const played = (ledger: Pick<Ledger, 'held' | 'waiting'>) => play(program, start, eventsOf(ledger));
  return {
    replays: (held: Ledger['held'], waiting: Ledger['waiting']) => {
      const { refused } = played({ held, waiting });
      if (refused === null) return null;
      const at = refused.at - eventsOf({ held, waiting: [] }).length;
      // what the server has taken stands, whatever this page thinks of it
      return at < 0 ? null : { at, why: { say: refused.refusal.say, rule: refused.refusal.rule } };
    },
    toSafety: (ledger: Ledger) =>
      played(ledger).state.context.phase === 'closed' ? [] : [stamp({ type: 'RESTART' }), stamp({ type: 'STOP' })],
  };
}

/** A run that was under way in another load of the page comes back first: nothing that was known of its sources still counts. */
async function comeBack(box: Outbox, program: Program, { start }: RunBundle): Promise<void> {
  const { context } = play(program, start, eventsOf(box.ledger())).state;
  if (context.last.boot !== '' && context.last.boot !== BOOT && context.phase !== 'closed') await box.add(stamp({ type: 'RESTART' }));
}
