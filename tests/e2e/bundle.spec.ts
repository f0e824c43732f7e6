import { readFileSync } from 'node:fs';

import { expect, test } from '@playwright/test';

import { buildWeb } from '@/server/cli/buildWeb';
import { filesUnder, inProject } from '@/server/cli/projectFiles';

/** Every string inside a JSON value. */
function stringsIn(value: unknown): string[] {
  if (typeof value === 'string') return [value];
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(stringsIn) : [];
}

/** The longest piece without a character that a bundler may write in another way. */
function plainPiece(text: string): string {
  return text.split(/[^ -!#-&(-[\]-~]+/).reduce((longest, piece) => (piece.length > longest.length ? piece : longest), '');
}

test.describe('the exported web client', () => {
  let bundle = '';

  test.beforeAll(async () => {
    test.setTimeout(180_000);
    await buildWeb(() => undefined);
    bundle = filesUnder('dist')
      .filter((path) => /\.(js|html|json|css|map)$/.test(path))
      .map((path) => readFileSync(inProject(path), 'utf8'))
      .join('\n');
  });

  test('is really read by these checks', () => {
    expect(bundle).toContain('/api/session');
  });

  test('carries no sentence of a tree in the library', () => {
    const trees = filesUnder('flows/library').filter((path) => path.endsWith('.json'));
    expect(trees.length).toBeGreaterThan(0);
    const sentences = trees.flatMap((path) => stringsIn(JSON.parse(readFileSync(inProject(path), 'utf8')))).map(plainPiece);
    const telling = sentences.filter((piece) => piece.length >= 32);
    expect(telling.length).toBeGreaterThan(20);
    expect(telling.filter((piece) => bundle.includes(piece))).toEqual([]);
  });

  test('carries nothing of the server', () => {
    const migrations = filesUnder('db/migrations').map((path) => path.replace(/^.*\/|\.ts$/g, ''));
    expect(migrations.length).toBeGreaterThan(0);
    const words = ['kysely', 'graphile_worker', 'SASLInitialResponse', 'bcrypt', 'nodemailer', 'lampstep_server', 'DATABASE_URL', 'SESSION_SECRET', 'SIGNING_KEY', ...migrations];
    expect(words.filter((word) => bundle.includes(word))).toEqual([]);
  });
});
