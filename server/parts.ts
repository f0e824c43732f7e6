/** What the server is made of: handed down, never looked up. */
import type { Logger } from 'pino';

import type { Db } from '@/db/createDb';

import type { ObjectStore } from './adapters/objectStore';
import type { Config } from './config';
import type { ProgramCache } from './program/programCache';

/** Epoch milliseconds now; tests give their own. */
export type Clock = () => number;

export interface Parts {
  readonly db: Db;
  readonly config: Config;
  readonly clock: Clock;
  readonly log: Logger;
  readonly programs: ProgramCache;
  /** photos and papers */
  readonly objects: ObjectStore;
}
