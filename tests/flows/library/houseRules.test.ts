import { describe, expect, it } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';
import type { Tree } from '@/flows/document/tree';
import { Bench, must, program } from '../support/bench';
import { LINEAR, demoProfile, libraryJson, libraryTree, makeDead, programOf, walk, walkTo } from './walk';
import type { Choices } from './walk';

const tree = libraryTree('first-power');
const whole = programOf(tree, 'corvane-12');

type Json = ReturnType<typeof libraryJson>;
type StepJson = Record<string, unknown> & { exits: { id: string; to: string }[] };

const at = (json: Json, id: string): StepJson => {
  const step = json.steps.find((s) => s['id'] === id);
  if (step === undefined) throw new Error(`no step ${id}`);
  return step as StepJson;
};

/** A copy of a tree with a hole cut into it. */
function mutant(change: (json: Json) => void, id = 'first-power'): Tree {
  const json = libraryJson(id);
  change(json);
  return must(parseTree(json));
}

/** Leads an exit of the tree elsewhere. */
const lead = (json: Json, step: string, exit: string, to: string) => {
  const found = at(json, step).exits.find((e) => e.id === exit);
  if (found === undefined) throw new Error(`no exit ${exit} of ${step}`);
  found.to = to;
};

function run(changed: Tree, choices: Choices = {}, callees: Tree[] = [makeDead]): () => Bench {
  return () => walk(new Bench(program(changed, demoProfile('corvane-12'), callees)), { ...LINEAR, ...choices });
}

describe('a tree with a hole in it is stopped at the bench', () => {
  const holes: { rule: string; hole: string; barred: string; cut: (json: Json) => void; seen?: Choices }[] = [
    { rule: 'H1', hole: 'hands go in while the lamp is on', barred: 'Clips off', cut: (j) => lead(j, 'lamp-look', 'dim', 'clips-off') },
    { rule: 'H1', hole: 'nothing is proved dead after the insulation test', barred: 'Every return measured', cut: (j) => lead(j, 'insulation', 'good', 'returns') },
    { rule: 'H4', hole: 'a clip stays on at full proving', barred: 'Rails at full load', cut: (j) => lead(j, 'dead-lamp', 'dead', 'full-loads') },
    { rule: 'H4', hole: 'a shorting link stays in', barred: 'Bench supply into the reservoir alone', cut: (j) => void (at(j, 'tag-leads')['fits'] = [{ id: 'short', name: 'Shorting link', class: 'link', area: 'part' }]) },
    { rule: 'H5', hole: 'light load where the mains step says full', barred: 'Full mains', cut: (j) => void (at(j, 'full-loads')['load'] = 'light') },
    { rule: 'H5', hole: 'the series resistor is never fitted', barred: 'Bench supply into the +5 V output', cut: (j) => {
      const prepare = at(j, 'trip-prepare')['fits'] as { id: string }[];
      const [series] = prepare.splice(1, 1); // fitted only on a side way, so that the tree still knows it
      (at(j, 'pass-lift')['fits'] as unknown[]).push(series);
    } },
    { rule: 'H6', hole: 'the look-over is dropped', barred: 'Bench supply into the reservoir alone', cut: (j) => void delete at(j, 'look-inside')['lookOver'] },
    { rule: 'H6', hole: 'the lamp is left out', barred: 'Full mains', cut: (j) => lead(j, 'dead-bench', 'dead', 'clips-off') },
    { rule: 'H7', hole: 'the earth bond is left out', barred: 'First mains, through the lamp', cut: (j) => lead(j, 'boards-out', 'done', 'insulation') },
    { rule: 'H7', hole: 'the insulation test is left out', barred: 'First mains, through the lamp', cut: (j) => lead(j, 'earth', 'good', 'returns') },
    { rule: 'H8', hole: 'the clips are left out', barred: 'Rails on the bench supply', cut: (j) => lead(j, 'bench-loads', 'done', 'bench-leads') },
    { rule: 'H9', hole: 'the boards stay in', barred: 'Insulation', cut: (j) => lead(j, 'tag-leads', 'done', 'earth') },
    { rule: 'H9', hole: 'a load stays on at the trip test', barred: 'Bench supply into the +5 V output', cut: (j) => { at(j, 'trip-feed')['load'] = 'light'; at(j, 'boards-out')['load'] = 'light'; } },
    { rule: 'H11', hole: 'a senior is waited for while the lamp is on', barred: 'Senior: readings on the lamp', cut: (j) => lead(j, 'lamp-look', 'dim', 'ask-lamp') },
    { rule: 'H12', hole: 'the supply is called proven after the lamp', barred: 'Supply proven', cut: (j) => lead(j, 'dead-lamp', 'dead', 'proven') },
    { rule: 'H13', hole: 'an unsure reading of the pass device goes on to power', barred: 'Bench supply into the reservoir alone', cut: (j) => lead(j, 'pass', 'again', 'reservoir-lift'), seen: { pass: { reading: 'not-sure' } } },
    { rule: 'H13', hole: 'an unclear rail goes on to the next power', barred: 'First mains, through the lamp', cut: (j) => lead(j, 'dead-bench-doubt', 'dead', 'lamp-loads'), seen: { 'rails-bench': { p5: 'not-sure' } } },
    { rule: 'H14', hole: 'a failed return goes on to power', barred: 'Bench supply into the reservoir alone', cut: (j) => lead(j, 'returns', 'high', 'primary'), seen: { returns: { r1: 3 } } },
    { rule: 'H14', hole: 'a cleaned return is not measured again', barred: 'Bench supply into the reservoir alone', cut: (j) => lead(j, 'returns-clean', 'done', 'primary'), seen: { returns: { r1: 3 } } },
  ];

  it.each(holes)('$rule: $hole', ({ rule, barred, cut, seen }) => {
    expect(run(mutant(cut), seen)).toThrow(new RegExp(`${rule} “${barred.replace('+', '\\+')}”`));
  });
});

