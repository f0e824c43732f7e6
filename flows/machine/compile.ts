/** Compiles a laid-out tree into an XState machine: one state a step, one below it for each phase, a transition for each exit. */
import { assign, setup } from 'xstate';

import type { DocumentFault } from '../document/parseTree';
import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import type { Exit } from '../document/steps';
import type { Tree } from '../document/tree';
import { enter } from './arrive';
import type { Judged } from './arrive';
import type { Phase, RunContext } from './context';
import type { EventType, MachineEvent } from './events';
import { judge, needsHold } from './judge';
import { landingsOf, layOut, SAFE } from './program';
import type { Layout, ProgramStep } from './program';

/** Changes whenever the same entries could lead to another state; snapshots of another engine are dropped. */
export const ENGINE = 'lampstep-engine-6';

interface Args {
  context: RunContext;
  event: MachineEvent;
}
interface Move {
  target?: string;
  guard?: (args: Args) => boolean;
  actions?: unknown;
}
interface Node {
  id?: string;
  type?: 'final';
  initial?: string;
  entry?: unknown;
  always?: Move[];
  on?: Partial<Record<EventType, Move[]>>;
  states?: Record<string, Node>;
}

const base = setup({ types: { context: {} as RunContext, events: {} as MachineEvent, input: {} as RunContext } });

export type RunMachine = ReturnType<typeof base.createMachine>;

/** A compiled tree: the layout that every question is asked of, and the machine that both server and client run. */
export interface Program {
  engine: string;
  layout: Layout;
  machine: RunMachine;
}

/** Compiles a tree with its callees for one profile and the workshop's settings. */
export function compile(input: { tree: Tree; callees: readonly Tree[]; profile: Profile; settings: Settings }): { ok: true; program: Program } | { ok: false; faults: DocumentFault[] } {
  const { layout, faults } = layOut(input);
  return faults.length > 0 ? { ok: false, faults } : { ok: true, program: { engine: ENGINE, layout, machine: machineOf(layout) } };
}

