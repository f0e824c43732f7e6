import { describe, expect, it } from 'vitest';

import { isLive } from '@/flows/facts/facts';
import { copyOf, explore } from './explore';
import { libraryTree, move, programOf, walk } from './walk';

const tree = libraryTree('first-power');

describe.each(['corvane-12', 'ostrel-16'])('every step of first power on %s', (name) => {
  const program = programOf(tree, name);
  const { arrivals, ends, barred } = explore(program);
  const steps = [...program.layout.steps.values()].filter((p) => !p.builtIn);

  it('is reached, and no answer leads into a step that the house rules bar', () => {
    expect(barred).toEqual([]);
    const reached = new Set(arrivals.map((a) => a.key));
    expect(steps.filter((p) => p.step.kind !== 'end' && p.step.kind !== 'call' && !reached.has(p.key)).map((p) => p.key)).toEqual([]);
  });

  it('leads to every end that the tree has', () => {
    expect(tree.steps.filter((s) => s.kind === 'end' && !ends.has(s.id)).map((s) => s.id)).toEqual([]);
  });

  it('shows its warning before its action where hands, a probe or power are at work', () => {
    for (const { key, bench } of arrivals) {
      const placed = program.layout.steps.get(key);
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
      for (const deep of [false, true]) {
        const stopped = copyOf(bench);
        for (let i = 0; deep && i < 8 && stopped.view.key === key && stopped.view.phase !== 'act'; i += 1) move(stopped, {});
        stopped.do({ type: 'STOP' });
        expect(stopped.view.key, key).toBe('~isolate');
        walk(stopped, {}, (b) => b.view.key === '~choose');
        expect(stopped.view.band, key).toBe('proved-dead');
      }
    }
  });

  it('goes on after Stop only at places whose step may be entered as the bench now stands', () => {
    const offered = new Set<string>();
    for (const { bench } of arrivals) {
      const stopped = copyOf(bench);
      stopped.do({ type: 'STOP' });
      walk(stopped, {}, (b) => b.view.key === '~choose');
      for (const { key } of stopped.view.reentries) {
        offered.add(key);
        const again = copyOf(stopped).do({ type: 'REENTER', step: key });
        expect(again.view.key).toBe(key);
        expect(isLive(again.view.facts)).toBe(false);
        expect(again.view.band).toBe('proved-dead');
      }
    }
    expect(tree.reentries.map((r) => r.step).filter((step) => !offered.has(step))).toEqual([]);
  });

  it('is led to make dead when power is broken off', () => {
    const live = arrivals.filter((a) => isLive(a.bench.view.facts));
    expect(live.length).toBeGreaterThan(10);
    for (const { key, bench } of live) {
      const aborted = copyOf(bench).do({ type: 'ABORT' });
      expect(aborted.view.key, key).toBe('dead-abort/isolate');
      walk(aborted, {});
      expect(aborted.view.end, key).toMatchObject({ says: 'referred', key: 'aborted' });
    }
  });
});
