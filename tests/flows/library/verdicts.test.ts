import { describe, expect, it } from 'vitest';

import type { EvidenceWord } from '@/flows/document/outcomes';
import { Bench } from '../support/bench';
import { LINEAR, libraryTree, programOf, walk } from './walk';
import type { Choices } from './walk';

const tree = libraryTree('first-power');

interface Verdict {
  fault: string;
  machine: 'corvane-12' | 'ostrel-16';
  /** what is read or seen on the way; everything else is good */
  seen: Choices;
  /** the exit that carries the evidence */
  said: { step: string; exit: string; says: EvidenceWord };
}

const VERDICTS: Verdict[] = [
  { fault: 'freewheel-open', machine: 'ostrel-16', seen: { freewheel: { reading: 'over' } }, said: { step: 'freewheel', exit: 'open', says: 'all-but-proves' } },
  { fault: 'freewheel-short', machine: 'ostrel-16', seen: { freewheel: { reading: 0.002 } }, said: { step: 'freewheel', exit: 'low', says: 'all-but-proves' } },
  { fault: 'pass-short', machine: 'corvane-12', seen: { ...LINEAR, pass: { reading: 0.4 }, 'pass-alone': { reading: 0.3 } }, said: { step: 'pass-alone', exit: 'low', says: 'all-but-proves' } },
  { fault: 'reservoir-leaky', machine: 'corvane-12', seen: { ...LINEAR, 'form-leak': { reading: 0.031 } }, said: { step: 'form-leak', exit: 'high', says: 'all-but-proves' } },
  { fault: 'reservoir-dry', machine: 'corvane-12', seen: { ...LINEAR, 'reservoir-esr': { reading: 2.4 } }, said: { step: 'reservoir-esr', exit: 'high', says: 'all-but-proves' } },
  { fault: 'loop-cap-open', machine: 'ostrel-16', seen: { 'ripple-bench': { p5: 0.21 }, 'loop-cap': { reading: 'over' } }, said: { step: 'loop-cap', exit: 'open', says: 'all-but-proves' } },
  { fault: 'return-lost', machine: 'corvane-12', seen: { returns: { r3: 1.8 } }, said: { step: 'returns', exit: 'high', says: 'points-to' } },
  { fault: 'trip-fires-early', machine: 'corvane-12', seen: { ...LINEAR, trip: { p5: 5.3 } }, said: { step: 'trip', exit: 'early', says: 'all-but-proves' } },
  { fault: 'trip-dead', machine: 'corvane-12', seen: { ...LINEAR, trip: { p5: 6.9 } }, said: { step: 'trip', exit: 'never', says: 'all-but-proves' } },
  { fault: 'trip-short', machine: 'corvane-12', seen: { 'rails-cold': { p5: 0.6 }, 'rails-alone': { '*': 80 } }, said: { step: 'rails-alone', exit: 'in', says: 'all-but-proves' } },
  { fault: 'output-short', machine: 'corvane-12', seen: { 'rails-cold': { p12: 0.6 }, 'rails-alone': { p12: 0.6 } }, said: { step: 'rails-alone', exit: 'low', says: 'all-but-proves' } },
  { fault: 'bridge-short', machine: 'corvane-12', seen: { bridge: { reading: 0.001 }, 'bridge-alone': { reading: 0.001 } }, said: { step: 'bridge-alone', exit: 'low', says: 'all-but-proves' } },
  { fault: 'reservoir-short', machine: 'corvane-12', seen: { bridge: { reading: 0.001 }, 'bridge-alone': { reading: 0.55 } }, said: { step: 'bridge-alone', exit: 'in', says: 'all-but-proves' } },
  { fault: 'bridge-open', machine: 'corvane-12', seen: { bridge: { reading: 'over' } }, said: { step: 'bridge', exit: 'open', says: 'all-but-proves' } },
  { fault: 'transformer-short', machine: 'corvane-12', seen: { ...LINEAR, 'lamp-look': 'bright', 'lamp-bare-look': 'bright' }, said: { step: 'lamp-bare-look', exit: 'bright', says: 'all-but-proves' } },
  { fault: 'primary-open', machine: 'corvane-12', seen: { primary: { reading: 'over' } }, said: { step: 'primary', exit: 'open', says: 'all-but-proves' } },
  { fault: 'filter-leaky', machine: 'corvane-12', seen: { insulation: { insulation: 200_000 } }, said: { step: 'insulation', exit: 'low', says: 'points-to' } },
  { fault: 'earth-open', machine: 'corvane-12', seen: { earth: { earth: 14 } }, said: { step: 'earth', exit: 'high', says: 'points-to' } },
  { fault: 'lead-perished', machine: 'corvane-12', seen: { 'look-outside': 'perished' }, said: { step: 'look-outside', exit: 'perished', says: 'all-but-proves' } },
  { fault: 'can-vented', machine: 'corvane-12', seen: { 'look-inside': 'vented' }, said: { step: 'look-inside', exit: 'vented', says: 'all-but-proves' } },
  { fault: 'reference-drift', machine: 'corvane-12', seen: { ...LINEAR, 'rails-bench': { p5: 5.4 } }, said: { step: 'pass-after', exit: 'in', says: 'points-to' } },
  { fault: 'driver-dead', machine: 'corvane-12', seen: { ...LINEAR, 'rails-full': { p5: 3.9 }, 'weak-which': 'sagged' }, said: { step: 'weak-which', exit: 'sagged', says: 'points-to' } },
];

