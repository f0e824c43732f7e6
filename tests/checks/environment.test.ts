import { describe, expect, it } from 'vitest';

import { sourceFiles } from './sourceFiles';

describe('.env.example', () => {
  it('names every variable that the server reads, and no other', () => {
    const config = sourceFiles(/^server\/config\.ts$/)[0]?.text ?? '';
    const schema = /const envSchema = z\.object\(\{([\s\S]*?)\n\}\);/.exec(config)?.[1] ?? '';
    const read = [...schema.matchAll(/^ {2}([A-Z_]+):/gm)].map((match) => match[1] ?? '');
    const example = sourceFiles(/^\.env\.example$/)[0]?.text ?? '';
    const documented = [...example.matchAll(/^#([A-Z_]+)=/gm)].map((match) => match[1] ?? '');
    expect(read.length).toBeGreaterThan(10);
    expect(documented.filter((name) => name !== 'CHROMIUM').sort()).toEqual([...read].sort());
  });
});
