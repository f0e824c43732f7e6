import { expect, phone, test } from './fixtures';

test.describe('the running product', () => {
  test('answers again on the same address after its server was killed, and whoever looks in sees the client', async ({ stack, openDevice }) => {
    const page = await openDevice({ viewport: phone });
    await page.goto('/sign-in');
    const signIn = page.getByRole('button', { name: 'Sign in' });
    await expect(signIn).toBeVisible();

    await stack.killServer();
    await expect(page.request.get('/healthz').catch((error: unknown) => String(error))).resolves.toMatch(/ECONNREFUSED/);
    await stack.startServer();
    expect((await page.request.get('/readyz')).ok()).toBe(true);
    await page.reload();
    await expect(signIn).toBeVisible();
  });
});
