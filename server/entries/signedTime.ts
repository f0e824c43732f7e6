/** Events that a person signs on the server, put into the clock of the restorer's device. */
import type { RunHeadRow } from '@/db/tables';
import type { RunState } from '@/flows/machine/advance';

/**
 * Time of an event that the server brings in. The engine compares times of one device only, so it is the device's last time and what
 * has passed on the server since that was received.
 */
export function signedTime(state: RunState, head: Pick<RunHeadRow, 'heard_at'>, now: number): { at: number; monotonic: number; boot: string } {
  const { at, monotonic, boot } = state.context.last;
  const passed = Math.max(0, now - head.heard_at.getTime());
  return { at: at + passed, monotonic: Math.round(monotonic + passed), boot: boot === '' ? 'server' : boot };
}
