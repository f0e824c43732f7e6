/** The shortest tree that wants a photo, issued in the demo workshop. */
import { demoPeople, demoWorkshops } from '@/db/seeds/demoPeople';
import { parseTree } from '@/flows/document/parseTree';
import { lampTreeJson, must } from '@/tests/flows/support/bench';
import { addTree } from '@/tests/setup/factory';

const one = (id: string) => lampTreeJson.steps.find((step) => step.id === id);

export const photoTree = must(
  parseTree({
    ...lampTreeJson,
    id: 'connectors-seen',
    title: 'Connectors, photographed before they move',
    suspects: [],
    opening: { ...lampTreeJson.opening, instruments: [] },
    reentries: [],
    steps: [
      { ...one('dead1'), exits: one('dead1')?.exits.map((exit) => (exit.to === 'earth' ? { ...exit, to: 'seen' } : exit)) },
      {
        id: 'seen', kind: 'photo', title: 'The connectors as found', lines: ['Photograph the connectors as they stand.'], of: 'connectors', power: 'dead', contact: 'none',
        tools: [], minutes: 2, hazards: [], exits: [{ id: 'taken', on: ['done'], to: 'done' }, { id: 'none', on: ['cannot'], to: 'refer' }],
      },
      one('done'),
      one('refer'),
    ].filter((step) => step !== undefined),
  }),
);

/** Issues it as the senior of the demo. */
export async function addPhotoTree(ownerUrl: string): Promise<void> {
  const person = (key: 'senior' | 'reviewer') => ({ id: demoPeople[key].id, mail: demoPeople[key].mail, code: key });
  await addTree(ownerUrl, { id: demoWorkshops.first.id, senior: person('senior'), senior2: person('reviewer') }, photoTree);
}