describe('what the person at the bench is refused', () => {
  it('H2: proving dead with a multimeter, or with two instruments', () => {
    const bench = walkTo(new Bench(whole), 'dead-first/prove', LINEAR, 'act');
    bench.row();
    const step = bench.view.key;
    const reading = (twoPole: boolean, id: string) => bench.try({ type: 'READING', step, row: bench.view.current?.row.id ?? '', value: 0, typed: '0', instrument: { id, twoPole, uncertainty: 0 } });
    expect(reading(false, 'multimeter')).toMatchObject({ ok: false, refusal: { rule: 'H2' } });
    expect(reading(true, 'tester').ok).toBe(true);
    expect(reading(true, 'another')).toMatchObject({ ok: false, refusal: { rule: 'H2' } });
  });

  it('H3: a discharge that is read before its time, and a proof without one', () => {
    const bench = walkTo(new Bench(whole), 'dead-first/discharge', LINEAR, 'act');
    const early = bench.try({ type: 'READING', step: bench.view.key, row: 'c1', value: 0.1, typed: '0.1', instrument: { id: 'tester', twoPole: true, uncertainty: 0 } });
    expect(early).toMatchObject({ ok: false, refusal: { rule: 'H3', code: 'too-early' } });
    const rash = mutant((j) => lead(j, 'isolate', 'out', 'prove'), 'make-dead');
    expect(run(tree, {}, [rash])).toThrow(/H3 “Prove dead”/);
  });

  it('H15: power after a pass device was named for replacement, while its driver is not ruled out', () => {
    const bench = new Bench(program(mutant((j) => lead(j, 'pass', 'in', 'reservoir-lift')), demoProfile('corvane-12'), [makeDead]));
    bench.state.context.facts.owed.killers.push({ part: 'pass-short', killer: 'driver-dead' });
    expect(() => walk(bench, LINEAR)).toThrow(/H15 “Bench supply into the \+5 V output”/);
  });

  it('H5: power whose guard is let go', () => {
    const bench = walkTo(new Bench(whole), 'lamp', LINEAR, 'guard');
    expect(bench.try({ type: 'GUARD_HELD', step: 'lamp', heldMs: 900 })).toMatchObject({ ok: false, refusal: { rule: 'H5' } });
    expect(bench.view.band).toBe('proved-dead');
  });

  it('H11: a pause while the lamp is on', () => {
    const bench = walkTo(new Bench(whole), 'rails-lamp', LINEAR, 'act');
    expect(bench.try({ type: 'PAUSE' })).toMatchObject({ ok: false, refusal: { rule: 'H11' } });
  });

  it('H17: an answer before the warning is read', () => {
    const bench = walkTo(new Bench(whole), 'returns', LINEAR, 'warning');
    expect(bench.try({ type: 'READING', step: 'returns', row: 'r1', value: 0.004, typed: '4m', instrument: { id: 'ohms', twoPole: false, uncertainty: 0 } }).ok).toBe(false);
    expect(bench.view.rows.every((r) => r.answer === null)).toBe(true);
  });

  it.each(['form', 'lamp', 'mains'])('H20: the first power of each kind waits for a senior, and the restorer is none (%s)', (step) => {
    const bench = walkTo(new Bench(whole), step, LINEAR, 'hold');
    expect(bench.try({ type: 'GUARD_HELD', step, heldMs: 2500 }).ok).toBe(false);
    bench.do({ type: 'HOLD_ASKED', step });
    expect(bench.try({ type: 'HOLD_GIVEN', step, by: 'ann' })).toMatchObject({ ok: false, refusal: { rule: 'H20' } });
    expect(bench.do({ type: 'HOLD_GIVEN', step, by: 'sam' }).view.phase).toBe('guard');
  });

  it('H21: going on after Stop at a place that the run has not been to, or without proving dead', () => {
    const bench = walkTo(new Bench(whole), 'returns', LINEAR).do({ type: 'STOP' });
    expect(bench.try({ type: 'REENTER', step: 'earth' })).toMatchObject({ ok: false, refusal: { rule: 'H21' } });
    walk(bench, {}, (b) => b.view.key === '~choose');
    expect(bench.try({ type: 'REENTER', step: 'lamp-loads' })).toMatchObject({ ok: false, refusal: { rule: 'H21' } });
    expect(bench.view.reentries.map((r) => r.key)).toContain('earth');
  });

  it('H21: going on after Stop with a clip left in; it is led out first, and then the lamp may go on again', () => {
    const stop = () => {
      const bench = walkTo(new Bench(whole), 'rails-lamp', LINEAR, 'act').do({ type: 'STOP' });
      return walk(bench, {}, (b) => b.view.key === '~take-out' && b.view.phase === 'act');
    };
    const left = stop();
    expect(left.view.rows.map((r) => r.row.id)).toEqual(['rail-clips']);
    left.do({ type: 'ROW', step: '~take-out', row: 'rail-clips', word: 'cannot' });
    expect(left.view).toMatchObject({ key: '~choose', reentries: [] });
    const out = walk(stop(), {}, (b) => b.view.key === '~choose');
    expect(out.view.facts.fitted).toEqual([]);
    expect(out.view.reentries.map((r) => r.key)).toContain('lamp-loads');
    walk(out.do({ type: 'REENTER', step: 'lamp-loads' }), LINEAR);
    expect(out.view.end?.says).toBe('supply-proven');
  });
});
