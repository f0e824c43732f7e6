import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { Exit } from '@/flows/document/steps';
import { advance, startRun } from '@/flows/machine/advance';
import type { RunState } from '@/flows/machine/advance';
import { classifyReading } from '@/flows/machine/classify';
import type { Program } from '@/flows/machine/compile';
import type { ReadingRow } from '@/flows/machine/rows';
import { canGive, nextEvent } from '@/flows/rehearsal/drive';
import { readingGiving } from '@/flows/rehearsal/reading';

import { benchProfile, lampTree, program } from '../support/bench';
import { bench, dead, look, rails, treeOf } from '../support/steps';
import { libraryTree, programOf } from '../library/walk';

const opened = (of: Program): RunState => startRun(of, { restorer: 'ann', restorerIsSenior: false, at: Date.UTC(2026, 0, 5, 9), release: false, fitted: [], killers: [] });

/** Goes on to the next step, or to the same one entered again. Returns the outcome that was recorded. */
function leave(of: Program, state: RunState, wanted: string | null): { state: RunState; exit: string | null } {
  const from = state.context.key;
  for (let i = 0; i < 500; i += 1) {
    const event = nextEvent(of, state, wanted);
    if (event === null) throw new Error(`no event at ${state.context.key} for ${wanted ?? 'good'}`);
    const taken = advance(of, state, event);
    if (!taken.ok) throw new Error(`${event.type} at ${from}: ${taken.refusal.say}`);
    state = taken.state;
    if (state.context.outcome !== null) return { state, exit: state.context.outcome.exit };
    if (state.context.key !== from || state.context.phase === 'closed') return { state, exit: null };
  }
  throw new Error('it did not come to an end');
}

describe('nextEvent', () => {
  it('walks a good run from the opening to the end and closes it', () => {
    const lamp = program(lampTree);
    let state = opened(lamp);
    for (let i = 0; i < 60 && state.context.phase !== 'closed'; i += 1) state = leave(lamp, state, null).state;
    expect(state.context.phase).toBe('closed');
    expect(state.context.end).toEqual({ says: 'cleared', key: 'done' });
  });

  it('gives at every step each outcome that its machine can have, and says null for the others', () => {
    const of = programOf(libraryTree('first-power'), 'corvane-12');
    let state = opened(of);
    const tried: string[] = [];
    for (let i = 0; i < 400 && state.context.phase !== 'ended'; i += 1) {
      const placed = of.layout.steps.get(state.context.key);
      if (placed !== undefined && !placed.builtIn) {
        for (const exit of placed.step.exits as Exit[]) {
          for (const on of exit.on) {
            const wanted = on === 'answer' ? exit.id : on;
            if (!canGive(of, placed, wanted)) continue;
            // the state is plain data: leaving a copy of it changes nothing here
            expect(leave(of, state, wanted).exit, `${placed.key} by ${wanted}`).toBe(exit.id);
            tried.push(`${placed.key}:${wanted}`);
          }
        }
      }
      state = leave(of, state, null).state;
    }
    expect(state.context.end?.says).toBe('supply-proven');
    expect(tried.length).toBeGreaterThan(200);
  });

  it('calls in a second person for live work above the limits', () => {
    const high = { ...benchProfile, rails: benchProfile.rails.map((r) => ({ ...r, nominal: 90, trip: { lowVolts: 95, highVolts: 99 } })) };
    const of = program(treeOf([look('d'), dead('d', 'b'), bench('b', 'r'), rails('r', 'regulator', 'e'), dead('e', 'done')]), high);
    const said: string[] = [];
    let state = opened(of);
    for (let event = nextEvent(of, state, null); event !== null && said.length < 300; event = nextEvent(of, state, null)) {
      const taken = advance(of, state, event);
      expect(taken).toMatchObject({ ok: true });
      if (taken.ok) state = taken.state;
      said.push(`${state.context.key}: ${event.type}`);
    }
    expect(said.filter((e) => e.endsWith('SECOND_PRESENT'))).toEqual(['r: SECOND_PRESENT']);
    expect(state.context).toMatchObject({ phase: 'closed', end: { says: 'cleared' } });
  });
});

describe('readingGiving', () => {
  const row = (limits: Partial<ReadingRow>): ReadingRow => ({ id: 'r', label: 'r', wait: null, ask: 'reading', quantity: 'volts-dc', low: null, high: null, nominal: null, bySize: false, plain: false, mayFall: false, red: null, black: null, ...limits });

  it('gives what it says, whatever the limits', () => {
    const volts = fc.double({ min: -1e4, max: 1e4, noNaN: true, noDefaultInfinity: true });
    fc.assert(
      fc.property(volts, volts, fc.constantFrom('in', 'close', 'low', 'high', 'reversed'), fc.boolean(), (a, b, result, withNominal) => {
        const [low, high] = a < b ? [a, b] : [b, a];
        const limits = row({ low, high, nominal: withNominal ? (low + high) / 2 : null });
        const given = readingGiving(limits, result);
        if (given !== null) expect(classifyReading(limits, given.value, given.uncertainty, given.falling)).toBe(result);
      }),
    );
  });

  it('finds each result of a positive and a negative rail', () => {
    for (const nominal of [5, -12]) {
      const edges = [nominal * 0.95, nominal * 1.05];
      const rail = row({ low: Math.min(...edges), high: Math.max(...edges), nominal });
      for (const result of ['in', 'close', 'low', 'high', 'reversed']) expect(readingGiving(rail, result), `${nominal} ${result}`).not.toBeNull();
    }
  });

  it('finds no high reading where only a least value is asked', () => {
    expect(readingGiving(row({ low: 1e6 }), 'high')).toBeNull();
    expect(readingGiving(row({ low: 1e6 }), 'in')?.value).toBe(2e6);
  });
});
