/** Types of the tables: what a row gives back, what an insert takes, what an update may change. */
import type { ColumnType, Generated, Insertable, JSONColumnType, Selectable, Updateable } from 'kysely';

import type { Profile } from '@/flows/document/profile';
import type { Settings } from '@/flows/document/settings';
import type { FittedThing } from '@/flows/document/steps';
import type { Tree } from '@/flows/document/tree';

/** Given back as a Date, taken as a Date or an RFC 3339 text. */
type Time = ColumnType<Date, Date | string, Date | string>;
type TimeOrNull = ColumnType<Date | null, Date | string | null | undefined, Date | string | null>;
/** Set once, never changed. */
type Fixed<T> = ColumnType<T, T, never>;
type FixedTime = ColumnType<Date, Date | string, never>;
type Json<T extends object> = JSONColumnType<T, string, string>;
type FixedJson<T extends object> = JSONColumnType<T, string, never>;

export interface WorkshopsTable {
  id: Fixed<string>;
  name: string;
  /** accepted records are kept at least this long */
  retention_days: Generated<number>;
}

export interface PeopleTable {
  id: Fixed<string>;
  name: string;
  mail: string;
}

export interface MembersTable {
  workshop: Fixed<string>;
  person: Fixed<string>;
  code: string;
  roles: string[];
  joined_at: FixedTime;
  left_at: TimeOrNull;
}

export interface CredentialsTable {
  person: Fixed<string>;
  password_hash: string;
  changed_at: Time;
}

export interface SessionsTable {
  id: Fixed<string>;
  workshop: Fixed<string>;
  person: Fixed<string>;
  /** counts the rotations of the refresh token */
  generation: number;
  /** SHA-256 of the refresh token in force */
  token_hash: string;
  rotated_at: Time;
  created_at: FixedTime;
  expires_at: Time;
  revoked_at: TimeOrNull;
  revoked_why: string | null;
  /** what its browser called itself */
  device: Generated<string>;
}

export interface SettingsTable {
  workshop: Fixed<string>;
  document: Json<Settings>;
  hash: string;
  changed_at: Time;
}

export interface MachinesTable {
  id: Fixed<string>;
  workshop: Fixed<string>;
  name: string;
  serial: string;
  machine_class: string;
}

export interface ProfileRevisionsTable {
  workshop: Fixed<string>;
  machine: Fixed<string>;
  revision: Fixed<number>;
  document: FixedJson<Profile>;
  hash: Fixed<string>;
  author: Fixed<string>;
  created_at: FixedTime;
}

export interface TreesTable {
  workshop: Fixed<string>;
  id: Fixed<string>;
}

export interface TreeVersionsTable {
  workshop: Fixed<string>;
  tree: Fixed<string>;
  version: Fixed<number>;
  document: Json<Tree>;
  hash: string;
  state: 'draft' | 'in-check' | 'issued' | 'withdrawn';
  author: Fixed<string>;
  checker: string | null;
  issued_at: TimeOrNull;
  withdrawn_at: TimeOrNull;
}

export interface InstrumentsTable {
  id: Fixed<string>;
  workshop: Fixed<string>;
  tag: string;
  name: string;
  kind: 'multimeter' | 'two-pole-tester' | 'low-ohm-meter' | 'insulation-tester' | 'earth-tester' | 'oscilloscope' | 'thermometer';
  serial: string;
  ranges: Json<InstrumentRangeRow[]>;
  category: string | null;
  two_pole: boolean;
  /** `YYYY-MM-DD` */
  calibrated_until: string;
}

export interface InstrumentRangeRow {
  quantity: string;
  fullScale: number;
  resolution: number;
  percent: number;
  counts: number;
}

export interface RunsTable {
  id: Fixed<string>;
  workshop: Fixed<string>;
  machine: Fixed<string>;
  tree: Fixed<string>;
  tree_version: Fixed<number>;
  tree_hash: Fixed<string>;
  /** the called trees in their pinned versions */
  callees: FixedJson<{ tree: string; version: number; hash: string }[]>;
  profile_revision: Fixed<number>;
  profile_hash: Fixed<string>;
  settings: FixedJson<Settings>;
  settings_hash: Fixed<string>;
  engine: Fixed<string>;
  /** who leads it now */
  restorer: string;
  restorer_roles: string[];
  /** everybody who led it before */
  former: Generated<string[]>;
  state: 'open' | 'closed' | 'submitted' | 'returned' | 'accepted';
  ended: string | null;
  started_at: FixedTime;
  closed_at: TimeOrNull;
  purged_at: TimeOrNull;
}

