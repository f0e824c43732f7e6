/** The run screen in the hands of a restorer: everything is found by role and name. */
import { expect, type Page } from '@playwright/test';

import { goodReading, meterFor } from './goodReading';
import { ASK, READ, readScreen, WAITS, type Seen } from './readScreen';

const RECORD = /^(Yes, )?[Rr]ecord/;

/** What the restorer says where the first answer is not the one: by title of the step, or by title and field. */
export interface Script {
  answers?: Readonly<Record<string, string>>;
  readings?: Readonly<Record<string, string>>;
}

export class BenchPage {
  readonly page: Page;
  readonly script: Script;

  constructor(page: Page, script: Script = {}) {
    this.page = page;
    this.script = script;
  }

  look(): Promise<Seen> {
    return readScreen(this.page);
  }

  /** Starts a run: the machine, then the tree, by their names. */
  async start(machine: string, tree: string): Promise<void> {
    await this.page.getByRole('radiogroup', { name: 'Machine' }).getByRole('radio', { name: machine }).click();
    await this.page.getByRole('radiogroup', { name: 'Fault tree' }).getByRole('radio', { name: tree }).click();
    await this.page.getByRole('button', { name: 'Start the run' }).click();
    await this.page.waitForURL(/\/bench\/[0-9a-f-]{36}$/);
    await expect(this.page.getByRole('heading', { level: 1, name: 'Open the bench' })).toBeVisible();
  }

  /** The run of the address. */
  get run(): string {
    return new URL(this.page.url()).pathname.split('/').at(-1) ?? '';
  }

  async readWarning(): Promise<void> {
    await this.page.getByRole('button', { name: READ }).click();
  }

  async askHold(): Promise<void> {
    await this.page.getByRole('button', { name: ASK }).click();
    await expect(this.page.getByRole('button', { name: WAITS })).toBeVisible();
  }

  /** Looks into the way of the run until it says that the server has every answer. */
  async allSaved(): Promise<void> {
    await this.page.getByRole('button', { name: /: show the way$/ }).click();
    const dialog = this.page.getByRole('dialog');
    await expect(dialog.getByText('all saved', { exact: true })).toBeVisible({ timeout: 40_000 });
    await dialog.getByRole('button', { name: 'Back to the step' }).click();
  }

  /** A senior reads the hold point of this run on a device of their own and gives the countersign; it arrives here by itself. */
  async countersign(senior: Page, password: string): Promise<void> {
    await senior.goto(`/bench`);
    await senior.locator(`a[href$="${this.run}"]`).click();
    await senior.getByRole('textbox', { name: 'Your password' }).fill(password);
    await senior.getByRole('button', { name: 'Give the countersign' }).click();
    await expect(senior.getByText('No countersign is awaited here')).toBeVisible();
    await expect(this.page.getByRole('button', { name: WAITS })).toBeHidden();
  }

  /** Ticks what has to be looked at, then keeps the pointer down until the button has had its two seconds. */
  async holdGuard(): Promise<void> {
    const boxes = this.page.getByRole('checkbox', { checked: false });
    while ((await boxes.count()) > 0) await boxes.first().click();
    const guard = this.page.getByRole('button', { name: /^Hold: / });
    await guard.hover();
    await this.page.mouse.down();
    await expect(guard).toBeHidden();
    await this.page.mouse.up();
  }

  /** Gives an answer by its words. */
  async answer(words: string): Promise<void> {
    await this.page.getByRole('group', { name: 'Answers' }).getByRole('button', { name: words, exact: true }).click();
  }

  /** Types a reading without recording it. */
  async type(text: string): Promise<void> {
    await this.page.getByRole('main').getByRole('textbox').fill(text);
  }

  async record(): Promise<void> {
    await this.page.getByRole('button', { name: RECORD }).click();
  }

  /** Takes the instrument with this sticker into the hand. */
  async takeMeter(tag: string): Promise<void> {
    await this.page.getByRole('button', { name: /^Meter: / }).click();
    const dialog = this.page.getByRole('dialog', { name: 'Which instrument?' });
    await dialog.getByRole('radio', { name: new RegExp(`^${tag}`) }).click();
    await dialog.getByRole('button', { name: 'Back to the reading' }).click();
  }

  async stop(): Promise<void> {
    await this.page.getByRole('button', { name: 'STOP, MAKE SAFE' }).click();
  }

  /** One move as a person makes it who finds everything good; resolves when the screen has moved on. */
  async move(seen: Seen): Promise<void> {
    const first = seen.answers.find((b) => !/^(Letters and sign|Meter: |Over range$)/.test(b.name));
    const named = (name: string) => [...seen.buttons, ...seen.answers].some((b) => b.name === name);
    if (named(READ)) await this.readWarning();
    else if (named(ASK)) return this.askHold();
    else if (seen.unticked.length > 0) await this.holdGuard();
    else if (seen.entry !== null) await this.read(seen);
    else if (first === undefined || first.disabled) return this.untilOpen(seen);
    else await this.answer(this.script.answers?.[seen.title] ?? first.name);
    await this.movedOn(seen);
  }

  /** Plays on until the screen is as wanted. */
  async playUntil(wanted: (seen: Seen) => boolean): Promise<Seen> {
    let seen = await this.look();
    while (!wanted(seen)) {
      await this.move(seen);
      seen = await this.look();
    }
    return seen;
  }

  /** Lets the time of this device go by: wall clock and steady clock together. */
  private async wait(seen: Seen): Promise<void> {
    await this.page.clock.fastForward(seen.waitMs + 1000);
  }

  /** An answer that cannot be given yet: the time is put on, or the screen is still on its way. */
  private async untilOpen(seen: Seen): Promise<void> {
    if (seen.waitMs > 0) await this.wait(seen);
    await expect.poll(async () => (await this.look()).answers.some((b) => !b.disabled), { message: `an answer can be given at “${seen.title}”` }).toBe(true);
  }

  private async read(seen: Seen): Promise<void> {
    if (seen.waitMs > 0) await this.wait(seen);
    const meter = meterFor(seen);
    if (meter !== null && ![...seen.buttons, ...seen.answers].some((b) => b.name.startsWith(`Meter: ${meter}`))) await this.takeMeter(meter);
    const row = (seen.entry ?? '').replace(/, in [^,]*$/, '');
    await this.type(this.script.readings?.[`${seen.title} / ${row}`] ?? this.script.readings?.[seen.title] ?? goodReading(seen));
    await this.record();
  }

  private async movedOn(before: Seen): Promise<void> {
    await expect.poll(async () => (await this.look()).question !== before.question, { message: `moves on from “${before.title}”, ${before.entry ?? 'no entry'}`, intervals: [10, 20, 40, 80] }).toBe(true);
  }
}
