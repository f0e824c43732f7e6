/** The words in which a fault tree is shown to a reader. */
import { HAZARDS } from '@/flows/document/hazards';
import type { HazardKind } from '@/flows/document/hazards';
import { QUANTITIES } from '@/flows/document/ids';
import { DEFAULT_VERDICT, SHOWN } from '@/flows/document/outcomes';
import type { Kind, Outcome, Shown, Verdict } from '@/flows/document/outcomes';
import type { Claim, Exit, Limit, Step } from '@/flows/document/steps';
import { TEST_CONDITIONS } from '@/flows/document/testConditions';
import type { TestCondition } from '@/flows/document/testConditions';
import type { Suspect, Tree } from '@/flows/document/tree';
import type { Unit } from '@/shared/quantity/units';
import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';

export const KIND_WORDS: Readonly<Record<Kind, string>> = {
  do: 'Do',
  observe: 'Look',
  measure: 'Measure',
  soak: 'Soak',
  photo: 'Photo',
  isolate: 'Isolate',
  discharge: 'Discharge',
  'prove-dead': 'Prove dead',
  'prove-earth': 'Prove earth',
  'prove-insulation': 'Prove insulation',
  'prove-returns': 'Prove returns',
  'prove-trip': 'Prove a trip',
  'connect-load': 'Connect load',
  energise: 'Energise',
  raise: 'Raise',
  'prove-rails': 'Prove rails',
  work: 'Work',
  hold: 'Hold point',
  call: 'Call of a tree',
  end: 'End',
};

export const CONTACT_WORDS: Readonly<Record<Step['contact'], string>> = {
  none: 'no contact',
  cover: 'cover off',
  probe: 'one insulated probe',
  hands: 'hands',
};

export const MODE_WORDS: Readonly<Record<Suspect['mode'], string>> = {
  open: 'open',
  short: 'short',
  leaky: 'leaky',
  drift: 'drifted',
  'no-contact': 'no contact',
  'low-value': 'low value',
  'fires-early': 'fires early',
  dead: 'dead',
};

const OUTCOME_WORDS: Readonly<Record<Outcome, string>> = {
  cannot: 'cannot do it',
  'not-sure': 'not sure',
  'not-out': 'not out',
  reversed: 'reversed',
  high: 'high',
  falling: 'falling',
  low: 'low',
  close: 'close',
  in: 'in',
  out: 'all out',
  done: 'done',
  on: 'it is on',
  given: 'given',
  refused: 'refused',
  answer: 'answer',
};

export const END_WORDS: Readonly<Record<Extract<Step, { kind: 'end' }>['says'], string>> = {
  'fault-found': 'fault found',
  'supply-proven': 'supply proven',
  cleared: 'cleared',
  stopped: 'stopped',
  referred: 'referred to a senior',
  'in-service': 'in service',
};

export const CLAIM_WORDS: Readonly<Record<Claim, string>> = {
  out: 'every source out',
  dead: 'proved dead',
  looked: 'looked over',
  earth: 'earth proved',
  insulation: 'insulation proved',
  returns: 'returns proved',
  trips: 'all trips proved',
  'proving-regulator': 'regulator proved on the bench supply',
  'proving-limited': 'rails proved on limited power',
  'proving-full': 'rails proved at full load',
  'load-none': 'no load',
  'load-boards': 'boards in',
  release: 'a valid release',
  'nothing-fitted': 'nothing temporary fitted',
};

const SUPPLY_WORDS: Readonly<Record<Tree['appliesTo']['supplyKinds'][number], string>> = {
  linear: 'linear',
  'switched-from-raw': 'switched from a raw rail',
  'switch-mode': 'switch-mode',
};

export const EVIDENCE_SAYS = {
  'rules-out': 'rules out',
  'points-away': 'points away from',
  'says-nothing': 'says nothing on',
  'points-to': 'points to',
  'all-but-proves': 'all but proves',
} as const;

/** `Class I; linear supplies; 1 to 6 rails`. */
export function appliesToWords({ protectiveClasses, supplyKinds, fewestRails, mostRails, serials }: Tree['appliesTo']): string {
  const rails =
    fewestRails === mostRails ? `${fewestRails} ${fewestRails === 1 ? 'rail' : 'rails'}` : `${fewestRails} to ${mostRails} rails`;
  const only = serials ? `; serials ${serials.join(', ')} only` : '';
  return `Class ${protectiveClasses.join(' or ')}; ${supplyKinds.map((kind) => SUPPLY_WORDS[kind]).join(', ')}; ${rails}${only}`;
}

/** What an exit is taken on, in the author's words where there are any. */
export function exitWords(exit: Exit, ends: ReadonlyMap<string, string> = new Map()): string {
  if (exit.label !== undefined) return exit.label;
  return exit.on.map((on) => ends.get(on) ?? OUTCOME_WORDS[on as Outcome] ?? on).join(', ');
}

/** What an answer shows of a part. */
export function shownWords(shows: Shown): string {
  return SHOWN[shows].name.toLowerCase();
}

/** Pass, fail, unsure or find, said or by default. */
export function exitVerdict(exit: Exit): Verdict {
  if (exit.verdict !== undefined) return exit.verdict;
  const verdicts = exit.on.map((on) => DEFAULT_VERDICT[on as Outcome] ?? 'pass');
  return (['fail', 'unsure', 'find', 'pass'] as const).find((v) => verdicts.includes(v)) ?? 'pass';
}

