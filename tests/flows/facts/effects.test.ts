import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { isProvedDead, worstFacts } from '@/flows/facts/facts';
import type { Facts } from '@/flows/facts/facts';
import { applyOps } from '@/flows/facts/ops';
import { after, entered } from '@/flows/facts/effects';
import type { StepScope } from '@/flows/facts/effects';
import { needs } from '@/flows/facts/needs';
import { defaultSettings } from '@/flows/document/settings';
import type { Step } from '@/flows/document/steps';

import { Bench, benchProfile, lampTree, program } from '../support/bench';
import { bench, connect, dead, earth, insulation, lamp, look, mains, observe, rails, returns, step, treeOf, work } from '../support/steps';

const tree = treeOf([
  look('d1'), dead('d1', 'earth'), earth('insulation'), insulation('returns'), returns('load'), connect('load', 'full', 'bench'), bench('bench', 'rails'), rails('rails', 'regulator', 'lamp'),
  lamp('lamp', 'mains'), mains('mains', 'w'), work('w', 'regulator', 'w2', { replaces: ['pass'] }), work('w2', 'harness', 'see'), observe('see', 'done'), step('isolate', 'out', 'bleed'),
  step('discharge', 'bleed', 'prove', { contact: 'probe' }), step('prove-dead', 'prove', 'done', { contact: 'probe' }),
]);
const scope: StepScope = { profile: benchProfile, settings: defaultSettings, suspects: tree.suspects, things: new Map(), check: (id) => id };
const steps = tree.steps.filter((s) => s.kind !== 'end' && s.kind !== 'call');

const proved = fc.constantFrom('unknown' as const, 'proved' as const);
const anyFacts: fc.Arbitrary<Facts> = fc.record({
  sources: fc.tuple(fc.constantFrom('unknown', 'lapsed', 'full', 'limited', 'out'), fc.constantFrom('unknown', 'limited', 'out')).map(([m, b]) => [{ id: 'mains', state: m, node: m === 'full' || m === 'limited' ? 'inlet' : null }, { id: 'bench', state: b, node: b === 'limited' ? 'raw' : null }] as Facts['sources']),
  stored: fc.constantFrom('unknown', 'lapsed', 'discharged', 'proved'),
  looked: proved, earth: proved, insulation: proved, returns: proved,
  load: fc.constantFrom('boards', 'none', 'light', 'full'),
  trips: fc.boolean().map((p) => [{ rail: 'p5', proved: p }]),
  proving: fc.constantFrom('none', 'regulator', 'limited', 'full'),
  fitted: fc.constant([]),
  owed: fc.record({ doubts: fc.subarray(['see', 'earth']), fails: fc.subarray([{ check: 'see', fixed: true, live: false }]), killers: fc.constant([]) }),
  cleared: fc.subarray(['diode', 'pass']),
  release: fc.constantFrom('none', 'valid'),
  opened: fc.boolean(),
  conditions: fc.subarray(['cover-on', 'forced-air'] as const).map((c) => [...c]),
  photos: fc.subarray(['photo']),
  powered: fc.subarray(['bench', 'limited', 'full'] as const).map((k) => [...k]),
});

const RANK = { stored: ['unknown', 'lapsed', 'discharged', 'proved'], proving: ['none', 'regulator', 'limited', 'full'] } as const;
/** True when `b` is nowhere better than `a`. */
const noBetter = (a: Facts, b: Facts) =>
  RANK.stored.indexOf(b.stored) <= RANK.stored.indexOf(a.stored) &&
  RANK.proving.indexOf(b.proving) <= RANK.proving.indexOf(a.proving) &&
  (['looked', 'earth', 'insulation', 'returns'] as const).every((f) => a[f] === 'proved' || b[f] === 'unknown') &&
  b.trips.every((t, i) => !t.proved || a.trips[i]?.proved === true) &&
  b.sources.every((s, i) => s.state !== 'out' || a.sources[i]?.state === 'out') &&
  b.owed.doubts.length >= a.owed.doubts.length && b.owed.fails.length >= a.owed.fails.length && b.owed.killers.length >= a.owed.killers.length &&
  b.cleared.every((s) => a.cleared.includes(s)) &&
  b.conditions.every((c) => a.conditions.includes(c)) && b.photos.every((p) => a.photos.includes(p)) &&
  (b.release === 'none' || a.release === 'valid');

describe('entered', () => {
  it('makes nothing better', () => {
    fc.assert(fc.property(anyFacts, fc.constantFrom(...steps), (facts, s) => noBetter(facts, applyOps(facts, entered(s, scope)))));
  });
});

