/** Keeping bytes in a store that speaks the S3 protocol. */
import type { Readable } from 'node:stream';

import type { S3Client } from '@aws-sdk/client-s3';

import type { Config } from '../config';

export interface StoredBytes {
  readonly stream: Readable;
  /** bytes that the stream will give */
  readonly length: number;
}

/** First and last byte, both counted in. */
export interface ByteRange {
  readonly from: number;
  readonly to: number;
}

export interface ObjectStore {
  /** Resolves when the bytes are kept; putting the same key again with the same bytes is harmless. */
  put(key: string, bytes: Buffer, media: string): Promise<void>;
  /** The bytes, or null when the store has no such key. */
  get(key: string, range?: ByteRange): Promise<StoredBytes | null>;
  close(): void;
}

type StoreConfig = Pick<Config, 'objectStore'>;

/**
 * The store of the configuration. The package is loaded at the first use, so that tests and commands that touch no file do not pay
 * for it. Without a configuration every call throws.
 */
export function createObjectStore({ objectStore }: StoreConfig): ObjectStore {
  let opened: Promise<S3Client> | undefined;
  const open = () => (opened ??= openClient(objectStore));
  const bucket = objectStore?.bucket ?? '';
  return {
    async put(key, bytes, media) {
      const [client, { PutObjectCommand }] = [await open(), await import('@aws-sdk/client-s3')];
      await client.send(new PutObjectCommand({ Bucket: bucket, Key: key, Body: bytes, ContentType: media, ContentLength: bytes.length }));
    },
    async get(key, range) {
      const [client, { GetObjectCommand, NoSuchKey }] = [await open(), await import('@aws-sdk/client-s3')];
      try {
        const found = await client.send(new GetObjectCommand({ Bucket: bucket, Key: key, ...(range === undefined ? {} : { Range: `bytes=${String(range.from)}-${String(range.to)}` }) }));
        if (found.Body === undefined) return null;
        return { stream: found.Body as Readable, length: found.ContentLength ?? 0 };
      } catch (error) {
        if (error instanceof NoSuchKey) return null;
        throw error;
      }
    },
    close() {
      void opened?.then((client) => client.destroy());
    },
  };
}

async function openClient(store: Config['objectStore']): Promise<S3Client> {
  if (store === null) throw new Error('S3_BUCKET is not set: there is no place for files');
  // the package's notice about future versions of Node.js is for whoever updates it, not for the log of a workshop
  process.env['AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED'] = 'true';
  const { S3Client: Client } = await import('@aws-sdk/client-s3');
  const { endpoint, region, accessKey, secretKey } = store;
  return new Client({
    region,
    ...(endpoint === null ? {} : { endpoint, forcePathStyle: true }),
    ...(accessKey === null || secretKey === null ? {} : { credentials: { accessKeyId: accessKey, secretAccessKey: secretKey } }),
    // Stores other than the first of their kind take no checksum that they were not asked for.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    maxAttempts: 3,
  });
}
