/** Records under review: findings, return and reply, acceptance, export. */
import { z } from 'zod';

import { profileDocument, settingsDocument, treeDocument } from './documents';
import { entrySchema } from './entries';
import { entryIdSchema, instantSchema, personIdSchema, sentence } from './ids';
import { instrumentSchema } from './instruments';
import { personSchema } from './people';
import { headSchema, runSummarySchema, RUN_STATES } from './runSummary';
import { pinsSchema, startSchema } from './runs';

/** A record can be read once its run is closed. */
export const RECORD_STATES = RUN_STATES.filter((state) => state !== 'open');

export const recordsQuery = z.strictObject({ state: z.enum(RECORD_STATES).optional() });
export const recordsSchema = z.object({ records: z.array(runSummarySchema) });

export const GRADES = ['note', 'minor', 'major'] as const;
export const gradeSchema = z.enum(GRADES);

export const findingSchema = z
  .object({
    /** the `finding` entry itself */
    id: entryIdSchema,
    /** the entry that it is about */
    entry: entryIdSchema,
    grade: gradeSchema,
    text: z.string(),
    by: personIdSchema,
    at: instantSchema,
  })
  .meta({ id: 'Finding' });
export type Finding = z.infer<typeof findingSchema>;

export const recordSchema = z
  .object({
    run: runSummarySchema,
    pins: pinsSchema,
    start: startSchema,
    tree: treeDocument,
    callees: z.array(treeDocument),
    profile: profileDocument,
    settings: settingsDocument,
    instruments: z.array(instrumentSchema),
    people: z.array(personSchema),
    entries: z.array(entrySchema),
    head: headSchema,
    findings: z.array(findingSchema),
    /** what the person signed in may do with it now; the server checks it again */
    may: z.object({ submit: z.boolean(), find: z.boolean(), return: z.boolean(), reply: z.boolean(), accept: z.boolean(), release: z.boolean() }),
  })
  .meta({ id: 'Record' });
export type RecordView = z.infer<typeof recordSchema>;

/** Every act of a review carries the id of the entry that it becomes, so that sending twice is harmless. */
const act = { id: entryIdSchema };

export const submitBody = z.strictObject({ ...act, remark: sentence(1000).optional() });
export const findingBody = z.strictObject({ ...act, entry: entryIdSchema, grade: gradeSchema, text: sentence(1000) });
export const returnBody = z.strictObject({ ...act, questions: z.array(sentence(500)).min(1, 'ask at least one question').max(20) });
export const replyBody = z.strictObject({ ...act, text: sentence(2000) });
export const acceptBody = z.strictObject({
  ...act,
  password: z.string().min(1, 'the password is missing').max(200),
  /** what the signature means, in the reviewer's words */
  meaning: sentence(400),
  /** `true` also gives the release "supply proven, may be refitted"; only for a run that ended so */
  release: z.boolean().default(false),
});

export const reviewedSchema = z.object({ entry: entrySchema, head: headSchema, run: runSummarySchema });

/** JWS in flattened JSON serialisation (RFC 7515 section 7.2.2), EdDSA with an Ed25519 key. */
export const signedRecordSchema = z.object({ payload: z.string(), protected: z.string(), signature: z.string() }).meta({ id: 'SignedRecord' });

export const jwksSchema = z.object({ keys: z.array(z.looseObject({ kty: z.string(), kid: z.string() })) });
