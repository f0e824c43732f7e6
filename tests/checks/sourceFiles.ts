/** The project's own text files, for checks that read them. */
import { readdirSync, readFileSync } from 'node:fs';
import { join, relative, sep } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../../', import.meta.url));
// What .gitignore names, and git's own folder (a file in a linked checkout).
const left = new Set(['.git', 'node_modules', '.expo', '.lampstep', 'dist', 'build', 'coverage', 'test-results', 'playwright-report', 'expo-env.d.ts', '.env']);
const binary = /\.(ttf|png|jpg|jpeg|webp|gif|pdf|ico)$/;

export type SourceFile = { path: string; text: string };

function walk(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    if (left.has(entry.name)) return [];
    const full = join(folder, entry.name);
    return entry.isDirectory() ? walk(full) : [relative(root, full).split(sep).join('/')];
  });
}

/** Every text file of the checkout whose path fits `pattern`, as paths with forward slashes from the root. */
export function sourceFiles(pattern: RegExp): SourceFile[] {
  return walk(root)
    .filter((path) => pattern.test(path) && !binary.test(path))
    .sort()
    .map((path) => ({ path, text: readFileSync(join(root, path), 'utf8') }));
}

/** Names of the top-level entries, split into folders and files. */
export function topLevel(): { folders: string[]; files: string[] } {
  const entries = readdirSync(root, { withFileTypes: true }).filter((entry) => !left.has(entry.name));
  return { folders: entries.filter((e) => e.isDirectory()).map((e) => e.name), files: entries.filter((e) => e.isFile()).map((e) => e.name) };
}
