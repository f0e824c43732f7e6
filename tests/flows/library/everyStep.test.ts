import { describe, expect, it } from 'vitest';

import { isLive } from '@/flows/facts/facts';
import { copyOf, explore } from './explore';
import { libraryTree, move, programOf, walk } from './walk';

const WALKS: [string, string][] = [
  ['first-power', 'corvane-12'],
  ['first-power', 'ostrel-16'],
  ['lamp-bright', 'corvane-12'],
  ['look-over', 'brindle-80'],
  ['returns-measured', 'wendle-5'],
  ['reform-in-place', 'ostrel-16'],
  ['rail-low', 'ostrel-16'],
  ['trip-fires', 'corvane-12'],
  ['raw-on-rail', 'ostrel-16'],
  ['ripple', 'corvane-12'],
  ['ticking', 'brindle-80'],
  ['lost-return', 'wendle-5'],
  ['dies-twice', 'ostrel-16'],
  ['earth-insulation', 'brindle-80'],
  ['heat-and-fan', 'corvane-12'],
  ['discharge', 'brindle-80'],
  ['reform-lifted', 'wendle-5'],
  ['lamp-first', 'brindle-80'],
  ['lamp-first', 'corvane-12'],
  ['regulator-bench', 'ostrel-16'],
  ['full-load', 'brindle-80'],
  ['fuse-switch-mode', 'brindle-80'],
  ['refit', 'wendle-5'],
  ['cold-checks', 'ostrel-16'],
  ['as-found-harness', 'corvane-12'],
  ['as-found-harness', 'brindle-80'],
  ['refit-no-trip', 'switch-mode, one rail, Class II'],
  ['prove-supply', 'brindle-80'],
  ['prove-supply-no-trip', 'switched from raw volts, one negative rail without a trip, Class II, a battery, boards in'],
];

describe.each(WALKS)('every step of %s on %s', (id, profile) => {
  const tree = libraryTree(id);
  const program = programOf(tree, profile);
  const { arrivals, ends, barred } = explore(program);
  const placedAt = (key: string) => program.layout.steps.get(key);
  const madeSafe = (bench: ReturnType<typeof copyOf>) => walk(bench.do({ type: 'STOP' }), {}, (b) => b.view.key === '~choose' || b.view.phase === 'ended');

  it('is reached, and no answer leads into a step that the house rules bar', () => {
    expect(barred).toEqual([]);
    const reached = new Set(arrivals.map((a) => a.key));
    const steps = [...program.layout.steps.values()].filter((p) => !p.builtIn && p.step.kind !== 'end' && p.step.kind !== 'call');
    expect(steps.filter((p) => !reached.has(p.key)).map((p) => p.key)).toEqual([]);
  });

  it('leads to every end that the tree has', () => {
    expect(tree.steps.filter((s) => s.kind === 'end' && !ends.has(s.id)).map((s) => s.id)).toEqual([]);
  });

  it('shows its warning before its action where hands, a probe or power are at work', () => {
    for (const { key, bench } of arrivals) {
      const placed = placedAt(key);
      if (placed === undefined || placed.builtIn) continue;
      const { step } = placed;
      if (step.contact !== 'hands' && step.contact !== 'probe' && step.kind !== 'energise' && step.kind !== 'raise') continue;
      expect(placed.hazards, key).not.toEqual([]);
      expect(bench.view.phase, key).toBe('warning');
      expect(bench.try({ type: 'ANSWER', step: key, answer: 'done' }).ok, key).toBe(false);
    }
  });

  it('can be left by Stop at once, and what follows is dead before anything else', () => {
    for (const { key, bench } of arrivals) {
      const deep = copyOf(bench);
      for (let i = 0; i < 8 && deep.view.key === key && deep.view.phase !== 'act'; i += 1) move(deep, {});
      for (const stopped of [copyOf(bench), deep]) {
        expect(copyOf(stopped).do({ type: 'STOP' }).view.key, key).toBe('~isolate');
        expect(madeSafe(stopped).view.band, key).toBe('proved-dead');
      }
    }
  });

  it('goes on after Stop only at places whose step may be entered as the bench now stands', () => {
    const offered = new Set<string>();
    for (const { bench } of arrivals) {
      const stopped = madeSafe(copyOf(bench));
      for (const { key } of stopped.view.reentries) {
        offered.add(key);
        const again = copyOf(stopped).do({ type: 'REENTER', step: key });
        expect(again.view.key).toBe(key);
        expect(again.view.band).toBe('proved-dead');
      }
    }
    expect(tree.reentries.map((r) => r.step).filter((step) => !offered.has(step))).toEqual([]);
  });

  it('is led to make dead and to a senior when power is broken off', () => {
    for (const { key, bench } of arrivals.filter((a) => isLive(a.bench.view.facts))) {
      const aborted = copyOf(bench).do({ type: 'ABORT' });
      expect(placedAt(aborted.view.key)?.step.kind, key).toBe('isolate');
      expect(walk(aborted).view.end?.says, key).toBe('referred');
    }
  });

  it('says one thing a line, in twenty words at most, and names every tool that it uses', () => {
    const wordy = tree.steps.flatMap((s) => s.lines).filter((line) => line.split(/\s+/).length > 20);
    expect(wordy).toEqual([]);
    const used = new Set(tree.steps.flatMap((s) => s.tools));
    const { tools, instruments, parts } = tree.opening;
    expect([...tools, ...instruments, ...parts].map((t) => t.id).filter((t) => !used.has(t))).toEqual([]);
  });
});
