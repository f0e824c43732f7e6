/** A tree rehearsed: every suspect played through it, with no machine on the bench. */
import type { Suspect, Tree } from '../document/tree';
import { classesOf } from '../evidence/groups';
import { legsOf, reachedFrom } from '../evidence/paths';
import { sureOutcomes } from '../evidence/sureExits';
import type { Program } from '../machine/compile';
import { play } from './play';
import type { Play } from './play';

/**
 * `verdict`: the tree names or mends the suspect itself. `group`: it ends among the likeliest, or a suspect is named that the tree cannot tell from it.
 * `missed`: neither.
 */
export type Reached = 'verdict' | 'group' | 'missed';

export interface Rehearsed extends Omit<Play, 'findings'> {
  suspect: string;
  /** share of the prior, 0 to 1 */
  share: number;
  reached: Reached;
  /** the other suspects among which it stays, where it is a group */
  among: string[];
}

export interface Rehearsal {
  /** false where a suspect is missed or a run does not come to an end */
  good: boolean;
  suspects: Rehearsed[];
  /** the tree on a machine without a fault */
  sound: Omit<Play, 'findings'>;
  /** shares of the prior that reach a verdict, a group, or neither */
  coverage: Record<Reached, number>;
  minutes: { expected: number; worst: number; worstSuspect: string | null };
  minutesLive: { expected: number; worst: number };
  /** steps of the tree itself that no suspect, no sound machine and no unsure answer comes to, in its order */
  neverUsed: string[];
  /** steps that only an unsure answer comes to */
  onlyWhenUnsure: string[];
}

/** Rehearses every suspect of the tree, or only the one that is named. Minutes are weighted by the prior. */
export function rehearse(program: Program, only?: string): Rehearsal {
  const { tree } = program.layout;
  const total = tree.suspects.reduce((sum, s) => sum + s.prior, 0);
  const alike = classesOf(tree);
  const chosen = tree.suspects.filter((s) => only === undefined || s.id === only);
  const sound = withEnd(program, play(program, null));
  const suspects = chosen.map((suspect) => judge(suspect, suspect.prior / total, withEnd(program, play(program, suspect)), alike));
  const weight = suspects.reduce((sum, s) => sum + s.share, 0) || 1;
  const mean = (of: (s: Rehearsed) => number) => suspects.reduce((sum, s) => sum + (s.share / weight) * of(s), 0);
  const worst = suspects.reduce<Rehearsed | null>((most, s) => (most === null || s.minutes > most.minutes ? s : most), null);
  const used = new Set([sound, ...suspects].flatMap((p) => [...p.path, ...(p.end?.key == null ? [] : [p.end.key])]).flatMap((key) => [key, key.split('/')[0] ?? key]));
  const unsure = afterDoubt(tree, used);
  const share = (reached: Reached) => mean((s) => (s.reached === reached ? 1 : 0));
  return {
    good: sound.stuck === null && suspects.every((s) => s.reached !== 'missed' && s.stuck === null),
    suspects,
    sound: bare(sound),
    coverage: { verdict: share('verdict'), group: share('group'), missed: share('missed') },
    minutes: { expected: mean((s) => s.minutes), worst: worst?.minutes ?? 0, worstSuspect: worst?.suspect ?? null },
    minutesLive: { expected: mean((s) => s.minutesLive), worst: suspects.reduce((most, s) => Math.max(most, s.minutesLive), 0) },
    neverUsed: tree.steps.filter((s) => !used.has(s.id) && !unsure.has(s.id)).map((s) => s.id),
    onlyWhenUnsure: tree.steps.filter((s) => !used.has(s.id) && unsure.has(s.id)).map((s) => s.id),
  };
}

function judge(suspect: Suspect, share: number, played: Play, alike: readonly (readonly Suspect[])[]): Rehearsed {
  const { id } = suspect;
  const twins = (alike.find((group) => group.some((s) => s.id === id)) ?? []).map((s) => s.id);
  const named = played.end?.suspect ?? null;
  const found = played.stuck === null && (played.mended || named === id);
  const inGroup = played.stuck === null && (named === null ? twins.some((twin) => played.likeliest.includes(twin)) : twins.includes(named));
  const reached = found ? 'verdict' : inGroup ? 'group' : 'missed';
  const among = reached === 'group' ? [...new Set([...twins, ...(named === null ? played.likeliest : [named])])].filter((s) => s !== id) : [];
  return { suspect: id, share, reached, among, ...bare(played) };
}

function withEnd(program: Program, played: Play): Play {
  const step = played.end?.key == null ? undefined : program.layout.steps.get(played.end.key)?.step;
  return played.end === null || step?.kind !== 'end' ? played : { ...played, end: { ...played.end, suspect: step.suspect ?? null } };
}

function bare({ path, end, mended, likeliest, minutes, minutesLive, stuck }: Play): Omit<Play, 'findings'> {
  return { path, end, mended, likeliest, minutes, minutesLive, stuck };
}

/** Steps to which an unsure answer at one of the used steps leads, directly or by way of others. */
function afterDoubt(tree: Tree, used: ReadonlySet<string>): Set<string> {
  const doubts = tree.steps.filter((s) => used.has(s.id)).flatMap((s) => legsOf(s).filter(({ exit }) => sureOutcomes(exit).length < exit.on.length).map((leg) => leg.to));
  return new Set(reachedFrom(tree, [...new Set(doubts)]).keys());
}
