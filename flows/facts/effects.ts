/**
 * `entered` and `after`: the only place where a step changes bench facts. What gets worse does so when the action is shown (for energise and
 * raise when the guard is confirmed); what gets better only with the passing outcome.
 */
import { ACT_KINDS, CHECK_KINDS, DEFAULT_VERDICT } from '../document/outcomes';
import type { Outcome, Verdict } from '../document/outcomes';
import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import type { Exit, FittedThing, Step } from '../document/steps';
import type { Suspect } from '../document/tree';
import type { Op } from './ops';
import { powerClass, powerKind, powerNode } from './power';
import { fitVoids, workVoids } from './voids';

/** What a step is read against. `check` is the name under which a step or suspect of this tree is owed, unique across called trees. */
export interface StepScope {
  profile: Profile;
  settings: Settings;
  suspects: readonly Suspect[];
  /** things that this tree can fit, by id */
  things: ReadonlyMap<string, FittedThing>;
  check(id: string): string;
}

/** Changes for the worse, at the moment at which the action is shown. They stand also when Stop breaks the step off. */
export function entered(step: Step, scope: StepScope): Op[] {
  return [...conditionsLost(step), ...enteredByKind(step, scope)];
}

/** A hand, a tool or a probe inside is a cover that is off; hands disturb the air too, and with the supply isolated no fan turns. */
function conditionsLost(step: Step): Op[] {
  const confirmed = step.kind === 'do' ? (step.confirms ?? []) : [];
  const cover = step.contact !== 'none' || confirmed.includes('cover-on');
  const air = step.contact === 'hands' || step.contact === 'cover' || step.kind === 'isolate' || confirmed.includes('forced-air');
  return [...(cover ? [{ op: 'condition', id: 'cover-on', stands: false } satisfies Op] : []), ...(air ? [{ op: 'condition', id: 'forced-air', stands: false } satisfies Op] : [])];
}

function enteredByKind(step: Step, scope: StepScope): Op[] {
  switch (step.kind) {
    case 'do':
      return [
        ...(step.fits ?? []).flatMap((thing): Op[] => [...fitVoids(thing.area), { op: 'fit', thing }]),
        ...(step.removes ?? []).flatMap((id) => fitVoids(scope.things.get(id)?.area ?? 'supply')),
        ...(step.trims === undefined ? [] : fitVoids(step.trims)),
      ];
    case 'isolate':
      return [{ op: 'stored', to: 'unknown' }];
    case 'prove-dead':
      return [{ op: 'stored-at-most', to: 'discharged' }];
    case 'prove-earth':
      return [{ op: 'proof', fact: 'earth', to: 'unknown' }];
    case 'prove-insulation':
      return [
        { op: 'proof', fact: 'insulation', to: 'unknown' },
        { op: 'stored', to: 'unknown' },
      ];
    case 'prove-returns':
      return [{ op: 'proof', fact: 'returns', to: 'unknown' }];
    case 'prove-trip':
      return [{ op: 'trip', rail: step.rail, proved: false }];
    case 'connect-load':
      return step.load === 'boards'
        ? [
            { op: 'load', to: 'boards' },
            { op: 'proof', fact: 'returns', to: 'unknown' },
          ]
        : [];
    case 'energise':
    case 'raise': {
      const cls = powerClass(step, scope.profile, scope.settings);
      const put: Op[] = [
        { op: 'source', id: step.source, to: cls, node: powerNode(step) },
        { op: 'stored', to: 'unknown' },
        { op: 'powered', kind: powerKind(step, scope.profile, scope.settings) },
      ];
      return step.kind === 'energise' ? [...put, { op: 'unclear', suspect: 'all' }] : put;
    }
    case 'work': {
      const touched = [...(step.suspects ?? []), ...(step.replaces ?? [])];
      return [
        ...workVoids(step.area),
        // what was photographed before is perhaps another part now
        { op: 'photo', step: 'all', taken: false },
        ...touched.map((suspect): Op => ({ op: 'unclear', suspect: scope.check(suspect) })),
        ...(step.replaces ?? []).flatMap((part) => killersOf(part, scope)),
      ];
    }
    default:
      return [];
  }
}

/** Changes that the outcome brings: the better facts only on the passing one. */
export function after(step: Step, exit: Exit, outcome: Outcome | string, scope: StepScope): Op[] {
  return [...kindOps(step, outcome, scope), ...checkOps(step, exit, outcome, scope)];
}

