/** Where the project's own files lie, and the git-ignored folder for what the commands keep. */
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The root folder of the checkout. */
export const projectRoot = fileURLToPath(new URL('../../', import.meta.url));

/** Kept between starts, never committed: cluster, keys, letters, markers. */
export const stateFolder = join(projectRoot, '.lampstep');

/** A path inside the checkout. */
export function inProject(...parts: string[]): string {
  return join(projectRoot, ...parts);
}

/** SHA-256 over names and content of files and folders of the checkout (absent ones count as absent), in hex. */
export function hashOf(paths: readonly string[]): string {
  const hash = createHash('sha256');
  for (const path of paths.flatMap((one) => filesUnder(one)).sort()) {
    hash.update(`${path}\0`);
    hash.update(readFileSync(inProject(path)));
    hash.update('\0');
  }
  return hash.digest('hex');
}

/** All files under a path of the checkout, as paths from its root; an absent path has none. */
export function filesUnder(path: string): string[] {
  const full = inProject(path);
  if (!existsSync(full)) return [];
  if (statSync(full).isFile()) return [path];
  return readdirSync(full, { withFileTypes: true }).flatMap((entry) => filesUnder(join(path, entry.name)));
}
