/** Secrets of a development server, made once and kept, so that sessions and signatures outlive a restart. */
import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';

import { makeSigningKey } from '@/server/config';

export type DevKeys = { SESSION_SECRET: string; SIGNING_KEY: string };

/** The values for SESSION_SECRET and SIGNING_KEY kept at `path`; makes the file when it is not there. */
export function devKeys(path: string): DevKeys {
  if (existsSync(path)) return JSON.parse(readFileSync(path, 'utf8')) as DevKeys;
  const keys: DevKeys = { SESSION_SECRET: randomBytes(32).toString('base64url'), SIGNING_KEY: JSON.stringify(makeSigningKey()) };
  mkdirSync(dirname(path), { recursive: true });
  writeFileSync(path, `${JSON.stringify(keys)}\n`, { mode: 0o600 });
  return keys;
}
