/** Sending a photo before the entry that names it. */
import type { ClientProblem } from '@/shared/ui/api/answer';
import type { Client } from '@/shared/ui/api/client';
import type { PhotoKeep } from '@/shared/ui/api/photoKeep';

/**
 * Makes what an outbox calls before it sends an entry with a photo. Null when the server has the photo, or when this device has it no
 * more: the server then says whether it is missing.
 */
export function makeSendPhoto(client: Pick<Client, 'upload'>, keep: PhotoKeep, run: string): (hash: string) => Promise<ClientProblem | null> {
  const known = new Set<string>();
  return async (hash) => {
    if (known.has(hash)) return null;
    const photo = await keep.get(hash);
    if (photo === null) return null;
    const answer = await client.upload('addFile', { query: { run, as: 'photo' } }, photo);
    if (answer.kind === 'problem') return answer;
    known.add(hash);
    await keep.drop(hash);
    return null;
  };
}
