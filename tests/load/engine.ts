/** `npm run bench:engine`: proof, compile and step of large trees; ratios are taken within one run. */
import { transition } from 'xstate';

import { defaultSettings } from '@/flows/document/settings';
import { advance, startRun } from '@/flows/machine/advance';
import { compile } from '@/flows/machine/compile';
import { prove } from '@/flows/proof/prove';
import { nextEvent } from '@/flows/rehearsal/drive';

import { benchProfile, makeDeadTree } from '../flows/support/bench';
import { bigTree } from './bigTree';

const pair = (size: number) => ({ tree: bigTree(size, 7), callees: [makeDeadTree], profile: benchProfile, settings: defaultSettings });

/** Best of several, in milliseconds. */
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

process.stdout.write(
  `${JSON.stringify(
    {
      proof: { broken: holds, ms1000: Math.round(smallMs), ms10000: Math.round(largeMs), ratio: Number((largeMs / smallMs).toFixed(1)), bar: 'under 500 ms and at most 12 times' },
      compile: { ms2000: Math.round(compileMs), bar: 'under 300 ms' },
      step: { events: steps.length, bareMs: Number((bare / steps.length).toFixed(3)), wholeMs: Number((whole / steps.length).toFixed(3)), ratio: Number((whole / bare).toFixed(2)), bar: 'at most 3 times a bare transition' },
    },
    null,
    1,
  )}\n`,
);
