import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { Exit } from '@/flows/document/steps';
import { entropyBits, expectedBits } from '@/flows/evidence/entropy';
import { findingsOf } from '@/flows/evidence/findings';
import type { Finding } from '@/flows/evidence/posterior';
import { tellsMost } from '@/flows/evidence/tellsMost';
import { advance, startRun } from '@/flows/machine/advance';
import { arriveAt } from '@/flows/machine/arrive';
import { canGive, nextEvent } from '@/flows/rehearsal/drive';

import { libraryTree, programOf } from '../library/walk';
import { Bench, program } from '../support/bench';
import { dead, look, observe, treeOf } from '../support/steps';

const says = (suspect: string, word: string) => [{ suspect, says: word }];
const check = (id: string, to: string, minutes: number, word: string, extra = {}) =>
  observe(id, to, {
    minutes,
    exits: [
      { id: 'good', label: 'Good', on: ['answer'], to, evidence: says('diode', 'rules-out') },
      { id: 'bad', label: 'Bad', on: ['answer'], to: 'refer', verdict: 'fail', evidence: says('diode', word) },
      { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' },
    ],
    ...extra,
  });

describe('expectedBits', () => {
  it('is one bit for a sure question between two equal causes, none for a question that all answer alike', () => {
    expect(
      expectedBits(
        [0.5, 0.5],
        [
          [1, 0],
          [0, 1],
        ],
      ),
    ).toBeCloseTo(1, 12);
    expect(
      expectedBits(
        [0.3, 0.7],
        [
          [0.4, 0.6],
          [0.4, 0.6],
        ],
      ),
    ).toBeCloseTo(0, 12);
  });

  it('is never less than nothing and never more than what is not known', () => {
    const weight = fc.double({ min: 0.01, max: 100, noNaN: true });
    const chance = fc.tuple(weight, weight, weight);
    fc.assert(
      fc.property(fc.array(fc.tuple(weight, chance), { minLength: 1, maxLength: 8 }), (causes) => {
        const total = causes.reduce((sum, [w]) => sum + w, 0);
        const shares = causes.map(([w]) => w / total);
        const bits = expectedBits(
          shares,
          causes.map(([, row]) => row.map((r) => r / (row[0] + row[1] + row[2]))),
        );
        expect(bits).toBeGreaterThanOrEqual(0);
        expect(bits).toBeLessThanOrEqual(entropyBits(shares) + 1e-9);
      }),
    );
  });
});

describe('tellsMost', () => {
  it('takes the check that tells most for its minutes, not the one that tells most', () => {
    const tree = treeOf([look('slow'), check('slow', 'quick', 20, 'all-but-proves'), check('quick', 'done', 2, 'points-to')]);
    const bench = new Bench(program(tree)).pass();
    const told = tellsMost(bench.program.layout, bench.state.context.facts, []);
    expect(told.map((t) => t.key)).toEqual(['quick', 'slow']);
    expect(told[1]?.bits).toBeGreaterThan(told[0]?.bits ?? 0);
  });

  it('keeps a check back that a house rule forbids now', () => {
    const tree = treeOf([
      look('d'),
      dead('d', 'hands'),
      check('hands', 'done', 1, 'points-to', { contact: 'hands' }),
      check('live', 'done', 1, 'points-to', { power: 'live' }),
    ]);
    const bench = new Bench(program(tree)).pass();
    const offered = () => tellsMost(bench.program.layout, bench.state.context.facts, []).map((t) => t.key);
    expect(offered()).toEqual([]);
    bench.answer('good').dead();
    expect(bench.view.key).toBe('hands');
    expect(offered()).toEqual(['hands']);
  });

  it('asks no check again before something has been repaired', () => {
    const tree = treeOf([look('quick'), check('quick', 'done', 2, 'points-to')]);
    const bench = new Bench(program(tree)).pass();
    const made: Finding = { check: 'quick', evidence: [] };
    const { facts } = bench.state.context;
    expect(tellsMost(bench.program.layout, facts, [made])).toEqual([]);
    expect(tellsMost(bench.program.layout, facts, [made, { check: 'mend', evidence: [], worked: ['diode'] }])).toHaveLength(1);
  });

  it('never offers what the machine would refuse, wherever a run stands', () => {
    const of = programOf(libraryTree('first-power'), 'corvane-12');
    fc.assert(
      fc.property(fc.infiniteStream(fc.nat(99)), fc.nat(60), (chance, length) => {
        let state = startRun(of, { restorer: 'ann', restorerIsSenior: false, at: 1e12, release: false, fitted: [], killers: [] });
        const findings: Finding[] = [];
        let wanted: { key: string; outcome: string | null } = { key: '', outcome: null };
        for (let left = length * 8; left > 0 && state.context.phase !== 'closed'; left -= 1) {
          const { key } = state.context;
          if (wanted.key !== key) {
            const placed = of.layout.steps.get(key);
            const outcomes = (placed?.step.exits ?? [])
              .flatMap((e: Exit) => (e.on.includes('answer') ? [e.id] : (e.on as string[])))
              .filter((o) => placed !== undefined && canGive(of, placed, o));
            const die = chance.next().value ?? 0;
            wanted = { key, outcome: die < 80 || placed?.builtIn === true ? null : (outcomes[die % Math.max(outcomes.length, 1)] ?? null) };
          }
          const event = nextEvent(of, state, wanted.outcome);
          if (event === null) break;
          const taken = advance(of, state, event);
          if (!taken.ok) break;
          state = taken.state;
          if (state.context.outcome !== null) wanted = { key: '', outcome: null };
          findings.push(...findingsOf(of.layout, state.context.outcome));
        }
        for (const { key } of tellsMost(of.layout, state.context.facts, findings))
          expect(arriveAt(of.layout, state.context, key)).toMatchObject({
            ok: true,
            next: { goto: of.layout.calleeFirst.get(key) ?? key },
          });
      }),
      { numRuns: 40 },
    );
  });
});
