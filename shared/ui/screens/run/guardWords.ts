/** What is looked at and told before power. Pure. */
import type { Profile } from '@/flows/document/profile';
import type { Load } from '@/flows/document/steps';
import { TEST_CONDITIONS } from '@/flows/document/testConditions';
import type { PowerStep } from '@/flows/facts/power';
import type { Program } from '@/flows/machine/compile';
import { formatDuration, formatQuantity } from '@/shared/quantity/formatQuantity';

const LOADS: Readonly<Record<Load, string>> = {
  boards: 'The boards are in, as the step says',
  none: 'Nothing is connected to the rails',
  light: 'The light dummy load is on every rail',
  full: 'The full dummy load is on every rail',
};

/** Each ticked by hand. */
export function guardChecks(step: PowerStep, profile: Profile): { id: string; label: string }[] {
  const guarded =
    profile.mains.protection === 'rcd' ? 'through the RCD tried today' : 'through its isolating transformer, this one load only';
  return [
    { id: 'clear', label: 'Hands and tools are clear of the machine' },
    { id: 'load', label: step.node === 'part' ? 'Only the part itself is fed; its lead is lifted' : LOADS[step.load] },
    ...(step.asInService ?? []).map((id) => ({ id, label: TEST_CONDITIONS[id].name })),
    {
      id: 'told',
      label: step.node === 'inlet' ? `Everybody here has been told; the plug goes in ${guarded}` : 'Everybody here has been told',
    },
  ];
}

/** Most amps, longest time, and where breaking off leads. */
export function guardTold(step: PowerStep, { layout }: Program): string {
  const minutes = formatDuration(step.longestMinutes * 60);
  const abort = layout.steps.get(step.abort)?.step.title ?? 'isolate';
  return `At most ${formatQuantity(step.mostAmps, 'A', { digits: 3 })}, for ${minutes} at the longest. To break off: Stop, or “${abort}”.`;
}
