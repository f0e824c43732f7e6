/** Playing the script of a demo run. */
import type { RunView } from '@/flows/machine/view';

import { demoPeople } from './demoPeople';
import type { DemoChoice, DemoChoices, DemoMove, DemoRun } from './DemoContent';
import type { DemoDevice } from './DemoDevice';
import type { DemoInstrument } from './demoInstruments';
import { goodValue, readWith, scatter } from './demoReading';

/** A step is done in less than the minutes that its author allows, and never twice alike. */
const SHARE_OF_MINUTES = 0.3;
/** More than any tree of the demo needs; a script that goes round in circles ends here. */
const MOST_MOVES = 3000;

interface Player {
  device: DemoDevice;
  instruments: readonly DemoInstrument[];
  countersign: string;
  /** readings and times of one run are not those of another */
  salt: string;
}

/** Plays every move of the run in order. Throws with the place where a script does not fit its tree. */
export async function playRun(device: DemoDevice, run: DemoRun, instruments: readonly DemoInstrument[]): Promise<void> {
  const player: Player = { device, instruments, countersign: demoPeople[run.countersign].id, salt: run.key };
  for (const move of run.moves) await playMove(player, move);
  await device.flush();
}

async function playMove(player: Player, move: DemoMove): Promise<void> {
  const { device } = player;
  if ('to' in move) {
    const wanted = move.to;
    await walk(player, choicesOf(move.choices), (view) => (wanted === 'end' ? view.phase === 'ended' : view.key === wanted && view.rows.every(({ answer }) => answer === null)), true);
  } else if ('askHold' in move) await walk(player, choicesOf(move.choices), (view) => view.phase === 'hold-wait', false);
  else if ('refuseHold' in move) {
    await walk(player, choicesOf(move.choices), (view) => view.phase === 'hold-wait', false);
    await device.answerHold(move.by === undefined ? player.countersign : demoPeople[move.by].id, 'refused', move.refuseHold);
  } else if ('stop' in move) {
    device.do({ type: 'STOP' });
    await walk(player, new Map(), (view) => view.key === '~choose', true);
  } else if ('pauseMinutes' in move) {
    device.do({ type: 'PAUSE', ...(move.reason === undefined ? {} : { reason: move.reason }) });
    device.wait(move.pauseMinutes * 60_000);
    device.do({ type: 'RESUME' });
  } else if ('second' in move) await device.addSecond(demoPeople[move.second].id);
  else if ('reenter' in move) device.do({ type: 'REENTER', step: move.reenter });
  else {
    if (device.view.phase !== 'ended') {
      device.do({ type: 'CLOSE' });
      await walk(player, new Map(), (view) => view.phase === 'ended', true);
    }
    device.do({ type: 'CLOSE' });
  }
}

type Choices = Map<string, DemoChoice[]>;

function choicesOf(choices: DemoChoices = {}): Choices {
  return new Map(Object.entries(choices).map(([key, choice]) => [key, Array.isArray(choice) ? [...(choice as readonly DemoChoice[])] : [choice as DemoChoice]]));
}

async function walk(player: Player, choices: Choices, until: (view: RunView) => boolean, countersign: boolean): Promise<void> {
  const { device } = player;
  let visit: { key: string; choice: DemoChoice | undefined } = { key: '', choice: undefined };
  for (let i = 0; i < MOST_MOVES; i += 1) {
    const { view } = device;
    if (until(view)) return;
    if (view.phase === 'ended') throw new Error(`the run has ended (${view.end?.title ?? ''}) before its script`);
    const first = view.rows.every(({ answer }) => answer === null);
    const arrives = visit.key !== view.key || (first && view.phase === 'warning');
    if (arrives) {
      device.wait(paceMs(view, player.salt));
      visit = { key: view.key, choice: (choices.get(view.key) ?? choices.get(view.key.split('/').at(-1) ?? ''))?.shift() };
    }
    if (view.phase === 'hold-wait') {
      if (!countersign) throw new Error('a hold point stands where none is expected');
      await device.answerHold(player.countersign, 'given');
    } else answerOnce(player, view, visit.choice);
  }
  throw new Error(`no end in sight at ${device.view.key}`);
}

function paceMs({ step, key }: RunView, salt: string): number {
  return Math.round((step?.minutes ?? 0) * 60_000 * SHARE_OF_MINUTES * (0.7 + scatter(`${salt}/${key}`) * 0.6));
}

/** One move of a person at the bench: warning, hold, guard, row or answer. */
function answerOnce({ device, instruments, salt }: Player, view: RunView, choice: DemoChoice | undefined): void {
  const { phase, key, current } = view;
  if (phase === 'warning') device.do({ type: 'WARNING_READ', step: key });
  else if (phase === 'hold' || view.step?.kind === 'hold') device.do({ type: 'HOLD_ASKED', step: key });
  else if (phase === 'guard') device.do({ type: 'GUARD_HELD', step: key, heldMs: 2200 });
  else if (current === null) device.do({ type: 'ANSWER', step: key, answer: typeof choice === 'string' ? choice : (view.answers[0]?.answer ?? '') });
  else {
    const { row, opensAt } = current;
    if (opensAt !== null && opensAt > device.time.now) device.wait(opensAt - device.time.now);
    const chosen = typeof choice === 'object' ? (choice[row.id] ?? choice['*']) : choice;
    if (row.ask === 'word') device.do({ type: 'ROW', step: key, row: row.id, word: typeof chosen === 'string' ? chosen : (row.words[0]?.word ?? '') });
    else if (typeof chosen === 'string' && chosen !== 'over') device.do({ type: 'ROW', step: key, row: row.id, word: chosen });
    else device.do({ type: 'READING', step: key, row: row.id, ...readWith(instruments, view.step, row, chosen === undefined || (typeof chosen === 'string' && chosen !== 'over') ? goodValue(row, salt) : (chosen as number | 'over')) });
  }
}
