/** The local object store, in a folder of its own that goes with it. */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { startObjectStoreFake } from '@/server/adapters/fakes/objectStoreFake';
import type { ObjectStoreConfig } from '@/server/config';

/** Starts it; `config` is what the server's configuration takes. */
export async function openObjectStore(): Promise<{ config: ObjectStoreConfig; dir: string; stop: () => Promise<void> }> {
  const dir = mkdtempSync(join(tmpdir(), 'lampstep-objects-'));
  const fake = await startObjectStoreFake({ dir });
  return {
    dir,
    config: { bucket: fake.env.S3_BUCKET, endpoint: fake.env.S3_ENDPOINT, region: 'us-east-1', accessKey: fake.env.S3_ACCESS_KEY, secretKey: fake.env.S3_SECRET_KEY },
    stop: async () => {
      await fake.stop();
      rmSync(dir, { recursive: true, force: true });
    },
  };
}
