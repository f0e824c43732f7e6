/** The clocks of this device, as events carry them. */
import { v4 } from 'uuid';

import type { MachineEvent } from '@/flows/machine/events';

type Bare<E> = E extends MachineEvent ? Omit<E, 'at' | 'monotonic' | 'boot'> : never;
/** An event before it has its time. */
export type BareEvent = Bare<MachineEvent>;

/** Changes with each load of the page: what was known of the bench before a load counts no more. */
export const BOOT = v4();

/** Whole milliseconds of the clock that never goes back. */
export function steadyMs(): number {
  return Math.round(performance.now());
}

/** Puts wall time, steady time and the load of the page on an event. */
export function stamp(event: BareEvent): MachineEvent {
  return { ...event, at: Date.now(), monotonic: steadyMs(), boot: BOOT } as MachineEvent;
}
