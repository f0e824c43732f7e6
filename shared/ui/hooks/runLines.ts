/** One line of the account of a run, as the bench shows it beside the step. Pure. */
import type { Exit } from '@/flows/document/steps';
import type { Verdict } from '@/flows/document/outcomes';
import { currentRows } from '@/flows/machine/answer';
import type { Program } from '@/flows/machine/compile';
import type { RunContext } from '@/flows/machine/context';
import type { MachineEvent } from '@/flows/machine/events';
import { SAFE } from '@/flows/machine/program';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { QUANTITIES } from '@/shared/quantity/quantities';
import { sheetById } from '@/shared/workings/list';

export interface RunLine {
  /** epoch milliseconds */
  at: number;
  type: MachineEvent['type'];
  /** key of the step at which it was answered */
  key: string;
  stud: string;
  title: string;
  words: string;
  /** set where a step was left */
  verdict: Verdict | null;
}

/** The line of one event that was taken. */
export function lineOf(program: Program, before: RunContext, event: MachineEvent, after: RunContext): RunLine {
  const placed = program.layout.steps.get(before.key);
  return {
    at: event.at,
    type: event.type,
    key: before.key,
    stud: placed?.stud ?? '',
    title: before.key === SAFE.opening ? 'Open the bench' : (placed?.step.title ?? 'The end'),
    words: wordsOf(program, before, event),
    verdict: (after.outcome?.verdict ?? null) as Verdict | null,
  };
}

function wordsOf(program: Program, before: RunContext, event: MachineEvent): string {
  const { layout } = program;
  switch (event.type) {
    case 'ROW': {
      const row = currentRows(layout, before).find((r) => r.id === event.row);
      const word = row?.ask === 'word' ? row.words.find((w) => w.word === event.word)?.label : undefined;
      return `${row?.label ?? event.row}: ${word ?? WORDS[event.word] ?? event.word}`;
    }
    case 'READING': {
      const row = currentRows(layout, before).find((r) => r.id === event.row);
      const unit = row?.ask === 'reading' ? QUANTITIES[row.quantity].unit : '%';
      const reading = event.value === 'over' ? 'over range' : formatQuantity(event.value, unit);
      return `${row?.label ?? event.row}: ${reading}${event.falling === true ? ', falling' : ''}`;
    }
    case 'ANSWER':
      return (
        layout.steps.get(event.step)?.step.exits.find((e: Exit) => e.id === event.answer)?.label ?? WORDS[event.answer] ?? event.answer
      );
    case 'PHOTO':
      return 'Photo taken';
    case 'WARNING_READ':
      return 'Warning read';
    case 'GUARD_HELD':
      return 'Guard held: power in';
    case 'HOLD_ASKED':
      return 'Countersign asked';
    case 'HOLD_GIVEN':
      return event.note === undefined ? 'Countersigned' : `Countersigned: ${event.note}`;
    case 'HOLD_REFUSED':
      return `Countersign refused: ${event.reason}`;
    case 'SECOND_PRESENT':
      return 'A second person has signed in';
    case 'HANDED_OVER':
      return event.note === undefined ? 'Offered to the next restorer' : `Offered to the next restorer: ${event.note}`;
    case 'TAKEN_OVER':
      return 'Taken over: what had been proved dead has lapsed';
    case 'ABORT':
      return 'Switched off before its time';
    case 'STOP':
      return 'Stop, make safe';
    case 'REENTER':
      return `Goes on from ${layout.steps.get(event.step)?.step.title ?? event.step}`;
    case 'PAUSE':
      return event.reason === undefined ? 'Paused' : `Paused: ${event.reason}`;
    case 'RESUME':
      return 'Gone on';
    case 'RESTART':
      return 'Page loaded anew: what was known of the bench has lapsed';
    case 'TICK':
      return 'Proved dead has lapsed';
    case 'CLOSE':
      return 'Closed';
    case 'NOTE':
      return `Noted, ${sheetById(event.sheet)?.title ?? event.sheet}: ${event.headline}`;
  }
}

const WORDS: Readonly<Record<string, string>> = {
  done: 'Done',
  on: 'It is on',
  'not-sure': 'Not sure',
  cannot: 'Cannot be done',
  out: 'Out',
  'not-out': 'Not out',
};
