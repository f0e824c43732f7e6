/** Fault trees and their versions. */
import { z } from 'zod';

import { PURPOSE_IDS } from '@/flows/document/purpose';

import { treeDocument } from './documents';
import { hashSchema, instantSchema, personIdSchema, treeIdSchema, versionSchema } from './ids';

export const VERSION_STATES = ['draft', 'in-check', 'issued', 'withdrawn'] as const;
export const versionStateSchema = z.enum(VERSION_STATES);

export const treeVersionSchema = z
  .object({
    tree: treeIdSchema,
    version: versionSchema,
    title: z.string(),
    symptom: z.string(),
    purpose: z.enum(PURPOSE_IDS),
    state: versionStateSchema,
    hash: hashSchema,
    steps: z.number().int(),
    author: personIdSchema,
    checker: personIdSchema.nullable(),
    issuedAt: instantSchema.nullable(),
  })
  .meta({ id: 'TreeVersion' });
export type TreeVersion = z.infer<typeof treeVersionSchema>;

export const treesSchema = z.object({ trees: z.array(z.object({ id: treeIdSchema, versions: z.array(treeVersionSchema) })) });

export const treeDocumentSchema = z.object({
  version: treeVersionSchema,
  document: treeDocument,
  /** the trees that it calls, each in its pinned version */
  callees: z.array(treeDocument),
});
