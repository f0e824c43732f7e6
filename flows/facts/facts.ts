/** Bench facts: what is true at the bench now. Everything starts at its worst. */
import type { Profile } from '../document/profile';
import { sourceIds, tripRails } from '../document/profile';
import type { FittedThing, Load } from '../document/steps';
import type { TestCondition } from '../document/testConditions';

/** `lapsed` counts as unknown in every need; the machine mends it. `limited` is the lamp on the mains, the amps limit on the bench supply. */
export type SourceState = 'unknown' | 'lapsed' | 'full' | 'limited' | 'out';
export type Stored = 'unknown' | 'lapsed' | 'discharged' | 'proved';
export type Proved = 'unknown' | 'proved';
export type Proving = 'none' | 'regulator' | 'limited' | 'full';
/** Kinds of power that sit behind a hold point the first time in a run. */
export type PowerKind = 'bench' | 'limited' | 'full' | 'boards';

export interface SourceFact {
  id: string;
  state: SourceState;
  /** where it feeds while it is in: `inlet`, `raw`, `part` or `rail:<id>` */
  node: string | null;
}

export interface Facts {
  sources: SourceFact[];
  stored: Stored;
  looked: Proved;
  earth: Proved;
  insulation: Proved;
  returns: Proved;
  load: Load;
  /** rails that have a trip, each proved or not */
  trips: { rail: string; proved: boolean }[];
  proving: Proving;
  fitted: FittedThing[];
  owed: {
    /** checks with an open doubt */
    doubts: string[];
    /** failed checks; `live` says how they are answered */
    fails: { check: string; fixed: boolean; live: boolean }[];
    /** replaced parts whose killer has not been ruled out */
    killers: { part: string; killer: string }[];
  };
  /** suspects ruled out or pointed away since the last energise and since the last work on them */
  cleared: string[];
  release: 'none' | 'valid';
  opened: boolean;
  /** test conditions that were confirmed and have not been changed since */
  conditions: TestCondition[];
  /** photo steps whose photo was taken */
  photos: string[];
  /** kinds of power that this run has had since the last work on the supply */
  powered: PowerKind[];
}

/** What a run brings with it: the machine's lasting tags and its release. */
export interface Carried {
  release: boolean;
  fitted: FittedThing[];
  killers: { part: string; killer: string }[];
}

/** The facts at the start of a run: the worst of everything, and what the machine carries. */
export function worstFacts(profile: Profile, carried: Carried = { release: false, fitted: [], killers: [] }): Facts {
  return {
    sources: sourceIds(profile).map((id) => ({ id, state: 'unknown', node: null })),
    stored: 'unknown',
    looked: 'unknown',
    earth: 'unknown',
    insulation: 'unknown',
    returns: 'unknown',
    load: profile.outOfMachine ? 'none' : 'boards',
    trips: tripRails(profile).map((r) => ({ rail: r.id, proved: false })),
    proving: 'none',
    fitted: carried.fitted,
    owed: { doubts: [], fails: [], killers: carried.killers },
    cleared: [],
    release: carried.release ? 'valid' : 'none',
    opened: false,
    conditions: [],
    photos: [],
    powered: [],
  };
}

/** True when every source is out. */
export function allOut(facts: Facts): boolean {
  return facts.sources.every((s) => s.state === 'out');
}

/** True when some source is in; a source that is not known is not counted as in. */
export function isLive(facts: Facts): boolean {
  return facts.sources.some((s) => s.state === 'full' || s.state === 'limited');
}

/** Proved dead, as the power band says it: every source out and stored charge proved. */
export function isProvedDead(facts: Facts): boolean {
  return allOut(facts) && facts.stored === 'proved';
}
