/** `npm run bench:engine`: proof, compile and step of large trees, trees that call trees, and a draft; ratios are taken within one run. */
import { transition } from 'xstate';

import { draft } from '@/flows/draft/draft';
import { defaultSettings } from '@/flows/document/settings';
import { advance, startRun } from '@/flows/machine/advance';
import { compile } from '@/flows/machine/compile';
import { prove } from '@/flows/proof/prove';
import { nextEvent } from '@/flows/rehearsal/drive';

import { benchProfile, makeDeadTree } from '../flows/support/bench';
import { randomTable } from '../flows/draft/tables';
import { bigTree } from './bigTree';
import { callsByTrees, chain } from './manyCalls';
import type { Called } from './manyCalls';

const pair = (size: number) => ({ tree: bigTree(size, 7), callees: [makeDeadTree], profile: benchProfile, settings: defaultSettings });

/** Best of several, in milliseconds of the wall: on a machine that does nothing else. */
function best(times: number, run: () => void): number {
  let least = Infinity;
  for (let i = 0; i < times; i += 1) {
    const from = performance.now();
    run();
    least = Math.min(least, performance.now() - from);
  }
  return least;
}

const small = pair(1000);
const large = pair(10_000);
const holds = [prove(small), prove(large)].map((p) => p.rules.filter((r) => !r.holds).map((r) => `${r.id} ${r.story}`));
const smallMs = best(5, () => prove(small));
const largeMs = best(3, () => prove(large));
const middle = pair(2000);
const compileMs = best(5, () => compile(middle));

const compiled = compile(middle);
if (!compiled.ok) throw new Error('does not compile');
const { program } = compiled;
let state = startRun(program, { restorer: 'ann', restorerIsSenior: true, at: 1_700_000_000_000, release: false, fitted: [], killers: [] });
const steps: { state: typeof state; event: NonNullable<ReturnType<typeof nextEvent>> }[] = [];
for (let i = 0; i < 400; i += 1) {
  const event = nextEvent(program, state, null);
  if (event === null) break;
  steps.push({ state, event });
  const advanced = advance(program, state, event);
  if (!advanced.ok) throw new Error(advanced.refusal.say);
  state = advanced.state;
}
const bare = best(5, () => {
  for (const s of steps) transition(program.machine, program.machine.resolveState({ value: s.state.value as never, context: s.state.context }), s.event);
});
const whole = best(5, () => {
  for (const s of steps) advance(program, s.state, s.event);
});

const called = (name: string, given: Called) => {
  const whole = { ...given, profile: benchProfile, settings: defaultSettings };
  const proof = prove(whole);
  const size = compile(whole);
  return { name, steps: size.ok ? size.program.layout.steps.size : null, broken: proof.rules.filter((r) => !r.holds).map((r) => `${r.id} ${r.story}`), ms: Math.round(best(2, () => prove(whole))) };
};
const calls = [called('20 trees that each call make-dead 20 times', callsByTrees(20, 20)), called('three levels of six calls each', chain(3, 6)), called('three levels of twelve calls each', chain(3, 12))];

const table = randomTable(7, 200, 200);
const drafted = draft(table).report;
const draftMs = best(2, () => draft(table));
const gaps = Array.from({ length: 200 }, (_, seed) => {
  const little = randomTable(seed, 5 + (seed % 8), 6 + (seed % 7));
  const optimum = draft(little).report.optimumMinutes ?? Number.NaN;
  return draft(little, { exact: false }).report.expectedMinutes / optimum - 1;
});

process.stdout.write(
  `${JSON.stringify(
    {
      proof: { broken: holds, ms1000: Math.round(smallMs), ms10000: Math.round(largeMs), ratio: Number((largeMs / smallMs).toFixed(1)), bar: 'under 500 ms and at most 12 times' },
      calls,
      draft: { ms: Math.round(draftMs), gapToBound: Number(drafted.gap.toFixed(4)), worstOf200SmallTables: Number(Math.max(...gaps).toFixed(4)), bar: 'under 3000 ms, and within 0.05 of the optimum with the exact solver off' },
      compile: { ms2000: Math.round(compileMs), bar: 'under 300 ms' },
      step: { events: steps.length, bareMs: Number((bare / steps.length).toFixed(3)), wholeMs: Number((whole / steps.length).toFixed(3)), ratio: Number((whole / bare).toFixed(2)), bar: 'at most 3 times a bare transition' },
    },
    null,
    1,
  )}\n`,
);
