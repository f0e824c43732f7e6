/** The canonical form of JSON (RFC 8785) that hashes and signatures are made over. */
import { utf8ToBytes } from '@noble/hashes/utils.js';
import canonicalize from 'canonicalize';

/** Any value that JSON can carry. */
export type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json };

/** Deeper nesting than any entry has; a bound keeps hostile input from ending in a stack overflow. */
export const MOST_LEVELS = 64;

/** Something has no canonical form; `path` says where, as in `body.reading.value`. */
export class CanonicalError extends Error {
  readonly path: string;

  constructor(path: string, what: string) {
    super(path === '' ? `The value ${what}.` : `“${path}” ${what}.`);
    this.name = 'CanonicalError';
    this.path = path;
  }
}

function refuseText(text: string, path: string): void {
  if (/\p{Surrogate}/u.test(text)) throw new CanonicalError(path, 'holds half a character (a lone surrogate)');
}

function refuseUncanonical(value: unknown, path: string, level: number): void {
  if (level > MOST_LEVELS) throw new CanonicalError(path, `is nested deeper than ${MOST_LEVELS} levels`);
  if (value === null || typeof value === 'boolean') return;
  if (typeof value === 'string') return refuseText(value, path);
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new CanonicalError(path, 'is not a finite number');
    return;
  }
  if (Array.isArray(value)) {
    for (let at = 0; at < value.length; at += 1) refuseUncanonical(value[at], `${path}[${at}]`, level + 1);
    return;
  }
  const prototype: unknown = typeof value === 'object' ? Object.getPrototypeOf(value) : undefined;
  // The root prototype is asked for by its place and not by identity: an object may come from another window.
  const isPlain = prototype === null || (typeof prototype === 'object' && Object.getPrototypeOf(prototype) === null);
  // A Date or a Map would be written as something that its reader cannot get back.
  if (!isPlain) throw new CanonicalError(path, `is ${value === undefined ? 'undefined' : 'not plain JSON'}`);
  for (const [key, member] of Object.entries(value as object)) {
    const at = path === '' ? key : `${path}.${key}`;
    refuseText(key, at);
    refuseUncanonical(member, at, level + 1);
  }
}

/**
 * Writes a value in the canonical form of RFC 8785: members sorted by UTF-16 code units, numbers as ECMAScript prints them.
 * Nothing is left out silently: undefined, NaN, dates and lone surrogates are refused with their place.
 * @throws CanonicalError
 */
export function canonicalJson(value: unknown): string {
  refuseUncanonical(value, '', 0);
  const text = canonicalize(value);
  if (text === undefined) throw new CanonicalError('', 'has no canonical form');
  return text;
}

/** The canonical form as UTF-8 bytes. @throws CanonicalError */
export function canonicalBytes(value: unknown): Uint8Array {
  return utf8ToBytes(canonicalJson(value));
}
