/** Bench facts in the words of a senior who was not there. */
import type { Facts } from '@/flows/facts/facts';
import type { Layout } from '@/flows/machine/program';

const SOURCE: Readonly<Record<Facts['sources'][number]['state'], string>> = {
  unknown: 'not known, treat as live', lapsed: 'lapsed, treat as live', full: 'in, full power', limited: 'in, limited', out: 'out',
};
const STORED: Readonly<Record<Facts['stored'], string>> = { unknown: 'not known', lapsed: 'lapsed', discharged: 'discharged, not proved', proved: 'proved dead' };
const PROVING: Readonly<Record<Facts['proving'], string>> = { none: 'none yet', regulator: 'regulator, on the bench supply', limited: 'on limited mains', full: 'on full mains and full load' };
const LOAD: Readonly<Record<Facts['load'], string>> = { boards: 'boards', none: 'none', light: 'light dummy load', full: 'full dummy load' };

/** One line a fact. Safety of the bench first, then what has been proved, then what is owed. */
export function factsInWords(facts: Facts, { steps, tree, profile }: Pick<Layout, 'steps' | 'tree' | 'profile'>): { name: string; value: string }[] {
  const { owed } = facts;
  const check = (key: string) => steps.get(key)?.step.title ?? key;
  const part = (id: string) => tree.suspects.find((suspect) => suspect.id === id)?.part ?? id;
  const rail = (id: string) => profile.rails.find((one) => one.id === id)?.name ?? id;
  const doubts = [...owed.doubts.map(check), ...owed.fails.filter((fail) => !fail.fixed).map((fail) => check(fail.check)), ...owed.killers.map((owes) => `${part(owes.killer)} for ${part(owes.part)}`)];
  return [
    ...facts.sources.map((source) => ({ name: `Source ${source.id}`, value: SOURCE[source.state] })),
    { name: 'Stored charge', value: STORED[facts.stored] },
    { name: 'Earth', value: facts.earth === 'proved' ? 'proved' : 'not proved' },
    { name: 'Insulation', value: facts.insulation === 'proved' ? 'proved' : 'not proved' },
    { name: 'Returns', value: facts.returns === 'proved' ? 'proved' : 'not proved' },
    ...facts.trips.map((trip) => ({ name: `Trip of ${rail(trip.rail)}`, value: trip.proved ? 'proved' : 'not tested' })),
    { name: 'Proving', value: PROVING[facts.proving] },
    { name: 'Load', value: LOAD[facts.load] },
    { name: 'Fitted', value: facts.fitted.length === 0 ? 'nothing' : facts.fitted.map((thing) => thing.name).join(', ') },
    { name: 'Open doubts', value: doubts.length === 0 ? 'none' : doubts.join(', ') },
    { name: 'Release', value: facts.release === 'valid' ? 'valid' : 'none' },
  ];
}
