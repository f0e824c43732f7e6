/** What must be true before a step may be entered: `needs(step, scope)`, each need under the house rule that asks it. */
import { DEAD_QUANTITIES } from '../document/ids';
import { resolvePoint, tripRails } from '../document/profile';
import type { Profile } from '../document/profile';
import type { Step, StepOf } from '../document/steps';
import { TEST_CONDITIONS } from '../document/testConditions';
import type { TestCondition } from '../document/testConditions';
import type { Atom } from './atoms';
import type { StepScope } from './effects';
import { staysShut } from './opening';
import { powerClass, powerNode } from './power';
import type { PowerStep } from './power';
import { partsToDischarge } from './stores';
import { isSupplyArea } from './voids';

export type RuleId = `H${1 | 2 | 3 | 4 | 5 | 6 | 7 | 8 | 9 | 10 | 11 | 12 | 13 | 14 | 15 | 16 | 17 | 18 | 19 | 20 | 21}`;

/** One statement that must hold, the house rule that asks it, and what is wrong when it does not. */
export interface Need {
  rule: RuleId;
  atom: Atom;
  say: string;
}

const out = (rule: RuleId): Need => ({ rule, atom: { fact: 'all-out' }, say: 'a source is in, or nobody knows that it is out' });
const stored = (rule: RuleId): Need => ({ rule, atom: { fact: 'stored', least: 'proved' }, say: 'stored charge is not proved dead' });
const dead = (rule: RuleId = 'H1'): Need[] => [out(rule), stored(rule)];
const settled = (rule: RuleId, ok: boolean, say: string): Need[] => (ok ? [] : [{ rule, atom: { fact: 'settled', holds: false }, say }]);

/** All that a step needs at its entry, kind and contact together. Role, clock and network are checked beside it and never make a need weaker. */
export function needs(step: Step, scope: StepScope): Need[] {
  return [...contactNeeds(step), ...kindNeeds(step, scope)];
}

function contactNeeds(step: Step): Need[] {
  switch (step.contact) {
    case 'hands':
      return dead();
    case 'cover':
      return [out('H1')];
    case 'probe':
    case 'none':
      return [];
  }
}

function kindNeeds(step: Step, scope: StepScope): Need[] {
  const { profile, settings } = scope;
  const boardsOut: Need[] = profile.boards.removable ? [{ rule: 'H9', atom: { fact: 'load-not', is: 'boards' }, say: 'the boards are still in' }] : [];
  switch (step.kind) {
    case 'do':
      return [
        ...((step.fits?.length ?? 0) + (step.removes?.length ?? 0) > 0 ? dead() : []),
        ...(step.fits ?? []).flatMap((thing) => settled('H8', thing.earthed !== true || mayBeEarthed(thing.point, profile), 'an earthed instrument goes only to a rail or to 0 V of this supply')),
        // a trimmed supply is no longer the one that was proved
        ...(step.trims !== undefined && isSupplyArea(step.trims) ? boardsOut : []),
      ];
    case 'observe':
      return [...powerNeeds(step.power), ...openingNeeds(step, scope)];
    case 'photo':
      return powerNeeds(step.power);
    case 'measure':
      return [...powerNeeds(step.power), ...readingNeeds(step, scope)];
    case 'soak':
      return [...powerNeeds(step.power), ...readingNeeds(step, scope), ...conditionNeeds(step.asInService)];
    case 'isolate':
    case 'call':
      return [];
    case 'discharge':
      return [out('H3')];
    case 'prove-dead':
      return [
        out('H2'),
        ...(partsToDischarge(profile, settings).length > 0 ? [{ rule: 'H3', atom: { fact: 'stored', least: 'discharged' }, say: 'a part that stores energy has not been discharged' } satisfies Need] : []),
      ];
    case 'prove-insulation':
      return [...dead(), ...boardsOut];
    case 'prove-earth':
    case 'prove-returns':
    case 'work':
      return dead();
    case 'prove-trip':
      return [
        { rule: 'H9', atom: { fact: 'feeds', id: 'bench', node: `rail:${step.rail}` }, say: 'the bench supply does not feed this rail' },
        { rule: 'H9', atom: { fact: 'source', id: 'bench', state: 'limited' }, say: 'the bench supply is not limited' },
        { rule: 'H9', atom: { fact: 'fitted', id: step.series }, say: 'the series part of the trip test is not fitted' },
        { rule: 'H9', atom: { fact: 'load', is: 'none' }, say: 'a load or a board is on the rail' },
        ...settled('H9', profile.rails.some((r) => r.id === step.rail && r.trip !== null), 'this rail of the profile has no trip'),
        ...(step.probe === 'clipped' ? clipNeeds([step.rail], 'each-rail', scope) : []),
      ];
    case 'connect-load':
      return [...dead(), ...(step.load === 'boards' ? [...boardNeeds(scope), ...owedNeeds('full')] : [])];
    case 'energise':
      return [out('H5'), ...feedNeeds(step, scope), ...conditionNeeds(step.asInService)];
    case 'raise':
      return [
        { rule: 'H5', atom: { fact: 'feeds', id: step.source, node: powerNode(step) }, say: 'that source is not in at this place' },
        ...settled('H9', step.load !== 'boards', 'boards are never raised, only energised'),
        // the first full mains waits for a countersign, and nobody is waited for while live: it is energised, not raised to
        ...(step.source === 'bench' ? [] : [{ rule: 'H20', atom: { fact: 'source', id: step.source, state: powerClass(step, profile, settings) }, say: 'a raise does not go from limited to full mains' } satisfies Need]),
        ...feedNeeds(step, scope),
        ...conditionNeeds(step.asInService),
      ];
    case 'prove-rails':
      return proveRailsNeeds(step, scope);
    case 'hold':
      return [out('H11')];
    case 'end':
      return endNeeds(step, scope);
  }
}

