/** What a person at the bench is shown of a run: read off the program and the state, nothing kept. */
import type { HazardKind } from '../document/hazards';
import type { Shown } from '../document/outcomes';
import type { Exit, Step } from '../document/steps';
import { bandOf } from '../facts/band';
import type { PowerBandState } from '../facts/band';
import type { Facts } from '../facts/facts';
import { currentRows, rowOpensAt } from './answer';
import type { Program } from './compile';
import type { RunState } from './advance';
import type { Phase, Purpose, RowAnswer, RunEnd } from './context';
import { reentriesOpen } from './judge';
import { SAFE } from './program';
import type { Row } from './rows';
import { stepNotes } from './stepNotes';
import type { StepNote } from './stepNotes';

export interface RowView {
  row: Row;
  answer: RowAnswer | null;
  /** wall time from which it may be answered, or null */
  opensAt: number | null;
}

export interface AnswerView {
  /** what ANSWER carries */
  answer: string;
  label: string;
  /** the plain way on; the others are set smaller */
  primary: boolean;
  /** what the answer shows of a part, or null */
  shows: Shown | null;
}

export interface RunView {
  key: string;
  phase: Phase;
  /** null at the opening, when paused and at the end */
  step: Step | null;
  stud: string;
  total: number;
  title: string;
  hazards: HazardKind[];
  rows: RowView[];
  /** the row to be answered now, or null */
  current: RowView | null;
  /** answers of a step without rows */
  answers: AnswerView[];
  /** what the step asks beyond its instruction */
  notes: StepNote[];
  reentries: { key: string; title: string }[];
  facts: Facts;
  band: PowerBandState;
  live: { since: number; until: number } | null;
  purpose: Purpose;
  /** who leads the run now */
  restorer: string;
  /** the run is offered to this person */
  handing: { to: string; at: number } | null;
  builtIn: boolean;
  end: (RunEnd & { title: string; replace: string | null; retest: string | null }) | null;
}

const LABELS: Record<string, string> = {
  done: 'Done',
  'not-sure': 'Not sure',
  cannot: 'Cannot do it',
  on: 'It is on',
};

/** The view of a run between two events. */
export function view(program: Program, state: RunState): RunView {
  const { layout } = program;
  const { context } = state;
  const placed = layout.steps.get(context.key);
  const shown = context.phase === 'paused' || context.phase === 'ended' || context.phase === 'closed' ? undefined : placed;
  const rows: RowView[] =
    context.phase === 'paused'
      ? []
      : currentRows(layout, context).map((row) => ({ row, answer: context.rows.find((r) => r.id === row.id) ?? null, opensAt: rowOpensAt(row, context) }));
  return {
    key: context.key,
    phase: context.phase,
    step: shown?.step ?? null,
    stud: placed?.stud ?? '',
    total: layout.total,
    title: titleOf(context.phase, context.key, shown?.step ?? null, context.handing !== null),
    hazards: shown?.hazards ?? [],
    rows,
    current: rows.find((r) => r.answer === null) ?? null,
    answers: shown === undefined || shown.rows.length > 0 || shown.builtIn ? [] : answersOf(shown.step),
    notes: shown === undefined ? [] : stepNotes(shown.step),
    reentries: context.key === SAFE.choose ? reentriesOpen(layout, context).map((key) => ({ key, title: layout.steps.get(key)?.step.title ?? key })) : [],
    facts: context.facts,
    band: bandOf(context.facts),
    live: context.live === null ? null : { since: context.live.since, until: context.live.until },
    purpose: context.purpose,
    restorer: context.restorer,
    handing: context.handing,
    builtIn: placed?.builtIn ?? false,
    end: endOf(program, context.end),
  };
}

function titleOf(phase: Phase, key: string, step: Step | null, offered: boolean): string {
  if (phase === 'paused') return offered ? 'Offered' : 'Paused';
  if (phase === 'ended') return 'The run has reached its end';
  if (phase === 'closed') return 'Closed';
  return key === SAFE.opening ? 'Open the bench' : (step?.title ?? '');
}

function answersOf(step: Step): AnswerView[] {
  return step.exits.flatMap((exit: Exit): AnswerView[] =>
    step.kind === 'observe' && exit.on.includes('answer')
      ? [{ answer: exit.id, label: exit.label ?? exit.id, primary: true, shows: exit.shows ?? null }]
      : (exit.on as string[]).filter((on) => on !== 'given' && on !== 'refused').map((on) => ({ answer: on, label: exit.on.length === 1 && exit.label !== undefined ? exit.label : (LABELS[on] ?? on), primary: on === 'done' || on === 'on', shows: null })),
  );
}

function endOf(program: Program, end: RunEnd | null): RunView['end'] {
  if (end === null) return null;
  const step = end.key === null ? undefined : program.layout.steps.get(end.key)?.step;
  const own = step?.kind === 'end' ? step : undefined;
  return { ...end, title: own?.title ?? 'Stopped', replace: own?.replace ?? null, retest: own?.retest ?? null };
}
