/** A broken rule told as a story in the author's own words. */
import type { Exit } from '../document/steps';
import { verdictOf } from '../facts/effects';
import type { Need } from '../facts/needs';
import type { Layout } from '../machine/program';
import type { Edge, Start } from './graph';
import type { Leg } from './search';

const WORDS: Record<string, string> = { in: 'in', close: 'too close to say', low: 'low', high: 'high', reversed: 'reversed', falling: 'falling', 'not-sure': 'not sure', cannot: 'cannot', out: 'out', 'not-out': 'not out', done: 'done', on: 'on', given: 'given', refused: 'refused' };

/** The title of a step by its key, as its author wrote it, with the calls that it stands under. */
export function titleOf(layout: Layout, key: string): string {
  const placed = layout.steps.get(key);
  const titles = [placed?.step.title ?? key];
  for (let caller = placed?.caller ?? null; caller !== null; caller = layout.steps.get(caller)?.caller ?? null) {
    const title = layout.steps.get(caller)?.step.title;
    if (title !== undefined && title !== titles.at(-1)) titles.push(title);
  }
  return titles.join('” in “');
}

/** The answer of an edge, as the restorer would say it. */
export function answerOf(edge: Edge): string {
  const { exit } = edge;
  return exit.on.length === 1 && exit.label !== undefined ? exit.label : (WORDS[edge.outcome] ?? exit.label ?? edge.outcome);
}

/** “You could reach … with …, by answering … at ….” */
export function tellStory(layout: Layout, start: Start, legs: readonly Leg[], at: string, needs: readonly Need[]): string {
  const why = [...new Set(needs.map((n) => n.say))].join('; ');
  const telling = legs.filter((leg) => leg.edge !== null && isTelling(leg.edge));
  const last = legs.at(-1);
  const named = last !== undefined && !telling.includes(last) ? [...telling, last] : telling;
  const begin = start.reentry ? `Going on after Stop from “${titleOf(layout, start.key)}”, you` : 'You';
  const answers = named.slice(-3).map((leg) => (leg.edge === null ? `breaking the power off at “${titleOf(layout, leg.key)}”` : `answering “${answerOf(leg.edge)}” at “${titleOf(layout, leg.key)}”`));
  const by = answers.length === 0 ? '' : `, by ${answers.join(', then ')}`;
  return `${begin} could reach “${titleOf(layout, at)}” although ${why}${by}.`;
}

/** Answers worth telling: those that are not the plain way on. */
function isTelling(edge: Edge): boolean {
  return edge.spent || verdictOf(edge.exit as Exit, edge.exit.on.includes('answer') ? 'answer' : edge.outcome) !== 'pass';
}
