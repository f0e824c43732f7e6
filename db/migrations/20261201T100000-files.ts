/** Photos and papers: what is kept, and for what it was sent. The bytes lie in the object store under workshop and hash. Frozen: a change is a new migration. */
import { sql } from 'kysely';
import type { Kysely } from 'kysely';

const SCHEMA = `
create table files (
  workshop uuid not null references workshops,
  hash text not null check (hash ~ '^[0-9a-f]{64}$'),
  media text not null check (media in ('image/jpeg','application/pdf')),
  bytes integer not null check (bytes > 0),
  width integer check (width > 0),
  height integer check (height > 0),
  added_at timestamptz not null,
  primary key (workshop, hash),
  check ((media = 'image/jpeg') = (width is not null and height is not null))
);

-- a file of a run is read by those who may read that run; one without a run by everyone of the workshop
create table file_uses (
  workshop uuid not null,
  hash text not null,
  run uuid,
  added_by uuid not null,
  added_at timestamptz not null,
  unique nulls not distinct (workshop, hash, run),
  foreign key (workshop, hash) references files (workshop, hash),
  foreign key (workshop, run) references runs (workshop, id),
  foreign key (workshop, added_by) references members (workshop, person)
);
create index file_uses_by_run on file_uses (workshop, run);
`;

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql.raw(SCHEMA).execute(db);
  for (const table of ['files', 'file_uses']) {
    await sql
      .raw(
        `alter table ${table} enable row level security;
         alter table ${table} force row level security;
         create policy ${table}_own on ${table} using (workshop = current_workshop()) with check (workshop = current_workshop());
         grant select, insert on ${table} to lampstep_server;`,
      )
      .execute(db);
  }
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await sql.raw('drop table file_uses, files;').execute(db);
}
