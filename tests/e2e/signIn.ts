/** A person of the demo workshops signs in on a device of their own. */
import { expect, type Page } from '@playwright/test';

import { DEMO_PASSWORD, demoPeople, type DemoPersonKey } from '@/db/seeds/demoPeople';

export { DEMO_PASSWORD };

/** Fills in the door and waits for what stands behind it. */
export async function signIn(page: Page, who: DemoPersonKey, at = '/bench'): Promise<void> {
  await page.goto(at);
  await passDoor(page, who);
}

/** Signs in at the door that is shown already. */
export async function passDoor(page: Page, who: DemoPersonKey): Promise<void> {
  await page.getByRole('textbox', { name: 'Mail address' }).fill(demoPeople[who].mail);
  await page.getByRole('textbox', { name: 'Password' }).fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Lampstep' })).toBeHidden();
}
