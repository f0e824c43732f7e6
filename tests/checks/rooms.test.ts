import { describe, expect, it } from 'vitest';

import { sourceFiles, topLevel } from './sourceFiles';

const lines = (text: string) => text.trimEnd().split('\n').length;

describe('the rooms of the project', () => {
  it('are the named folders and no others', () => {
    const named = ['app', 'flows', 'server', 'db', 'shared', 'fonts', 'tests', 'docs', 'public', '.ci'];
    expect(topLevel().folders.filter((folder) => !named.includes(folder))).toEqual([]);
  });

  it('hold no code file longer than 400 lines, and the middle one is under 130', () => {
    const code = sourceFiles(/\.(ts|tsx|mjs|cjs)$/).map(({ path, text }) => ({ path, lines: lines(text) }));
    expect(code.filter((file) => file.lines > 400)).toEqual([]);
    const sorted = code.map((file) => file.lines).sort((a, b) => a - b);
    expect(sorted[Math.floor(sorted.length / 2)]).toBeLessThan(130);
  });

  it('have no file that only passes on what others export', () => {
    const barrels = sourceFiles(/^(flows|server|db|shared|tests)\/.*\.tsx?$/).filter(
      ({ path, text }) => /(^|\/)index\.tsx?$/.test(path) || /^export \* from/m.test(text),
    );
    expect(barrels.map(({ path }) => path)).toEqual([]);
  });
});
