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
