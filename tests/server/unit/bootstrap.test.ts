import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { inProject } from '@/server/cli/projectFiles';

type Listed = { version?: string; optional?: boolean; extraneous?: boolean };
type Lock = { packages: Record<string, Listed> };
type Bootstrap = { nodeFault(version: string, engines: string): string | undefined; fitsLock(lock: Lock, installed: Lock): boolean };

// Plain JavaScript without types, since it runs before anything is installed.
const bootstrap = (await import(inProject('server/cli/bootstrap.mjs'))) as Bootstrap;

describe('nodeFault', () => {
  const { engines } = JSON.parse(readFileSync(inProject('package.json'), 'utf8')) as { engines: { node: string } };

  it.each(['v20.19.0', 'v20.20.2'])('takes %s', (version) => {
    expect(bootstrap.nodeFault(version, engines.node)).toBeUndefined();
  });

  it.each(['v18.20.4', 'v20.18.3', 'v21.0.0', 'v22.12.0'])('refuses %s and says what is needed', (version) => {
    expect(bootstrap.nodeFault(version, engines.node)).toBe(`Lampstep needs Node.js ${engines.node}; this is ${version}.`);
  });
});

describe('fitsLock', () => {
  const lock: Lock = {
    packages: {
      '': {},
      'node_modules/a': { version: '1.0.0' },
      'node_modules/for-another-system': { version: '2.0.0', optional: true },
      'node_modules/left-over': { version: '3.0.0', extraneous: true },
    },
  };

  it('is content with what the lock file names, packages for other systems and left-overs left out', () => {
    expect(bootstrap.fitsLock(lock, { packages: { 'node_modules/a': { version: '1.0.0' } } })).toBe(true);
  });

  it('sees a package that is missing or of another version', () => {
    expect(bootstrap.fitsLock(lock, { packages: {} })).toBe(false);
    expect(bootstrap.fitsLock(lock, { packages: { 'node_modules/a': { version: '1.0.1' } } })).toBe(false);
  });

  it('is content with this very checkout', () => {
    const read = (path: string) => JSON.parse(readFileSync(inProject(path), 'utf8')) as Lock;
    expect(bootstrap.fitsLock(read('package-lock.json'), read('node_modules/.package-lock.json'))).toBe(true);
  });
});
