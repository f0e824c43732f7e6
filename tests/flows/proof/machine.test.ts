/** The proof against the machine: what it passes is never refused at the bench, and what it tells as a story is refused there. */
import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { defaultSettings } from '@/flows/document/settings';
import type { Tree } from '@/flows/document/tree';
import { advance, startRun } from '@/flows/machine/advance';
import type { RunState } from '@/flows/machine/advance';
import { compile } from '@/flows/machine/compile';
import type { Program } from '@/flows/machine/compile';
import type { MachineEvent } from '@/flows/machine/events';
import { prove } from '@/flows/proof/prove';
import type { RuleVerdict } from '@/flows/proof/prove';
import { canGive, nextEvent } from '@/flows/rehearsal/drive';

import { benchProfile, makeDeadTree } from '../support/bench';
import { randomForest, randomTree } from '../support/randomTree';

const runs = Number(process.env['PROOF_CASES'] ?? 250);
interface Forest {
  tree: Tree;
  callees: readonly Tree[];
}
const pairOf = ({ tree, callees }: Forest) => ({ tree, callees, profile: benchProfile, settings: defaultSettings });
/** Two of three are one tree and make-dead, the third calls trees that call trees. */
const forests = (): fc.Arbitrary<Forest> => fc.oneof({ weight: 2, arbitrary: randomTree().map((tree) => ({ tree, callees: [makeDeadTree] })) }, { weight: 1, arbitrary: randomForest() });
/** Rules that speak of a single moment at the bench; the others are read off the tree alone. */
const BENCH_RULES = new Set(['H1', 'H2', 'H3', 'H4', 'H5', 'H6', 'H7', 'H8', 'H9', 'H10', 'H12', 'H13', 'H14', 'H15']);

function programOf(tree: Forest): Program {
  const compiled = compile(pairOf(tree));
  if (!compiled.ok) throw new Error(JSON.stringify(compiled.faults));
  return compiled.program;
}

const opened = (program: Program): RunState => startRun(program, { restorer: 'ann', restorerIsSenior: false, at: 1_700_000_000_000, release: false, fitted: [], killers: [] });

/** Drives the run on until it leaves the step it stands at (or the opening), by the wanted outcome; the rule of a refusal otherwise. */
function leave(program: Program, state: RunState, wanted: string | null): { state: RunState; refused: string | null; said: string } {
  const from = state.context.key;
  let now = state;
  for (let i = 0; i < 60; i += 1) {
    const event = nextEvent(program, now, wanted);
    if (event === null) return { state: now, refused: null, said: '' };
    const advanced = advance(program, now, event);
    if (!advanced.ok) return { state: now, refused: advanced.refusal.rule ?? advanced.refusal.code, said: advanced.refusal.say };
    const outcome = advanced.state.context.outcome;
    now = advanced.state;
    if (now.context.key !== from || now.context.phase === 'ended' || now.context.phase === 'closed' || outcome?.key === from) return { state: now, refused: null, said: '' };
  }
  throw new Error(`${from} is never left by ${String(wanted)}`);
}

describe('a tree that the proof passes', () => {
  it('is never refused at the bench for a bench fact, whatever is answered', { timeout: 240_000 + runs * 400 }, () => {
    let walked = 0;
    fc.assert(
      fc.property(forests(), fc.array(fc.nat(40), { maxLength: 60 }), (tree, choices) => {
        const broken = prove(pairOf(tree)).rules.filter((r) => !r.holds && BENCH_RULES.has(r.id));
        if (broken.length > 0) return;
        const program = programOf(tree);
        let { state } = leave(program, opened(program), null);
        for (const choice of choices) {
          const placed = program.layout.steps.get(state.context.key);
          if (state.context.phase === 'ended' || placed === undefined || placed.builtIn) break;
          const possible = placed.step.exits.flatMap((e) => (e.on.includes('answer') ? [e.id] : (e.on as string[]))).filter((o) => canGive(program, placed, o));
          const left = leave(program, state, possible[choice % possible.length] ?? null);
          expect(left.refused, `${placed.key} ${possible[choice % possible.length] ?? ''}`).toBeNull();
          state = left.state;
          walked += 1;
        }
      }),
      { numRuns: runs },
    );
    expect(walked).toBeGreaterThan(50);
  });
});

describe('a story of the proof', () => {
  it('plays in the machine up to the refusal that it tells of', { timeout: 240_000 + runs * 400 }, () => {
    let played = 0;
    fc.assert(
      fc.property(forests(), (tree) => {
        const { rules } = prove(pairOf(tree));
        const told = rules.filter((r): r is RuleVerdict & { legs: NonNullable<RuleVerdict['legs']> } => !r.holds && r.legs !== null && r.legs.length > 0 && r.start?.reentry === false);
        if (told.length === 0) return;
        const program = programOf(tree);
        for (const verdict of told) {
          let { state } = leave(program, opened(program), null);
          let refused: string | null = null;
          let said = '';
          for (const [i, leg] of verdict.legs.entries()) {
            expect(state.context.key).toBe(leg.key);
            const event: MachineEvent | null = leg.edge === null ? { type: 'ABORT', at: state.context.last.at + 1000, monotonic: state.context.last.monotonic + 1000, boot: state.context.last.boot } : null;
            if (event !== null) {
              // power is on before it can be broken off
              while (state.context.phase !== 'act') {
                const next = nextEvent(program, state, null);
                const on = next === null ? null : advance(program, state, next);
                if (on === null || !on.ok) throw new Error('the guard does not open');
                state = on.state;
              }
              const broken = advance(program, state, { ...event, at: state.context.last.at + 1000, monotonic: state.context.last.monotonic + 1000 });
              refused = broken.ok ? null : broken.refusal.rule;
              said = broken.ok ? '' : broken.refusal.say;
              if (broken.ok) state = broken.state;
            } else {
              const left = leave(program, state, leg.edge?.outcome ?? null);
              refused = left.refused;
              said = left.said;
              state = left.state;
            }
            if (i < verdict.legs.length - 1) expect(refused, `leg ${i} of ${verdict.id}: ${verdict.story}`).toBeNull();
          }
          // several rules can bar one place: the machine names the first, which the proof must know as broken too, and says what is wrong by all of them
          expect(rules.filter((r) => !r.holds).map((r) => r.id as string), verdict.story).toContain(refused);
          const why = /although (.+?)(?:, by (?:answering|breaking)|\.$)/.exec(verdict.story)?.[1]?.split('; ') ?? [];
          expect(why.length).toBeGreaterThan(0);
          for (const part of why) expect(said).toContain(part);
          played += 1;
        }
      }),
      { numRuns: runs },
    );
    expect(played).toBeGreaterThan(50);
  });
});
