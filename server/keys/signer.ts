/** Signing records with the server's Ed25519 key. */
import { calculateJwkThumbprint, FlattenedSign, importJWK } from 'jose';
import type { FlattenedJWS } from 'jose';

import type { SigningKey } from '../config';

/** The public half, with the RFC 7638 thumbprint as its name. */
export async function publicJwk(key: SigningKey): Promise<{ kty: string; crv: string; x: string; kid: string; alg: string; use: string }> {
  const { kty, crv, x } = key;
  return { kty, crv, x, kid: await calculateJwkThumbprint({ kty, crv, x }), alg: 'EdDSA', use: 'sig' };
}

/** Signs `bytes` as they are: JWS in flattened JSON form (RFC 7515 section 7.2.2, RFC 8037). */
export async function signBytes(key: SigningKey, bytes: Uint8Array, type: string): Promise<FlattenedJWS> {
  const { kid } = await publicJwk(key);
  return new FlattenedSign(bytes).setProtectedHeader({ alg: 'EdDSA', kid, typ: type }).sign(await importJWK(key, 'EdDSA'));
}