describe('the verdicts of first power', () => {
  it.each(VERDICTS)('$fault is found on $machine, with its evidence, what to replace and what to re-test', ({ fault, machine, seen, said }) => {
    const bench = walk(new Bench(programOf(tree, machine)), seen);
    expect(bench.view.end?.says).toBe('fault-found');
    const end = tree.steps.find((s) => s.id === bench.view.end?.key);
    expect(end).toMatchObject({ kind: 'end', suspect: fault });
    expect(bench.view.end?.replace).toBeTruthy();
    expect(bench.view.end?.retest).toBeTruthy();
    const exit = tree.steps.find((s) => s.id === said.step)?.exits.find((e) => e.id === said.exit);
    expect(exit?.evidence).toContainEqual({ suspect: fault, says: said.says });
    expect(bench.view.band).toBe('proved-dead');
  });

  it('covers every suspect of the tree', () => {
    const mended = tree.steps.flatMap((s) => (s.kind === 'work' ? (s.suspects ?? []) : []));
    expect(tree.suspects.map((s) => s.id).filter((id) => !VERDICTS.some((v) => v.fault === id) && !mended.includes(id))).toEqual([]);
  });

  it('mends a wrong fuse on the way, looks again and goes on', () => {
    const bench = new Bench(programOf(tree, 'corvane-12'));
    walk(bench, { ...LINEAR, 'look-outside': 'wrong-fuse' }, (b) => b.view.key === 'fuse-right');
    walk(bench, LINEAR);
    expect(bench.state.context.visited.filter((key) => key === 'look-outside' || key === 'fuse-right')).toEqual(['look-outside', 'fuse-right']);
    expect(bench.view.end?.says).toBe('supply-proven');
  });

  it('finds a lost return also by a rail that reads reversed under load', () => {
    const bench = walk(new Bench(programOf(tree, 'corvane-12')), { ...LINEAR, 'rails-lamp': { m12: 1.4 }, 'returns-after': { r3: 0.9 } });
    expect(bench.view.end).toMatchObject({ says: 'fault-found', key: 'end-return-lost' });
  });

  it('keeps a fault that a repair has mended from ending the run: an earth that is re-made passes', () => {
    const bench = new Bench(programOf(tree, 'corvane-12'));
    walk(bench, { ...LINEAR, earth: { earth: 0.9 } }, (b) => b.view.key === 'earth-remake');
    walk(bench, LINEAR);
    expect(bench.view.end?.says).toBe('supply-proven');
  });

  it('leads a reading that stays unclear to a senior, and goes on only when the senior has said so', () => {
    const bench = new Bench(programOf(tree, 'corvane-12'));
    walk(bench, { ...LINEAR, 'rails-bench': { p12: 'not-sure' } }, (b) => b.view.key === 'ask-bench');
    expect(bench.view.band).toBe('proved-dead');
    expect(bench.view.facts.owed.doubts).toEqual(['rails-bench']);
    walk(bench, LINEAR);
    expect(bench.view.end?.says).toBe('supply-proven');
  });
});
