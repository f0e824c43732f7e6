/** What differs in one step that both versions have. */
import { SHOWN } from '../document/outcomes';
import type { Exit, Step } from '../document/steps';
import { same, shown } from './change';
import type { Change, Risk } from './change';

type Field = { what: Change['what']; risk: Risk; name: string };

const WORDS: Field = { what: 'reworded', risk: 'text', name: '' };
/** How each key of a step is called and how far a change of it reaches. What is not named here reaches furthest. */
const FIELDS: Record<string, Field> = {
  title: { ...WORDS, name: 'title' },
  lines: { ...WORDS, name: 'instruction' },
  expect: { ...WORDS, name: 'what you will see' },
  why: { ...WORDS, name: 'why' },
  asks: { ...WORDS, name: 'question' },
  of: { ...WORDS, name: 'subject of the photo' },
  figure: { ...WORDS, name: 'figure' },
  replace: { ...WORDS, name: 'what to replace' },
  retest: { ...WORDS, name: 'what to re-test' },
  limit: { what: 'limit', risk: 'limit', name: 'limit' },
  minutes: { what: 'limit', risk: 'text', name: 'expected minutes' },
  holdMinutes: { what: 'limit', risk: 'limit', name: 'minutes of the soak' },
  everyMinutes: { what: 'limit', risk: 'limit', name: 'minutes between readings' },
  quantity: { what: 'limit', risk: 'limit', name: 'quantity' },
  points: { what: 'limit', risk: 'limit', name: 'points' },
  each: { what: 'limit', risk: 'limit', name: 'rows' },
  level: { what: 'limit', risk: 'energy', name: 'level of proving' },
  workings: { what: 'limit', risk: 'limit', name: 'workings' },
  toolOhms: { what: 'limit', risk: 'energy', name: 'ohms of the discharge tool' },
  toolWatts: { what: 'limit', risk: 'energy', name: 'watts of the discharge tool' },
  ceilingVolts: { what: 'limit', risk: 'energy', name: 'most volts of the trip test' },
  mostVolts: { what: 'power', risk: 'energy', name: 'most volts' },
  mostAmps: { what: 'power', risk: 'energy', name: 'most amps' },
  longestMinutes: { what: 'power', risk: 'energy', name: 'longest time' },
  lampWatts: { what: 'power', risk: 'energy', name: 'lamp' },
  through: { what: 'power', risk: 'energy', name: 'way of the power' },
  source: { what: 'power', risk: 'energy', name: 'source' },
  node: { what: 'power', risk: 'energy', name: 'where the power goes in' },
  load: { what: 'power', risk: 'energy', name: 'load' },
  abort: { what: 'power', risk: 'energy', name: 'abort' },
  power: { what: 'power', risk: 'energy', name: 'live or dead' },
  contact: { what: 'power', risk: 'energy', name: 'contact' },
  probe: { what: 'power', risk: 'energy', name: 'how the probe gets there' },
  tools: { what: 'opening', risk: 'text', name: 'tools' },
  suspect: { what: 'suspect', risk: 'order', name: 'suspect that it names' },
  suspects: { what: 'suspect', risk: 'order', name: 'suspects worked on' },
  replaces: { what: 'suspect', risk: 'order', name: 'parts replaced' },
  confirms: { what: 'power', risk: 'energy', name: 'test conditions that are confirmed' },
  asInService: { what: 'power', risk: 'energy', name: 'test conditions' },
  opens: { what: 'other', risk: 'energy', name: 'part that is opened' },
  cannotBeUndone: { what: 'other', risk: 'order', name: 'mark “cannot be undone”' },
};

