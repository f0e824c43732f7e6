/** What a tree is for, as a workshop looks for it. */
import type { Tree } from './tree';

export const PURPOSES = {
  checks: 'Checks without power',
  'bring-up': 'Bringing it up',
  'fault-finding': 'Finding a fault',
} as const;
export type Purpose = keyof typeof PURPOSES;
export const PURPOSE_IDS = Object.keys(PURPOSES) as [Purpose, ...Purpose[]];

/** What its author says it is for; else what it does: no power, the supply proved or the machine in service, or a fault found. */
export function purposeOf(tree: Pick<Tree, 'purpose' | 'steps'>): Purpose {
  if (tree.purpose !== undefined) return tree.purpose;
  if (!tree.steps.some((s) => s.kind === 'energise' || s.kind === 'raise')) return 'checks';
  return tree.steps.some((s) => s.kind === 'end' && (s.says === 'supply-proven' || s.says === 'in-service')) ? 'bring-up' : 'fault-finding';
}
