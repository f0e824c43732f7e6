/** What has to be written on the disk when the record that a device holds has changed. Pure. */
import type { Entry } from '@/shared/contract/entries';
import type { RecordPart } from '@/shared/ui/api/outboxStore';

/** The entries from the first place that differs, or undefined where none does. */
export function recordPart(run: string, before: readonly Entry[], next: readonly Entry[]): RecordPart | undefined {
  if (before === next) return undefined;
  const differs = next.findIndex((entry, i) => before[i]?.hash !== entry.hash);
  const after = differs === -1 ? next.length : differs;
  return differs === -1 && before.length <= next.length ? undefined : { run, after, entries: next.slice(after) };
}

/** The longer of two accounts of one record: what this device was told later than the page's own copy, where both agree on what the copy has. */
export function longerOf(given: readonly Entry[], kept: readonly Entry[]): readonly Entry[] {
  const last = given.at(-1);
  return last !== undefined && kept.length > given.length && kept[given.length - 1]?.hash === last.hash ? kept : given;
}
