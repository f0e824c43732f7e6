/** Queries of machines, their profiles, releases and what stays fitted. */
import type { Tx } from '@/db/createDb';

/** Machines with their newest profile revision, by name; the caller narrows it down. */
export function findMachines(tx: Tx) {
  return tx
    .selectFrom('machines')
    .innerJoin('profile_revisions as newest', (join) =>
      join.onRef('newest.machine', '=', 'machines.id').on((eb) =>
        eb('newest.revision', '=', (eb2) => eb2.selectFrom('profile_revisions as other').select((e) => e.fn.max('other.revision').as('revision')).whereRef('other.machine', '=', 'machines.id')),
      ),
    )
    .leftJoin('runs as open', (join) => join.onRef('open.machine', '=', 'machines.id').on('open.state', '=', 'open'))
    .select(['machines.id', 'machines.name', 'machines.serial', 'machines.machine_class', 'newest.revision', 'newest.hash', 'newest.document as profile', 'open.id as open_run'])
    .select((eb) => eb.selectFrom('machine_tags').select(eb.fn.countAll<number>().as('tags')).whereRef('machine_tags.machine', '=', 'machines.id').as('tags'))
    .orderBy('machines.name')
    .orderBy('machines.serial');
}

/** Releases of the workshop or of one machine, newest first, void ones too. */
export function findReleases(tx: Tx, machine?: string) {
  return tx
    .selectFrom('releases')
    .leftJoin('release_voids', 'release_voids.release', 'releases.id')
    .select(['releases.id', 'releases.machine', 'releases.run', 'releases.given_at', 'releases.given_by', 'release_voids.voided_at', 'release_voids.run as void_run', 'release_voids.reason'])
    .$if(machine !== undefined, (query) => query.where('releases.machine', '=', machine ?? ''))
    .orderBy('releases.given_at', 'desc')
    .execute();
}

/** What earlier runs have left on the machine, oldest first. */
export function findMachineTags(tx: Tx, machine: string) {
  return tx.selectFrom('machine_tags').selectAll().where('machine', '=', machine).orderBy('id').execute();
}
