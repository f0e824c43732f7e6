/** A tree played at a bench until it ends, asks for something else, or is refused. */
import type { Tree } from '@/flows/document/tree';

import { Bench, benchProfile, makeDeadTree, program } from './bench';
import { dead, earth, insulation, look, returns } from './steps';

/** Plays a tree with good answers until it ends, asks for something else, or is refused; the refusal's rule, or where it came to. */
export function play(tree: Tree, answers: Record<string, string> = {}, profile = benchProfile, carried: { release?: boolean } = {}): { rule: string | null; at: string; bench: Bench } {
  const b = new Bench(program(tree, profile, [makeDeadTree]), false, carried);
  for (let i = 0; i < 200; i += 1) {
    const { phase, key, current, answers: words } = b.view;
    if (phase === 'ended' || phase === 'closed' || key === '~choose') return { rule: null, at: b.view.end?.key ?? key, bench: b };
    let refused: string | null | undefined;
    const take = (advanced: ReturnType<Bench['try']>) => (refused = advanced.ok ? undefined : (advanced.refusal.rule ?? advanced.refusal.code));
    if (phase === 'warning') take(b.try({ type: 'WARNING_READ', step: key }));
    else if (phase === 'hold') take(b.try({ type: 'HOLD_ASKED', step: key }));
    else if (phase === 'hold-wait') take(b.try({ type: 'HOLD_GIVEN', step: key, by: 'sam' }));
    else if (phase === 'guard') take(b.try({ type: 'GUARD_HELD', step: key, heldMs: 2500 }));
    else if (current) {
      try {
        b.row();
      } catch (error) {
        refused = /(H\d+)/.exec(String(error))?.[1] ?? String(error);
      }
    } else if (b.view.step?.kind === 'hold') take(b.try({ type: 'HOLD_ASKED', step: key }));
    else if (b.view.step?.kind === 'photo' && answers[key] === undefined) take(b.try({ type: 'PHOTO', step: key, photo: '0'.repeat(64) }));
    else take(b.try({ type: 'ANSWER', step: key, answer: answers[key] ?? words[0]?.answer ?? '' }));
    if (refused !== undefined) return { rule: refused, at: key, bench: b };
  }
  throw new Error(`never ends: ${b.view.key}`);
}

/** Everything that must stand before power at the inlet, then `next`. */
export const ready = (next: string) => [look('d1'), dead('d1', 'returns'), returns('earth'), earth('insulation'), insulation('d2'), dead('d2', next)];
