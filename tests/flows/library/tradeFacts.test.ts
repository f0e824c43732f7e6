/** What the trade knows of diodes, returns and first power, and what the trees make of it: common practice, no source. */
import { describe, expect, it } from 'vitest';

import type { Exit } from '@/flows/document/steps';
import type { Tree } from '@/flows/document/tree';
import { posterior } from '@/flows/evidence/posterior';
import { rehearse } from '@/flows/rehearsal/rehearse';
import { Bench, program } from '../support/bench';
import { libraryTree, programOf, walk } from './walk';
import type { Choices } from './walk';

const railLow = libraryTree('rail-low');
const cold = libraryTree('cold-checks');
const lostReturn = libraryTree('lost-return');
const walked = (tree: Tree, choices: Choices, machine = 'ostrel-16') => walk(new Bench(programOf(tree, machine)), choices);
const exitOf = (tree: Tree, step: string, exit: string): Exit => tree.steps.find((s) => s.id === step)!.exits.find((e: Exit) => e.id === exit)!;
const order = (path: readonly string[], wanted: readonly string[]) => [...new Set(path)].filter((key) => wanted.includes(key));

describe('an on-demand step-down with an open freewheel diode (common practice, no source)', () => {
  it.each<[string, string, string]>([
    ['makes its rail at light load, sags as load grows, heats at low current', 'story', 'sags-hot'],
    ['heats its heatsink hard at light load', 'heat-light', 'high'],
    ['shuts down near a third of full load, hot', 'sag-how', 'trips'],
  ])('%s: the diode is the likeliest, the pass device is not', (_, step, exit) => {
    const ranked = posterior(railLow.suspects, [{ check: step, evidence: exitOf(railLow, step, exit).evidence ?? [] }]).map((r) => r.suspect.id);
    expect(ranked[0]).toBe('freewheel-open');
    expect(ranked.indexOf('pass')).toBeGreaterThan(0);
  });

  it('has a verdict of its own in both trees, and so has each other part of the list', () => {
    const wanted = ['pass', 'driver', 'freewheel-open', 'freewheel-short', 'loop-caps', 'output-cap', 'choke', 'current-sense', 'reference', 'divider', 'sense-device', 'hysteresis', 'trip-early', 'return-lost'];
    for (const tree of [railLow, cold]) {
      const named = tree.steps.flatMap((s) => (s.kind === 'end' && s.says === 'fault-found' ? [s.suspect] : []));
      expect(wanted.filter((id) => !named.includes(id))).toEqual([]);
    }
  });
});

describe('a diode that is read both ways (common practice, no source)', () => {
  it.each([['rail-low', railLow], ['cold-checks', cold]] as const)('over range both ways is open, in %s', (_, tree) => {
    expect(walked(tree, { freewheel: { reading: 'over' } }).state.context.visited).toContain('diode-photo');
    expect(exitOf(tree, 'freewheel', tree === cold ? 'open' : 'high').evidence).toContainEqual({ suspect: 'freewheel-open', says: 'all-but-proves' });
  });

  it('next to nothing both ways is short only between two terminals: two leads of one read short on a good part', () => {
    const freewheel = walked(cold, { freewheel: { reading: 0.001 }, 'diode-leads': 'two' });
    expect(freewheel.view.end?.key).toBe('end-freewheel-short');
    const pass = walked(cold, { pass: { reading: 0.1 }, 'pass-leads': 'two' });
    expect(pass.view.end?.key).toBe('end-pass');
    const bench = new Bench(programOf(cold, 'ostrel-16'));
    walk(bench, { freewheel: { reading: 0.001 }, 'diode-leads': 'one' }, (b) => b.state.context.visited.includes('diode-leads') && b.view.key === 'freewheel');
    // read again, between anode and cathode this time
    walk(bench);
    expect(bench.view.end?.key).toBe('nothing-cold');
  });
});

