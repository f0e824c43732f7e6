/** The exported record: a JWS in flattened JSON form (RFC 7515, 7.2.2) whose payload is the record's exact bytes. */
import { base64url } from 'jose';
import { z } from 'zod';

import type { Json } from '@/shared/record/canonical';
import { canonicalBytes, CanonicalError, canonicalJson } from '@/shared/record/canonical';
import type { ChainVerdict } from '@/shared/record/chain';
import { sha256HexOf, verifyChain } from '@/shared/record/chain';
import type { RecordEntry } from '@/shared/record/recordEntry';
import { recordEntrySchema, sha256Hex, wallTime } from '@/shared/record/recordEntry';

// The Encoding standard's decoder is there in every browser and in Node, but no type library of a pure room names it.
declare const TextDecoder: new (label: 'utf-8', options: { fatal: true; ignoreBOM: true }) => { decode(bytes: Uint8Array): string };

const idText = z.string().min(1).max(64);
const name = z.string().min(1).max(200);
const json = z.custom<Json>((value) => value !== undefined);

/** What the run was pinned to; `document` is the thing itself, so that the export can be read without the workshop. */
const pinned = { hash: sha256Hex, document: json.optional() };

/** Head of an exported record: everything that the entries name by id or by hash. */
export const recordHeadSchema = z.strictObject({
  run: z.uuid(),
  workshop: z.strictObject({ id: idText, name }),
  machine: z.strictObject({ id: idText, name, serial: z.string().max(200).nullable() }),
  tree: z.strictObject({ id: idText, title: name, version: z.int().min(1), ...pinned }),
  profile: z.strictObject({ id: idText, revision: z.int().min(1), ...pinned }),
  settings: z.strictObject(pinned),
  engine: z.strictObject({ hash: sha256Hex }),
  people: z.array(z.strictObject({ id: idText, name, roles: z.array(z.string().max(40)) })),
  instruments: z.array(
    z.strictObject({ id: idText, name, serial: z.string().max(200).nullable(), calibrationDue: z.iso.date().nullable() }),
  ),
  exportedAt: wallTime,
  /** Hash of the last entry and number of entries: a cut-off tail shows. */
  head: sha256Hex,
  count: z.int().min(0),
});

/** What the signature covers. */
export const exportedRecordSchema = z.strictObject({ format: z.literal(1), record: recordHeadSchema, entries: z.array(recordEntrySchema) });

/** The file as it is handed out. */
export const exportFileSchema = z.strictObject({
  payload: z.string().min(1),
  protected: z.string().min(1),
  signature: z.string().min(1),
});

/** Head of an exported record. */
export type RecordHead = z.infer<typeof recordHeadSchema>;
/** Head and entries. */
export type ExportedRecord = z.infer<typeof exportedRecordSchema>;
/** The file as it is handed out. */
export type ExportFile = z.infer<typeof exportFileSchema>;

/** Media type in the protected header. */
export const EXPORT_TYPE = 'lampstep-record+json';

/** An export that could be read. Whether its signature is good is `verifyExport`'s answer and not this one's. */
export interface ReadExport {
  readonly ok: true;
  readonly file: ExportFile;
  readonly record: RecordHead;
  readonly entries: readonly RecordEntry[];
  readonly chain: ChainVerdict;
  /** SHA-256 of the signed bytes. */
  readonly sha256: string;
}

/** An export that could not be read, with a sentence. */
export interface UnreadableExport {
  readonly ok: false;
  readonly say: string;
}

/**
 * The exact bytes that are signed: canonical JSON of the record.
 * @throws CanonicalError
 */
export function exportBytes(exported: ExportedRecord): Uint8Array {
  return canonicalBytes(exported);
}

const unreadable = (say: string): UnreadableExport => ({ ok: false, say });

function firstIssue(error: z.ZodError): string {
  const [issue] = error.issues;
  if (issue === undefined) return 'it cannot be read';
  const place = issue.path.map(String).join('.');
  return place === '' ? issue.message : `“${place}”: ${issue.message}`;
}

/** Refuses what canonical JSON refuses too: a member written twice reads one way here and another way elsewhere. */
function isCanonical(value: unknown, text: string): boolean {
  try {
    return canonicalJson(value) === text;
  } catch (error) {
    if (error instanceof CanonicalError) return false;
    throw error;
  }
}

/**
 * Reads an exported record and checks its chain against the head and count that it states.
 * @param text the file
 */
export function readExport(text: string): ReadExport | UnreadableExport {
  let outer: unknown;
  try {
    outer = JSON.parse(text);
  } catch {
    return unreadable('This file is not JSON.');
  }
  const file = exportFileSchema.safeParse(outer);
  if (!file.success) return unreadable('This file is not an exported record: it must have exactly payload, protected and signature.');
  let inner: unknown;
  let payloadText: string;
  let bytes: Uint8Array;
  try {
    bytes = base64url.decode(file.data.payload);
    payloadText = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes);
    inner = JSON.parse(payloadText);
  } catch {
    return unreadable('The payload of this record is damaged: it is not base64url of JSON.');
  }
  const exported = exportedRecordSchema.safeParse(inner);
  if (!exported.success) return unreadable(`The payload is not a record of format 1: ${firstIssue(exported.error)}.`);
  if (!isCanonical(inner, payloadText)) return unreadable('The payload is not in canonical form, so it was not written by this program.');
  const { record, entries } = exported.data;
  const stray = entries.find((entry) => entry.run !== record.run);
  const chain: ChainVerdict =
    stray === undefined
      ? verifyChain(entries, { head: record.head, count: record.count })
      : {
          ok: false,
          fault: 'foreign',
          seq: stray.seq,
          entryId: stray.id,
          what: `Entry ${stray.seq} belongs to another run than the record.`,
        };
  return { ok: true, file: file.data, record, entries, chain, sha256: sha256HexOf(bytes) };
}
