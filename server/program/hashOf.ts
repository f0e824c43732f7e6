/** Content hash of a document. */
import { canonicalBytes } from '@/shared/record/canonical';
import { sha256HexOf } from '@/shared/record/chain';

/** SHA-256 over the RFC 8785 form: the same for the same content, whatever the order of its keys. */
export function hashOf(document: unknown): string {
  return sha256HexOf(canonicalBytes(document));
}
