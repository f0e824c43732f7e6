/** The hash chain over the entries of a run: each entry carries the hash of the one before. */
import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex } from '@noble/hashes/utils.js';

import { canonicalBytes } from '@/shared/record/canonical';
import type { DraftEntry, RecordEntry } from '@/shared/record/recordEntry';

/** `prev` of the first entry: 64 zeros. */
export const GENESIS = '0'.repeat(64);

/** What is wrong with a chain. */
export type ChainFault = 'altered' | 'missing' | 'reordered' | 'inserted' | 'duplicated' | 'foreign';

/** The chain holds up to its head, or the first place where it does not. */
export type ChainVerdict =
  | { readonly ok: true; readonly head: string; readonly count: number }
  | { readonly ok: false; readonly fault: ChainFault; readonly seq: number; readonly entryId: string | null; readonly what: string };

/** What is known about the chain from elsewhere (a receipt, a signed export), so that a cut-off tail is seen too. */
export interface ExpectedChain {
  readonly head?: string;
  readonly count?: number;
}

/** SHA-256 in lower-case hexadecimal (FIPS 180-4). */
export function sha256HexOf(bytes: Uint8Array): string {
  return bytesToHex(sha256(bytes));
}

/**
 * Hash of an entry: SHA-256 over the RFC 8785 canonical JSON of all its members, `prev` included, `hash` left out.
 * @throws CanonicalError when a member has no canonical form
 */
export function hashEntry(entry: Omit<RecordEntry, 'hash'>): string {
  const { hash: _, ...content } = entry as RecordEntry;
  return sha256HexOf(canonicalBytes(content));
}

/**
 * Makes the entry that is kept from the one that was posted.
 * @param receivedAt the server's wall time
 * @param prev hash of the last entry of the run, or GENESIS
 */
export function sealEntry(draft: DraftEntry, receivedAt: string, prev: string): RecordEntry {
  const content = { ...draft, receivedAt, prev };
  return { ...content, hash: hashEntry(content) };
}

function hashes(entry: RecordEntry): boolean {
  try {
    return hashEntry(entry) === entry.hash;
  } catch {
    // What has no canonical form cannot be what was hashed.
    return false;
  }
}

const called = (entry: RecordEntry): string => `Entry ${entry.seq} (${entry.kind}, ${entry.id})`;

function bad(fault: ChainFault, entry: RecordEntry, what: string): ChainVerdict {
  return { ok: false, fault, seq: entry.seq, entryId: entry.id, what };
}

/** What the entries before the one in hand were called. */
interface Seen {
  readonly bySeq: Map<number, RecordEntry>;
  readonly byId: Map<string, RecordEntry>;
}

/** Two entries carry one number: the one that the next entry was chained to is the true one. */
function sameNumber(first: RecordEntry, second: RecordEntry, all: readonly RecordEntry[]): ChainVerdict {
  const next = all.find((entry) => entry.seq === first.seq + 1);
  const intruder = next !== undefined && next.prev === second.hash ? first : second;
  return bad('inserted', intruder, `Two entries carry number ${first.seq}; ${called(intruder)} was put in.`);
}

function twinFault(entry: RecordEntry, seen: Seen, all: readonly RecordEntry[]): ChainVerdict | null {
  const twin = seen.bySeq.get(entry.seq) ?? seen.byId.get(entry.id);
  if (twin === undefined) return null;
  if (twin.hash === entry.hash) return bad('duplicated', entry, `${called(entry)} stands here twice.`);
  if (twin.seq === entry.seq) return sameNumber(twin, entry, all);
  return bad('duplicated', entry, `${called(entry)} carries the id of entry ${twin.seq}.`);
}

function orderFault(entry: RecordEntry, expected: number, all: readonly RecordEntry[]): ChainVerdict | null {
  if (entry.seq === expected) return null;
  if (all.some((other) => other.seq === expected)) {
    return bad('reordered', entry, `${called(entry)} stands where entry ${expected} belongs: the order was changed.`);
  }
  const what = `Entry ${expected} is missing: entry ${entry.seq} stands in its place.`;
  return { ok: false, fault: 'missing', seq: expected, entryId: null, what };
}

function linkFault(entry: RecordEntry, previous: RecordEntry | undefined): ChainVerdict | null {
  if (entry.prev === (previous?.hash ?? GENESIS)) return null;
  if (previous === undefined) return bad('altered', entry, `${called(entry)} is not the start of a record: something stood before it.`);
  const what = `${called(previous)} is not the one that entry ${entry.seq} was chained to: one of the two was replaced.`;
  return bad('altered', previous, what);
}

function faultAt(entries: readonly RecordEntry[], at: number, seen: Seen): ChainVerdict | null {
  const entry = entries[at];
  if (entry === undefined) return null;
  if (!hashes(entry)) return bad('altered', entry, `${called(entry)} was altered: its contents do not give its hash.`);
  if (entry.run !== entries[0]?.run) return bad('foreign', entry, `${called(entry)} belongs to another run.`);
  return twinFault(entry, seen, entries) ?? orderFault(entry, at + 1, entries) ?? linkFault(entry, entries[at - 1]);
}

/**
 * Checks a record from its first entry on: contents, numbers, order and links.
 * @param entries in the order in which they stand
 * @param expected head hash and number of entries known from elsewhere; without them a cut-off tail cannot be seen
 * @returns the head hash, or the first fault with the entry and a sentence
 */
export function verifyChain(entries: readonly RecordEntry[], expected: ExpectedChain = {}): ChainVerdict {
  const seen: Seen = { bySeq: new Map(), byId: new Map() };
  for (const [at, entry] of entries.entries()) {
    const fault = faultAt(entries, at, seen);
    if (fault !== null) return fault;
    seen.bySeq.set(entry.seq, entry);
    seen.byId.set(entry.id, entry);
  }
  const count = entries.length;
  if (expected.count !== undefined && count < expected.count) {
    const seq = count + 1;
    return {
      ok: false,
      fault: 'missing',
      seq,
      entryId: null,
      what: `The record ends at entry ${count}; it should have ${expected.count} entries.`,
    };
  }
  const last = entries[count - 1];
  const head = last?.hash ?? GENESIS;
  if (last !== undefined && expected.count !== undefined && count > expected.count) {
    return bad('inserted', last, `The record has ${count} entries; it should have ${expected.count}.`);
  }
  if (expected.head !== undefined && expected.head !== head) {
    const what = 'The record does not end with the entry that it should end with: its last entry was replaced or cut off.';
    return { ok: false, fault: 'altered', seq: count, entryId: last?.id ?? null, what };
  }
  return { ok: true, head, count };
}