describe('after', () => {
  it('leaves a prove step that did not pass with its fact at its worst', () => {
    const gives: Partial<Record<Step['kind'], (f: Facts) => string>> = { 'prove-earth': (f) => f.earth, 'prove-insulation': (f) => f.insulation, 'prove-returns': (f) => f.returns };
    fc.assert(
      fc.property(anyFacts, fc.constantFrom(...steps.filter((s) => gives[s.kind])), fc.constantFrom('close', 'not-sure', 'cannot'), (facts, s, outcome) => {
        const exit = s.exits.find((e) => (e.on as string[]).includes(outcome))!;
        expect(gives[s.kind]?.(applyOps(facts, after(s, exit, outcome, scope)))).toBe('unknown');
      }),
    );
  });
  it('holds every source unknown when proving dead finds anything but a falling charge', () => {
    const prove = steps.find((s) => s.kind === 'prove-dead')!;
    const at = (outcome: string) => applyOps({ ...worstFacts(benchProfile), sources: [{ id: 'mains', state: 'out', node: null }] }, after(prove, prove.exits.find((e) => (e.on as string[]).includes(outcome))!, outcome, scope));
    for (const outcome of ['high', 'not-sure', 'cannot']) expect(at(outcome).sources[0]?.state).toBe('unknown');
    expect(at('falling').sources[0]?.state).toBe('out');
    expect(at('in').stored).toBe('proved');
  });
  it('looks at its own fact alone: what happens to one fact does not hang on the others', () => {
    fc.assert(
      fc.property(anyFacts, anyFacts, fc.constantFrom(...steps), (a, b, s) => {
        const mixed: Facts = { ...b, earth: a.earth, stored: a.stored, proving: a.proving };
        const exit = s.exits[0]!;
        const outcome = exit.on[0]!;
        const ops = [...entered(s, scope), ...after(s, exit, outcome, scope)];
        const fromA = applyOps(a, ops);
        const fromMixed = applyOps(mixed, ops);
        expect([fromMixed.earth, fromMixed.stored, fromMixed.proving]).toEqual([fromA.earth, fromA.stored, fromA.proving]);
      }),
    );
  });
});

describe('needs', () => {
  it('lets no hands near a machine that is not proved dead', () => {
    for (const s of steps.filter((x) => x.contact === 'hands')) {
      const atoms = needs(s, scope).map((n) => n.atom);
      expect(atoms).toEqual(expect.arrayContaining([{ fact: 'all-out' }, { fact: 'stored', least: 'proved' }]));
    }
  });
});

describe('any sequence of events at the bench', () => {
  const words = ['done', 'cannot', 'not-sure', 'out', 'not-out', 'sound', 'dim', 'bright', 'on', 'in'];
  const anyEvent = fc.oneof(
    { weight: 14, arbitrary: fc.record({ act: fc.constant('good' as const) }) },
    { weight: 4, arbitrary: fc.record({ act: fc.constant('word' as const), word: fc.constantFrom(...words) }) },
    { weight: 3, arbitrary: fc.record({ act: fc.constant('value' as const), value: fc.constantFrom(0, 2, 40, -3, 1e7) }) },
    { weight: 1, arbitrary: fc.record({ act: fc.constantFrom('STOP', 'ABORT', 'PAUSE', 'RESUME', 'TICK', 'RESTART', 'CLOSE', 'late', 'next day', 'offer', 'take') }) },
  );
  it('never shows hands a bench that is not proved dead, nor power without its guard', () => {
    const compiled = program(lampTree);
    fc.assert(
      fc.property(fc.array(anyEvent, { maxLength: 70 }), (events) => {
        const b = new Bench(compiled);
        for (const e of events) {
          const before = b.view;
          if (e.act === 'good') {
            try {
              if (before.phase === 'act' && before.current === null && before.answers[0]) b.do({ type: 'ANSWER', step: before.key, answer: before.answers[0].answer });
              else if (before.current) b.row();
              else b.pass();
            } catch {
              // refused: the state is as it was
            }
          } else if (e.act === 'word') b.try(before.current ? { type: 'ROW', step: before.key, row: before.current.row.id, word: e.word } : { type: 'ANSWER', step: before.key, answer: e.word });
          else if (e.act === 'value' && before.current) b.try({ type: 'READING', step: before.key, row: before.current.row.id, value: e.value, typed: 'x', instrument: { id: 'tester', twoPole: true, uncertainty: 0.01 } });
          else if (e.act === 'late') b.at += 40 * 60_000;
          else if (e.act === 'next day') b.at += 20 * 3_600_000;
          else if (e.act === 'offer') b.try({ type: 'HANDED_OVER', by: before.restorer, to: before.restorer === 'ann' ? 'bo' : 'ann', meaning: 'gives' });
          else if (e.act === 'take') b.try({ type: 'TAKEN_OVER', by: before.restorer === 'ann' ? 'bo' : 'ann', senior: false, meaning: 'takes' });
          else if (e.act !== 'value') {
            if (e.act === 'RESTART') b.boot = `boot-${b.at}`;
            b.try({ type: e.act });
          }
          const now = b.view;
          const live = now.facts.sources.some((s) => s.state === 'full' || s.state === 'limited');
          if (now.phase === 'act' && now.step?.contact === 'hands' && now.key !== before.key) expect(isProvedDead(now.facts) || now.step.kind === 'prove-insulation').toBe(true);
          // nobody goes on in a tree whose load and fitted things have not been read back
          if (b.state.context.readBack) expect(now.builtIn || ['opening', 'paused', 'ended', 'closed'].includes(now.phase)).toBe(true);
          if (now.restorer !== before.restorer) expect([e.act, before.phase, before.handing?.to]).toEqual(['take', 'paused', now.restorer]);
          if (live && !before.facts.sources.some((s) => s.state === 'full' || s.state === 'limited')) expect(before.phase).toBe('guard');
        }
      }),
      { numRuns: 150 },
    );
  });
});
