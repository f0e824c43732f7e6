/** The one door for tree and profile documents: after it nothing is checked again. */
import type { z } from 'zod';

import { migrate, profileMigrations, treeMigrations } from './migrations';
import type { Migration } from './migrations';
import { profileSchema } from './profile';
import type { Profile } from './profile';
import { treeShape } from './tree';
import type { Tree } from './tree';
import { treeFaults } from './treeFaults';

/** A fault of a document: the step that it is in (null in the head), the key, and a sentence. */
export interface DocumentFault {
  step: string | null;
  key: string;
  message: string;
}

export type Parsed<T> = { ok: true; value: T } | { ok: false; faults: DocumentFault[] };

/** A tree whose ids are unique, whose references exist and whose exits cover each outcome exactly once. */
export const treeSchema = treeShape.superRefine((tree, ctx) => {
  for (const fault of treeFaults(tree)) ctx.addIssue({ code: 'custom', path: fault.path, message: fault.message });
});

/** Reads a tree from parsed JSON of any format up to today's. All faults are reported, with step and key. */
export function parseTree(json: unknown, migrations: readonly Migration[] = treeMigrations): Parsed<Tree> {
  return read(json, migrations, treeSchema);
}

/** Reads a profile from parsed JSON of any format up to today's. All faults are reported, with their key. */
export function parseProfile(json: unknown, migrations: readonly Migration[] = profileMigrations): Parsed<Profile> {
  return read(json, migrations, profileSchema);
}

function read<T>(json: unknown, migrations: readonly Migration[], schema: z.ZodType<T>): Parsed<T> {
  const migrated = migrate(json, migrations);
  if (!migrated.ok) return { ok: false, faults: [{ step: null, key: 'format', message: migrated.message }] };
  const parsed = schema.safeParse(migrated.json);
  return parsed.success ? { ok: true, value: parsed.data } : { ok: false, faults: toFaults(parsed.error, migrated.json) };
}

function toFaults(error: z.ZodError, json: unknown): DocumentFault[] {
  return error.issues.map((issue) => {
    const [first, second, ...rest] = issue.path;
    const inStep = first === 'steps' && typeof second === 'number';
    return {
      step: inStep ? stepName(json, second) : null,
      key: (inStep ? rest : issue.path).map(String).join('.'),
      message: issue.message,
    };
  });
}

function stepName(json: unknown, index: number): string {
  const steps = (json as { steps?: unknown[] }).steps;
  const id = (steps?.[index] as { id?: unknown } | undefined)?.id;
  return typeof id === 'string' ? id : `step ${index + 1}`;
}
