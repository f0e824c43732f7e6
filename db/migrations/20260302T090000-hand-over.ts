/** A run can change hands; old sessions can be swept away. Frozen: a change is a new migration. */
import { sql } from 'kysely';
import type { Kysely } from 'kysely';

const HAND_OVER = `
-- everybody who led the run before its restorer of now: none of them is its witness or its reviewer
alter table runs add column former uuid[] not null default '{}';
alter table runs add constraint runs_former_is_not_now check (not (restorer = any (former)));
alter table run_heads add column offered_to uuid;
alter table run_heads add constraint run_heads_offered_to_a_member foreign key (workshop, offered_to) references members (workshop, person);

create function keep_former_restorers() returns trigger language plpgsql as $$
begin
  if new.restorer is distinct from old.restorer and (old.state <> 'open' or not (old.restorer = any (new.former))) then
    raise exception 'run % changes hands only while it is open, and keeps who led it', old.id using errcode = 'restrict_violation';
  end if;
  if not (old.former <@ (new.former || new.restorer)) then
    raise exception 'run % keeps everybody who led it', old.id using errcode = 'restrict_violation';
  end if;
  return new;
end $$;
create trigger runs_keep_former_restorers before update on runs for each row execute function keep_former_restorers();
grant update (restorer, restorer_roles, former) on runs to lampstep_server;
`;

// The owner alone may touch ended sessions of every workshop, and only through this function; the server's role still deletes nothing.
const SWEEP = `
create policy sessions_ended on sessions to current_user using (least(expires_at, revoked_at) < clock_timestamp() - interval '1 day');
create function sweep_sessions(before timestamptz) returns integer
  language plpgsql security definer set search_path = public, pg_temp as $$
declare
  gone integer;
begin
  delete from sessions where least(expires_at, revoked_at) < least(before, clock_timestamp() - interval '1 day');
  get diagnostics gone = row_count;
  return gone;
end $$;
revoke execute on function sweep_sessions(timestamptz) from public;
grant execute on function sweep_sessions(timestamptz) to lampstep_server;
`;

export async function up(db: Kysely<unknown>): Promise<void> {
  await sql.raw(HAND_OVER).execute(db);
  await sql.raw(SWEEP).execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await sql
    .raw(
      `drop function sweep_sessions(timestamptz);
       drop policy sessions_ended on sessions;
       revoke update (restorer, restorer_roles, former) on runs from lampstep_server;
       drop trigger runs_keep_former_restorers on runs;
       drop function keep_former_restorers();
       alter table run_heads drop constraint run_heads_offered_to_a_member;
       alter table run_heads drop column offered_to;
       alter table runs drop constraint runs_former_is_not_now;
       alter table runs drop column former;`,
    )
    .execute(db);
}
