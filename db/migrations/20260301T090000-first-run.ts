/** The tables of the first run. Frozen: a change is a new migration. */
import { sql } from 'kysely';
import type { Kysely } from 'kysely';

const SCHEMA = `
create function current_workshop() returns uuid language sql stable parallel safe
  as $$ select nullif(current_setting('lampstep.workshop', true), '')::uuid $$;
create function current_person() returns uuid language sql stable parallel safe
  as $$ select nullif(current_setting('lampstep.person', true), '')::uuid $$;
create function current_mail() returns text language sql stable parallel safe
  as $$ select nullif(current_setting('lampstep.mail', true), '') $$;

create table workshops (
  id uuid primary key,
  name text not null check (name <> ''),
  retention_days integer not null default 3650 check (retention_days >= 365)
);

create table people (
  id uuid primary key,
  name text not null check (name <> ''),
  mail text not null unique check (mail = lower(mail))
);

create table members (
  workshop uuid not null references workshops,
  person uuid not null references people,
  code text not null check (code <> ''),
  roles text[] not null check (roles <@ array['restorer','senior','reviewer','keeper']),
  joined_at timestamptz not null,
  left_at timestamptz,
  primary key (workshop, person),
  unique (workshop, code)
);
create index members_by_person on members (person);

create table credentials (
  person uuid primary key references people,
  password_hash text not null,
  changed_at timestamptz not null
);

create table sessions (
  id uuid primary key,
  workshop uuid not null,
  person uuid not null,
  generation integer not null check (generation >= 1),
  token_hash text not null,
  rotated_at timestamptz not null,
  created_at timestamptz not null,
  expires_at timestamptz not null,
  revoked_at timestamptz,
  revoked_why text,
  foreign key (workshop, person) references members (workshop, person)
);
create index sessions_by_person on sessions (workshop, person);

create table settings (
  workshop uuid primary key references workshops,
  document jsonb not null,
  hash text not null,
  changed_at timestamptz not null
);

create table machines (
  id uuid primary key,
  workshop uuid not null references workshops,
  name text not null check (name <> ''),
  serial text not null check (serial <> ''),
  machine_class text not null,
  unique (workshop, id),
  unique (workshop, serial)
);

create table profile_revisions (
  workshop uuid not null,
  machine uuid not null,
  revision integer not null check (revision >= 1),
  document jsonb not null,
  hash text not null,
  author uuid not null,
  created_at timestamptz not null,
  primary key (machine, revision),
  unique (workshop, machine, revision),
  foreign key (workshop, machine) references machines (workshop, id),
  foreign key (workshop, author) references members (workshop, person)
);

create table trees (
  workshop uuid not null references workshops,
  id text not null,
  primary key (workshop, id)
);

create table tree_versions (
  workshop uuid not null,
  tree text not null,
  version integer not null check (version >= 1),
  document jsonb not null,
  hash text not null,
  state text not null check (state in ('draft','in-check','issued','withdrawn')),
  author uuid not null,
  checker uuid,
  issued_at timestamptz,
  withdrawn_at timestamptz,
  primary key (workshop, tree, version),
  foreign key (workshop, tree) references trees (workshop, id),
  foreign key (workshop, author) references members (workshop, person),
  foreign key (workshop, checker) references members (workshop, person),
  constraint tree_versions_author_is_not_checker check (checker <> author),
  constraint tree_versions_issued_is_checked check (state in ('draft','in-check') or (checker is not null and issued_at is not null))
);

create table instruments (
  id uuid primary key,
  workshop uuid not null references workshops,
  tag text not null,
  name text not null,
  kind text not null check (kind in ('multimeter','two-pole-tester','low-ohm-meter','insulation-tester','earth-tester','oscilloscope','thermometer')),
  serial text not null,
  ranges jsonb not null,
  category text,
  two_pole boolean not null,
  calibrated_until date not null,
  unique (workshop, tag)
);

create table runs (
  id uuid primary key,
  workshop uuid not null references workshops,
  machine uuid not null,
  tree text not null,
  tree_version integer not null,
  tree_hash text not null,
  callees jsonb not null,
  profile_revision integer not null,
  profile_hash text not null,
  settings jsonb not null,
  settings_hash text not null,
  engine text not null,
  restorer uuid not null,
  restorer_roles text[] not null,
  state text not null check (state in ('open','closed','submitted','returned','accepted')),
  ended text check (ended in ('fault-found','supply-proven','cleared','stopped','referred','in-service')),
  started_at timestamptz not null,
  closed_at timestamptz,
  purged_at timestamptz,
  unique (workshop, id),
  foreign key (workshop, machine, profile_revision) references profile_revisions (workshop, machine, revision),
  foreign key (workshop, tree, tree_version) references tree_versions (workshop, tree, version),
  foreign key (workshop, restorer) references members (workshop, person),
  constraint runs_open_has_no_end check ((state = 'open') = (ended is null) and (state = 'open') = (closed_at is null))
);
create unique index runs_one_open_per_machine on runs (machine) where state = 'open';
create index runs_by_restorer on runs (workshop, restorer, started_at desc);
create index runs_by_state on runs (workshop, state, started_at desc);

create table run_heads (
  run uuid primary key,
  workshop uuid not null,
  seq integer not null check (seq >= 0),
  hash text not null,
  heard_at timestamptz not null,
  band text not null,
  step_key text,
  step_title text,
  step_stud text,
  step_total integer not null,
  hold_entry uuid,
  foreign key (workshop, run) references runs (workshop, id)
);
create index run_heads_waiting on run_heads (workshop) where hold_entry is not null;

create table entries (
  id uuid not null,
  workshop uuid not null,
  run uuid not null,
  seq integer not null check (seq >= 1),
  at timestamptz not null,
  monotonic bigint not null,
  received_at timestamptz not null,
  actor uuid not null,
  kind text not null check (kind in ('opened','answer','reading','photo','part','tag','warning-read','energised','isolated','lapsed','hold-asked','hold-given',
    'hold-refused','deviation','paused','resumed','handed-over','taken-over','conflict','stopped','correction','closed','submitted','returned','reply','finding',
    'accepted','addendum','released','void')),
  body jsonb not null,
  prev text not null,
  hash text not null,
  constraint entries_id primary key (id),
  constraint entries_one_per_place unique (run, seq),
  foreign key (workshop, run) references runs (workshop, id),
  foreign key (workshop, actor) references members (workshop, person)
);
create index entries_by_workshop on entries (workshop, run, seq);

create function refuse_change() returns trigger language plpgsql
  as $$ begin raise exception 'rows of % are never changed', tg_table_name using errcode = 'restrict_violation'; end $$;
create trigger entries_are_never_changed before update on entries for each row execute function refuse_change();

create function refuse_tree_change() returns trigger language plpgsql as $$
begin
  if old.state <> 'draft' and (old.document is distinct from new.document or old.hash is distinct from new.hash) then
    raise exception 'version % of tree % has left the draft and is never changed', old.version, old.tree using errcode = 'restrict_violation';
  end if;
  return new;
end $$;
create trigger tree_versions_are_frozen before update on tree_versions for each row execute function refuse_tree_change();

create table snapshots (
  run uuid primary key,
  workshop uuid not null,
  program text not null,
  seq integer not null,
  -- json and not jsonb: the text comes back as it was, and with it the order of keys that the engine compares by
  state json not null,
  foreign key (workshop, run) references runs (workshop, id)
);

create table releases (
  id uuid primary key,
  workshop uuid not null,
  machine uuid not null,
  run uuid not null,
  given_by uuid not null,
  given_at timestamptz not null,
  unique (workshop, id),
  constraint releases_one_per_run unique (run),
  foreign key (workshop, machine) references machines (workshop, id),
  foreign key (workshop, run) references runs (workshop, id),
  foreign key (workshop, given_by) references members (workshop, person)
);
create index releases_by_machine on releases (workshop, machine, given_at desc);

create table release_voids (
  release uuid primary key,
  workshop uuid not null,
  run uuid not null,
  entry uuid not null,
  voided_at timestamptz not null,
  reason text not null,
  foreign key (workshop, release) references releases (workshop, id),
  foreign key (workshop, run) references runs (workshop, id)
);

create table machine_tags (
  id bigint generated always as identity primary key,
  workshop uuid not null,
  machine uuid not null,
  run uuid not null,
  "is" text not null check ("is" in ('fitted','killer')),
  body jsonb not null,
  since timestamptz not null,
  foreign key (workshop, machine) references machines (workshop, id),
  foreign key (workshop, run) references runs (workshop, id)
);
create index machine_tags_by_machine on machine_tags (workshop, machine);

create table demo_content (name text primary key, hash text not null);
`;