/** All differences of a step, exits and their evidence included. */
export function stepChanges(older: Step, newer: Step): Change[] {
  const { id } = newer;
  if (older.kind !== newer.kind) return [{ what: 'other', step: id, risk: 'energy', say: `“${newer.title}” is now ${newer.kind}, it was ${older.kind}.` }, ...exitChanges(older, newer)];
  const keys = [...new Set([...Object.keys(older), ...Object.keys(newer)])].filter((k) => k !== 'id' && k !== 'kind' && k !== 'exits');
  const fields = keys.flatMap((key): Change[] => {
    const [was, is] = [(older as Record<string, unknown>)[key], (newer as Record<string, unknown>)[key]];
    if (same(was, is)) return [];
    const field = FIELDS[key] ?? { what: 'other', risk: 'energy', name: key };
    return [{ what: field.what, step: id, risk: field.risk, say: `“${newer.title}”: ${field.name} is now ${shown(is)}, it was ${shown(was)}.` }];
  });
  return [...fields, ...exitChanges(older, newer)];
}

/** Where each answer leads, and what it says of suspects: told by answer, so that exits put together or parted differently are no change by themselves. */
function exitChanges(older: Step, newer: Step): Change[] {
  const { id, title } = newer;
  const [before, after] = [byAnswer(older), byAnswer(newer)];
  const changes: Change[] = [];
  const add = (what: Change['what'], risk: Risk, say: string) => changes.push({ what, step: id, risk, say: `“${title}”: ${say}` });
  for (const answer of new Set([...before.keys(), ...after.keys()])) {
    const [was, is] = [before.get(answer), after.get(answer)];
    const name = labelOf(is ?? was, answer);
    if (is === undefined || was === undefined) {
      add('exit', 'order', is === undefined ? `the answer ${name} is gone.` : `there is a new answer ${name}, to ${is.to}.`);
      continue;
    }
    if (was.to !== is.to) add('exit', 'order', `${name} now leads to ${is.to}, not to ${was.to}.`);
    if (was.then !== is.then || was.atMost !== is.atMost) add('exit', 'order', `${name} is now ${countOf(is)}, it was ${countOf(was)}.`);
    if (was.verdict !== is.verdict) add('exit', 'order', `${name} is now judged ${is.verdict ?? 'as usual'}, it was ${was.verdict ?? 'as usual'}.`);
    if (was.shows !== is.shows) add('evidence', 'order', `${name} now shows ${shownAs(is)}, before: ${shownAs(was)}.`);
    if (was.label !== is.label || was.reason !== is.reason) add('reworded', 'text', `the words of ${name} have changed.`);
    changes.push(...evidenceChanges(was, is).map(({ say, risk }): Change => ({ what: 'evidence', step: id, risk, say: `“${title}”: ${name} ${say}` })));
  }
  return changes;
}

function evidenceChanges(was: Exit, is: Exit): { say: string; risk: Risk }[] {
  const said = (exit: Exit) => new Map((exit.evidence ?? []).map((e) => [e.suspect, e.says]));
  const [before, after] = [said(was), said(is)];
  return [...new Set([...before.keys(), ...after.keys()])].flatMap((suspect) => {
    const [then, now] = [before.get(suspect) ?? 'says-nothing', after.get(suspect) ?? 'says-nothing'];
    // what clears a suspect also clears it as a killer, before power
    return then === now ? [] : [{ say: `now ${now.replaceAll('-', ' ')} ${suspect}, before: ${then.replaceAll('-', ' ')}.`, risk: 'order' as const }];
  });
}

function byAnswer(step: Step): Map<string, Exit> {
  return new Map(step.exits.flatMap((exit: Exit) => (exit.on as string[]).map((on): [string, Exit] => [on === 'answer' ? `answer ${exit.id}` : on, exit])));
}

function labelOf(exit: Exit | undefined, answer: string): string {
  return answer.startsWith('answer ') ? `“${exit?.label ?? answer.slice(7)}”` : `“${answer}”`;
}

function shownAs(exit: Exit): string {
  return exit.shows === undefined ? 'nothing of a part' : SHOWN[exit.shows].name.toLowerCase();
}

function countOf(exit: Exit): string {
  return exit.atMost === undefined ? 'not counted' : `counted, ${exit.atMost} times and then to ${exit.then ?? ''}`;
}
