/** Keeping a file: cleaned, named by its content, stored before the database names it. */
import { createHash } from 'node:crypto';

import { inWorkshop } from '@/db/createDb';
import type { FileRow } from '@/db/tables';
import type { KeptFile } from '@/shared/contract/files';

import type { Parts } from '../parts';
import { ProblemError } from '../problems';
import { getRunFor } from '../runs/access';
import type { SignedIn } from '../session/access';
import { wantMayAdd } from './access';
import { cleanPhoto } from './cleanPhoto';
import { mediaOf } from './mediaOf';
import { insertFile } from './queries';

/** Place of a file in the object store. */
export const keyOf = (workshop: string, hash: string, size: 'full' | 'small'): string => `${workshop}/${hash}${size === 'small' ? '-small' : ''}`;

interface Cleaned {
  readonly bytes: Buffer;
  readonly hash: string;
  readonly media: FileRow['media'];
  readonly width: number | null;
  readonly height: number | null;
  readonly small: Buffer | null;
}

/** Refuses who may not add before a byte is read. */
export async function wantMayAddTo(parts: Parts, who: SignedIn, run: string | undefined): Promise<void> {
  wantMayAdd(who, run === undefined ? null : await inWorkshop(parts.db, who.workshop, (tx) => getRunFor(tx, run)));
}

/** Keeps what was sent. Sending it again is answered as the first time. */
export async function keepFile(parts: Parts, who: SignedIn, sent: Buffer, { run, as }: { run?: string | undefined; as: 'photo' | 'paper' }): Promise<KeptFile> {
  const file = await clean(sent, as);
  const { workshop } = who;
  await parts.objects.put(keyOf(workshop, file.hash, 'full'), file.bytes, file.media);
  if (file.small !== null) await parts.objects.put(keyOf(workshop, file.hash, 'small'), file.small, file.media);
  const { hash, media, width, height } = file;
  const bytes = file.bytes.length;
  await inWorkshop(parts.db, workshop, async (tx) => {
    // asked again: the run may have been closed while the photo came in
    wantMayAdd(who, run === undefined ? null : await getRunFor(tx, run));
    await insertFile(tx, { workshop, hash, media, bytes, width, height, added_at: new Date(parts.clock()) }, { run: run ?? null, addedBy: who.person });
  });
  return { hash, media, bytes, width, height };
}

async function clean(sent: Buffer, as: 'photo' | 'paper'): Promise<Cleaned> {
  if (as === 'paper' && mediaOf(sent) === 'pdf') {
    if (!sent.subarray(-1024).includes('%%EOF')) throw new ProblemError('bad-file', 'This PDF is not whole: its end is missing.');
    return { bytes: sent, hash: createHash('sha256').update(sent).digest('hex'), media: 'application/pdf', width: null, height: null, small: null };
  }
  return { ...(await cleanPhoto(sent)), media: 'image/jpeg' };
}
