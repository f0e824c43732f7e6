/** When the guard sends somebody to the door, and with which way back. */
import type { ClientProblemCode } from '@/shared/ui/api/answer';

/**
 * The address of the sign-in page with the way back in it, or null where the person may stay.
 * @param code problem of asking who is signed in, or null
 * @param search of the address, with its question mark
 */
export function doorFor(code: ClientProblemCode | null, pathname: string, search: string): string | null {
  if (code !== 'signed-out' && code !== 'session-expired') return null;
  const from = new URLSearchParams({ from: `${pathname}${search}` });
  if (code === 'session-expired') from.set('expired', '1');
  return `/sign-in?${from.toString()}`;
}
