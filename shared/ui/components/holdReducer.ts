/**
 * What a hold-to-confirm does with what happens to it. Pure: times come in with the events.
 *
 * A press must last; a click that no press came before is a screen reader's or a switch's, which cannot hold:
 * it arms, and a second one after the same wait confirms.
 */

export type HoldPhase = 'idle' | 'holding' | 'armed' | 'let-go' | 'confirmed';

export interface HoldState {
  phase: HoldPhase;
  sinceMs: number;
}

export type HoldEvent = { type: 'down' | 'up' | 'tick' | 'bare-click'; atMs: number };

export const holdStart: HoldState = { phase: 'idle', sinceMs: 0 };

/** How long an armed button waits for its second click, in milliseconds. */
export const armedForMs = 15_000;

/** The next state. `confirmed` is final: a second confirmation needs a fresh button. */
export function holdReducer(state: HoldState, event: HoldEvent, holdMs: number): HoldState {
  const elapsedMs = event.atMs - state.sinceMs;
  if (state.phase === 'confirmed') return state;
  switch (event.type) {
    case 'down':
      return state.phase === 'holding' ? state : { phase: 'holding', sinceMs: event.atMs };
    case 'up':
      if (state.phase !== 'holding') return state;
      return { phase: elapsedMs >= holdMs ? 'confirmed' : 'let-go', sinceMs: event.atMs };
    case 'tick':
      if (state.phase === 'holding' && elapsedMs >= holdMs) return { phase: 'confirmed', sinceMs: event.atMs };
      if (state.phase === 'armed' && elapsedMs >= armedForMs) return { phase: 'idle', sinceMs: event.atMs };
      return state;
    case 'bare-click':
      if (state.phase === 'armed')
        return elapsedMs >= holdMs && elapsedMs < armedForMs ? { phase: 'confirmed', sinceMs: event.atMs } : state;
      return state.phase === 'holding' ? state : { phase: 'armed', sinceMs: event.atMs };
  }
}

/** Share of the hold that is done, 0 to 1. */
export function holdShare(state: HoldState, nowMs: number, holdMs: number): number {
  if (state.phase === 'confirmed') return 1;
  if (state.phase !== 'holding') return 0;
  return Math.min(1, Math.max(0, (nowMs - state.sinceMs) / holdMs));
}

/** The sentence below the button; read out when it changes. */
export function holdWords(phase: HoldPhase, holdMs: number): string {
  const seconds = `${Math.round(holdMs / 100) / 10} s`;
  switch (phase) {
    case 'idle':
      return `Press and hold for ${seconds}.`;
    case 'holding':
      return 'Keep holding. Let go to call it off.';
    case 'armed':
      return `Wait ${seconds}, then press again to confirm.`;
    case 'let-go':
      return `Let go too soon: nothing was done. Hold for ${seconds}.`;
    case 'confirmed':
      return 'Confirmed.';
  }
}