export interface RunHeadsTable {
  run: Fixed<string>;
  workshop: Fixed<string>;
  seq: number;
  hash: string;
  heard_at: Time;
  band: string;
  step_key: string | null;
  step_title: string | null;
  step_stud: string | null;
  step_total: number;
  /** the `hold-asked` entry that waits for an answer */
  hold_entry: string | null;
  /** the person whom the run is offered to */
  offered_to: Generated<string | null>;
}

export interface EntriesTable {
  id: Fixed<string>;
  workshop: Fixed<string>;
  run: Fixed<string>;
  seq: Fixed<number>;
  at: FixedTime;
  monotonic: Fixed<number>;
  received_at: FixedTime;
  actor: Fixed<string>;
  kind: Fixed<string>;
  body: FixedJson<Record<string, unknown>>;
  prev: Fixed<string>;
  hash: Fixed<string>;
}

export interface SnapshotsTable {
  run: Fixed<string>;
  workshop: Fixed<string>;
  /** hashes of tree, callees, profile, settings and engine together */
  program: string;
  seq: number;
  state: Json<object>;
}

export interface ReleasesTable {
  id: Fixed<string>;
  workshop: Fixed<string>;
  machine: Fixed<string>;
  run: Fixed<string>;
  given_by: Fixed<string>;
  given_at: FixedTime;
}

export interface ReleaseVoidsTable {
  release: Fixed<string>;
  workshop: Fixed<string>;
  run: Fixed<string>;
  entry: Fixed<string>;
  voided_at: FixedTime;
  reason: Fixed<string>;
}

export interface MachineTagsTable {
  id: Generated<number>;
  workshop: Fixed<string>;
  machine: Fixed<string>;
  run: Fixed<string>;
  is: Fixed<'fitted' | 'killer'>;
  body: FixedJson<FittedThing | { part: string; killer: string }>;
  since: FixedTime;
}

export interface DemoContentTable {
  name: string;
  hash: string;
}

export interface FilesTable {
  workshop: Fixed<string>;
  /** SHA-256 of the bytes, which lie in the object store */
  hash: Fixed<string>;
  media: Fixed<'image/jpeg' | 'application/pdf'>;
  bytes: Fixed<number>;
  width: Fixed<number | null>;
  height: Fixed<number | null>;
  added_at: FixedTime;
}

export interface FileUsesTable {
  workshop: Fixed<string>;
  hash: Fixed<string>;
  /** the run for whose record it was sent; null: for the whole workshop */
  run: Fixed<string | null>;
  added_by: Fixed<string>;
  added_at: FixedTime;
}

export interface Database {
  workshops: WorkshopsTable;
  people: PeopleTable;
  members: MembersTable;
  credentials: CredentialsTable;
  sessions: SessionsTable;
  settings: SettingsTable;
  machines: MachinesTable;
  profile_revisions: ProfileRevisionsTable;
  trees: TreesTable;
  tree_versions: TreeVersionsTable;
  instruments: InstrumentsTable;
  runs: RunsTable;
  run_heads: RunHeadsTable;
  entries: EntriesTable;
  snapshots: SnapshotsTable;
  releases: ReleasesTable;
  release_voids: ReleaseVoidsTable;
  machine_tags: MachineTagsTable;
  files: FilesTable;
  file_uses: FileUsesTable;
  demo_content: DemoContentTable;
}

export type EntryRow = Selectable<EntriesTable>;
export type InsertableEntryRow = Insertable<EntriesTable>;
export type RunRow = Selectable<RunsTable>;
export type InsertableRunRow = Insertable<RunsTable>;
export type RunHeadRow = Selectable<RunHeadsTable>;
export type UpdateableRunHeadRow = Updateable<RunHeadsTable>;
export type SessionRow = Selectable<SessionsTable>;
export type InsertableSessionRow = Insertable<SessionsTable>;
export type FileRow = Selectable<FilesTable>;
export type InsertableFileRow = Insertable<FilesTable>;
export type InstrumentRow = Selectable<InstrumentsTable>;
export type InsertableInstrumentRow = Insertable<InstrumentsTable>;
export type TreeVersionRow = Selectable<TreeVersionsTable>;
