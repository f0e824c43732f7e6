/** A draft as a fault tree that an author goes on with: one observation a check, with its answers and their evidence. */
import type { Exit, Step } from '../document/steps';
import type { Tree } from '../document/tree';
import type { Draft, DraftNode } from './draft';
import type { CheckTable } from './table';

/** Most words of evidence that one exit may carry. */
const MOST_EVIDENCE = 64;
const ID_LENGTH = 40;

/**
 * The tree document of a draft, `format: 1`. It says in which order to ask; what each check needs, whether it is made dead or live, and what is on the opening list is the author's
 * to fill in, and the proof holds the tree back until it is.
 */
export function draftTree(table: CheckTable, { root }: Draft, head: { id: string; symptom: string }): Tree {
  const steps: Step[] = [];
  const ends: Step[] = [];
  const taken = new Set<string>();
  const unique = (wish: string): string => {
    for (let n = 1; ; n += 1) {
      const suffix = n === 1 ? '' : `-${n}`;
      const id = `${wish.slice(0, ID_LENGTH - suffix.length)}${suffix}`;
      if (taken.has(id)) continue;
      taken.add(id);
      return id;
    }
  };
  const refer = unique('ask-a-senior');
  const found = new Map<string, string>();
  const place = (node: DraftNode): string => {
    if ('suspects' in node) {
      const name = node.suspects.map((s) => s.id).join(' ');
      const known = found.get(name);
      if (known !== undefined) return known;
      const id = unique(node.suspects.length === 1 ? `is-${name}` : 'one-of-several');
      found.set(name, id);
      ends.push(endFor(table, id, node.suspects.map((s) => s.id)));
      return id;
    }
    const id = unique(node.check);
    const at = steps.length;
    const check = table.checks.findIndex((c) => c.id === node.check);
    // kept in its place before what follows it
    steps.push(observation(table, check, id, [], refer));
    const to = new Map(node.answers.map(({ answer, next }) => [answer, place(next)]));
    steps[at] = observation(table, check, id, exitsFor(table, check, to, refer, suspectsOf(node)), refer);
    return id;
  };
  place(root);
  ends.push(end(refer, 'Ask a senior', ['Nothing in the table gives this answer, or it is not sure.', 'Ask a senior.'], { says: 'referred' }));
  return {
    format: 1,
    id: head.id,
    title: table.title,
    symptom: head.symptom,
    appliesTo: { protectiveClasses: ['I', 'II'], supplyKinds: ['linear', 'switched-from-raw', 'switch-mode'], fewestRails: 1, mostRails: 16 },
    needsAtStart: [],
    opening: { tools: [], instruments: [], parts: [], conditions: [] },
    suspects: table.suspects.map((s) => ({ ...s, killedBy: [] })),
    steps: [...steps, ...ends],
    reentries: [],
  };
}

function observation(table: CheckTable, check: number, id: string, exits: Exit[], refer: string): Step {
  const { title, minutes } = table.checks[check] ?? { title: id, minutes: 1 };
  const unsure: Exit = { id: 'unsure-of-it', on: ['not-sure', 'cannot'], to: refer };
  return { id, kind: 'observe', title, lines: [`${title}.`], contact: 'none', tools: [], minutes, hazards: [], asks: title, exits: [...exits, unsure] };
}

/** An exit for each answer of the check, also for those that no suspect here would give. */
function exitsFor(table: CheckTable, check: number, to: ReadonlyMap<string, string>, refer: string, here: ReadonlySet<string>): Exit[] {
  return (table.checks[check]?.answers ?? []).map((answer): Exit => {
    const evidence = table.suspects.flatMap((suspect, i) => {
      const cell = table.cells[i]?.[check] ?? null;
      return cell === null || !here.has(suspect.id) ? [] : [{ suspect: suspect.id, says: cell === answer.id ? ('points-to' as const) : ('points-away' as const) }];
    });
    // what points to a suspect comes first where there is no room for all
    const kept = [...evidence].sort((a, b) => Number(b.says === 'points-to') - Number(a.says === 'points-to')).slice(0, MOST_EVIDENCE);
    return { id: answer.id, label: answer.label, on: ['answer'], to: to.get(answer.id) ?? refer, ...(kept.length === 0 ? {} : { evidence: kept }) };
  });
}

function suspectsOf(node: DraftNode): Set<string> {
  return 'suspects' in node ? new Set(node.suspects.map((s) => s.id)) : new Set(node.answers.flatMap((a) => [...suspectsOf(a.next)]));
}

function endFor(table: CheckTable, id: string, suspects: readonly string[]): Step {
  const names = suspects.map((s) => table.suspects.find((t) => t.id === s)).map((s) => `${s?.part ?? ''}, ${s?.mode ?? ''}`);
  const [only] = suspects;
  return suspects.length === 1 && only !== undefined
    ? end(id, (names[0] ?? id).slice(0, 80), ['The checks lead to this part.'], { says: 'fault-found', suspect: only, retest: 'The check that found it.' })
    : end(id, 'One of several', [`No check tells these apart: ${names.join('; ')}`.slice(0, 240)], { says: 'referred' });
}

function end(id: string, title: string, lines: string[], says: Pick<Extract<Step, { kind: 'end' }>, 'says' | 'suspect' | 'retest'>): Step {
  return { id, kind: 'end', title, lines, contact: 'none', tools: [], minutes: 0, hazards: [], exits: [], ...says };
}
