/**
 * Documents of an earlier format, brought up to date one format at a time before anything else is asked of them. A format that was ever
 * written stays readable; the lists only grow, and what stands in them is frozen.
 */

type Json = Record<string, unknown>;

/** One step from a format to the next: pure, and whole by itself. What it cannot read it leaves for the shape to refuse. */
export interface Migration {
  /** the format that it reads; it writes the next one */
  from: number;
  /** what has changed, in an author's words */
  says: string;
  up(document: Json): Json;
}

/** Of fault trees, from format 1 on, without a gap. */
export const treeMigrations: readonly Migration[] = [];

/** Of machine profiles, from format 1 on, without a gap. */
export const profileMigrations: readonly Migration[] = [];

/** The format that a list of migrations leads to: the one that is written today. */
export function newestFormat(migrations: readonly Migration[]): number {
  return migrations.length + 1;
}

export type Migrated = { ok: true; json: unknown } | { ok: false; message: string };

/** The document in today's format. One from a future format is refused; what has no format at all goes on as it is, for the shape to say so. */
export function migrate(json: unknown, migrations: readonly Migration[]): Migrated {
  const newest = newestFormat(migrations);
  if (typeof json !== 'object' || json === null || Array.isArray(json)) return { ok: true, json };
  const { format } = json as Json;
  if (typeof format !== 'number' || !Number.isInteger(format) || format < 1) return { ok: true, json };
  if (format > newest) return { ok: false, message: `this document is of format ${format}, and this program reads formats up to ${newest}: a newer program has written it` };
  const due = migrations.slice(format - 1);
  return { ok: true, json: due.reduce((document, migration, i) => ({ ...migration.up(document), format: format + i + 1 }), json as Json) };
}
