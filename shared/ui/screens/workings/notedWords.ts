/** What has become of a note, in words. */
import type { Saved } from '@/shared/ui/api/outbox';

/**
 * Where the note is now.
 * @param machine of the run in whose record it belongs
 */
export function notedWords(machine: string, saved: Pick<Saved, 'waiting' | 'notTaken'> | null): string {
  const refused = saved?.notTaken.at(-1)?.notTaken;
  if (refused !== undefined && refused !== null) return `The note was not taken into the record of ${machine}: ${refused.say}`;
  if (saved !== null && saved.waiting === 0) return `Noted in the record of ${machine}.`;
  return `Noted on this device for the record of ${machine}. It is sent when the network allows, at the latest when that run is opened again.`;
}
