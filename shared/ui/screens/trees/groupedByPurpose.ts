/** Trees under what they are for, in the order in which a machine meets them. Pure. */
import { PURPOSE_IDS, PURPOSES } from '@/flows/document/purpose';
import type { Purpose } from '@/flows/document/purpose';

export interface PurposeGroup<T> {
  purpose: Purpose;
  name: string;
  /** by title */
  trees: T[];
}

/** Groups that have a tree; a title of its own order inside each. */
export function groupedByPurpose<T extends { purpose: Purpose; title: string }>(trees: readonly T[]): PurposeGroup<T>[] {
  return PURPOSE_IDS.map((purpose) => ({
    purpose,
    name: PURPOSES[purpose],
    trees: trees.filter((t) => t.purpose === purpose).sort((a, b) => a.title.localeCompare(b.title)),
  })).filter((group) => group.trees.length > 0);
}