/** C2: what a step declares is what must be so; a test condition stands only while it was confirmed and nothing has changed it. */
function conditionNeeds(stated: readonly TestCondition[] = []): Need[] {
  return stated.map((id) => ({ rule: 'H5', atom: { fact: 'condition', id }, say: TEST_CONDITIONS[id].missing }));
}

/** A part is destroyed by opening it: its photo stands before that, and none is opened that may hold beryllium oxide. Dead is asked by contact. */
function openingNeeds(step: StepOf<'observe'>, scope: StepScope): Need[] {
  if (step.opens === undefined) return [];
  return [
    { rule: 'H17', atom: { fact: 'photo', step: scope.check(step.opens.photo) }, say: 'the part has not been photographed before it is opened' },
    ...settled('H17', !staysShut(scope.profile), 'a part of this machine may hold beryllium oxide, so none is opened'),
  ];
}

/** A rail and 0 V are parted from the mains by the supply; on a switch-mode supply nothing else is known to be. */
function mayBeEarthed(point: string | undefined, profile: Profile): boolean {
  if (profile.supplyKind !== 'switch-mode' || point === 'each-rail' || point === 'zero' || point === profile.zeroPoint) return true;
  return profile.points.some((p) => p.id === point && p.rail !== null);
}

function powerNeeds(power: 'live' | 'dead' | undefined): Need[] {
  if (power === 'live') return [{ rule: 'H8', atom: { fact: 'live' }, say: 'the supply is not live, so there is nothing to read' }];
  return power === 'dead' ? dead() : [];
}

function readingNeeds(step: StepOf<'measure'> | StepOf<'soak'>, scope: StepScope): Need[] {
  if (DEAD_QUANTITIES.includes(step.quantity)) return dead();
  if (step.probe !== 'clipped') return [];
  const rows = step.each === 'rails' ? scope.profile.rails.map((r) => r.id) : step.each === 'stores' ? scope.profile.stores.map((s) => s.id) : [];
  const generic = step.each === 'rails' ? 'each-rail' : step.each === 'stores' ? 'each-store' : step.points?.red;
  return generic === undefined ? settled('H8', false, 'a clipped reading names its point') : clipNeeds(rows, generic, scope);
}

/** A reading without contact needs its clip, fitted while dead; a clip on `each-rail` serves every rail. */
function clipNeeds(rows: string[], generic: string, scope: StepScope): Need[] {
  const resolved = rows.length === 0 ? [resolvePoint(scope.profile, generic, null)] : rows.map((row) => resolvePoint(scope.profile, generic, row));
  return [
    ...settled('H8', resolved.every((p) => p !== null), 'the profile has no such point'),
    { rule: 'H8', atom: { fact: 'clip-on', point: generic }, say: 'the clip for this reading is not fitted' },
  ];
}