/** The limit of a reading, as an author states it. */
export function limitWords(limit: Limit, quantity: keyof typeof QUANTITIES): string {
  const unit: Unit = QUANTITIES[quantity];
  const print = (n: number) => formatQuantity(n, unit);
  switch (limit.is) {
    case 'nominal': {
      const of = limit.of === 'row' ? 'nominal of the rail' : print(limit.of);
      return `${of} ± ${limit.tolerance === 'row' ? 'its tolerance' : `${formatNumber(limit.tolerance * 100)} %`}`;
    }
    case 'between':
      return `${print(limit.low)} to ${print(limit.high)}`;
    case 'below':
      return `${print(limit.high)} or less`;
    case 'above':
      return `${print(limit.low)} or more`;
    case 'twin':
      return `like its twin (${limit.of}), within ${formatNumber(limit.within * 100)} %`;
    case 'workings':
      return `from the workings “${limit.sheet}”`;
  }
}

/** What is particular to the kind of a step, one fact a line; the tree gives things their names. */
export function stepFacts(step: Step, tree: Pick<Tree, 'steps'>): string[] {
  switch (step.kind) {
    case 'do':
      return [
        ...(step.fits ?? []).map((f) => `Fits: ${f.name}`),
        ...(step.removes?.length ? [`Takes out: ${step.removes.map((id) => thingName(tree, id)).join(', ')}`] : []),
        ...(step.trims ? [`Trims: ${step.trims}`] : []),
        ...(step.confirms ?? []).map((id) => `Confirms: ${conditionWords(id)}`),
      ];
    case 'observe':
      return [
        `Asks: ${step.asks}`,
        ...(step.power === 'live' ? ['While live'] : []),
        ...(step.opens ? [openingWords(step.opens, tree)] : []),
      ];
    case 'measure':
    case 'soak':
      return [
        `Limit: ${limitWords(step.limit, step.quantity)}`,
        `Probe: ${{ clipped: 'clipped on while dead', hand: 'by hand, one insulated probe', none: 'no contact' }[step.probe]}`,
        ...(step.each ? [`For each of the ${step.each}`] : []),
        ...(step.kind === 'soak' ? (step.asInService ?? []).map(conditionWords) : []),
        ...(step.kind === 'soak' ? [`Held ${formatNumber(step.holdMinutes)} min, read every ${formatNumber(step.everyMinutes)} min`] : []),
      ];
    case 'discharge':
      return [
        step.toolOhms === undefined
          ? 'Resistor and wait: from the workings, for the machine'
          : `Through ${formatQuantity(step.toolOhms, 'Ω')}${step.toolWatts === undefined ? '' : `, ${formatQuantity(step.toolWatts, 'W')}`}`,
      ];
    case 'prove-trip':
      return [`Rail ${step.rail}, no more than ${formatQuantity(step.ceilingVolts, 'V')}`];
    case 'connect-load':
      return [`Load: ${{ boards: 'boards', none: 'none', light: 'light dummy load', full: 'full dummy load' }[step.load]}`];
    case 'energise':
    case 'raise':
      return [
        `Through ${{ lamp: `a lamp${step.lampWatts ? ` of ${formatQuantity(step.lampWatts, 'W')}` : ''}`, bench: 'the bench supply', mains: 'mains', 'limited-ac': 'a limited AC source' }[step.through]} into the ${step.node}${step.rail ? ` ${step.rail}` : ''}`,
        `At most ${formatQuantity(step.mostVolts, 'V')}, ${formatQuantity(step.mostAmps, 'A')}, for ${formatNumber(step.longestMinutes)} min`,
        `Load: ${step.load}`,
        ...(step.asInService ?? []).map(conditionWords),
      ];
    case 'prove-rails':
      return [{ regulator: 'Regulator, on the bench supply', limited: 'On limited power', full: 'At full load' }[step.level]];
    case 'work':
      return [`Area: ${step.area}`, ...(step.cannotBeUndone ? ['Cannot be undone'] : [])];
    case 'hold':
      return [`Asks the senior: ${step.asks}`];
    case 'end':
      return [...(step.replace ? [`Replace: ${step.replace}`] : []), ...(step.retest ? [`Test again: ${step.retest}`] : [])];
    case 'photo':
      return [`Of: ${step.of}`];
    case 'isolate':
    case 'prove-dead':
    case 'prove-earth':
    case 'prove-insulation':
    case 'prove-returns':
    case 'call':
      return [];
  }
}

function conditionWords(id: TestCondition): string {
  return TEST_CONDITIONS[id].name.toLowerCase();
}

function openingWords(
  { photo, instead }: NonNullable<Extract<Step, { kind: 'observe' }>['opens']>,
  { steps }: Pick<Tree, 'steps'>,
): string {
  const title = (id: string) => `“${steps.find((s) => s.id === id)?.title ?? id}”`;
  const otherwise = instead === undefined ? '' : `; where a part may hold beryllium oxide, ${title(instead)} in its place`;
  return `Opens a part, after ${title(photo)}${otherwise}`;
}

function thingName({ steps }: Pick<Tree, 'steps'>, id: string): string {
  const fits = steps.flatMap((s) => (s.kind === 'do' ? (s.fits ?? []) : []));
  return fits.find((f) => f.id === id)?.name ?? id.replaceAll('-', ' ');
}

/** A hazard in one line. */
export function hazardWords(kind: HazardKind): string {
  const { hazard, result } = HAZARDS[kind];
  return `${hazard}. ${result}`;
}
