/** Identifiers and times as they cross the wire. */
import { z } from 'zod';

import { idSchema } from '@/flows/document/ids';

const uuid = z.string().regex(/^[0-9a-f]{8}-[0-9a-f]{4}-[1-8][0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/, 'a UUID in small letters is wanted');
const uuid7 = z.string().regex(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/, 'a UUID of version 7 in small letters is wanted');

export const personIdSchema = uuid.describe('a person');
export const workshopIdSchema = uuid.describe('a workshop');
export const machineIdSchema = uuid.describe('a machine');
export const instrumentIdSchema = uuid.describe('an instrument');
export const releaseIdSchema = uuid.describe('a release');
/** made by the client, so that sending twice is harmless */
export const runIdSchema = uuid7.describe('a run');
/** made by the client, so that sending twice is harmless */
export const entryIdSchema = uuid7.describe('an entry of a record');
export const treeIdSchema = idSchema.describe('a fault tree');
export const versionSchema = z.number().int().positive().max(100_000).describe('version of a tree');

/** SHA-256 in small hexadecimal letters. */
export const hashSchema = z.string().regex(/^[0-9a-f]{64}$/, 'a SHA-256 in hexadecimal is wanted');
/** Wall time, RFC 3339 in UTC with milliseconds. */
export const instantSchema = z.iso.datetime({ precision: 3 });
/** Place of an entry in its record; the first is 1. */
export const seqSchema = z.number().int().positive().max(1_000_000);

/** Free text of a person: trimmed, not empty. */
export const sentence = (max: number) => z.string().trim().min(1, 'write something here').max(max, `at most ${max} characters`);