/** Tables that carry their workshop in the column of that name. */
const OF_WORKSHOP = [
  'sessions', 'settings', 'machines', 'profile_revisions', 'trees', 'tree_versions', 'instruments', 'runs', 'run_heads', 'entries', 'snapshots', 'releases',
  'release_voids', 'machine_tags',
];

const POLICIES = `
alter table workshops enable row level security;
alter table workshops force row level security;
create policy workshops_own on workshops using (
  id = current_workshop() or exists (select from members m where m.workshop = workshops.id and m.person = current_person() and m.left_at is null));

alter table members enable row level security;
alter table members force row level security;
create policy members_own on members using (workshop = current_workshop() or person = current_person());

-- not forced: people belong to no workshop, and the owner makes their accounts
alter table people enable row level security;
create policy people_own on people using (
  id = current_person() or mail = current_mail()
  or exists (select from members m where m.person = people.id and m.workshop = current_workshop()));

alter table credentials enable row level security;
create policy credentials_own on credentials using (
  person = current_person() or exists (select from people p where p.id = credentials.person and p.mail = current_mail()));
`;

const GRANTS: Record<string, string> = {
  workshops: 'select',
  people: 'select',
  members: 'select',
  credentials: 'select',
  sessions: 'select, insert, update',
  settings: 'select',
  machines: 'select',
  profile_revisions: 'select',
  trees: 'select',
  tree_versions: 'select',
  instruments: 'select',
  runs: 'select, insert, update (state, ended, closed_at)',
  run_heads: 'select, insert, update',
  entries: 'select, insert',
  snapshots: 'select, insert, update, delete',
  releases: 'select, insert',
  release_voids: 'select, insert',
  machine_tags: 'select, insert, delete',
};

