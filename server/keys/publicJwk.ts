/** The public half of the server's signing key. */
import { calculateJwkThumbprint } from 'jose';

import type { SigningKey } from '../config';

/** With its RFC 7638 thumbprint as its name, so that the same key has the same name everywhere. */
export async function publicJwk(key: SigningKey): Promise<{ kty: string; crv: string; x: string; kid: string; alg: string; use: string }> {
  const { kty, crv, x } = key;
  return { kty, crv, x, kid: await calculateJwkThumbprint({ kty, crv, x }), alg: 'EdDSA', use: 'sig' };
}
