/** Single statements about the bench facts: what a step can need, and how each is read off the facts. */
import type { Area } from '../document/ids';
import type { Load } from '../document/steps';
import type { TestCondition } from '../document/testConditions';
import { allOut, isLive } from './facts';
import type { Facts, SourceState } from './facts';

export type Atom =
  | { fact: 'all-out' }
  | { fact: 'live' }
  | { fact: 'source'; id: string; state: SourceState }
  | { fact: 'feeds'; id: string; node: string }
  | { fact: 'stored'; least: 'discharged' | 'proved' }
  | { fact: 'looked' | 'earth' | 'insulation' | 'returns' }
  | { fact: 'load'; is: Load }
  | { fact: 'load-not'; is: Load }
  | { fact: 'trip'; rail: string }
  | { fact: 'proving'; least: 'regulator' | 'limited' | 'full' }
  | { fact: 'fitted'; id: string }
  | { fact: 'clip-on'; point: string }
  | { fact: 'none-fitted' }
  | { fact: 'none-of-class'; class: 'link' | 'bypass' }
  | { fact: 'none-in-area'; area: Area }
  | { fact: 'no-earthed-clip-on-primary' }
  | { fact: 'no-doubt' }
  | { fact: 'no-open-fail' }
  | { fact: 'no-fail-waiting-for-limited-power'; deadToo: boolean }
  | { fact: 'no-killer' }
  | { fact: 'release' }
  | { fact: 'opened' }
  | { fact: 'condition'; id: TestCondition }
  | { fact: 'photo'; step: string }
  /** settled by the document and the profile alone, whatever the bench */
  | { fact: 'settled'; holds: boolean };

const STORED_RANK = { unknown: 0, lapsed: 0, discharged: 1, proved: 2 } as const;
const PROVING_RANK = { none: 0, regulator: 1, limited: 2, full: 3 } as const;

/** Whether the facts make the statement true. `lapsed` counts as unknown. */
export function holds(facts: Facts, atom: Atom): boolean {
  switch (atom.fact) {
    case 'all-out':
      return allOut(facts);
    case 'live':
      return isLive(facts);
    case 'source':
      return facts.sources.some((s) => s.id === atom.id && s.state === atom.state);
    case 'feeds':
      return facts.sources.some((s) => s.id === atom.id && s.node === atom.node);
    case 'stored':
      return STORED_RANK[facts.stored] >= STORED_RANK[atom.least];
    case 'looked':
    case 'earth':
    case 'insulation':
    case 'returns':
      return facts[atom.fact] === 'proved';
    case 'load':
      return facts.load === atom.is;
    case 'load-not':
      return facts.load !== atom.is;
    case 'trip':
      return facts.trips.some((t) => t.rail === atom.rail && t.proved);
    case 'proving':
      return PROVING_RANK[facts.proving] >= PROVING_RANK[atom.least];
    case 'fitted':
      return facts.fitted.some((f) => f.id === atom.id);
    case 'clip-on':
      return facts.fitted.some((f) => f.class === 'clip' && f.point === atom.point);
    case 'none-fitted':
      return facts.fitted.length === 0;
    case 'none-of-class':
      return !facts.fitted.some((f) => f.class === atom.class);
    case 'none-in-area':
      return !facts.fitted.some((f) => f.area === atom.area);
    case 'no-earthed-clip-on-primary':
      return !facts.fitted.some((f) => f.earthed === true && (f.area === 'primary' || f.area === 'earth'));
    case 'no-doubt':
      return facts.owed.doubts.length === 0;
    case 'no-open-fail':
      return facts.owed.fails.every((f) => f.fixed);
    case 'no-fail-waiting-for-limited-power':
      // a fixed live check may be re-made on limited power; a fixed dead check is re-made dead, before any power
      return facts.owed.fails.every((f) => !f.fixed || (f.live && !atom.deadToo));
    case 'no-killer':
      return facts.owed.killers.length === 0;
    case 'release':
      return facts.release === 'valid';
    case 'opened':
      return facts.opened;
    case 'condition':
      return facts.conditions.includes(atom.id);
    case 'photo':
      return facts.photos.includes(atom.step);
    case 'settled':
      return atom.holds;
  }
}

/** Whether the statement would hold if what has lapsed were as it was: such a need is mended, not refused. */
export function holdsButForLapse(facts: Facts, atom: Atom): boolean {
  if (atom.fact !== 'all-out' && atom.fact !== 'stored') return holds(facts, atom);
  const mended: Facts = {
    ...facts,
    stored: facts.stored === 'lapsed' ? 'proved' : facts.stored,
    sources: facts.sources.map((s) => (s.state === 'lapsed' ? { ...s, state: 'out' } : s)),
  };
  return holds(mended, atom);
}
