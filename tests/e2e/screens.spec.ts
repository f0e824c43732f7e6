import AxeBuilder from '@axe-core/playwright';

import type { DemoPersonKey } from '@/db/seeds/demoPeople';

import { expect, phone, test, wide } from './fixtures';
import { findPlaces, type Place } from './findPlaces';
import { signIn } from './signIn';

/** The senior's pages are everybody's: they are seen on both sizes, the others' on the one that they mostly use. */
const looks: readonly [DemoPersonKey, 'phone' | 'wide', 'light' | 'dark'][] = [
  ['senior', 'phone', 'light'],
  ['senior', 'phone', 'dark'],
  ['senior', 'wide', 'light'],
  ['restorer', 'phone', 'light'],
  ['reviewer', 'wide', 'light'],
  ['keeper', 'phone', 'light'],
];
const sizes = { phone, wide };

/** Rules of WCAG 2.2 AA, and the good practice that axe knows. */
const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];

// the tests share nothing but what the demo holds
test.describe.configure({ mode: 'parallel' });

for (const [who, name, colorScheme] of looks) {
  const viewport = sizes[name];
  test(`${who} opens every place on a ${name} screen, ${colorScheme}`, async ({ stack, openDevice }) => {
    test.setTimeout(180_000);
    const page = await openDevice({ viewport, colorScheme });
    const said: string[] = [];
    page.on('console', (message) => {
      if (message.type() === 'error') said.push(`${page.url()}: ${message.text()}`);
    });
    await signIn(page, who);
    said.length = 0; // asking who one is, before signing in, is answered 401
    const places: Place[] = await findPlaces(stack.ownerUrl, who);
    for (const { path, heading, own, again } of places) {
      await test.step(path, async () => {
        await page.goto(path);
        await expect(page.getByRole('heading', { level: 1, name: heading }), path).toBeVisible();
        expect(await page.evaluate<string | undefined>('document.documentElement.dataset.scheme'), path).toBe(colorScheme);
        await expect(page.getByText(/^(Fetching|Reading the entries)/), path).toHaveCount(0);
        expect(
          await page.evaluate<number>('document.documentElement.scrollWidth - document.documentElement.clientWidth'),
          `${path} scrolls sideways`,
        ).toBeLessThanOrEqual(0);
        // what is the same for everybody, or on every size, is looked at once
        if (again === true || (own !== true && who !== 'senior')) return;
        // pages without frames: the one-piece way of axe is five times faster on the longest of them
        const axe = new AxeBuilder({ page }).options({ resultTypes: ['violations'] }).setLegacyMode(true);
        // only colours change by night
        const { violations } = await (colorScheme === 'light' ? axe.withTags(tags) : axe.withRules(['color-contrast'])).analyze();
        expect(
          violations.map((v) => `${v.id}: ${v.nodes.map((n) => n.target.join(' ')).join(', ')}`),
          path,
        ).toEqual([]);
      });
    }
    expect(said, 'errors on the console').toEqual([]);
  });
}
