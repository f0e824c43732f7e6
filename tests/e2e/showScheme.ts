/** Day or night on a page, resolved when the sheet really has its colours. */
import { expect, type Page } from '@playwright/test';

/** The page follows its device a moment after the device has changed. */
export async function showScheme(page: Page, colorScheme: 'light' | 'dark'): Promise<void> {
  await page.emulateMedia({ colorScheme });
  const ground = `getComputedStyle(document.querySelector('[role=main]')).backgroundColor.match(/\\d+/g).slice(0, 3).map(Number)`;
  await expect.poll(() => page.evaluate<boolean>(`Math.max(...${ground}) > 128`), { intervals: [10, 20, 50] }).toBe(colorScheme === 'light');
}
