/** Who is asked at a hold point, and for what. Pure. */
import type { PowerKind } from '@/flows/facts/facts';
import { powerKind } from '@/flows/facts/power';
import type { Program } from '@/flows/machine/compile';
import type { RunView } from '@/flows/machine/view';
import type { RunBundle } from '@/shared/contract/runs';

const KINDS: Readonly<Record<PowerKind, string>> = {
  bench: 'the first power from a bench supply',
  limited: 'the first limited mains power',
  full: 'the first full mains power',
  boards: 'the first power with boards fitted',
};

/** What the senior is asked. */
export function holdAsks(view: RunView, { layout }: Program): string {
  const { step } = view;
  if (step?.kind === 'hold') return step.asks;
  if (step?.kind === 'energise' || step?.kind === 'raise')
    return `A senior has to countersign ${KINDS[powerKind(step, layout.profile, layout.settings)]} of this run before it goes on.`;
  return 'A senior has to countersign before this run goes on.';
}

/** The seniors of the workshop who never led this run, by name. */
export function seniorsFor({ people, run }: Pick<RunBundle, 'people' | 'run'>): string {
  const names = people.filter((p) => p.roles.includes('senior') && p.id !== run.restorer && !run.former.includes(p.id)).map((p) => p.name);
  if (names.length === 0) return 'This workshop has no other senior: nobody can countersign. Stop, and ask the keeper.';
  return `${names.length === 1 ? names[0] : `${names.slice(0, -1).join(', ')} or ${names.at(-1) ?? ''}`}, on their own device and by letter.`;
}
