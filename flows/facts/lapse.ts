/** What lapses when nobody can say any more that it is so (C11), and what the next restorer reads back. Beside a step, the only cause of a change. */
import type { Facts } from './facts';
import type { Op } from './ops';
import { fitVoids } from './voids';

/** Why something lapses: 30 minutes; a clock, a pause or a page that leaves a gap; somebody else at the bench; more than 8 hours. */
export type LapseCause = 'time' | 'gap' | 'hand-over' | 'long-gap';

/** More than this without an event and the bench is opened anew, load and fitted read back. */
export const LONG_GAP_MS = 8 * 3_600_000;

/** The changes that a lapse makes. All are for the worse. */
export function lapseOps(cause: LapseCause): Op[] {
  const stored: Op = { op: 'stored-lapses' };
  if (cause === 'time') return [stored];
  const gap: Op[] = [stored, { op: 'sources', to: 'lapsed' }];
  if (cause === 'gap') return gap;
  // a countersign of the first power was for the one who was led then
  return cause === 'long-gap' ? [...gap, { op: 'opened-lapses' }] : [...gap, { op: 'opened-lapses' }, { op: 'powered-void' }];
}

/** The row of a read-back that asks for the load. */
export const LOAD_ROW = 'load';

/**
 * What follows from a read-back that does not bear out the record: the load counts as boards, the area of a thing that is not as it was
 * written is void, and a doubt that nothing lifts stays owed.
 * @param denied rows that were not answered with a plain yes: `load`, or the id of a thing
 * @param check the name under which the doubt is owed
 */
export function readBackOps(facts: Facts, denied: readonly string[], check: string): Op[] {
  const things = facts.fitted.filter((thing) => denied.includes(thing.id));
  return [...(denied.includes(LOAD_ROW) ? [{ op: 'load', to: 'boards' } satisfies Op] : []), ...things.flatMap((thing) => fitVoids(thing.area)), { op: 'doubt', check }];
}
