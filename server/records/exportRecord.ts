/** A closed record as a file that anyone can check. */
import type { Tx } from '@/db/createDb';
import type { RunRow } from '@/db/tables';
import type { Json } from '@/shared/record/canonical';
import type { ExportedRecord, ExportFile } from '@/shared/record/exportFormat';
import { signExport } from '@/shared/record/verifyExport';

import { publicJwk } from '../keys/publicJwk';
import type { Parts } from '../parts';
import { hashOf } from '../program/hashOf';
import { getRunBundle } from '../runs/runBundle';

/** The record with all that it names, signed over exactly the bytes of its payload. */
export async function exportRecord(tx: Tx, parts: Parts, run: RunRow): Promise<ExportFile> {
  const bundle = await getRunBundle(tx, parts, run);
  const workshop = await tx.selectFrom('workshops').select(['id', 'name']).where('id', '=', run.workshop).executeTakeFirstOrThrow();
  const exported: ExportedRecord = {
    format: 1,
    record: {
      run: run.id,
      workshop,
      machine: bundle.run.machine,
      tree: { ...bundle.run.tree, hash: run.tree_hash, document: bundle.tree as unknown as Json },
      profile: { id: run.machine, revision: run.profile_revision, hash: run.profile_hash, document: bundle.profile as unknown as Json },
      settings: { hash: run.settings_hash, document: bundle.settings as unknown as Json },
      engine: { hash: hashOf(run.engine) },
      people: bundle.people.map(({ id, name, roles }) => ({ id, name, roles })),
      instruments: bundle.instruments.map(({ id, name, serial, calibratedUntil }) => ({ id, name, serial, calibrationDue: calibratedUntil })),
      exportedAt: new Date(parts.clock()).toISOString(),
      head: bundle.head.hash,
      count: bundle.head.seq,
    },
    entries: bundle.entries,
  };
  const { kid } = await publicJwk(parts.config.signingKey);
  return signExport(exported, { ...parts.config.signingKey, alg: 'EdDSA' }, kid);
}
