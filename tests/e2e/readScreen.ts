/** What a run screen says to somebody who cannot see it: names by role, read in one look. */
import type { Page } from '@playwright/test';

export interface SeenButton {
  name: string;
  disabled: boolean;
}

export interface Seen {
  /** the text of the look, without its clocks */
  text: string;
  /** what is asked, to tell one question from the next: whatever is typed or disabled for a moment leaves it as it is */
  question: string;
  /** the one level-1 heading: the title of the step */
  title: string;
  /** buttons outside the answers */
  buttons: readonly SeenButton[];
  /** the answers in their order */
  answers: readonly SeenButton[];
  /** name of the field for a reading, or null */
  entry: string | null;
  /** as it stands at the field, without the word "Limit" */
  limit: string | null;
  /** boxes that are not ticked yet */
  unticked: readonly string[];
  /** time that is still to wait, in milliseconds */
  waitMs: number;
}

export const READ = 'I have read this';
export const ASK = 'Ask for the countersign';
export const WAITS = 'Look for the answer now';
const GATES: readonly string[] = [READ, ASK, WAITS];

const ELEMENT = /^(\s*)- (\w+)(?: "((?:[^"\\]|\\.)*)")?(.*)$/;

/** Reads the main region of the page. */
export async function readScreen(page: Page): Promise<Seen> {
  return seenIn(await page.getByRole('main').ariaSnapshot());
}

/** Understands an ARIA snapshot of a run screen. */
export function seenIn(snapshot: string): Seen {
  const buttons: SeenButton[] = [];
  const answers: SeenButton[] = [];
  const unticked: string[] = [];
  const asks: string[] = [];
  let [title, entry] = ['', null as string | null];
  let dock: number | null = null;
  for (const line of snapshot.split('\n')) {
    const [, indent = '', role = '', quoted = '', rest = ''] = ELEMENT.exec(line.replace(/^(\s*- )'(.*)'(:.*)?$/, '$1$2$3').replace(/''/g, "'")) ?? [];
    if (role === '') continue;
    const name = quoted.replace(/\\(.)/g, '$1');
    if (dock !== null && indent.length <= dock) dock = null;
    if (role === 'group' && name === 'Answers') dock = indent.length;
    if (role === 'heading' && rest.includes('[level=1]')) title = name;
    if (role === 'heading' || role === 'textbox' || role === 'checkbox') asks.push(name);
    if (role === 'button' && GATES.includes(name)) asks.push(name);
    if (role === 'textbox') entry ??= name;
    if (role === 'checkbox' && !rest.includes('[checked]')) unticked.push(name);
    if (role === 'button') (dock === null ? buttons : answers).push({ name, disabled: rest.includes('[disabled]') });
  }
  const clock = /\b(?:(\d+):)?(\d\d):(\d\d)\b/.exec(timerIn(snapshot));
  return {
    text: snapshot.replace(/\d+:\d\d/g, ''),
    question: [...asks, /\b\d+ of \d+\b/.exec(snapshot)?.[0] ?? ''].join(' | '),
    title,
    buttons,
    answers,
    entry,
    limit: /\bLimit:? ([^\n"]*)/.exec(snapshot)?.[1] ?? null,
    unticked,
    waitMs: clock === null ? 0 : ((Number(clock[1] ?? 0) * 60 + Number(clock[2])) * 60 + Number(clock[3])) * 1000,
  };
}

/** The countdown, or nothing once the wait is over. */
function timerIn(snapshot: string): string {
  const at = snapshot.indexOf('- timer ');
  if (at < 0) return '';
  const timer = snapshot.slice(at, at + 160);
  return timer.includes('the wait is over') ? '' : timer;
}
