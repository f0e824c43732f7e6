/**
 * A run on this page: the compiled XState machine at the place where the entries have brought it, and the one way to move it. An answer is first
 * asked of the engine, then put on the disk, and only then the screen moves. Stop moves first and is written after.
 */
import { useActorRef, useSelector } from '@xstate/react';
import { useCallback, useEffect, useMemo, useRef, useState, useSyncExternalStore } from 'react';

import { advance } from '@/flows/machine/advance';
import type { RunState } from '@/flows/machine/advance';
import type { Refusal } from '@/flows/machine/arrive';
import type { Program } from '@/flows/machine/compile';
import type { MachineEvent } from '@/flows/machine/events';
import { view as viewOf } from '@/flows/machine/view';
import type { RunView } from '@/flows/machine/view';
import type { RunStart } from '@/shared/contract/runs';
import { eventOf, eventsOf } from '@/shared/ui/api/ledger';
import type { RecordChange, Saved } from '@/shared/ui/api/outbox';
import { stamp } from '@/shared/ui/hooks/benchClock';
import type { BareEvent } from '@/shared/ui/hooks/benchClock';
import { noted, play } from '@/shared/ui/hooks/play';
import type { Account } from '@/shared/ui/hooks/play';
import type { RunOutbox } from '@/shared/ui/hooks/useRunOutbox';

/** Why the last answer was not taken; `rule` is the house rule at stake. */
export type Said = Pick<Refusal, 'rule' | 'say'>;

export interface RunMachine {
  state: RunState;
  view: RunView;
  account: Account;
  saved: Saved;
  /** set from a refusal until the next answer that is taken */
  refusal: Said | null;
  /** true while an answer is on its way to the disk */
  busy: boolean;
  /** true once the answer is taken, on the disk, and shown */
  send(event: BareEvent): Promise<boolean>;
  /** the restorer has read which answers were not taken */
  markSeen(): void;
}

/** Runs the machine; give its component a new key for each `epoch` of the outbox. */
export function useRunMachine(program: Program, start: RunStart, { outbox, again }: Pick<RunOutbox, 'outbox' | 'again'>): RunMachine {
  const [begun] = useState(() => play(program, start, eventsOf(outbox.ledger())));
  const [account, setAccount] = useState(begun.account);
  const [refusal, setRefusal] = useState<Said | null>(null);
  const [busy, setBusy] = useState(false);
  const writing = useRef(false);
  const stopped = useRef(0);
  const saved = useSyncExternalStore(outbox.onSaved, outbox.saved);

  const [restored] = useState(() => program.machine.resolveState({ value: begun.state.value as never, context: begun.state.context }));
  const actor = useActorRef(program.machine, { snapshot: restored, input: begun.state.context });
  const snapshot = useSelector(actor, (s) => s);
  const state = useMemo<RunState>(() => ({ value: snapshot.value, context: snapshot.context }), [snapshot]);
  const view = useMemo(() => viewOf(program, state), [program, state]);

  const move = useCallback(
    (event: MachineEvent) => {
      const before = standing(actor);
      actor.send(event);
      const after = standing(actor);
      setAccount((so) => noted(program, so, before, event, after));
    },
    [actor, program],
  );

  const send = useCallback(
    async (bare: BareEvent): Promise<boolean> => {
      if (writing.current && bare.type !== 'STOP') return false;
      const event = stamp(bare);
      const asked = advance(program, standing(actor), event);
      if (!asked.ok) {
        setRefusal(asked.refusal);
        return false;
      }
      if (event.type === 'STOP') {
        const overtakes = writing.current;
        stopped.current += 1;
        setRefusal(null);
        move(event);
        const kept = await outbox.add(event);
        if (!kept.ok) setRefusal({ rule: null, say: kept.say });
        // the answer that was being written comes before the Stop in the record
        if (overtakes) again();
        return true;
      }
      const stops = stopped.current;
      writing.current = true;
      setBusy(true);
      const kept = await outbox.add(event);
      writing.current = false;
      setBusy(false);
      if (!kept.ok) {
        setRefusal({ rule: null, say: kept.say });
        return false;
      }
      setRefusal(null);
      if (stopped.current === stops) move(event);
      return true;
    },
    [actor, again, move, outbox, program],
  );

  const take = useCallback(
    (change: RecordChange) => {
      if (change.is === 'other') return;
      for (const entry of change.entries) {
        const event = eventOf(entry);
        if (event === null) continue;
        if (!advance(program, standing(actor), event).ok) {
          again();
          return;
        }
        move(event);
      }
    },
    [actor, again, move, program],
  );
  useEffect(() => outbox.onRecord(take), [outbox, take]);

  useLapse(state, program.layout.settings.deadLapseMinutes, program, send);
  usePolling(state.context.phase === 'hold-wait' || state.context.handing !== null || !saved.onDevice ? OFTEN_MS : SELDOM_MS, outbox);

  return { state, view, account, saved, refusal, busy, send, markSeen: () => void outbox.markSeen() };
}

interface HasSnapshot {
  getSnapshot(): { value: unknown; context: RunState['context'] };
}

function standing(actor: HasSnapshot): RunState {
  const { value, context } = actor.getSnapshot();
  return { value, context };
}

const OFTEN_MS = 2_000;
const SELDOM_MS = 15_000;

/** Asks for entries of others. */
function usePolling(everyMs: number, outbox: RunOutbox['outbox']): void {
  useEffect(() => {
    const timer = setInterval(() => void outbox.poll(), everyMs);
    return () => clearInterval(timer);
  }, [everyMs, outbox]);
}

const LOOK_EVERY_MS = 5_000;

/** "Proved dead" does not last: the moment its time is over the machine is told, and it leads through mending. */
function useLapse(state: RunState, minutes: number, program: Program, send: (event: BareEvent) => Promise<boolean>): void {
  const { provedAt, facts, phase } = state.context;
  const from = facts.stored === 'proved' && phase !== 'ended' && phase !== 'closed' && phase !== 'paused' ? provedAt : null;
  const now = useRef(state);
  useEffect(() => {
    now.current = state;
  }, [state]);
  useEffect(() => {
    if (from === null) return undefined;
    const look = () => {
      if (Date.now() - from <= minutes * 60_000) return;
      const asked = advance(program, now.current, stamp({ type: 'TICK' }));
      // parts that are each under their own link do not lapse
      if (asked.ok && asked.state.context.facts.stored !== 'proved') void send({ type: 'TICK' });
    };
    const timer = setInterval(look, LOOK_EVERY_MS);
    document.addEventListener('visibilitychange', look);
    return () => {
      clearInterval(timer);
      document.removeEventListener('visibilitychange', look);
    };
  }, [from, minutes, program, send]);
}
