/** Makes the pictures of the documentation from a fresh demo: `npm run pictures`, or only some: `npm run pictures -- record workings`. A few minutes; needs Chromium. */
import { mkdirSync } from 'node:fs';

import { chromium, expect, type Browser, type Page } from '@playwright/test';

import { DEMO_PASSWORD, type DemoPersonKey } from '@/db/seeds/demoPeople';
import { inProject } from '@/server/cli/projectFiles';

import { BenchPage } from './BenchPage';
import { findPlaces } from './findPlaces';
import { startStack, type Stack } from './harness';
import type { Seen } from './readScreen';
import { showScheme } from './showScheme';
import { signIn } from './signIn';

const folder = inProject('docs/pictures');
const sizes = [
  { width: 390, height: 844 },
  { width: 1440, height: 900 },
];
const schemes = ['light', 'dark'] as const;
/** names of the pictures that are asked for; none asks for all */
const only = process.argv.slice(2);
const TREE = 'Dormant three-rail supply: first power';

/** The page as it stands, from its top, in both sizes and by day and by night; `open` opens it anew for each scheme, which it then has from its first line on. */
async function take(page: Page, what: string, open: () => Promise<unknown> = () => Promise.resolve()): Promise<void> {
  if (only.length > 0 && !only.includes(what)) return;
  for (const colorScheme of schemes) {
    await page.emulateMedia({ colorScheme });
    await open();
    for (const size of sizes) {
      await page.setViewportSize(size);
      await settle(page, colorScheme);
      await page.screenshot({ path: `${folder}/${what}-${size.width}-${colorScheme}.png`, caret: 'hide', animations: 'disabled' });
    }
  }
  process.stdout.write(`${what}\n`);
}

/** Everything is fetched, the sheet has the colours asked for and stands at its top, and nothing lies under the pointer. */
async function settle(page: Page, colorScheme: (typeof schemes)[number]): Promise<void> {
  await page.mouse.move(0, 0);
  await expect(page.getByText(/^(Fetching|Reading the entries)/)).toHaveCount(0, { timeout: 30_000 });
  await showScheme(page, colorScheme);
  await page.evaluate(`document.querySelectorAll('[role=main] div').forEach((box) => (box.scrollTop = 0))`);
  await page.evaluate('document.fonts.ready.then(() => undefined)');
}

/** `clock` where waits of the bench are passed over. */
async function openPage(browser: Browser, stack: Stack, who: DemoPersonKey, clock = true): Promise<Page> {
  const context = await browser.newContext({ baseURL: stack.url, viewport: { width: 390, height: 844 }, reducedMotion: 'reduce' });
  const page = await context.newPage();
  if (clock) await page.clock.install();
  await signIn(page, who);
  return page;
}

async function still(browser: Browser, stack: Stack): Promise<void> {
  const door = await (await browser.newContext({ baseURL: stack.url })).newPage();
  await door.goto('/sign-in');
  await door.getByRole('button', { name: 'Sign in' }).waitFor();
  await take(door, 'sign-in');
  const page = await openPage(browser, stack, 'reviewer', false);
  for (const { path, heading, picture } of await findPlaces(stack.ownerUrl, 'reviewer')) {
    if (picture === undefined || (only.length > 0 && !only.includes(picture))) continue;
    await take(page, picture, async () => {
      await page.goto(path);
      await page.getByRole('heading', { level: 1, name: heading }).waitFor();
    });
  }
  await page.context().close();
}

async function run(browser: Browser, stack: Stack): Promise<void> {
  const page = await openPage(browser, stack, 'restorer');
  await page.getByRole('radiogroup', { name: 'Machine' }).waitFor();
  await take(page, 'bench');
  const senior = await openPage(browser, stack, 'senior');
  const bench = new BenchPage(page, { answers: { 'Which kind of regulator': 'No, it is linear' } });
  const upTo = async (wanted: (seen: Seen) => boolean) => {
    await page.setViewportSize({ width: 390, height: 844 });
    await bench.playUntil(wanted);
  };
  const waits = (seen: Seen) => seen.answers.some((b) => b.name === 'Look for the answer now');
  await bench.start('Corvane 12, serial C12-0417', TREE);
  await take(page, 'run-opening');
  await upTo((seen) => seen.title === 'Take every source out');
  await take(page, 'run-isolate');
  await upTo((seen) => seen.title === 'Insulation' && seen.buttons.some((b) => b.name === 'I have read this'));
  await take(page, 'run-warning');
  await upTo(waits);
  await bench.countersign(senior, DEMO_PASSWORD);
  await upTo((seen) => seen.title === 'First mains, through the lamp' && waits(seen));
  await take(page, 'run-hold');
  await senior.goto('/bench');
  await senior.locator(`a[href$="${bench.run}"]`).click();
  await senior.getByRole('button', { name: 'Give the countersign' }).waitFor();
  await take(senior, 'holds');
  await bench.countersign(senior, DEMO_PASSWORD);
  await upTo((seen) => seen.title === 'First mains, through the lamp' && seen.unticked.length > 0);
  await take(page, 'run-guard');
  await upTo((seen) => seen.title === 'Rails on the lamp' && seen.entry !== null);
  await bench.takeMeter('Q-02');
  await bench.type('4.97');
  await take(page, 'run-reading');
  await bench.stop();
  await page.getByRole('heading', { level: 1, name: /^Make safe/ }).waitFor();
  await take(page, 'run-stop');
}

mkdirSync(folder, { recursive: true });
const stack = await startStack();
const browser = await chromium.launch({
  executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
  args: ['--no-sandbox', '--disable-gpu'],
});
try {
  // the places first, as a new workshop finds them
  await still(browser, stack);
  if (only.length === 0 || only.some((name) => name === 'bench' || name === 'holds' || name.startsWith('run-'))) await run(browser, stack);
} finally {
  await browser.close();
  await stack.stop();
}
