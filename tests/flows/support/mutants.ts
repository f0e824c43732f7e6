/** Trees broken on purpose: every single edit of a kind that matters, made on a copy. */
import { parseTree } from '@/flows/document/parseTree';
import type { Exit, Step } from '@/flows/document/steps';
import type { Tree } from '@/flows/document/tree';

export interface Mutant {
  /** what was done, and to which step */
  name: string;
  kind: string;
  /** the tree, or null where the document itself is refused (with what it says) */
  tree: Tree | null;
  say: string;
}

type Loose = Record<string, unknown> & { id: string; kind: Step['kind']; exits: (Exit & Record<string, unknown>)[] };
type Edit = { kind: string; at: string; change: (steps: Loose[], at: number) => void };

/** Leads everything that led to a step past it, to where its good exit leads. */
function bypass(steps: Loose[], at: number): void {
  const gone = steps[at];
  const on = gone?.exits[0]?.to;
  if (gone === undefined || on === undefined) return;
  for (const s of steps) for (const e of s.exits) {
    if (e.to === gone.id) e.to = on;
    if (e.then === gone.id) e.then = on;
  }
  steps.splice(at, 1);
  // a tree begins with its first step
  if (at === 0) {
    const first = steps.findIndex((s) => s.id === on);
    if (first > 0) steps.unshift(...steps.splice(first, 1));
  }
}

function edits(tree: Tree): Edit[] {
  return tree.steps.flatMap((step): Edit[] => {
    const at = step.id;
    const list: Edit[] = [];
    const drop = (kind: string) => list.push({ kind, at, change: bypass });
    if (step.kind === 'call') drop('drop a make-dead');
    if (step.kind === 'isolate' || step.kind === 'discharge' || step.kind === 'prove-dead') drop(`drop ${step.kind}`);
    if (step.kind === 'prove-earth' || step.kind === 'prove-insulation' || step.kind === 'prove-returns' || step.kind === 'prove-trip' || step.kind === 'prove-rails') drop(`drop ${step.kind}`);
    if (step.kind === 'observe' && step.lookOver === true) drop('drop the look-over');
    if (step.kind === 'do' && (step.removes?.length ?? 0) > 0) drop('forget to take out');
    if (step.kind === 'do' && (step.fits?.length ?? 0) > 0) drop('forget to fit');
    if (step.kind === 'do' && step.confirms !== undefined) drop('forget to confirm the test conditions');
    if (step.kind === 'photo' && tree.steps.some((s) => s.kind === 'observe' && s.opens?.photo === step.id)) drop('open a part without its photo');
    if (step.kind === 'connect-load') {
      drop('forget the load');
      list.push({ kind: 'boards in early', at, change: (steps, i) => Object.assign(steps[i] ?? {}, { load: 'boards' }) });
    }
    if (step.kind === 'energise' && step.through === 'lamp') list.push({ kind: 'lamp to mains', at, change: (steps, i) => Object.assign(steps[i] ?? {}, { through: 'mains', lampWatts: undefined }) });
    if (step.kind === 'energise' && step.through === 'bench') list.push({ kind: 'bench limit away', at, change: (steps, i) => Object.assign(steps[i] ?? {}, { mostAmps: 500 }) });
    if (step.kind === 'energise') list.push({ kind: 'abort to a check', at, change: (steps, i) => Object.assign(steps[i] ?? {}, { abort: steps.find((s) => s.kind === 'observe')?.id ?? '' }) });
    if ('power' in step && step.power === 'live') list.push({ kind: 'hands on a live step', at, change: (steps, i) => Object.assign(steps[i] ?? {}, { contact: 'hands' }) });
    step.exits.forEach((exit: Exit, j: number) => {
      const pass = step.exits[0];
      if (j > 0 && pass !== undefined && exit.to !== pass.to && step.kind !== 'energise') {
        list.push({ kind: 'an exit led past its check', at: `${at}>${exit.id}`, change: (steps, i) => { const e = steps[i]?.exits[j]; if (e) { e.to = pass.to; delete e['atMost']; delete e['then']; } } });
      }
      if (exit.atMost !== undefined) list.push({ kind: 'a loop unbound', at: `${at}>${exit.id}`, change: (steps, i) => { const e = steps[i]?.exits[j]; if (e) { delete e['atMost']; delete e['then']; } } });
      if (exit.on.length > 1) list.push({ kind: 'an outcome left out', at: `${at}>${exit.id}`, change: (steps, i) => { const e = steps[i]?.exits[j]; if (e) e.on = e.on.slice(1) as typeof e.on; } });
    });
    return list;
  });
}

/** Every mutant of a tree. */
export function mutantsOf(tree: Tree): Mutant[] {
  return edits(tree).map(({ kind, at, change }) => {
    const copy = JSON.parse(JSON.stringify(tree)) as Omit<Tree, 'steps'> & { steps: Loose[] };
    const index = copy.steps.findIndex((s) => s.id === at.split('>')[0]);
    change(copy.steps, index);
    const parsed = parseTree(JSON.parse(JSON.stringify(copy)));
    return { name: `${kind}: ${at}`, kind, tree: parsed.ok ? parsed.value : null, say: parsed.ok ? '' : (parsed.faults[0]?.message ?? '') };
  });
}
