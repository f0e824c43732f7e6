/** What is said of a release: the reviewer's statement that a supply may be refitted. */
import type { Release } from '@/shared/contract/machines';
import { dateWords } from '@/shared/ui/screens/shell/dateWords';

/** One line; a void release says so before anything else. */
export function releaseWord(release: Release | null): string {
  if (release === null) return 'none';
  if (release.voidedAt !== null) return `void since ${dateWords(release.voidedAt)}`;
  return release.valid ? `valid, given ${dateWords(release.givenAt)}` : `too old, given ${dateWords(release.givenAt)}`;
}