/** C7, H4, H5, H6, H7, H13–H15: what every feed of power needs, energise and raise alike. */
function feedNeeds(step: PowerStep, scope: StepScope): Need[] {
  const { profile, settings } = scope;
  const cls = powerClass(step, profile, settings);
  const needed: Need[] = [
    { rule: 'H5', atom: { fact: 'opened' }, say: 'the bench has not been opened today' },
    { rule: 'H4', atom: { fact: 'none-of-class', class: 'link' }, say: 'a shorting link is still fitted' },
    { rule: 'H8', atom: { fact: 'no-earthed-clip-on-primary' }, say: 'an earthed instrument is clipped to the primary' },
    { rule: 'H6', atom: { fact: 'looked' }, say: 'the look-over does not stand' },
    ...(step.throughItems ?? []).map((id): Need => ({ rule: 'H5', atom: { fact: 'fitted', id }, say: 'what the power must pass through is not fitted' })),
    // a part fed alone is how a killer is ruled out: H15 bars only what feeds the circuit
    ...owedNeeds(cls).filter((need) => need.rule !== 'H15' || step.node !== 'part'),
  ];
  if (cls === 'full') needed.push({ rule: 'H4', atom: { fact: 'none-of-class', class: 'bypass' }, say: 'a bypass is still fitted' });
  if (step.node !== 'part') needed.push({ rule: 'H5', atom: { fact: 'load', is: step.load }, say: 'the load at the bench is not the one that this step declares' });
  switch (step.node) {
    case 'inlet':
      if (profile.mains.protectiveClass === 'I') needed.push({ rule: 'H7', atom: { fact: 'earth' }, say: 'the earth does not stand proved' });
      needed.push(
        { rule: 'H7', atom: { fact: 'insulation' }, say: 'the insulation does not stand proved' },
        { rule: 'H4', atom: { fact: 'none-in-area', area: 'earth' }, say: 'something is fitted or lifted in the earth path' },
        { rule: 'H4', atom: { fact: 'none-in-area', area: 'primary' }, say: 'something is fitted or lifted in the primary' },
      );
      if (cls === 'full') needed.push({ rule: 'H6', atom: { fact: 'proving', least: 'limited' }, say: 'no limited pass of this build opens full power' });
      if (profile.minimumLoad.length > 0) needed.push(...settled('H5', step.load !== 'none', 'this supply needs its minimum load'));
      break;
    case 'raw':
      needed.push(...settled('H5', profile.raw !== null, 'the profile has no raw node'));
      if (cls === 'full') needed.push({ rule: 'H6', atom: { fact: 'proving', least: 'regulator' }, say: 'no limited pass of the regulator opens full power' });
      break;
    case 'rail': {
      const rail = profile.rails.find((r) => r.id === step.rail);
      needed.push(...settled('H9', rail !== undefined, 'the profile has no such rail'));
      needed.push(...settled('H6', cls === 'limited', 'a rail is fed from outside only by a limited supply'));
      needed.push({ rule: 'H9', atom: { fact: 'load', is: 'none' }, say: 'a load or a board is on the rail' });
      if (rail?.trip) needed.push(...settled('H9', step.mostVolts <= rail.trip.highVolts + 0.5, 'more volts than the trip test of this rail may see'));
      else if (rail !== undefined) needed.push(...settled('H9', step.mostVolts <= Math.abs(rail.nominal) * (1 + rail.tolerance), 'more volts than this rail may have, and it has no trip'));
      break;
    }
    case 'part':
      needed.push(...settled('H6', cls === 'limited', 'a part is fed alone only from a limited supply'));
      needed.push({ rule: 'H5', atom: { fact: 'fitted', id: step.lead ?? '' }, say: 'the lead of this part is not lifted' });
      break;
  }
  if (step.load === 'boards') needed.push(...boardNeeds(scope), { rule: 'H10', atom: { fact: 'returns' }, say: 'a return does not stand proved' });
  return needed;
}

