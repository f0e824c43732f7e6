/** What the trade knows of on-demand switching regulators; common practice, no source. */
import { describe, expect, it } from 'vitest';

import { posterior } from '@/flows/evidence/posterior';
import { rehearse } from '@/flows/rehearsal/rehearse';
import { Bench } from '../support/bench';
import { libraryTree, programOf, walk } from './walk';

const tree = libraryTree('rail-low');
const program = programOf(tree, 'ostrel-16');
const walked = (choices: Parameters<typeof walk>[1]) => walk(new Bench(program), choices);
/** The order in which the first visit of some steps came. */
const order = (path: readonly string[], wanted: readonly string[]) => [...new Set(path)].filter((key) => wanted.includes(key));

describe('a rail that is low or soft under load', () => {
  it('is not laid to the pass device alone: twelve parts and the harness have their own verdict', () => {
    const named = new Set(tree.steps.flatMap((s) => (s.kind === 'end' && s.suspect !== undefined ? [s.suspect] : [])));
    expect(tree.suspects.map((s) => s.id).filter((id) => !named.has(id))).toEqual([]);
    expect(named.size).toBeGreaterThanOrEqual(13);
  });

  it('right at light load, sagging and hot at low current, points to the freewheel diode before the pass device', () => {
    const story = tree.steps.find((s) => s.id === 'story')?.exits.find((e) => e.id === 'sags-hot');
    const ranked = posterior(tree.suspects, [{ check: 'story', evidence: story?.evidence ?? [] }]).map((r) => r.suspect.id);
    expect(ranked[0]).toBe('freewheel-open');
    expect(ranked.indexOf('pass')).toBeGreaterThan(ranked.indexOf('freewheel-open'));
  });

  it('an open diode has its large over-current looked for before a new one goes in', () => {
    const { path } = rehearse(program, 'freewheel-open').suspects[0]!;
    expect(order(path, ['freewheel', 'diode-killer', 'returns-why', 'caps-why', 'switch-group', 'bench-low'])).toEqual(['freewheel', 'diode-killer', 'returns-why', 'caps-why', 'switch-group', 'bench-low']);
    expect(walked({ freewheel: { reading: 'over' }, 'returns-why': { r1: 0.9 } }).view.end?.key).toBe('end-return-lost');
    expect(walked({ freewheel: { reading: 'over' }, 'caps-why': { reading: 'over' } }).view.end?.key).toBe('end-loop-caps');
  });

  it('a shorted diode goes without that search: age does it', () => {
    expect(rehearse(program, 'freewheel-short').suspects[0]!.path).not.toContain('diode-killer');
  });

  it('after pass device, driver and diode: bench supply, regulated volts, scope, full load, and nothing refitted before', () => {
    const { path, end } = rehearse(program, 'pass').suspects[0]!;
    const since = path.slice(path.lastIndexOf('switch-group'));
    const wanted = ['freewheel', 'bench-low', 'rails-bench', 'scope', 'full', 'rails-full'];
    expect(order(since, wanted)).toEqual(wanted);
    expect(end?.key).toBe('holds');
    const after = tree.steps.filter((s) => since.includes(s.id));
    expect(after.filter((s) => s.kind === 'connect-load' && s.load === 'boards')).toEqual([]);
    expect(after.filter((s) => s.kind === 'energise' && s.source !== 'bench')).toEqual([]);
  });

  it('a heatsink that heats at light load ends at the diode, though it read well while cold', () => {
    expect(walked({ 'heat-light': { reading: 61 } }).view.end?.key).toBe('end-freewheel-open');
  });
});
