/** What can come out of a step, by kind; the exits of a step must cover each of these exactly once. */

export const KINDS = [
  'do', 'observe', 'measure', 'soak', 'photo', 'isolate', 'discharge', 'prove-dead', 'prove-earth', 'prove-insulation', 'prove-returns',
  'prove-trip', 'connect-load', 'energise', 'raise', 'prove-rails', 'work', 'hold', 'call', 'end',
] as const;
export type Kind = (typeof KINDS)[number];

/** Worst first: the outcome of a step that is answered row by row is its worst row. */
export const ROW_ORDER = ['cannot', 'not-sure', 'not-out', 'reversed', 'high', 'falling', 'low', 'close', 'in', 'out', 'done'] as const;
export type RowResult = (typeof ROW_ORDER)[number];

export const OUTCOMES = [...ROW_ORDER, 'on', 'given', 'refused', 'answer'] as const;
/** `answer` stands for an authored answer of an observe step; at a call the outcome is the id of the end that was reached. */
export type Outcome = (typeof OUTCOMES)[number];

const reading = ['in', 'close', 'low', 'high', 'reversed', 'not-sure', 'cannot'] as const;
const act = ['done', 'not-sure', 'cannot'] as const;

/** Outcomes that the exits of each kind must cover. Observe has authored answers besides; a call has the callee's ends. */
export const OUTCOMES_OF: Record<Kind, readonly Outcome[]> = {
  do: act,
  observe: ['not-sure', 'cannot'],
  measure: reading,
  soak: reading,
  photo: ['done', 'cannot'],
  isolate: ['out', 'not-out', 'not-sure'],
  discharge: ['in', 'high', 'not-sure', 'cannot'],
  'prove-dead': ['in', 'falling', 'high', 'not-sure', 'cannot'],
  'prove-earth': ['in', 'close', 'high', 'not-sure', 'cannot'],
  'prove-insulation': ['in', 'close', 'low', 'not-sure', 'cannot'],
  'prove-returns': ['in', 'close', 'high', 'not-sure', 'cannot'],
  'prove-trip': reading,
  'connect-load': act,
  energise: ['on', 'cannot'],
  raise: ['on', 'cannot'],
  'prove-rails': reading,
  work: act,
  hold: ['given', 'refused'],
  call: [],
  end: [],
};

export const VERDICTS = ['pass', 'fail', 'unsure', 'find'] as const;
export type Verdict = (typeof VERDICTS)[number];

/** What an exit means when its author has not said so. */
export const DEFAULT_VERDICT: Record<Outcome, Verdict> = {
  in: 'pass', done: 'pass', out: 'pass', on: 'pass', given: 'pass', answer: 'pass',
  low: 'fail', high: 'fail', reversed: 'fail', falling: 'fail',
  close: 'unsure', 'not-sure': 'unsure', cannot: 'unsure', 'not-out': 'unsure', refused: 'unsure',
};

/** The outcome that earns a kind its better facts. */
export const PASSING: Record<Kind, Outcome | null> = {
  do: 'done', observe: null, measure: 'in', soak: 'in', photo: 'done', isolate: 'out', discharge: 'in', 'prove-dead': 'in', 'prove-earth': 'in',
  'prove-insulation': 'in', 'prove-returns': 'in', 'prove-trip': 'in', 'connect-load': 'done', energise: 'on', raise: 'on', 'prove-rails': 'in',
  work: 'done', hold: 'given', call: null, end: null,
};

/** Kinds whose exits lift or leave doubts (H13, H14). Dead-making steps are left out: their doubt is the bench fact itself. */
export const CHECK_KINDS: readonly Kind[] = ['observe', 'measure', 'soak', 'prove-earth', 'prove-insulation', 'prove-returns', 'prove-trip', 'prove-rails'];

/** Acts whose unsure answer is a doubt too: what is perhaps not fitted or not mended, or was not photographed when it was asked for, bars power like an unsure reading. */
export const ACT_KINDS: readonly Kind[] = ['do', 'photo', 'work'];

/** What an answer of a look shows about a part, beside which answer it was. */
export const SHOWN = {
  'not-original': { name: 'Not original', say: 'It is of another maker or batch than its neighbours, or its lead was cut or soldered again.' },
  'large-over-current': { name: 'Large over-current', say: 'Burnt through and spattered inside: age does not do this. What drove the current is looked for before power.' },
} as const;
export type Shown = keyof typeof SHOWN;
export const SHOWN_KINDS = Object.keys(SHOWN) as [Shown, ...Shown[]];

/** What evidence an exit carries on a suspect, and its likelihood ratio (steps of Jeffreys' scale; nothing is ever zero). */
export const EVIDENCE = { 'rules-out': 0.01, 'points-away': 0.1, 'says-nothing': 1, 'points-to': 10, 'all-but-proves': 100 } as const;
export type EvidenceWord = keyof typeof EVIDENCE;
export const EVIDENCE_WORDS = Object.keys(EVIDENCE) as [EvidenceWord, ...EvidenceWord[]];
