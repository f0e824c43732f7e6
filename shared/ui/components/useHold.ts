/** Runs a hold-to-confirm: keeps its state, ticks while a hold is under way, confirms once. */
import { useCallback, useEffect, useRef, useState } from 'react';

import { holdReducer, holdShare, holdStart } from '@/shared/ui/components/holdReducer';
import type { HoldEvent, HoldPhase, HoldState } from '@/shared/ui/components/holdReducer';

interface Hold {
  phase: HoldPhase;
  /** 0 to 1 */
  share: number;
  send: (type: HoldEvent['type']) => void;
}

const tickMs = 50;

/** State of one hold; `onConfirm` is called once, at the moment the hold is complete. */
export function useHold(holdMs: number, onConfirm: () => void): Hold {
  const [state, setState] = useState<HoldState>(holdStart);
  const [nowMs, setNowMs] = useState(0);
  const current = useRef(state);
  const confirm = useRef(onConfirm);
  useEffect(() => {
    confirm.current = onConfirm;
  }, [onConfirm]);

  const send = useCallback(
    (type: HoldEvent['type']) => {
      const atMs = performance.now();
      const before = current.current;
      const next = holdReducer(before, { type, atMs }, holdMs);
      setNowMs(atMs);
      if (next === before) return;
      // kept beside React's state so that two events of one frame cannot both confirm
      current.current = next;
      setState(next);
      if (next.phase === 'confirmed') confirm.current();
    },
    [holdMs],
  );

  const ticking = state.phase === 'holding' || state.phase === 'armed';
  useEffect(() => {
    if (!ticking) return undefined;
    const timer = setInterval(() => send('tick'), tickMs);
    return () => clearInterval(timer);
  }, [ticking, send]);

  return { phase: state.phase, share: holdShare(state, nowMs, holdMs), send };
}
