import { build } from 'esbuild';
import { describe, expect, it } from 'vitest';

/** Files and packages that an entry brings along, as production bundles it. */
async function graphOf(entry: string): Promise<{ files: string[]; packages: string[] }> {
  const { metafile } = await build({ entryPoints: [`./${entry}`], bundle: true, platform: 'node', format: 'esm', packages: 'external', write: false, metafile: true, logLevel: 'silent', outdir: 'build' });
  const packages = Object.values(metafile.inputs).flatMap((input) => input.imports.filter((one) => one.external === true).map((one) => one.path));
  return { files: Object.keys(metafile.inputs), packages: [...new Set(packages)].filter((name) => !name.startsWith('node:')) };
}

describe.each(['server/main.ts', 'server/cli/migrate.ts'])('%s in production', { timeout: 30_000 }, (entry) => {
  it('carries no fake, no demo data and no tree of the library', async () => {
    const { files, packages } = await graphOf(entry);
    expect(files).toContain(entry);
    expect(packages.filter((name) => name.startsWith('@/')), 'own files that were not found').toEqual([]);
    expect(files.filter((path) => /^(server\/adapters\/fakes|db\/seeds|flows\/library|tests)\//.test(path))).toEqual([]);
  });

  it('carries nothing of the interface and no development package', async () => {
    const { files, packages } = await graphOf(entry);
    expect(files.filter((path) => /^(app|shared\/ui)\//.test(path))).toEqual([]);
    expect(packages.filter((name) => /^(react|expo|@expo|@xstate\/react|@tanstack|smtp-server|tsx|vitest|typescript|esbuild|eslint)/.test(name))).toEqual([]);
  });
});
