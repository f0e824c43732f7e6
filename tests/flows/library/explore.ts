/** Goes to every step of a tree by every exit, once from the first way that leads there. */
import type { Exit } from '@/flows/document/steps';
import type { Refusal } from '@/flows/machine/arrive';
import type { Program } from '@/flows/machine/compile';
import type { ReadingRow, Row } from '@/flows/machine/rows';
import { Bench } from '../support/bench';
import { goodReading, move, NO_PHOTO } from './walk';
import type { Choice } from './walk';

export interface Arrival {
  key: string;
  /** the bench as it arrived, before any warning is read */
  bench: Bench;
}

export interface Exploration {
  arrivals: Arrival[];
  /** ends that were reached, by key; `null` for a run closed as stopped by the machine itself */
  ends: Set<string>;
  /** exits that the machine would not take, with the way to them */
  barred: { key: string; outcome: string; refusal: Refusal }[];
}

/** A copy of a run that goes its own way. */
export function copyOf(bench: Bench): Bench {
  const copy = new Bench(bench.program);
  copy.state = structuredClone(bench.state);
  copy.at = bench.at;
  copy.boot = bench.boot;
  return copy;
}

/** Explores a program from its opening. Each key is entered once; from there every outcome of every exit is tried, counted ones spent and unspent. */
export function explore(program: Program): Exploration {
  const found: Exploration = { arrivals: [], ends: new Set(), barred: [] };
  const seen = new Set<string>();
  const queue: Bench[] = [];
  const arrive = (bench: Bench) => {
    const { key, phase, end, purpose } = bench.view;
    if (purpose.is === 'end') found.ends.add(purpose.key ?? 'stopped');
    if (phase === 'ended') found.ends.add(end?.key ?? 'stopped');
    else if (!seen.has(key)) {
      seen.add(key);
      found.arrivals.push({ key, bench: copyOf(bench) });
      queue.push(bench);
    }
  };
  const start = new Bench(program, false, { release: program.layout.tree.needsAtStart.includes('release') });
  while (start.view.phase === 'opening') move(start, {});
  arrive(start);
  for (let bench = queue.shift(); bench !== undefined; bench = queue.shift()) {
    const { key } = bench.view;
    const placed = program.layout.steps.get(key);
    if (placed === undefined) throw new Error(`no step ${key}`);
    if (placed.builtIn) {
      if (key === '~choose') continue;
      const onward = copyOf(bench);
      while (onward.view.key === key) move(onward, {});
      arrive(onward);
      continue;
    }
    for (const exit of placed.step.exits) {
      for (const outcome of exit.on) {
        for (const spent of exit.atMost === undefined ? [false] : [false, true]) {
          const tried = copyOf(bench);
          if (spent) tried.state.context.counters.push({ key: `${key}>${exit.id}`, n: exit.atMost ?? 0 });
          const refusal = take(tried, key, exit, outcome);
          if (refusal === null) arrive(tried);
          else if (refusal !== 'impossible') found.barred.push({ key, outcome: `${outcome}${spent ? ', spent' : ''}`, refusal });
        }
      }
    }
  }
  return found;
}

/** Plays one outcome of a step from its arrival; a refusal, or `impossible` where the limits of the row leave no such reading. */
function take(bench: Bench, key: string, exit: Exit, outcome: string): Refusal | 'impossible' | null {
  for (let i = 0; i < 60 && bench.view.key === key; i += 1) {
    const { phase, current, step } = bench.view;
    if (step?.kind === 'hold' && phase === 'hold-wait' && outcome === 'refused') {
      bench.do({ type: 'HOLD_REFUSED', step: key, by: 'sam', reason: 'not yet' });
    } else if (phase !== 'act' || step?.kind === 'hold') move(bench, {});
    else if (current === null) {
      const photo = step?.kind === 'photo' && outcome === 'done';
      const advanced = bench.try(photo ? { type: 'PHOTO', step: key, photo: NO_PHOTO } : { type: 'ANSWER', step: key, answer: outcome === 'answer' ? exit.id : outcome });
      if (!advanced.ok) return advanced.refusal;
      return null; // a loop to itself has the same key
    } else {
      const value = outcome === 'answer' ? exit.id : readingFor(current.row, outcome, bench.view.rows.length === bench.view.rows.indexOf(current) + 1);
      if (value === null) return 'impossible';
      const before = bench.state.context.rows.length;
      const refusal = rowOnce(bench, current.row, value);
      if (refusal !== null) return refusal;
      if (bench.view.key === key && bench.state.context.rows.length <= before) return null;
    }
  }
  return null;
}

function rowOnce(bench: Bench, row: Row, value: Exclude<Choice, string>[string]): Refusal | null {
  try {
    bench.row({ [row.id]: value });
    return null;
  } catch (error) {
    return { rule: null, code: 'house-rule', say: String(error) };
  }
}

/** What to answer so that the row comes to the outcome: every row the same, or the last one where the step ends at the first bad row. */
function readingFor(row: Row, outcome: string, last: boolean): number | 'over' | string | null {
  if (outcome === 'in' || outcome === 'out') return goodReading(row);
  if (row.ask === 'word') {
    const word = row.words.find((w) => w.result === outcome);
    return word?.word ?? (last ? null : goodReading(row));
  }
  // the twin itself is not judged: the row after it comes to the outcome
  if (row.twin?.is === 'twin') return outcome === 'not-sure' || outcome === 'cannot' ? outcome : goodReading(row);
  return readingOf(row, outcome);
}

function readingOf(row: ReadingRow, outcome: string): number | 'over' | string | null {
  const { low, high, nominal } = row;
  const negative = nominal !== null && nominal < 0;
  switch (outcome) {
    case 'not-sure':
    case 'cannot':
      return outcome;
    case 'high':
      return row.high === null ? null : negative ? (low ?? 0) * 1.3 : (high ?? 0) * 1.3 + 0.01;
    case 'low':
      return low === null ? null : negative ? (high ?? 0) * 0.5 : low > 0 ? low * 0.5 : low - 0.1;
    case 'close':
      return high ?? low;
    case 'reversed':
      return nominal === null ? null : -nominal;
    default:
      return null;
  }
}
