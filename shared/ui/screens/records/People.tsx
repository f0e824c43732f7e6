/** Who did what in a record. */
import type { RecordView } from '@/shared/contract/records';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import { Mono } from '@/shared/ui/components/Mono';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';
import type { Replay } from '@/shared/ui/screens/records/replayRecord';
import { whoDidWhat } from '@/shared/ui/screens/records/whoDidWhat';
import { clockWords, dateWords } from '@/shared/ui/screens/shell/dateWords';
import { personName } from '@/shared/ui/screens/shell/personName';
import { Section } from '@/shared/ui/screens/shell/Section';

interface Props {
  record: RecordView;
  replay: Replay;
  readings: readonly ReadingLine[];
}

/** One row a person. */
export function People({ record, replay, readings }: Props) {
  return (
    <Section title="Who, when, with what">
      <DataTable
        caption="Who did what"
        rows={whoDidWhat(replay.entries, readings, record.instruments)}
        rowKey={(p) => p.person}
        columns={[
          { key: 'who', title: 'Who', grow: 1.2, cell: (p) => personName(record.people, p.person) },
          { key: 'did', title: 'Did', grow: 2.4, cell: (p) => <BodyText>{p.did}</BodyText> },
          { key: 'when', title: 'When', grow: 1.4, cell: (p) => <Mono>{span(p.from, p.to)}</Mono> },
          { key: 'with', title: 'With', grow: 2.2, cell: (p) => <BodyText>{p.with}</BodyText> },
        ]}
      />
    </Section>
  );
}

function span(from: string, to: string): string {
  if (dateWords(from) !== dateWords(to)) return `${dateWords(from)} to ${dateWords(to)}`;
  return from === to ? `${dateWords(from)} ${clockWords(from)}` : `${dateWords(from)} ${clockWords(from)}–${clockWords(to)}`;
}
