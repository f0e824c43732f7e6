/** Every format that was ever written stays readable: its fixture is brought up to date and parses. */
import { existsSync, readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { migrate, newestFormat, profileMigrations, treeMigrations } from '@/flows/document/migrations';
import type { Migration } from '@/flows/document/migrations';
import { parseProfile, parseTree } from '@/flows/document/parseTree';

type Json = Record<string, unknown>;
const fixture = (kind: string, format: number): Json => JSON.parse(readFileSync(`tests/flows/document/formats/${kind}-${format}.json`, 'utf8')) as Json;
const formatsOf = (migrations: readonly Migration[]) => Array.from({ length: newestFormat(migrations) }, (_, i) => i + 1);

describe.each([
  { kind: 'tree', migrations: treeMigrations, parse: (json: unknown) => parseTree(json) },
  { kind: 'profile', migrations: profileMigrations, parse: (json: unknown) => parseProfile(json) },
])('formats of a $kind', ({ kind, migrations, parse }) => {
  it('follow each other without a gap', () => {
    expect(migrations.map((m) => m.from)).toEqual(migrations.map((_, i) => i + 1));
    for (const m of migrations) expect(m.says.length).toBeGreaterThan(10);
  });
  it.each(formatsOf(migrations))('%i has a fixture that parses today, and is not changed by being read', (format) => {
    expect(existsSync(`tests/flows/document/formats/${kind}-${format}.json`)).toBe(true);
    const old = fixture(kind, format);
    const before = structuredClone(old);
    const parsed = parse(old);
    expect(parsed.ok ? parsed.value.format : parsed.faults).toBe(newestFormat(migrations));
    expect(old).toEqual(before);
  });
  it('of another day are refused in a sentence', () => {
    const next = newestFormat(migrations) + 1;
    const parsed = parse({ ...fixture(kind, 1), format: next });
    expect(parsed).toEqual({ ok: false, faults: [{ step: null, key: 'format', message: `this document is of format ${next}, and this program reads formats up to ${next - 1}: a newer program has written it` }] });
  });
  it.each([['none at all', undefined], ['a word', '1'], ['nought', 0], ['a half', 1.5], ['less than nothing', -1], ['no number', Number.NaN]])('that are no formats (%s) are refused by the key', (_, format) => {
    const parsed = parse({ ...fixture(kind, 1), format });
    expect(parsed.ok ? [] : parsed.faults.map((f) => f.key)).toContain('format');
  });
});

describe('a chain of migrations', () => {
  const words: readonly Migration[] = [
    { from: 1, says: 'the title is called a heading', up: ({ title, ...rest }) => ({ ...rest, heading: title }) },
    { from: 2, says: 'the heading is called a title again', up: ({ heading, ...rest }) => ({ ...rest, title: heading }) },
    { from: 3, says: 'a symptom is always stated', up: (document) => ({ symptom: 'Not stated', ...document }) },
  ];
  it('takes each format up by one, from wherever it stands', () => {
    expect(newestFormat(words)).toBe(4);
    expect(migrate({ format: 1, title: 'T' }, words)).toEqual({ ok: true, json: { format: 4, title: 'T', symptom: 'Not stated' } });
    expect(migrate({ format: 2, heading: 'T' }, words)).toEqual({ ok: true, json: { format: 4, title: 'T', symptom: 'Not stated' } });
    expect(migrate({ format: 4, title: 'T' }, words)).toEqual({ ok: true, json: { format: 4, title: 'T' } });
    expect(migrate({ format: 5 }, words)).toMatchObject({ ok: false });
  });
  it('is what a reader goes through before it asks anything else', () => {
    // a chain that ends at format 2 leads past the shape of today, which is of format 1
    const parsed = parseTree(fixture('tree', 1), words.slice(0, 1));
    expect(parsed.ok ? [] : parsed.faults.map((f) => f.key)).toEqual(expect.arrayContaining(['format', 'title']));
  });
  it('leaves what is no document to the shape', () => {
    for (const json of [null, 7, 'tree', []]) expect(migrate(json, words)).toEqual({ ok: true, json });
  });
});
