import { BenchPage } from './BenchPage';
import { expect, phone, test } from './fixtures';
import { readRun } from './readRun';
import { addRestMachine } from './restMachine';
import { signIn } from './signIn';

const TREE = 'Dormant three-rail supply: first power';

test.describe('a run without the network', () => {
  test('comes back from the device: on the way from the bench, and after a load of the page', async ({ stack, openDevice }) => {
    const machine = await addRestMachine(stack.ownerUrl, 'C12-0733');
    const page = await openDevice({ viewport: phone });
    await signIn(page, 'restorer');
    const bench = new BenchPage(page);
    await bench.start(machine, TREE);
    const { run } = bench;
    const { title } = await bench.playUntil((seen) => seen.title !== 'Open the bench');
    await bench.allSaved();
    const heading = (name: string) => page.getByRole('heading', { level: 1, name });

    await test.step('from the bench into the run', async () => {
      await page.getByRole('button', { name: /: show the way$/ }).click();
      await page.getByRole('link', { name: 'To the bench; the run stays open' }).click();
      const row = page.getByRole('link', { name: `Go on with ${machine}` });
      await expect(row).toBeVisible();
      await page.context().setOffline(true);
      await row.click();
      await expect(heading(title)).toBeVisible();
      await page.context().setOffline(false);
    });

    await test.step('after the page was loaded anew, with its own files at hand and no way to the server', async () => {
      // the files of the page itself do not come without the network: this stands for a browser that has them still
      await page.route('**/api/**', (route) => route.abort('internetdisconnected'));
      await page.reload();
      // nothing was energised and no hand was in it: the step of before still holds, what was known of the bench does not
      await expect(heading(title)).toBeVisible();
      await expect(page.getByText('1 answer waits to be sent: no network')).toBeVisible();
      await bench.move(await bench.look());
      await expect(page.getByText('2 answers wait to be sent: no network')).toBeVisible();
    });

    await test.step('and everything reaches the server once it is there again', async () => {
      await page.unroute('**/api/**');
      await bench.allSaved();
      const { entries } = await readRun(stack.ownerUrl, run);
      const events = entries.map((e) => (e.body['event'] as { type: string } | undefined)?.type);
      expect(events.slice(-2)).toEqual(['RESTART', 'ANSWER']);
    });

    await test.step('but nobody reads it there who has not signed in', async () => {
      await page.goto('/workshop');
      await page.getByRole('button', { name: /Sign out/ }).click();
      await expect(page.getByRole('button', { name: 'Sign in' })).toBeVisible();
      // as text: this file knows no browser's own names
      const left = await page.evaluate<number>(`new Promise((resolve, reject) => {
        const asked = indexedDB.open('lampstep');
        asked.onerror = () => reject(new Error('no database'));
        asked.onsuccess = () => {
          const counts = ['runs', 'held'].map((name) => asked.result.transaction(name).objectStore(name).count());
          for (const count of counts) count.onsuccess = () => {
            if (counts.every((c) => c.readyState === 'done')) resolve(counts.reduce((sum, c) => sum + c.result, 0));
          };
        };
      })`);
      expect(left).toBe(0);
    });
  });
});
