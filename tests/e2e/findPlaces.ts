/** Every page that a person of the demo can open, with the heading that it has to show. */
import { createDb, inWorkshop } from '@/db/createDb';
import { demoPeople, demoWorkshops, type DemoPersonKey } from '@/db/seeds/demoPeople';

export interface Place {
  path: string;
  heading: string | RegExp;
  /** true where the page is not the same for everybody */
  own?: boolean;
  /** true where another page of the list is made of the same parts */
  again?: boolean;
  /** name of its picture in the documentation */
  picture?: string;
}

/** All places, and one page of each kind below them; pages that only some roles have are left out for the others. */
export async function findPlaces(ownerUrl: string, who: DemoPersonKey): Promise<Place[]> {
  const db = createDb(ownerUrl, { connections: 1 });
  try {
    return await inWorkshop(db, demoWorkshops.first.id, async (tx) => {
      const runs = await tx
        .selectFrom('runs')
        .innerJoin('machines', 'machines.id', 'runs.machine')
        .innerJoin('run_heads', 'run_heads.run', 'runs.id')
        .select(['runs.id', 'runs.state', 'runs.restorer', 'machines.id as machine', 'machines.name', 'machines.serial', 'run_heads.hold_entry as hold'])
        .orderBy('runs.started_at', 'asc')
        .execute();
      const one = (state: string) => runs.find((run) => run.state === state) ?? wanted(state);
      const records = ['accepted', 'returned', 'submitted', 'closed'].map((state) => ({ path: `/records/${one(state).id}`, heading: /^(Supply|Fault|Stopped|Referred)/, ...(state === 'submitted' ? { own: true } : {}), ...(state === 'returned' || state === 'closed' ? { again: true } : {}), ...(state === 'accepted' ? { picture: 'record' } : {}) }));
      const open = runs.filter((run) => run.state === 'open' && run.restorer !== demoPeople[who].id);
      const others = [open.find((run) => run.hold !== null), open.find((run) => run.hold === null)].filter((run) => run !== undefined);
      return [
        { path: '/bench', heading: 'Bench', own: true },
        // a senior countersigns what waits; a restorer's own run is led on in tests of its own
        ...others.map((run) => ({ path: `/bench/${run.id}`, heading: run.hold !== null && who === 'senior' ? /^Countersign wanted/ : `${run.name}, serial ${run.serial}`, own: true })),
        { path: '/trees', heading: 'Fault trees', picture: 'trees' },
        { path: '/trees/first-power', heading: 'Dormant three-rail supply: first power', picture: 'tree' },
        { path: '/machines', heading: 'Machines', picture: 'machines' },
        { path: `/machines/${one('accepted').machine}`, heading: /Corvane 12/, picture: 'machine' },
        { path: '/records', heading: 'Records', picture: 'records' },
        ...records,
        { path: '/workings', heading: 'Workings' },
        { path: '/workings/series-lamp', heading: /lamp/i, picture: 'workings' },
        { path: '/workings/smoothing-ripple', heading: 'Smoothing ripple' },
        { path: '/workings/lost-return', heading: 'Lost return', picture: 'lost-return' },
        // a link with a fault in it
        { path: '/workings/bleed-down?volts=1,234', heading: 'Bleed-down' },
        { path: '/workshop', heading: demoWorkshops.first.name, picture: 'workshop' },
        { path: '/workshop/instruments', heading: 'Instruments' },
        { path: '/workshop/people', heading: 'People and roles' },
        { path: '/workshop/account', heading: 'My account' },
        { path: '/workshop/settings', heading: 'Settings of the workshop' },
        { path: '/nowhere', heading: 'No such page' },
      ];
    });
  } finally {
    await db.destroy();
  }
}

function wanted(state: string): never {
  throw new Error(`the demo has no ${state} run`);
}
