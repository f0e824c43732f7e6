import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { parseTree } from '@/flows/document/parseTree';
import type { Exit } from '@/flows/document/steps';
import { compareTrees } from '@/flows/compare/compareTrees';
import { renamedSteps } from '@/flows/compare/renamed';
import { advance, startRun } from '@/flows/machine/advance';
import type { Program } from '@/flows/machine/compile';
import type { MachineEvent } from '@/flows/machine/events';
import { canGive, nextEvent } from '@/flows/rehearsal/drive';
import { replay } from '@/flows/replay/replay';

import { lampTree, lampTreeJson, must, program } from '../support/bench';

type Json = Record<string, unknown>;
const json = lampTreeJson as unknown as { steps: Json[] } & Json;
const start = { restorer: 'ann', restorerIsSenior: false, at: 1_000_000_000_000, release: false, fitted: [], killers: [] };

/** The events of a run that leaves the named steps by the named outcomes and the others well. */
function record(of: Program, outcomes: Record<string, string> = {}): MachineEvent[] {
  let state = startRun(of, start);
  const events: MachineEvent[] = [];
  for (let i = 0; i < 500 && state.context.phase !== 'closed'; i += 1) {
    const event = nextEvent(of, state, outcomes[state.context.key] ?? null);
    if (event === null) break;
    const taken = advance(of, state, event);
    if (!taken.ok) throw new Error(taken.refusal.say);
    state = taken.state;
    events.push(event);
  }
  return events;
}

const changed = (id: string, change: (step: Json) => Json) => must(parseTree({ ...json, steps: json.steps.map((s) => (s['id'] === id ? change(s) : s)) }));
const lamp = program(lampTree);

describe('replay', () => {
  it('goes the same way on the same version', () => {
    const events = record(lamp);
    expect(replay(lamp, start, events)).toEqual({ same: true, taken: events.length, given: events.length, divergences: [], at: '~ended', end: { says: 'cleared', key: 'done' } });
  });

  it('goes the same way on any run of the same version, however it was answered', () => {
    const outcomes = fc.record(Object.fromEntries(['look', 'earth', 'insulation', 'see'].map((key) => {
      const placed = lamp.layout.steps.get(key);
      const words = (placed?.step.exits ?? []).flatMap((e: Exit) => (e.on.includes('answer') ? [e.id] : (e.on as string[]))).filter((o) => placed !== undefined && canGive(lamp, placed, o));
      return [key, fc.constantFrom(...words)];
    })));
    fc.assert(
      fc.property(outcomes, (o) => {
        expect(replay(lamp, start, record(lamp, o)).divergences).toEqual([]);
      }),
      { numRuns: 40 },
    );
  });

  it('names the answer after which another version stands elsewhere, and where both meet again', () => {
    // the other version asks for the insulation first, and for the earth after it
    const steps = json.steps.map((s) => {
      const exits = s['exits'] as Json[];
      const to = (good: string) => ({ ...s, exits: exits.map((e) => (e['id'] === 'good' || e['id'] === 'dead' ? { ...e, to: good } : e)) });
      if (s['id'] === 'dead1') return to('insulation');
      if (s['id'] === 'insulation') return to('dead2');
      if (s['id'] === 'dead2') return to('earth');
      return s['id'] === 'earth' ? to('lamp') : s;
    });
    const other = program(must(parseTree({ ...json, steps })));
    const { same, divergences, end } = replay(other, start, record(lamp));
    expect(same).toBe(false);
    expect(divergences[0]).toMatchObject({ is: 'elsewhere', was: 'earth', now: 'insulation' });
    expect(divergences[0]?.say).toContain('“Earth” (earth)');
    expect(divergences[0]?.rejoined).toBeGreaterThan(divergences[0]?.index ?? Infinity);
    expect(end).toBeNull();
  });

  it('names the answer that another version does not take', () => {
    const other = program(changed('see', (s) => ({ ...s, exits: (s['exits'] as Json[]).map((e) => (e['id'] === 'dim' ? { ...e, id: 'dark' } : e)) })));
    const replayed = replay(other, start, record(lamp));
    expect(replayed.divergences).toMatchObject([{ is: 'refused', was: 'see', now: 'see', say: 'That is not one of the answers of this step.', rejoined: null }]);
  });

  it('names the house rule where the other version would have been refused', () => {
    const other = program(changed('dead2', ({ tree: _tree, version: _version, ...s }) => ({ ...s, kind: 'observe', asks: 'Ready?', contact: 'none', exits: [{ id: 'dead', label: 'Yes', on: ['answer'], to: 'lamp' }, { id: 'unsure', on: ['not-sure', 'cannot'], to: 'refer' }] })));
    const back = program(changed('insulation', (s) => ({ ...s, exits: (s['exits'] as Json[]).map((e) => (e['id'] === 'good' ? { ...e, to: 'earth' } : e)) })));
    expect(replay(back, start, record(lamp)).divergences[0]).toMatchObject({ is: 'refused', was: 'insulation', rule: 'H1' });
    expect(replay(other, start, record(lamp)).divergences[0]).toMatchObject({ is: 'elsewhere', was: 'dead2/isolate', now: 'dead2' });
  });

  it('follows steps that were only renamed', () => {
    const renamed = must(parseTree(JSON.parse(JSON.stringify(json).replaceAll('"insulation"', '"megger"').replaceAll('"dead2"', '"dead-again"'))));
    const events = record(lamp);
    expect(compareTrees(lampTree, renamed).risk).toBe('text');
    expect(replay(program(renamed), start, events).same).toBe(false);
    expect(replay(program(renamed), start, events, renamedSteps(lampTree, renamed)).same).toBe(true);
  });

  it('says what the other version needs at its start and the run did not bring', () => {
    const other = program(must(parseTree({ ...json, needsAtStart: ['release'] })));
    expect(replay(other, start, record(lamp))).toMatchObject({ same: false, taken: 0, divergences: [{ is: 'refused', say: 'This version needs at its start: release.' }] });
  });

  it('goes on where the other version only asks more, or less, at the opening of the bench', () => {
    const more = program(must(parseTree({ ...json, opening: { tools: [{ id: 'lamp-holder', name: 'Lamp holder' }], instruments: [], parts: [], conditions: [{ id: 'dry', name: 'The bench is dry' }] } })));
    const replayed = replay(more, start, record(lamp));
    expect(replayed.divergences.filter((d) => d.rejoined === null)).toEqual([]);
    expect(replayed.divergences.map((d) => d.say).join(' ')).toMatch(/Tools and parts here: Lamp holder.*The bench is dry/);
    expect(replayed.end).toMatchObject({ says: 'cleared' });
    expect(replay(lamp, start, record(more)).end).toMatchObject({ says: 'cleared' });
  });
});
