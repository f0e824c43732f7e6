/** Ways to a live step that the older version did not have. */
import type { Step } from '../document/steps';
import type { Tree } from '../document/tree';
import { legsOf, reachedFrom, startsOf, wayTo } from '../evidence/paths';

export interface NewWay {
  /** the live step that it leads to */
  to: string;
  /** ids of the steps on a shortest way by the new leg, the live step last */
  path: string[];
  /** the leg that is new: from a step, by an answer, to another (`from` is null for a new start) */
  leg: { from: string | null; answer: string; to: string };
  say: string;
}

/**
 * Every answer of the newer version that leads where the older one's did not, can be reached, and from which a live step can be: one entry for each such leg
 * and each live step that is the first to be met behind it. `live` says which steps put power in (energise and raise, and calls of trees that do).
 */
export function newWaysToLive(older: Tree, newer: Tree, live: (step: Step) => boolean): NewWay[] {
  const steps = new Map(newer.steps.map((s) => [s.id, s]));
  const known = new Set(legNames(older));
  // told from the beginning where it can be, otherwise from a re-entry or an abort
  const fromStart = reachedFrom(newer, startsOf(newer).slice(0, 1));
  const fromAny = reachedFrom(newer);
  const title = (id: string) => `“${steps.get(id)?.title ?? id}”`;
  const ways = (leg: NewWay['leg'], lead: string[]): NewWay[] =>
    firstLive(steps, leg.to, live).map((path) => {
      const to = path.at(-1) ?? leg.to;
      const by = leg.from === null ? `A run can now begin at ${title(leg.to)}` : `By answering ${leg.answer} at ${title(leg.from)} a run now comes to ${title(leg.to)}`;
      return { to, path: [...lead, ...path], leg, say: leg.to === to ? `${by}, which is live.` : `${by}, and from there to ${title(to)}, which is live.` };
    });
  const startWays = startsOf(newer).filter((id) => !known.has(`> ${id}`)).flatMap((to) => ways({ from: null, answer: '', to }, []));
  const legWays = newer.steps.flatMap((step) => {
    const way = wayTo(fromStart, step.id) ?? wayTo(fromAny, step.id);
    if (way === null) return [];
    const lead = [...way.map((l) => l.from), step.id];
    return legNamesOf(step).filter((leg) => !known.has(`${step.id} ${leg.answer} ${leg.to}`)).flatMap((leg) => ways({ from: step.id, ...leg }, lead));
  });
  return [...startWays, ...legWays];
}

function legNames(tree: Tree): string[] {
  return [...startsOf(tree).map((id) => `> ${id}`), ...tree.steps.flatMap((s) => legNamesOf(s).map((leg) => `${s.id} ${leg.answer} ${leg.to}`))];
}

/** Legs by answer, each once. */
function legNamesOf(step: Step): { answer: string; to: string }[] {
  return legsOf(step).flatMap(({ exit, to }) => (exit.on as string[]).map((on) => ({ answer: on === 'answer' ? exit.id : on, to })));
}

/** Shortest paths from a step to each live step that can be met without passing through another one. */
function firstLive(steps: ReadonlyMap<string, Step>, from: string, live: (step: Step) => boolean): string[][] {
  const paths = new Map<string, string[]>([[from, [from]]]);
  const found: string[][] = [];
  for (const [id, path] of paths) {
    const step = steps.get(id);
    if (step === undefined) continue;
    if (live(step)) found.push(path);
    else for (const { to } of legsOf(step)) if (!paths.has(to)) paths.set(to, [...path, to]);
  }
  return found;
}
