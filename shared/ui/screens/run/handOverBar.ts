/** Why a run cannot be handed over now. Pure. */
import type { Saved } from '@/shared/ui/api/outbox';

interface Now {
  live: boolean;
  /** as the browser says it; true where it does not know */
  online: boolean;
  saved: Pick<Saved, 'waiting' | 'trouble'>;
}

/** A sentence, or null where nothing bars it. */
export function handOverBar({ live, online, saved }: Now): string | null {
  if (live) return 'The bench may be live. Press Stop, and make it safe: nobody takes over a live bench. Then the run can be handed over.';
  if (!online || saved.trouble?.code === 'no-network')
    return 'There is no network. Both of you sign on the server, so a run cannot be handed over until this device reaches it again. You can go on, or pause; nothing is lost.';
  if (saved.trouble !== null && saved.waiting > 0) return `What you answered has to reach the server first: ${saved.trouble.say}`;
  return null;
}