describe('a failed diode (common practice, no source)', () => {
  it('that is open has what drove the current looked for before power, in both trees', () => {
    for (const tree of [railLow, cold]) {
      const { path } = rehearse(programOf(tree, 'ostrel-16'), 'freewheel-open').suspects[0]!;
      const opened = tree === railLow ? 'diode-killer' : 'diode-opened';
      expect(order(path, ['diode-photo', opened, 'returns-why', 'caps-why'])).toEqual(['diode-photo', opened, 'returns-why', 'caps-why']);
      expect(path.indexOf('bench-low') === -1 || path.indexOf('bench-low') > path.indexOf('caps-why')).toBe(true);
    }
  });

  it('that is short goes without that search: age and too many volts do it', () => {
    for (const tree of [railLow, cold]) expect(rehearse(programOf(tree, 'ostrel-16'), 'freewheel-short').suspects[0]!.path).not.toContain('returns-why');
  });

  it('burnt through and spattered inside shows a large over-current, and raises what can drive one', () => {
    for (const [tree, step] of [[railLow, 'diode-killer'], [cold, 'diode-opened']] as const) {
      const exit = exitOf(tree, step, 'spattered');
      expect(exit.shows).toBe('large-over-current');
      const ranked = posterior(tree.suspects.filter((s) => s.id !== 'freewheel-open'), [{ check: step, evidence: exit.evidence ?? [] }]).map((r) => r.suspect.id);
      expect(ranked.slice(0, 2).sort()).toEqual(['loop-caps', 'return-lost']);
    }
  });

  it('is never opened where a part may hold beryllium oxide: the search goes on without it', () => {
    for (const tree of [railLow, cold]) {
      const { layout } = programOf(tree, 'ostrel-16');
      const shut = { ...layout.profile, hazards: [...layout.profile.hazards, 'beryllium-oxide' as const] };
      const { path } = rehearse(compiled(tree, shut), 'freewheel-open').suspects[0]!;
      expect(path.some((key) => key === 'diode-killer' || key === 'diode-opened')).toBe(false);
      expect(path).toContain('returns-why');
    }
  });
});

describe('a lifted common return with a negative rail on (common practice, no source)', () => {
  it('shows as a positive rail below zero at the supply, and leads to every return, read dead', () => {
    const bench = walked(lostReturn, { 'rails-near': { p5: -0.7 }, returns: { r1: 0.9 }, where: { reading: 3 } });
    expect(order(bench.state.context.visited, ['rails-near', 'dead-returns/prove', 'returns', 'where'])).toEqual(['rails-near', 'dead-returns/prove', 'returns', 'where']);
    expect(bench.view.end).toMatchObject({ says: 'fault-found', key: 'end-return-wire' });
    expect(exitOf(lostReturn, 'rails-near', 'reversed').verdict).toBe('find');
  });

  it('is looked for on a limited supply alone: what flows is the limit of the negative rail, not its rating', () => {
    const power = lostReturn.steps.flatMap((s) => (s.kind === 'energise' || s.kind === 'raise' ? [s] : []));
    const { profile } = programOf(lostReturn, 'ostrel-16').layout;
    expect(power.length).toBeGreaterThan(0);
    for (const step of power) expect([step.source, step.mostAmps <= Math.min(...profile.rails.map((r) => r.limitAmps))]).toEqual(['bench', true]);
    expect(power[0]?.why).toMatch(/below zero through its freewheel diode.*the negative rail’s limit/s);
    for (const rail of profile.rails) expect(rail.limitAmps).toBeGreaterThan(rail.maxAmps);
  });
});

describe('after pass device, driver and diode are new (common practice, no source)', () => {
  it.each(['pass', 'driver', 'freewheel-open', 'freewheel-short'])('%s: bench supply, regulated volts, scope, full load under its cover, and nothing refitted before', (suspect) => {
    const { path, end } = rehearse(programOf(railLow, 'ostrel-16'), suspect).suspects[0]!;
    const since = path.slice(path.lastIndexOf('switch-group'));
    const wanted = ['bench-low', 'rails-bench', 'scope', 'as-in-service', 'full', 'rails-full'];
    expect(order(since, wanted)).toEqual(wanted);
    expect(end?.key).toBe('holds');
    const steps = railLow.steps.filter((s) => since.includes(s.id));
    expect(steps.filter((s) => s.kind === 'connect-load' && s.load === 'boards')).toEqual([]);
    expect(steps.filter((s) => (s.kind === 'energise' || s.kind === 'raise') && s.source !== 'bench')).toEqual([]);
  });
});

/** The program of a tree on a changed machine. */
function compiled(tree: Tree, profile: Parameters<typeof program>[1]) {
  return program(tree, profile, [libraryTree('make-dead')]);
}