/** The verdict of an exit: its author's word, or what its outcome means by itself. */
export function verdictOf(exit: Exit, outcome: Outcome | string): Verdict {
  return exit.verdict ?? DEFAULT_VERDICT[outcome as Outcome] ?? 'pass';
}

/** How a check is answered: on a live circuit, or on a dead one. */
export function answeredLive(step: Step): boolean {
  return (step.kind === 'prove-rails' || step.kind === 'prove-trip' || ('power' in step && step.power === 'live')) ?? false;
}

function kindOps(step: Step, outcome: Outcome | string, scope: StepScope): Op[] {
  const passed = outcome === 'in';
  switch (step.kind) {
    case 'do':
      return outcome === 'done'
        ? [...(step.removes ?? []).map((id): Op => ({ op: 'unfit', id })), ...(step.confirms ?? []).map((id): Op => ({ op: 'condition', id, stands: true }))]
        : [];
    case 'photo':
      return [{ op: 'photo', step: scope.check(step.id), taken: outcome === 'done' }];
    case 'isolate':
      return [{ op: 'sources', to: outcome === 'out' ? 'out' : 'unknown' }];
    case 'discharge':
      return passed ? [{ op: 'stored-at-least', to: 'discharged' }] : [{ op: 'stored', to: 'unknown' }];
    case 'prove-dead':
      if (passed) return [{ op: 'stored', to: 'proved' }];
      return outcome === 'falling'
        ? [{ op: 'stored', to: 'unknown' }]
        : [
            { op: 'stored', to: 'unknown' },
            { op: 'sources', to: 'unknown' },
          ];
    case 'prove-earth':
      return [{ op: 'proof', fact: 'earth', to: passed ? 'proved' : 'unknown' }];
    case 'prove-insulation':
      return [{ op: 'proof', fact: 'insulation', to: passed ? 'proved' : 'unknown' }];
    case 'prove-returns':
      return [{ op: 'proof', fact: 'returns', to: passed ? 'proved' : 'unknown' }];
    case 'prove-trip':
      return [{ op: 'trip', rail: step.rail, proved: passed }];
    case 'prove-rails':
      return passed ? [{ op: 'proving-at-least', to: step.level }] : [{ op: 'proving', to: 'none' }];
    case 'connect-load':
      return [{ op: 'load', to: outcome === 'done' ? step.load : 'boards' }];
    case 'raise':
      return outcome === 'on' ? [{ op: 'load', to: step.load }] : [];
    case 'work':
      return outcome === 'done' ? (step.for ?? []).map((c): Op => ({ op: 'fix', check: scope.check(c) })) : [];
    case 'hold':
      return outcome === 'given'
        ? [...(step.names ?? []), step.id].map((c): Op => ({ op: 'lift-doubt', check: scope.check(c) }))
        : [{ op: 'doubt', check: scope.check(step.id) }];
    default:
      return [];
  }
}

function checkOps(step: Step, exit: Exit, outcome: Outcome | string, scope: StepScope): Op[] {
  const check = scope.check(step.id);
  if (ACT_KINDS.includes(step.kind)) return verdictOf(exit, outcome) === 'unsure' ? [{ op: 'doubt', check }] : [{ op: 'lift-doubt', check }];
  if (!CHECK_KINDS.includes(step.kind)) return [];
  const cleared = (exit.evidence ?? [])
    .filter((e) => e.says === 'rules-out' || e.says === 'points-away')
    .map((e): Op => ({ op: 'clear', suspect: scope.check(e.suspect) }));
  switch (verdictOf(exit, outcome)) {
    case 'pass':
      return [{ op: 'pass', check }, ...cleared, ...(step.kind === 'observe' && step.lookOver === true ? [{ op: 'proof', fact: 'looked', to: 'proved' } satisfies Op] : [])];
    case 'fail':
      // a plain answer ends the doubt about it: what was not known is known now, and bars power as a failure
      return [{ op: 'fail', check, live: answeredLive(step) }, { op: 'lift-doubt', check }, ...cleared];
    case 'unsure':
      return [{ op: 'doubt', check }];
    case 'find':
      return [{ op: 'proving', to: 'none' }, { op: 'lift-doubt', check }, ...cleared];
  }
}

/** Suspects that are known to have killed a part: each is owed a check before power (H15). */
function killersOf(part: string, scope: StepScope): Op[] {
  const killers = scope.suspects.find((s) => s.id === part)?.killedBy ?? [];
  return killers.map((killer): Op => ({ op: 'owe-killer', part: scope.check(part), killer: scope.check(killer) }));
}