/** H9: boards stay out until every trip and full proving stand, with a valid release and nothing fitted. */
function boardNeeds(scope: StepScope): Need[] {
  return [
    ...tripNeeds(scope, 'H9'),
    { rule: 'H9', atom: { fact: 'proving', least: 'full' }, say: 'the supply has not been proved at full load' },
    { rule: 'H9', atom: { fact: 'release' }, say: 'no valid release of this supply' },
    { rule: 'H4', atom: { fact: 'none-fitted' }, say: 'something temporary is still fitted' },
  ];
}

function tripNeeds(scope: StepScope, rule: RuleId): Need[] {
  return tripRails(scope.profile).map((r): Need => ({ rule, atom: { fact: 'trip', rail: r.id }, say: `the trip of ${r.name} does not stand proved` }));
}

function owedNeeds(cls: 'limited' | 'full'): Need[] {
  return [
    { rule: 'H13', atom: { fact: 'no-doubt' }, say: 'an unsure answer is still open' },
    { rule: 'H14', atom: { fact: 'no-open-fail' }, say: 'a failed check has not been fixed' },
    { rule: 'H14', atom: { fact: 'no-fail-waiting-for-limited-power', deadToo: cls === 'full' }, say: 'a fixed check has not passed again' },
    { rule: 'H15', atom: { fact: 'no-killer' }, say: 'what killed a replaced part has not been ruled out' },
  ];
}

function proveRailsNeeds(step: StepOf<'prove-rails'>, scope: StepScope): Need[] {
  const boards: Need = { rule: 'H9', atom: { fact: 'load-not', is: 'boards' }, say: 'boards are on the rails' };
  const clip = step.probe === 'clipped' ? clipNeeds(scope.profile.rails.map((r) => r.id), 'each-rail', scope) : [];
  switch (step.level) {
    case 'regulator':
      return [{ rule: 'H6', atom: { fact: 'feeds', id: 'bench', node: 'raw' }, say: 'the bench supply does not feed the raw node' }, boards, ...clip];
    case 'limited':
      return [{ rule: 'H6', atom: { fact: 'source', id: 'mains', state: 'limited' }, say: 'the mains is not on through its limiter' }, boards, ...clip];
    case 'full':
      return [
        { rule: 'H6', atom: { fact: 'source', id: 'mains', state: 'full' }, say: 'the mains is not on in full' },
        { rule: 'H6', atom: { fact: 'load', is: 'full' }, say: 'the full dummy load is not on' },
        { rule: 'H4', atom: { fact: 'none-fitted' }, say: 'something temporary is still fitted' },
        boards,
        // full proving is read with one insulated probe: a clip is a fitted thing
        ...settled('H4', step.probe === 'hand', 'a clip is a fitted thing; full proving is read by hand'),
      ];
  }
}

/** What an end claims must be so. Close-out has taken out links, bypasses, series parts and clips before this is asked. */
function endNeeds(step: StepOf<'end'>, scope: StepScope): Need[] {
  const nothing: Need = { rule: 'H4', atom: { fact: 'none-fitted' }, say: 'something temporary is still fitted' };
  const earth: Need[] = scope.profile.mains.protectiveClass === 'I' ? [{ rule: 'H12', atom: { fact: 'earth' }, say: 'the earth does not stand proved' }] : [];
  const returns: Need = { rule: 'H12', atom: { fact: 'returns' }, say: 'the returns do not stand proved' };
  const full: Need = { rule: 'H12', atom: { fact: 'proving', least: 'full' }, say: 'the supply has not been proved at full load' };
  switch (step.says) {
    case 'supply-proven':
      return [...tripNeeds(scope, 'H12'), full, ...earth, { rule: 'H12', atom: { fact: 'insulation' }, say: 'the insulation does not stand proved' }, returns, nothing, ...owedNeeds('full')];
    case 'in-service':
      return [
        { rule: 'H12', atom: { fact: 'source', id: 'mains', state: 'full' }, say: 'the mains is not on in full' },
        { rule: 'H12', atom: { fact: 'load', is: 'boards' }, say: 'the boards are not in' },
        ...tripNeeds(scope, 'H12'),
        full,
        returns,
        { rule: 'H12', atom: { fact: 'release' }, say: 'no valid release of this supply' },
        nothing,
        ...owedNeeds('full'),
      ];
    case 'cleared':
      return [nothing];
    case 'fault-found':
    case 'referred':
    case 'stopped':
      return [];
  }
}
