/**
 * A naive walker of trees, written without the compiled machine, its layout or its graph: a stack of trees, a step, the facts.
 * It knows outcomes only, no rows, phases or time. `needs`, `entered` and `after` are the rules themselves and are shared.
 */
import type { Profile } from '@/flows/document/profile';
import type { Settings } from '@/flows/document/settings';
import type { Exit, FittedThing, Step } from '@/flows/document/steps';
import type { Tree } from '@/flows/document/tree';
import { holds } from '@/flows/facts/atoms';
import { after, entered } from '@/flows/facts/effects';
import type { StepScope } from '@/flows/facts/effects';
import { worstFacts } from '@/flows/facts/facts';
import type { Facts } from '@/flows/facts/facts';
import { needs } from '@/flows/facts/needs';
import { applyOps } from '@/flows/facts/ops';

interface Frame {
  tree: Tree;
  /** the step of the calling tree, or null at the bottom */
  call: Step | null;
  counts: Map<string, number>;
}

export class Walker {
  facts: Facts;
  private stack: Frame[];
  private step: Step;
  private readonly callees: readonly Tree[];
  private readonly profile: Profile;
  private readonly settings: Settings;

  constructor(tree: Tree, callees: readonly Tree[], profile: Profile, settings: Settings) {
    this.callees = callees;
    this.profile = profile;
    this.settings = settings;
    this.facts = { ...worstFacts(profile), opened: true };
    this.stack = [{ tree, call: null, counts: new Map() }];
    this.step = tree.steps[0]!;
    this.enterCalls();
  }

  /** Where it stands: the ids of the calls and the step. */
  get key(): string {
    return [...this.stack.flatMap((f) => (f.call === null ? [] : [f.call.id])), this.step.id].join('/');
  }

  get ended(): boolean {
    return this.step.kind === 'end';
  }

  /** The rules that the step at which it stands is barred by. */
  barred(): string[] {
    return needs(this.step, this.scope()).filter((n) => !holds(this.facts, n.atom)).map((n) => n.rule);
  }

  /** The facts once the action of the step is shown. */
  get shown(): Facts {
    return applyOps(this.facts, entered(this.step, this.scope()));
  }

  /** Takes an outcome (or the id of an authored answer); the rules that bar the way on, in which case it stays. */
  take(outcome: string): string[] {
    const before = { facts: this.facts, step: this.step, stack: this.stack.map((f) => ({ ...f, counts: new Map(f.counts) })) };
    const scope = this.scope();
    const exit = this.step.exits.find((e: Exit) => (e.on.includes('answer') ? e.id === outcome : (e.on as string[]).includes(outcome)));
    if (exit === undefined) throw new Error(`${this.key} has no exit for ${outcome}`);
    this.facts = applyOps(this.facts, entered(this.step, scope));
    this.facts = applyOps(this.facts, after(this.step, exit, exit.on.includes('answer') ? 'answer' : outcome, scope));
    this.go(exit);
    const barred = this.barred();
    if (barred.length > 0) Object.assign(this, before);
    return barred;
  }

  private top(): Frame {
    return this.stack.at(-1)!;
  }

  private scope(): StepScope {
    const prefix = this.stack.flatMap((f) => (f.call === null ? [] : [`${f.call.id}/`])).join('');
    const { tree } = this.top();
    const things = new Map<string, FittedThing>();
    for (const s of tree.steps) if (s.kind === 'do') for (const f of s.fits ?? []) things.set(f.id, f);
    return { profile: this.profile, settings: this.settings, suspects: tree.suspects, things, check: (id) => prefix + id };
  }

  /** By an exit of the step or call at the top: counted exits lead to `to` so often and then to `then`. */
  private go(exit: Exit): void {
    const from = this.step.id;
    const { counts, tree } = this.top();
    const n = (counts.get(`${from}>${exit.id}`) ?? 0) + 1;
    counts.set(`${from}>${exit.id}`, n);
    const to = exit.atMost !== undefined && exit.then !== undefined && n > exit.atMost ? exit.then : exit.to;
    this.step = tree.steps.find((s) => s.id === to)!;
    this.leaveEnds();
    this.enterCalls();
  }

  private enterCalls(): void {
    // where a part may hold beryllium oxide, something else stands in the place of opening it
    if (this.step.kind === 'observe' && this.step.opens?.instead !== undefined && this.profile.hazards.includes('beryllium-oxide')) {
      const { instead } = this.step.opens;
      this.step = this.top().tree.steps.find((s) => s.id === instead)!;
    }
    if (this.step.kind !== 'call') return;
    const callee = this.callees.find((t) => this.step.kind === 'call' && t.id === this.step.tree)!;
    this.stack.push({ tree: callee, call: this.step, counts: new Map() });
    this.step = callee.steps[0]!;
    this.enterCalls();
  }

  private leaveEnds(): void {
    const { step } = this;
    const { call } = this.top();
    if (step.kind !== 'end' || call === null || step.says === 'stopped' || step.says === 'in-service') return;
    this.stack.pop();
    const exit = call.exits.find((e: Exit) => (e.on as string[]).includes(step.id))!;
    this.step = call;
    const scope = this.scope();
    for (const e of exit.evidence ?? []) {
      if (e.says === 'rules-out' || e.says === 'points-away') this.facts = applyOps(this.facts, [{ op: 'clear', suspect: scope.check(e.suspect) }]);
    }
    this.go(exit);
  }
}
