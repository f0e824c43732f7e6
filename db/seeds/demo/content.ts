/** What the demo workshops hold: machines of makers that never were, their trees, and the runs that were done on them. */
import { parseProfile, parseTree } from '@/flows/document/parseTree';
import firstPower from '@/flows/library/first-power.json';
import lampBright from '@/flows/library/lamp-bright.json';
import lookOver from '@/flows/library/look-over.json';
import makeDead from '@/flows/library/make-dead.json';
import reformInPlace from '@/flows/library/reform-in-place.json';
import returnsMeasured from '@/flows/library/returns-measured.json';

import type { DemoContent } from '../DemoContent';
import { demoRuns } from './demoRuns';
import brindle from './profiles/brindle-80.json';
import corvane from './profiles/corvane-12.json';
import ostrel from './profiles/ostrel-16.json';
import wendle from './profiles/wendle-5.json';

const profile = (json: unknown) => wanted(parseProfile(json));
const tree = (json: unknown) => wanted(parseTree(json));

const first = { workshop: 'first', author: 'senior', checker: 'senior2' } as const;
const second = { workshop: 'second', author: 'other', checker: 'otherRestorer' } as const;

export const demoContent: DemoContent = {
  machines: [
    { key: 'corvane', workshop: 'first', name: 'Corvane 12', serial: 'C12-0417', profile: profile(corvane) },
    { key: 'corvane-b', workshop: 'first', name: 'Corvane 12', serial: 'C12-0588', profile: profile(corvane) },
    { key: 'ostrel', workshop: 'first', name: 'Ostrel 16', serial: '16/2093', profile: profile(ostrel) },
    { key: 'ostrel-b', workshop: 'first', name: 'Ostrel 16', serial: '16/2214', profile: profile(ostrel) },
    { key: 'wendle', workshop: 'first', name: 'Wendle 5', serial: 'W5 1120', profile: profile(wendle) },
    { key: 'wendle-b', workshop: 'first', name: 'Wendle 5', serial: 'W5 1131', profile: profile(wendle) },
    { key: 'brindle', workshop: 'first', name: 'Brindle 80', serial: 'B80-33', profile: profile(brindle) },
    { key: 'corvane', workshop: 'second', name: 'Corvane 12', serial: 'C12-0102', profile: profile(corvane) },
  ],
  trees: [
    { ...first, document: tree(makeDead), version: 1, state: 'issued', daysAgo: 190 },
    { ...first, document: { ...tree(firstPower), title: 'Dormant three-rail supply, first trial' }, version: 1, state: 'withdrawn', daysAgo: 150 },
    { ...first, document: tree(firstPower), version: 2, state: 'issued', daysAgo: 120 },
    { ...first, document: tree(lookOver), version: 1, state: 'issued', daysAgo: 110 },
    { ...first, document: tree(returnsMeasured), version: 1, state: 'issued', author: 'senior3', daysAgo: 95 },
    { ...first, document: tree(reformInPlace), version: 1, state: 'withdrawn', author: 'senior2', checker: 'senior', daysAgo: 170 },
    { ...first, document: tree(lampBright), version: 1, state: 'draft', author: 'senior3', checker: null, daysAgo: 6 },
    { ...second, document: tree(makeDead), version: 1, state: 'issued', daysAgo: 90 },
    { ...second, document: tree(firstPower), version: 1, state: 'issued', daysAgo: 80 },
  ],
  runs: demoRuns,
};

function wanted<T>(parsed: { ok: true; value: T } | { ok: false; faults: unknown }): T {
  if (!parsed.ok) throw new Error(`the demo's content has faults: ${JSON.stringify(parsed.faults)}`);
  return parsed.value;
}
