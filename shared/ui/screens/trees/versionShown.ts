/** Which version of a tree a page shows, and what is said of its state. */
import type { TreeVersion } from '@/shared/contract/trees';

/** The newest issued version; without one the newest of all. */
export function leadingVersion(versions: readonly TreeVersion[]): TreeVersion | undefined {
  const newestFirst = [...versions].sort((a, b) => b.version - a.version);
  return newestFirst.find((v) => v.state === 'issued') ?? newestFirst[0];
}

/** The version asked for in an address, or the leading one; null where the address names none of this tree. */
export function versionShown(versions: readonly TreeVersion[], asked: string | undefined): TreeVersion | null {
  if (asked === undefined) return leadingVersion(versions) ?? null;
  return versions.find((v) => String(v.version) === asked) ?? null;
}

export const VERSION_STATE_WORDS: Readonly<Record<TreeVersion['state'], string>> = {
  draft: 'draft',
  'in-check': 'in check',
  issued: 'issued',
  withdrawn: 'withdrawn',
};

export const VERSION_STATE_TAGS = { draft: 'look', 'in-check': 'look', issued: 'plain', withdrawn: 'over' } as const;
