/** The compiled machine against a naive walker that knows nothing of it: same place, same facts, same refusals. */
import { readFileSync } from 'node:fs';

import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { parseProfile, parseTree } from '@/flows/document/parseTree';
import type { Profile } from '@/flows/document/profile';
import { defaultSettings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { advance, startRun } from '@/flows/machine/advance';
import { compile } from '@/flows/machine/compile';
import { canGive, nextEvent } from '@/flows/rehearsal/drive';

import { benchProfile, makeDeadTree, must } from '../support/bench';
import { randomForest, randomTree } from '../support/randomTree';
import { Walker } from '../support/walker';

const runs = Number(process.env['PROOF_CASES'] ?? 150);

/** Plays the same outcomes in both; the number of steps that were compared. */
function compare(tree: Tree, callees: Tree[], profile: Profile, choices: readonly number[]): number {
  const compiled = compile({ tree, callees, profile, settings: defaultSettings });
  if (!compiled.ok) throw new Error(JSON.stringify(compiled.faults));
  const { program } = compiled;
  const walker = new Walker(tree, callees, profile, defaultSettings);
  let state = startRun(program, { restorer: 'ann', restorerIsSenior: false, at: 1_700_000_000_000, release: false, fitted: [], killers: [] });
  let refused: string | null = null;
  const drive = (wanted: string | null) => {
    const from = state.context.key;
    refused = null;
    for (let i = 0; i < 80; i += 1) {
      const event = nextEvent(program, state, wanted);
      if (event === null) return;
      const advanced = advance(program, state, event);
      if (!advanced.ok) {
        refused = advanced.refusal.rule ?? advanced.refusal.code;
        return;
      }
      state = advanced.state;
      if (state.context.outcome?.key === from || state.context.key !== from) return;
    }
  };
  drive(null);
  if (refused !== null) {
    expect(walker.barred()).toContain(refused);
    return 1;
  }
  let compared = 0;
  for (const choice of choices) {
    if (walker.ended || state.context.phase === 'ended') break;
    expect(state.context.key).toBe(walker.key);
    const placed = program.layout.steps.get(state.context.key)!;
    const possible = placed.step.exits.flatMap((e) => (e.on.includes('answer') ? [e.id] : (e.on as string[]))).filter((o) => canGive(program, placed, o));
    const outcome = possible[choice % possible.length]!;
    drive(outcome);
    const barred = walker.take(outcome);
    compared += 1;
    if (refused !== null) {
      // an end is asked after close-out, which the naive walker does not do: it is barred there too or stands at an end
      if (!walker.ended) expect(barred).toContain(refused);
      break;
    }
    if (walker.ended || barred.length > 0) break;
    expect(state.context.key).toBe(walker.key);
    const { powered: _a, ...mine } = state.context.facts;
    // a step without a warning shows its action as it is reached
    const { powered: _b, ...naive } = state.context.phase === 'act' ? walker.shown : walker.facts;
    expect(mine).toEqual(naive);
  }
  return compared;
}

describe('the machine and the naive walker', () => {
  it('agree on random trees', { timeout: 120_000 + runs * 400 }, () => {
    let compared = 0;
    fc.assert(
      fc.property(randomTree(), fc.array(fc.nat(60), { minLength: 10, maxLength: 50 }), (tree, choices) => {
        compared += compare(tree, [makeDeadTree], benchProfile, choices);
      }),
      { numRuns: runs },
    );
    expect(compared).toBeGreaterThan(runs);
  });
  it('agree on random trees that call trees, three deep', { timeout: 120_000 + runs * 400 }, () => {
    let compared = 0;
    fc.assert(
      fc.property(randomForest(), fc.array(fc.oneof({ weight: 3, arbitrary: fc.constant(0) }, { weight: 2, arbitrary: fc.nat(60) }), { minLength: 10, maxLength: 60 }), ({ tree, callees }, choices) => {
        compared += compare(tree, callees, benchProfile, choices);
      }),
      { numRuns: runs },
    );
    expect(compared).toBeGreaterThan(runs);
  });
  it('agree on the starter tree, mostly on its good way', { timeout: 120_000 + runs * 400 }, () => {
    const tree = must(parseTree(JSON.parse(readFileSync('flows/library/first-power.json', 'utf8'))));
    const dead = must(parseTree(JSON.parse(readFileSync('flows/library/make-dead.json', 'utf8'))));
    const corvane = must(parseProfile(JSON.parse(readFileSync('db/seeds/demo/profiles/corvane-12.json', 'utf8'))));
    let compared = 0;
    fc.assert(
      fc.property(fc.array(fc.oneof({ weight: 9, arbitrary: fc.constant(0) }, { weight: 1, arbitrary: fc.nat(40) }), { minLength: 60, maxLength: 120 }), (choices) => {
        compared += compare(tree, [dead], corvane, choices);
      }),
      { numRuns: 25 },
    );
    expect(compared).toBeGreaterThan(200);
  });
});
