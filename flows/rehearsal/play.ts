/** One cause played through a tree, from the opening of the bench to the close of the run. */
import type { Suspect } from '../document/tree';
import { findingsOf } from '../evidence/findings';
import type { Finding } from '../evidence/posterior';
import { posterior } from '../evidence/posterior';
import { advance, startRun, unmetAtStart } from '../machine/advance';
import type { RunState } from '../machine/advance';
import type { Program } from '../machine/compile';
import { answersOf } from './causes';
import { nextEvent } from './drive';

export interface Play {
  /** keys of steps in the order in which they were entered, the machine's own left out */
  path: string[];
  end: { says: string; key: string | null; suspect: string | null } | null;
  /** what the run was told, in order */
  findings: Finding[];
  /** the suspect was worked on during the run */
  mended: boolean;
  /** the likeliest suspects at the end, equal ones together, or at the moment at which the suspect was mended */
  likeliest: string[];
  /** by the stated minutes of the steps and the waits of their rows */
  minutes: number;
  minutesLive: number;
  /** why the run did not come to an end, or null */
  stuck: { at: string; rule: string | null; say: string } | null;
}

/** A run that stands so often at one place with the same facts and counters goes round for ever: the answers of a cause never change. */
const ROUNDS = 4;
/** Events after which a run is given up, for each step of the tree and besides. */
const EVENTS_A_STEP = 60;
const EVENTS_BESIDES = 2_000;
/** Any time will do: a rehearsal has no day. */
const START = 1_000_000_000_000;

/** Plays a suspect (null: a sound machine). Always comes to an end: a limit that is met is said in `stuck`. */
export function play(program: Program, suspect: Suspect | null): Play {
  const { layout } = program;
  const { tree } = layout;
  const start = { restorer: 'rehearsal', restorerIsSenior: false, at: START, release: tree.needsAtStart.includes('release'), fitted: [], killers: [] };
  const done: Play = { path: [], end: null, findings: [], mended: false, likeliest: [], minutes: 0, minutesLive: 0, stuck: null };
  const unmet = unmetAtStart(program, start);
  if (unmet.length > 0) return { ...done, stuck: { at: layout.first, rule: null, say: `The tree needs at its start: ${unmet.join(', ')}. It can be rehearsed where another tree calls it.` } };

  const caused = answersOf(program, suspect?.id ?? null);
  const sound = answersOf(program, null);
  let state: RunState = startRun(program, start);
  const stood = new Map<string, number>();
  const most = layout.steps.size * EVENTS_A_STEP + EVENTS_BESIDES;
  for (let taken = 0; state.context.phase !== 'closed'; taken += 1) {
    const { key, phase } = state.context;
    if (taken >= most) return stuckAt(done, state, key, `It comes to no end in ${most} events.`);
    if (state.context.outcome !== null && timesHere(stood, state, done.mended) > ROUNDS) return stuckAt(done, state, key, 'It goes round for ever: the same place, with the same facts, again and again.');
    const placed = layout.steps.get(key);
    const wanted = placed === undefined || placed.builtIn || phase === 'opening' ? null : (done.mended ? sound : caused)(placed);
    const event = nextEvent(program, state, wanted, 'stated');
    if (event === null) return stuckAt(done, state, key, 'This machine gives no answer that leads on.');
    const advanced = advance(program, state, event);
    if (!advanced.ok) {
      // time that runs out while live is answered as a restorer would: by the abort of the tree
      const aborted = advanced.refusal.code === 'overdue' ? advance(program, state, { type: 'ABORT', at: event.at, monotonic: event.monotonic, boot: event.boot }) : advanced;
      if (!aborted.ok) return stuckAt(done, state, key, advanced.refusal.say, advanced.refusal.rule);
      return stuckAt(done, state, key, `${advanced.refusal.say} The stated minutes do not fit into the longest time of the energise.`, 'H11');
    }
    if (state.context.live !== null) done.minutesLive += (event.at - state.context.last.at) / 60_000;
    state = advanced.state;
    listen(done, program, state, suspect);
    if (state.context.key !== done.path.at(-1) && state.context.phase !== 'ended' && layout.steps.get(state.context.key)?.builtIn === false) done.path.push(state.context.key);
  }
  return close(done, state, tree.suspects);
}

function timesHere(stood: Map<string, number>, { context }: RunState, mended: boolean): number {
  const { key, facts, counters, purpose } = context;
  const place = JSON.stringify([key, facts, counters, purpose, mended]);
  const times = (stood.get(place) ?? 0) + 1;
  stood.set(place, times);
  return times;
}

function listen(done: Play, program: Program, state: RunState, suspect: Suspect | null): void {
  for (const finding of findingsOf(program.layout, state.context.outcome)) {
    if (suspect !== null && finding.worked?.includes(suspect.id) === true && !done.mended) {
      done.likeliest = likeliestOf(program.layout.tree.suspects, done.findings);
      done.mended = true;
    }
    done.findings.push(finding);
  }
}

function close(done: Play, state: RunState, suspects: readonly Suspect[]): Play {
  const { end, last } = state.context;
  const step = end?.key ?? null;
  return { ...done, minutes: (last.at - START) / 60_000, end: end === null ? null : { says: end.says, key: step, suspect: null }, likeliest: done.mended ? done.likeliest : likeliestOf(suspects, done.findings) };
}

function stuckAt(done: Play, state: RunState, at: string, say: string, rule: string | null = null): Play {
  return { ...done, minutes: (state.context.last.at - START) / 60_000, stuck: { at, rule, say } };
}

/** The suspects level with the likeliest; none while all are as they were before the first check. */
function likeliestOf(suspects: readonly Suspect[], findings: readonly Finding[]): string[] {
  const ranked = posterior(suspects, findings);
  const top = ranked[0];
  if (top === undefined || ranked.every((r) => r.heard === 0)) return [];
  return ranked.filter((r) => r.share >= top.share * (1 - 1e-9)).map((r) => r.suspect.id);
}
