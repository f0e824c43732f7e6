/** Signs an exported record and checks its signature; EdDSA over Ed25519 (RFC 8037), nothing else. */
import { base64url, createLocalJWKSet, errors, flattenedVerify, FlattenedSign } from 'jose';
import type { CryptoKey, JSONWebKeySet, JWK } from 'jose';

import type { ExportedRecord, ExportFile, ReadExport, UnreadableExport } from '@/shared/record/exportFormat';
import { EXPORT_TYPE, exportBytes, readExport } from '@/shared/record/exportFormat';

/** What can be said of a signature. */
export type SignatureVerdict =
  | { readonly state: 'good'; readonly kid: string; readonly say: string }
  | { readonly state: 'bad' | 'unknown-key'; readonly kid: string | null; readonly say: string };

/** An export with both answers: is it what was signed, and do its entries hold together. */
export type VerifiedExport = (ReadExport & { readonly signature: SignatureVerdict; readonly trusted: boolean }) | UnreadableExport;

/**
 * Signs a record for export.
 * @param key private Ed25519 key
 * @param kid key id under which the public key is published
 */
export async function signExport(exported: ExportedRecord, key: CryptoKey | JWK, kid: string): Promise<ExportFile> {
  const jws = await new FlattenedSign(exportBytes(exported)).setProtectedHeader({ alg: 'EdDSA', kid, typ: EXPORT_TYPE }).sign(key);
  return { payload: jws.payload, protected: jws.protected ?? '', signature: jws.signature };
}

function kidOf(file: ExportFile): string | null {
  try {
    const header = JSON.parse(String.fromCharCode(...base64url.decode(file.protected))) as unknown;
    const kid = typeof header === 'object' && header !== null && 'kid' in header ? header.kid : null;
    return typeof kid === 'string' ? kid : null;
  } catch {
    return null;
  }
}

async function checkSignature(file: ExportFile, keys: JSONWebKeySet): Promise<SignatureVerdict> {
  const kid = kidOf(file);
  if (kid === null) return { state: 'bad', kid, say: 'The signature names no key.' };
  const named = keys.keys.filter((key) => key.kid === kid);
  if (named.length === 0)
    return {
      state: 'unknown-key',
      kid,
      say: `The key “${kid}” is not among the published keys, so nothing can be said about the signature.`,
    };
  try {
    const { protectedHeader } = await flattenedVerify(file, createLocalJWKSet({ keys: named }), { algorithms: ['EdDSA', 'Ed25519'] });
    if (protectedHeader?.typ !== EXPORT_TYPE) return { state: 'bad', kid, say: 'This was signed as something else than a record.' };
    return { state: 'good', kid, say: `Signed with the published key “${kid}”; not a byte has changed since.` };
  } catch (error) {
    if (error instanceof errors.JOSEError)
      return { state: 'bad', kid, say: 'The signature does not fit: the file was changed after it was signed.' };
    // What is left is a published key that the platform cannot import.
    return { state: 'unknown-key', kid, say: `The published key “${kid}” is damaged, so nothing can be said about the signature.` };
  }
}

/**
 * Reads an exported record, checks its signature against published keys and its chain of entries.
 * @param text the file
 * @param keys the published JWKS of the workshop's server, or the one that a verifier was given by hand
 * @returns `trusted` only when the signature is good and the chain holds
 */
export async function verifyExport(text: string, keys: JSONWebKeySet): Promise<VerifiedExport> {
  const read = readExport(text);
  if (!read.ok) return read;
  const signature = await checkSignature(read.file, keys);
  return { ...read, signature, trusted: signature.state === 'good' && read.chain.ok };
}
