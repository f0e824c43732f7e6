/** What the demo workshops hold: machines of makers that never were, their trees, and the runs that were done on them. */
import { parseProfile, parseTree } from '@/flows/document/parseTree';
import asFoundHarness from '@/flows/library/as-found-harness.json';
import coldChecks from '@/flows/library/cold-checks.json';
import diesTwice from '@/flows/library/dies-twice.json';
import discharge from '@/flows/library/discharge.json';
import earthInsulation from '@/flows/library/earth-insulation.json';
import firstPower from '@/flows/library/first-power.json';
import fullLoad from '@/flows/library/full-load.json';
import fuseSwitchMode from '@/flows/library/fuse-switch-mode.json';
import heatAndFan from '@/flows/library/heat-and-fan.json';
import lampBright from '@/flows/library/lamp-bright.json';
import lampFirst from '@/flows/library/lamp-first.json';
import lookOver from '@/flows/library/look-over.json';
import lostReturn from '@/flows/library/lost-return.json';
import makeDead from '@/flows/library/make-dead.json';
import proveSupplyNoTrip from '@/flows/library/prove-supply-no-trip.json';
import proveSupply from '@/flows/library/prove-supply.json';
import railLow from '@/flows/library/rail-low.json';
import rawOnRail from '@/flows/library/raw-on-rail.json';
import refitNoTrip from '@/flows/library/refit-no-trip.json';
import refit from '@/flows/library/refit.json';
import reformInPlace from '@/flows/library/reform-in-place.json';
import reformLifted from '@/flows/library/reform-lifted.json';
import regulatorBench from '@/flows/library/regulator-bench.json';
import returnsMeasured from '@/flows/library/returns-measured.json';
import ripple from '@/flows/library/ripple.json';
import ticking from '@/flows/library/ticking.json';
import tripFires from '@/flows/library/trip-fires.json';

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
    { ...first, document: tree(asFoundHarness), version: 1, state: 'issued', daysAgo: 88 },
    { ...first, document: tree(coldChecks), version: 1, state: 'issued', author: 'senior2', checker: 'senior', daysAgo: 84 },
    { ...first, document: tree(diesTwice), version: 1, state: 'issued', author: 'senior3', checker: 'senior', daysAgo: 80 },
    { ...first, document: tree(discharge), version: 1, state: 'issued', daysAgo: 77 },
    { ...first, document: tree(earthInsulation), version: 1, state: 'issued', author: 'senior2', checker: 'senior', daysAgo: 74 },
    { ...first, document: tree(fullLoad), version: 1, state: 'issued', author: 'senior3', checker: 'senior', daysAgo: 70 },
    { ...first, document: tree(fuseSwitchMode), version: 1, state: 'issued', daysAgo: 66 },
    { ...first, document: tree(heatAndFan), version: 1, state: 'issued', author: 'senior2', checker: 'senior', daysAgo: 63 },
    { ...first, document: tree(lampFirst), version: 1, state: 'issued', author: 'senior3', checker: 'senior', daysAgo: 60 },
    { ...first, document: tree(lostReturn), version: 1, state: 'issued', daysAgo: 57 },
    { ...first, document: tree(railLow), version: 1, state: 'issued', author: 'senior2', checker: 'senior', daysAgo: 54 },
    { ...first, document: tree(rawOnRail), version: 1, state: 'issued', author: 'senior3', checker: 'senior', daysAgo: 50 },
    { ...first, document: tree(refit), version: 1, state: 'issued', daysAgo: 46 },
    { ...first, document: tree(refitNoTrip), version: 1, state: 'issued', daysAgo: 46 },
    { ...first, document: tree(proveSupply), version: 1, state: 'issued', daysAgo: 46 },
    { ...first, document: tree(proveSupplyNoTrip), version: 1, state: 'issued', daysAgo: 46 },
    { ...first, document: tree(reformLifted), version: 1, state: 'issued', author: 'senior2', checker: 'senior', daysAgo: 42 },
    { ...first, document: tree(regulatorBench), version: 1, state: 'issued', author: 'senior3', checker: 'senior', daysAgo: 38 },
    { ...first, document: tree(ripple), version: 1, state: 'issued', daysAgo: 33 },
    { ...first, document: tree(ticking), version: 1, state: 'issued', author: 'senior2', checker: 'senior', daysAgo: 27 },
    { ...first, document: tree(tripFires), version: 1, state: 'issued', author: 'senior3', checker: 'senior', daysAgo: 20 },
    { ...second, document: tree(makeDead), version: 1, state: 'issued', daysAgo: 90 },
    { ...second, document: tree(firstPower), version: 1, state: 'issued', daysAgo: 80 },
  ],
  runs: demoRuns,
};

function wanted<T>(parsed: { ok: true; value: T } | { ok: false; faults: unknown }): T {
  if (!parsed.ok) throw new Error(`the demo's content has faults: ${JSON.stringify(parsed.faults)}`);
  return parsed.value;
}