// Only whole records go, only accepted ones, only after the workshop's time; the run's own row stays, so that a release can still name it.
const PURGE = `
create function purge_records(of_workshop uuid, now_at timestamptz) returns integer
  language plpgsql security definer set search_path = public, pg_temp as $$
declare
  gone integer;
begin
  perform set_config('lampstep.workshop', of_workshop::text, true);
  create temporary table going on commit drop as
    select r.id from runs r join workshops w on w.id = r.workshop
    where r.workshop = of_workshop and r.state = 'accepted' and r.purged_at is null
      and r.closed_at < least(now_at, clock_timestamp()) - make_interval(days => w.retention_days);
  delete from snapshots where run in (select id from going);
  delete from entries where run in (select id from going);
  update runs set purged_at = least(now_at, clock_timestamp()) where id in (select id from going);
  get diagnostics gone = row_count;
  drop table going;
  return gone;
end $$;
revoke execute on function purge_records(uuid, timestamptz) from public;
grant execute on function purge_records(uuid, timestamptz) to lampstep_keeper;
`;

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql.raw(SCHEMA).execute(db);
  await sql.raw(POLICIES).execute(db);
  for (const table of OF_WORKSHOP) {
    await sql
      .raw(
        `alter table ${table} enable row level security;
         alter table ${table} force row level security;
         create policy ${table}_own on ${table} using (workshop = current_workshop()) with check (workshop = current_workshop());`,
      )
      .execute(db);
  }
  await sql.raw('grant usage on schema public to lampstep_server, lampstep_keeper').execute(db);
  for (const [table, rights] of Object.entries(GRANTS)) await sql.raw(`grant ${rights} on ${table} to lampstep_server`).execute(db);
  await sql.raw(PURGE).execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await sql
    .raw(
      `drop function purge_records(uuid, timestamptz);
       drop table demo_content, machine_tags, release_voids, releases, snapshots, entries, run_heads, runs, instruments, tree_versions, trees, profile_revisions,
         machines, settings, sessions, credentials, members, people, workshops;
       drop function refuse_change(); drop function refuse_tree_change();
       drop function current_workshop(); drop function current_person(); drop function current_mail();`,
    )
    .execute(db);
}
