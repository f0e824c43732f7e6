/** The jobs that write letters. */
import type { TaskList } from 'graphile-worker';
import { z } from 'zod';

import { inWorkshop } from '@/db/createDb';
import type { Db } from '@/db/createDb';

import type { Mailer } from '../adapters/mail';
import { COUNTERSIGN_WANTED } from './askForCountersign';
import { countersignWanted } from './countersignWanted';
import { PASSWORD_CHANGED, passwordChanged } from './passwordChanged';

const jobSchema = z.object({ workshop: z.uuid(), run: z.uuid(), entry: z.uuid(), step: z.string(), to: z.uuid() });

const passwordJobSchema = z.object({ person: z.uuid(), workshop: z.uuid(), at: z.iso.datetime() });

/** The tasks of the job queue by name. One that throws is tried again later. */
export function mailTasks({ db, mailer, publicUrl }: { db: Db; mailer: Mailer; publicUrl: string }): TaskList {
  return {
    [COUNTERSIGN_WANTED]: async (payload) => {
      const job = jobSchema.parse(payload);
      const facts = await inWorkshop(db, job.workshop, async (tx) => {
        const to = await tx.selectFrom('people').select(['name', 'mail']).where('id', '=', job.to).executeTakeFirst();
        const run = await tx
          .selectFrom('runs')
          .innerJoin('machines', 'machines.id', 'runs.machine')
          .innerJoin('people', 'people.id', 'runs.restorer')
          .innerJoin('tree_versions', (join) =>
            join.onRef('tree_versions.workshop', '=', 'runs.workshop').onRef('tree_versions.tree', '=', 'runs.tree').onRef('tree_versions.version', '=', 'runs.tree_version'),
          )
          .select(['machines.name as machine', 'machines.serial', 'people.name as restorer', 'tree_versions.document as tree'])
          .where('runs.id', '=', job.run)
          .executeTakeFirst();
        return to === undefined || run === undefined ? undefined : { to, run };
      });
      if (facts === undefined) return;
      const { to, run } = facts;
      await mailer.send(
        countersignWanted({
          to: { name: to.name, address: to.mail },
          machine: run.machine, serial: run.serial, restorer: run.restorer, tree: run.tree.title, step: job.step,
          link: `${publicUrl}/bench/${job.run}`,
        }),
      );
    },
    [PASSWORD_CHANGED]: async (payload) => {
      const job = passwordJobSchema.parse(payload);
      const facts = await inWorkshop(db, job.workshop, async (tx) => ({
        to: await tx.selectFrom('people').select(['name', 'mail']).where('id', '=', job.person).executeTakeFirst(),
        workshop: await tx.selectFrom('workshops').select('name').where('id', '=', job.workshop).executeTakeFirst(),
      }));
      if (facts.to === undefined || facts.workshop === undefined) return;
      await mailer.send(passwordChanged({ to: { name: facts.to.name, address: facts.to.mail }, workshop: facts.workshop.name, at: new Date(job.at) }));
    },
  };
}
