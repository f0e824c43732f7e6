/** One entry of the append-only record of a run. */
import { z } from 'zod';

import type { Json } from '@/shared/record/canonical';
import { CanonicalError, canonicalJson } from '@/shared/record/canonical';

/** What an entry can be about, in the order in which a run usually meets them. */
export const ENTRY_KINDS = [
  'opened',
  'answer',
  'reading',
  'photo',
  'part',
  'tag',
  'warning-read',
  'energised',
  'isolated',
  'lapsed',
  'hold-asked',
  'hold-given',
  'hold-refused',
  'deviation',
  'paused',
  'resumed',
  'handed-over',
  'taken-over',
  'conflict',
  'stopped',
  'correction',
  'closed',
  'submitted',
  'returned',
  'reply',
  'finding',
  'accepted',
  'addendum',
  'released',
  'void',
] as const;

/** The kind of an entry. */
export type EntryKind = (typeof ENTRY_KINDS)[number];

/** Most characters that the canonical body of one entry may have; photos are named by hash and never carried. */
export const MOST_BODY_CHARACTERS = 64_000;

/** SHA-256 as 64 lower-case hexadecimal digits. */
export const sha256Hex = z.string().regex(/^[0-9a-f]{64}$/, 'must be a SHA-256 hash: 64 lower-case hexadecimal digits');

/**
 * Wall time as `Date.prototype.toISOString` writes it: UTC with milliseconds. One spelling only, so that an entry read
 * back from a database still gives its hash.
 */
export const wallTime = z
  .string()
  .regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}\.\d{3}Z$/, 'must be a UTC time with milliseconds, like 2024-05-01T09:30:00.000Z')
  .pipe(z.iso.datetime('must be a time that exists'));

const idText = z.string().regex(/^[a-z0-9][a-z0-9-]{0,63}$/, 'must be an id of small letters, figures and hyphens');

function bodyFault(body: unknown): string | null {
  try {
    const text = canonicalJson(body);
    if (text.length > MOST_BODY_CHARACTERS) return `is longer than ${MOST_BODY_CHARACTERS} characters`;
    // PostgreSQL's jsonb cannot hold U+0000, and what cannot be stored must be refused where it is made.
    if (/(?<!\\)(?:\\\\)*\\u0000/.test(text)) return 'holds the character U+0000, which cannot be kept';
    return text.includes('"__proto__":') ? 'has a member named __proto__' : null;
  } catch (error) {
    if (error instanceof CanonicalError) return `cannot be kept: ${error.message}`;
    throw error;
  }
}

const entryBody = z.custom<Readonly<Record<string, Json>>>().superRefine((body: unknown, context) => {
  if (typeof body !== 'object' || body === null || Array.isArray(body)) {
    context.addIssue({ code: 'custom', message: 'must be an object' });
    return;
  }
  const fault = bodyFault(body);
  if (fault !== null) context.addIssue({ code: 'custom', message: fault });
});

const clientShape = {
  /** Made by the client when the answer is given, so that posting it twice is the same entry. */
  id: z.uuidv7('must be a UUID of version 7'),
  run: z.uuid('must be a UUID'),
  /** 1 for the first entry of a run, then without a gap. */
  seq: z.int('must be a whole number').min(1, 'must be 1 or more'),
  at: wallTime,
  /** Whole milliseconds of the client's monotonic clock; only differences within one client session mean anything. */
  monotonic: z.int('must be whole milliseconds').min(0, 'must be 0 or more'),
  /** The member by id, or `machine` for what the engine does by itself. Never a name. */
  actor: idText,
  kind: z.enum(ENTRY_KINDS, 'is not a kind of entry'),
  body: entryBody,
};

/** An entry as the client makes it, before the server has received it. */
export const draftEntrySchema = z.strictObject(clientShape);

/** An entry as it is kept. */
export const recordEntrySchema = z.strictObject({
  ...clientShape,
  /** Wall time of the server when it received the entry. */
  receivedAt: wallTime,
  /** Hash of the entry before, or GENESIS. */
  prev: sha256Hex,
  hash: sha256Hex,
});

/** An entry as the client makes it. */
export type DraftEntry = z.infer<typeof draftEntrySchema>;

/** An entry as it is kept. */
export type RecordEntry = z.infer<typeof recordEntrySchema>;
