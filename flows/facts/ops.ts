/**
 * The only ways in which a bench fact can change. Each operation looks at its own fact alone, so that the effect of a step on every
 * fact can be read off without knowing the others (that is what lets a proof treat each fact by itself).
 */
import type { FittedThing, Load } from '../document/steps';
import type { TestCondition } from '../document/testConditions';
import type { Facts, PowerKind, Proved, Proving, SourceState, Stored } from './facts';

export type Op =
  | { op: 'source'; id: string; to: SourceState; node: string | null }
  | { op: 'sources'; to: 'unknown' | 'lapsed' | 'out' }
  | { op: 'stored'; to: Stored }
  | { op: 'stored-at-most'; to: 'discharged' }
  | { op: 'stored-at-least'; to: 'discharged' }
  | { op: 'stored-lapses' }
  | { op: 'proof'; fact: 'looked' | 'earth' | 'insulation' | 'returns'; to: Proved }
  | { op: 'load'; to: Load }
  | { op: 'trip'; rail: string | 'all'; proved: boolean }
  | { op: 'proving'; to: 'none' }
  | { op: 'proving-at-least'; to: Proving }
  | { op: 'fit'; thing: FittedThing }
  | { op: 'unfit'; id: string }
  | { op: 'doubt'; check: string }
  | { op: 'lift-doubt'; check: string }
  | { op: 'fail'; check: string; live: boolean }
  | { op: 'fix'; check: string }
  | { op: 'pass'; check: string }
  | { op: 'clear'; suspect: string }
  | { op: 'unclear'; suspect: string | 'all' }
  | { op: 'owe-killer'; part: string; killer: string }
  | { op: 'release-void' }
  | { op: 'opened' }
  | { op: 'opened-lapses' }
  | { op: 'condition'; id: TestCondition; stands: boolean }
  | { op: 'photo'; step: string | 'all'; taken: boolean }
  | { op: 'powered'; kind: PowerKind }
  | { op: 'powered-void' };

const STORED: readonly Stored[] = ['unknown', 'lapsed', 'discharged', 'proved'];
const PROVING: readonly Proving[] = ['none', 'regulator', 'limited', 'full'];

/** Applies operations in order; the given facts stay as they are. */
export function applyOps(facts: Facts, ops: readonly Op[]): Facts {
  return ops.reduce(applyOp, facts);
}

function applyOp(facts: Facts, op: Op): Facts {
  const { owed } = facts;
  switch (op.op) {
    case 'source':
      return { ...facts, sources: facts.sources.map((s) => (s.id === op.id ? { id: s.id, state: op.to, node: op.node } : s)) };
    case 'sources':
      return { ...facts, sources: facts.sources.map((s) => ({ id: s.id, state: op.to, node: null })) };
    case 'stored':
      return { ...facts, stored: op.to };
    case 'stored-at-most':
      return STORED.indexOf(facts.stored) > STORED.indexOf(op.to) ? { ...facts, stored: op.to } : facts;
    case 'stored-at-least':
      return STORED.indexOf(facts.stored) < STORED.indexOf(op.to) ? { ...facts, stored: op.to } : facts;
    case 'stored-lapses':
      return facts.stored === 'unknown' ? facts : { ...facts, stored: 'lapsed' };
    case 'proof':
      return { ...facts, [op.fact]: op.to };
    case 'load':
      return { ...facts, load: op.to };
    case 'trip':
      return { ...facts, trips: facts.trips.map((t) => (op.rail === 'all' || t.rail === op.rail ? { rail: t.rail, proved: op.proved } : t)) };
    case 'proving':
      return { ...facts, proving: op.to };
    case 'proving-at-least':
      return PROVING.indexOf(facts.proving) < PROVING.indexOf(op.to) ? { ...facts, proving: op.to } : facts;
    case 'fit':
      return { ...facts, fitted: [...facts.fitted.filter((f) => f.id !== op.thing.id), op.thing] };
    case 'unfit':
      return { ...facts, fitted: facts.fitted.filter((f) => f.id !== op.id) };
    case 'doubt':
      return { ...facts, owed: { ...owed, doubts: withId(owed.doubts, op.check) } };
    case 'lift-doubt':
      return { ...facts, owed: { ...owed, doubts: owed.doubts.filter((c) => c !== op.check) } };
    case 'fail':
      return { ...facts, owed: { ...owed, fails: [...owed.fails.filter((f) => f.check !== op.check), { check: op.check, fixed: false, live: op.live }] } };
    case 'fix':
      return { ...facts, owed: { ...owed, fails: owed.fails.map((f) => (f.check === op.check ? { ...f, fixed: true } : f)) } };
    case 'pass':
      return { ...facts, owed: { ...owed, doubts: owed.doubts.filter((c) => c !== op.check), fails: owed.fails.filter((f) => f.check !== op.check) } };
    case 'clear':
      return { ...facts, cleared: withId(facts.cleared, op.suspect), owed: { ...owed, killers: owed.killers.filter((k) => k.killer !== op.suspect) } };
    case 'unclear':
      return { ...facts, cleared: op.suspect === 'all' ? [] : facts.cleared.filter((s) => s !== op.suspect) };
    case 'owe-killer':
      return facts.cleared.includes(op.killer) || owed.killers.some((k) => k.part === op.part && k.killer === op.killer)
        ? facts
        : { ...facts, owed: { ...owed, killers: [...owed.killers, { part: op.part, killer: op.killer }] } };
    case 'release-void':
      return { ...facts, release: 'none' };
    case 'opened':
      return { ...facts, opened: true };
    case 'opened-lapses':
      return { ...facts, opened: false };
    case 'condition': {
      const others = facts.conditions.filter((c) => c !== op.id);
      return others.length === facts.conditions.length && !op.stands ? facts : { ...facts, conditions: op.stands ? [...others, op.id].sort() : others };
    }
    case 'photo': {
      const others = op.step === 'all' ? [] : facts.photos.filter((p) => p !== op.step);
      return { ...facts, photos: op.taken ? [...others, op.step].sort() : others };
    }
    case 'powered':
      return facts.powered.includes(op.kind) ? facts : { ...facts, powered: [...facts.powered, op.kind] };
    case 'powered-void':
      return { ...facts, powered: [] };
  }
}

function withId(ids: string[], id: string): string[] {
  return ids.includes(id) ? ids : [...ids, id];
}
