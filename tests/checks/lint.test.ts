import { ESLint } from 'eslint';
import { describe, expect, it } from 'vitest';

type Restricted = (string | { name: string })[];

async function rulesFor(path: string): Promise<Record<string, [number, ...unknown[]] | undefined>> {
  const config = (await new ESLint().calculateConfigForFile(path)) as { rules: Record<string, [number, ...unknown[]]> };
  return config.rules;
}

// The first look loads every plug-in.
describe('the lint configuration', { timeout: 30_000 }, () => {
  it.each(['flows/x.ts', 'shared/contract/x.ts', 'shared/quantity/x.ts', 'shared/workings/x.ts', 'shared/record/x.ts'])('keeps clock, chance and I/O out of %s', async (path) => {
    const rules = await rulesFor(path);
    const [level, ...names] = rules['no-restricted-globals'] ?? [0];
    const banned = (names as Restricted).map((one) => (typeof one === 'string' ? one : one.name));
    expect(level).toBe(2);
    expect(banned).toEqual(expect.arrayContaining(['Date', 'setTimeout', 'fetch', 'console', 'process', 'crypto', 'document']));
    expect(rules['no-restricted-properties']).toMatchObject([2, { object: 'Math', property: 'random' }]);
  });

  it('has one door to the kit of parts', async () => {
    expect((await rulesFor('shared/ui/screens/x.tsx'))['no-restricted-imports']?.[0]).toBe(2);
    expect((await rulesFor('app/x.tsx'))['no-restricted-imports']?.[0]).toBe(2);
    expect((await rulesFor('shared/ui/components/x.tsx'))['no-restricted-imports']?.[0]).toBe(0);
  });

  it.each(['flows/x.ts', 'server/x.ts', 'shared/ui/x.tsx'])('lets no promise float and no any pass in %s', async (path) => {
    const rules = await rulesFor(path);
    expect(rules['@typescript-eslint/no-floating-promises']?.[0]).toBe(2);
    expect(rules['@typescript-eslint/no-explicit-any']?.[0]).toBe(2);
  });
});
