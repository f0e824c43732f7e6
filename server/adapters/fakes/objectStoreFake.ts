/** An object store for development and tests: speaks the S3 protocol on the loopback address, keeps everything in a folder. */
import { mkdirSync } from 'node:fs';

export type ObjectStoreFake = {
  /** For the server's environment. */
  env: Record<'S3_BUCKET' | 'S3_ENDPOINT' | 'S3_ACCESS_KEY' | 'S3_SECRET_KEY', string>;
  stop(): Promise<void>;
};

const BUCKET = 'lampstep';
/** The one key and secret that the fake knows. */
const KEY = 'S3RVER';

/** Starts the fake (`port` 0: any free one); objects lie under `dir`. */
export async function startObjectStoreFake({ dir, port = 0 }: { dir: string; port?: number }): Promise<ObjectStoreFake> {
  mkdirSync(dir, { recursive: true });
  // loaded here, so that production, which never calls this, needs no such package
  const { default: S3rver } = await import('s3rver');
  const fake = new S3rver({ address: '127.0.0.1', port, directory: dir, silent: true, configureBuckets: [] });
  await fake.store.putBucket(BUCKET);
  const address = await fake.run();
  return {
    env: { S3_BUCKET: BUCKET, S3_ENDPOINT: `http://127.0.0.1:${String(address.port)}`, S3_ACCESS_KEY: KEY, S3_SECRET_KEY: KEY },
    stop: async () => {
      fake.httpServer.closeAllConnections();
      await fake.close();
    },
  };
}
