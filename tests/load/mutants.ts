/** `npm run bench:mutants`: breaks every library tree on purpose and shows what the rules catch. */
import { readdirSync, readFileSync } from 'node:fs';

import { parseProfile, parseTree } from '@/flows/document/parseTree';
import { misfits } from '@/flows/document/admits';
import { defaultSettings } from '@/flows/document/settings';
import { oddProfiles } from '@/flows/proof/oddProfiles';
import { prove } from '@/flows/proof/prove';

import { must } from '../flows/support/bench';
import { mutantsOf } from '../flows/support/mutants';

const read = (folder: string) => readdirSync(folder).filter((f) => f.endsWith('.json')).sort().map((f) => JSON.parse(readFileSync(`${folder}/${f}`, 'utf8')) as unknown);
const trees = read('flows/library').map((json) => must(parseTree(json)));
const profiles = read('db/seeds/demo/profiles').map((json) => must(parseProfile(json))).concat(oddProfiles);

for (const tree of trees) {
  const profile = profiles.find((p) => misfits(tree, p).length === 0);
  if (profile === undefined) continue;
  const counts = { mutants: 0, refusedAsDocument: 0, refused: 0 };
  const survivors: string[] = [];
  const byRule: Record<string, number> = {};
  for (const mutant of mutantsOf(tree)) {
    counts.mutants += 1;
    if (mutant.tree === null) {
      counts.refusedAsDocument += 1;
      continue;
    }
    const broken = prove({ tree: mutant.tree, callees: trees, profile, settings: defaultSettings });
    if (broken.holds) survivors.push(mutant.name);
    else counts.refused += 1;
    for (const r of broken.rules) if (!r.holds) byRule[r.id] = (byRule[r.id] ?? 0) + 1;
  }
  process.stdout.write(`${JSON.stringify({ tree: tree.id, profile: profile.title, ...counts, byRule, survivors: survivors.length }, null, 0)}\n${survivors.map((s) => `  ${s}`).join('\n')}\n`);
}
