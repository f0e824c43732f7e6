/** What every browser test starts from: the running product, and people who each have a device of their own. */
import { test as base, expect, type BrowserContextOptions, type Page } from '@playwright/test';

import { startStack, type Stack } from './harness';

export { expect };

/** A phone held in one hand, and a screen on the bench. */
export const phone = { width: 390, height: 844 };
export const wide = { width: 1440, height: 900 };

type Devices = {
  /** Opens a device of its own (cookies and storage apart) and its page; an error on the page fails the test. */
  openDevice: (options?: BrowserContextOptions) => Promise<Page>;
};

export const test = base.extend<Devices, { stack: Stack }>({
  stack: [
    // Playwright finds out what a fixture needs by reading its first argument's pattern, so an empty one must stand there.
    // eslint-disable-next-line no-empty-pattern
    async ({}, use) => {
      const stack = await startStack();
      await use(stack);
      await stack.stop();
    },
    { scope: 'worker', timeout: 180_000 },
  ],
  baseURL: async ({ stack }, use) => {
    await use(stack.url);
  },
  openDevice: async ({ browser, stack }, use) => {
    const opened: Page[] = [];
    const errors: string[] = [];
    await use(async (options = {}) => {
      const context = await browser.newContext({ baseURL: stack.url, viewport: phone, ...options });
      const page = await context.newPage();
      page.on('pageerror', (error) => errors.push(error.stack ?? error.message));
      opened.push(page);
      return page;
    });
    for (const page of opened) await page.context().close();
    expect(errors, 'errors thrown on a page').toEqual([]);
  },
});
