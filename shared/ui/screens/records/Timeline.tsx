/** Every entry of a record, step by step. */
import { useMemo } from 'react';
import { View } from 'react-native';

import type { RecordView } from '@/shared/contract/records';
import { Heading } from '@/shared/ui/components/Heading';
import { StudRail } from '@/shared/ui/components/StudRail';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';
import type { Replay } from '@/shared/ui/screens/records/replayRecord';
import { TimelineEntry } from '@/shared/ui/screens/records/TimelineEntry';
import { timelineOf } from '@/shared/ui/screens/records/timelineOf';
import { Section } from '@/shared/ui/screens/shell/Section';

interface Props {
  record: RecordView;
  replay: Replay;
  readings: readonly ReadingLine[];
  /** asks for a finding on an entry; null where this person cannot make one */
  onRemark: ((entry: string) => void) | null;
}

/** Hung on the studs of the tree's steps; the edge of each row carries the power that stood at the bench. */
export function Timeline({ record, replay, readings, onRemark }: Props) {
  const groups = useMemo(() => timelineOf(replay.entries), [replay]);
  const known = useMemo(
    () => ({ entries: record.entries, instruments: record.instruments, readings: new Map(readings.map((line) => [line.id, line])) }),
    [record, readings],
  );
  return (
    <Section title="Entries">
      <View>
        {groups.map((group, at) => (
          <StudRail key={group.id} number={group.stud} state="done" above={at > 0} below={at < groups.length - 1}>
            <Heading level={3}>{group.title}</Heading>
            <View role="list" aria-label={`Entries of ${group.title}`}>
              {group.entries.map((replayed) => (
                <TimelineEntry
                  key={replayed.entry.id}
                  replayed={replayed}
                  people={record.people}
                  known={known}
                  findings={record.findings.filter((f) => f.entry === replayed.entry.id)}
                  onRemark={onRemark}
                />
              ))}
            </View>
          </StudRail>
        ))}
      </View>
    </Section>
  );
}
