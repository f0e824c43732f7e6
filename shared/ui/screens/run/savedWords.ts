/** Where the answers of a run are, in words. Pure. */
import type { Saved } from '@/shared/ui/api/outbox';

/** `all saved`, `3 answers wait to be sent`, and why. */
export function savedWords({ waiting, trouble, onDevice }: Pick<Saved, 'waiting' | 'trouble' | 'onDevice'>): string {
  if (waiting === 0) return onDevice ? 'all saved' : 'all saved; this browser keeps nothing itself';
  const wait = waiting === 1 ? '1 answer waits to be sent' : `${waiting} answers wait to be sent`;
  if (trouble === null) return wait;
  switch (trouble.code) {
    case 'no-network':
      return `${wait}: no network`;
    case 'signed-out':
    case 'session-expired':
      return `${wait}: sign in again`;
    default:
      return `${wait}: ${trouble.say}`;
  }
}
