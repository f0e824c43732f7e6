/** The steps of the tree as a way that has been walked. Pure. */
import type { PowerBandState } from '@/flows/facts/band';
import type { Layout } from '@/flows/machine/program';
import type { Account } from '@/shared/ui/hooks/play';
import type { StudState } from '@/shared/ui/components/StepStud';

export interface WayStep {
  key: string;
  stud: string;
  title: string;
  state: StudState;
  /** the power in which it was left, or null where the run has not been */
  band: PowerBandState | null;
}

/** Every step of the tree that a person meets, in its order; a call stands for all that is in it. */
export function wayOf(layout: Layout, account: Account, current: string): WayStep[] {
  const at = layout.steps.get(current)?.top ?? current;
  return [...layout.steps.values()].flatMap((placed): WayStep[] => {
    const { key, step, stud, caller, builtIn } = placed;
    if (builtIn || caller !== null || step.kind === 'end') return [];
    const inside = [...account.bands].filter(([k]) => k === key || layout.steps.get(k)?.top === key);
    const band = inside.at(-1)?.[1] ?? null;
    return [{ key, stud, title: step.title, band, state: key === at ? 'now' : band === null ? 'ahead' : 'done' }];
  });
}