function machineOf(layout: Layout): RunMachine {
  const ask = asker(layout);
  const goes = (key: string | null) => (args: Args) => {
    const judged = ask(args);
    return judged.ok && judged.next.goto === key;
  };
  const taken = (args: Args) => ask(args).ok;
  const apply = assign(({ context, event }: Args) => {
    const judged = ask({ context, event });
    return judged.ok ? judged.next : context;
  });
  const phase = (name: Phase) => assign({ phase: () => name });
  const away: Move[] = [{ guard: taken, actions: apply, target: '#~route' }];

  const stepNode = (placed: ProgramStep): Node => {
    const { key, step } = placed;
    const power = step.kind === 'energise' || step.kind === 'raise';
    const hold = (args: Args) => needsHold(layout, args.context, placed);
    const begin = assign(({ context }: Args) => enter(context, placed));
    const onward = (guard?: Move['guard'], actions: unknown[] = []): Move[] => {
      const both = (other: (args: Args) => boolean) => (args: Args) => (guard?.(args) ?? true) && other(args);
      return power
        ? [
            { guard: both(hold), actions, target: 'hold' },
            { ...(guard ? { guard } : {}), actions, target: 'guard' },
          ]
        : [{ ...(guard ? { guard } : {}), actions: [...actions, begin], target: 'act' }];
    };
    const leads = leadsOf(layout, placed);
    const answers: Move[] = [{ guard: goes(null), actions: apply }, ...leads.map((to) => ({ guard: goes(to), actions: apply, target: `#${to}` })), ...away];
    const held: Move[] = power ? [{ guard: goes(null), actions: apply, target: 'guard' }, ...answers] : answers;
    const states: Record<string, Node> = {
      gate: { always: placed.hazards.length > 0 ? [{ target: 'warning' }] : onward() },
      warning: { entry: phase('warning'), on: { WARNING_READ: onward(taken, [apply]) } },
      act: {
        entry: phase('act'),
        on: { ROW: answers, READING: answers, ANSWER: answers, ...(step.kind === 'photo' ? { PHOTO: answers } : {}), ...(step.kind === 'hold' ? { HOLD_ASKED: [{ guard: taken, actions: apply, target: 'hold-wait' }] } : {}), ...(placed.key === SAFE.choose ? { REENTER: away, CLOSE: away } : {}) },
      },
    };
    if (power || step.kind === 'hold') {
      states['hold-wait'] = { entry: phase('hold-wait'), on: { HOLD_GIVEN: held, HOLD_REFUSED: answers } };
    }
    if (power) {
      states['hold'] = { entry: phase('hold'), on: { HOLD_ASKED: [{ guard: taken, actions: apply, target: 'hold-wait' }] } };
      states['guard'] = { entry: phase('guard'), on: { GUARD_HELD: [{ guard: taken, actions: apply, target: 'act' }], HOLD_ASKED: [{ guard: taken, actions: apply, target: 'hold-wait' }] } };
    }
    return { id: key, initial: 'gate', entry: arrive(key), states };
  };

  const placed = [...layout.steps.values()];
  const below = new Map<string | null, ProgramStep[]>();
  for (const p of placed) {
    if (p.builtIn || p.step.kind === 'end') continue;
    const known = below.get(p.caller);
    if (known === undefined) below.set(p.caller, [p]);
    else known.push(p);
  }
  // a call is a state with the states of the called tree in it, and so on down
  const statesOf = (call: string | null): Record<string, Node> =>
    Object.fromEntries((below.get(call) ?? []).map((p): [string, Node] => [p.step.id, p.step.kind === 'call' ? { initial: below.get(p.key)?.[0]?.step.id ?? '', states: statesOf(p.key) } : stepNode(p)]));
  const tree = statesOf(null);
  const safe = Object.fromEntries(placed.filter((p) => p.builtIn).map((p) => [p.key, stepNode(p)]));
  const reachable = [...placed].sort((a, b) => Number(b.builtIn) - Number(a.builtIn)).filter((p) => p.step.kind !== 'call' && p.step.kind !== 'end').map((p) => p.key);
  const opening: Move[] = [{ guard: goes(null), actions: apply }, ...away];

  const config: Node & { context: unknown } = {
    id: 'run',
    initial: SAFE.opening,
    context: ({ input }: { input: RunContext }) => input,
    on: {
      STOP: [{ guard: taken, actions: apply, target: `#${SAFE.isolate}` }],
      ABORT: away,
      RESTART: [{ guard: goes(null), actions: apply }, ...away],
      RESUME: away,
      PAUSE: [{ guard: taken, actions: apply, target: '#~paused' }],
      SECOND_PRESENT: [{ guard: taken, actions: apply }],
      NOTE: [{ guard: taken, actions: apply }],
      HANDED_OVER: [{ guard: taken, actions: apply, target: '#~paused' }],
      TAKEN_OVER: away,
      TICK: [{ guard: goes(null), actions: apply }, ...away],
    },
    states: {
      [SAFE.opening]: { id: SAFE.opening, entry: [arrive(SAFE.opening), phase('opening')], on: { ROW: opening } },
      tree: { initial: Object.keys(tree)[0] ?? '', states: tree },
      safe: { initial: SAFE.isolate, states: safe },
      '~route': { id: '~route', always: [SAFE.opening, SAFE.ended, ...reachable].map((key) => ({ guard: ({ context }: Args) => context.goto === key, target: `#${key}` })) },
      '~paused': { id: '~paused', entry: phase('paused') },
      [SAFE.ended]: { id: SAFE.ended, entry: [arrive(SAFE.ended), phase('ended')], on: { CLOSE: [{ guard: taken, actions: apply, target: '#~closed' }] } },
      '~closed': { id: '~closed', type: 'final', entry: phase('closed') },
    },
  };
  return base.createMachine(config as unknown as Parameters<typeof base.createMachine>[0]);
}

/** Marks the arrival at a step: no row answered, waits counting from now. */
function arrive(key: string) {
  return assign(({ context }: Args) => ({
    ...context,
    key,
    rows: [],
    proofInstrument: null,
    goto: null,
    enteredAt: context.last.at,
    visited: context.visited.includes(key) ? context.visited : [...context.visited, key],
  }));
}

/** Every key that an exit of this step can lead to directly, counted or not. */
function leadsOf(layout: Layout, placed: ProgramStep): string[] {
  if (placed.builtIn) return [SAFE.isolate, SAFE.discharge, SAFE.prove, SAFE.takeOut, SAFE.putBack, SAFE.readBack, SAFE.choose, SAFE.ended];
  const targets = placed.step.exits.flatMap((e: Exit) => [e.to, ...(e.then === undefined ? [] : [e.then])]).map((to) => placed.scope.check(to));
  const landed = targets.flatMap((to) => landingsOf(layout, to).map((landing) => landing.key)).filter((key) => {
    const kind = layout.steps.get(key)?.step.kind;
    return kind !== undefined && kind !== 'end' && kind !== 'call';
  });
  // to safety it goes by way of the route, which knows every key
  return [...new Set(landed)];
}

/** Asks `judge` once for each event and context: guards and actions of one transition share the answer. */
function asker(layout: Layout): (args: Args) => Judged {
  const answers = new WeakMap<MachineEvent, { context: RunContext; judged: Judged }>();
  return ({ context, event }) => {
    const known = answers.get(event);
    if (known !== undefined && known.context === context) return known.judged;
    const judged = judge(layout, context, event);
    answers.set(event, { context, judged });
    return judged;
  };
}
