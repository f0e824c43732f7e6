/** The part of the package that the fake uses; it brings no types of its own. */
declare module 's3rver' {
  import type { Server } from 'node:http';
  import type { AddressInfo } from 'node:net';

  export default class S3rver {
    constructor(options: { address: string; port: number; directory: string; silent: boolean; configureBuckets: readonly { name: string }[] });
    readonly store: { putBucket(name: string): Promise<unknown> };
    readonly httpServer: Server;
    run(): Promise<AddressInfo>;
    close(): Promise<void>;
  }
}
