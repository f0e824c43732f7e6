/** The readings of a record: those against limits drawn, those of proving dead in a plain table. */
import { useWindowDimensions, View } from 'react-native';

import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { Mono } from '@/shared/ui/components/Mono';
import { ReadingScale } from '@/shared/ui/components/ReadingScale';
import { Verdict } from '@/shared/ui/components/Verdict';
import { goToEntry } from '@/shared/ui/screens/records/goToEntry';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';
import { scaleOf } from '@/shared/ui/screens/records/scaleOf';
import { Section } from '@/shared/ui/screens/shell/Section';
import { isWide } from '@/shared/ui/theme/space';

const drawn: Column<ReadingLine>[] = [
  { key: 'seq', title: 'Entry', grow: 0.8, cell: (r) => <Mono>{r.seq}</Mono> },
  {
    key: 'what',
    title: 'Step, point',
    grow: 2.1,
    cell: (r) => (
      <View>
        <BodyText>{r.label}</BodyText>
        <BodyText size="small" tone="soft">
          {r.step}
        </BodyText>
      </View>
    ),
  },
  { key: 'reading', title: 'Reading', grow: 1.3, cell: (r) => <Mono bold>{r.reading}</Mono> },
  { key: 'scale', title: 'Against its limit', grow: 3.6, cell: (r) => <Scale line={r} /> },
  { key: 'verdict', title: 'Verdict', grow: 1.3, cell: (r) => <Verdict mark={r.mark} word={r.verdict} /> },
];

const plain: Column<ReadingLine>[] = [
  { key: 'seq', title: 'Entry', grow: 0.6, cell: (r) => <Mono>{r.seq}</Mono> },
  { key: 'what', title: 'Point', grow: 2.6, cell: (r) => <BodyText>{r.label}</BodyText> },
  { key: 'reading', title: 'Reading', grow: 1, cell: (r) => <Mono bold>{r.reading}</Mono> },
  { key: 'limit', title: 'At most', grow: 0.8, cell: (r) => <Mono>{r.high === null ? '–' : formatQuantity(r.high, r.unit)}</Mono> },
  { key: 'verdict', title: 'Verdict', grow: 1.1, cell: (r) => <Verdict mark={r.mark} word={r.verdict} /> },
];

/** Each row leads to its entry. */
export function Readings({ lines }: { lines: readonly ReadingLine[] }) {
  const wide = isWide(useWindowDimensions().width);
  const against = lines.filter((l) => !l.plain);
  const dead = lines.filter((l) => l.plain);
  const to = (line: ReadingLine) => ({
    name: `Entry ${line.seq}, ${line.label}, ${line.reading}, ${line.verdict}`,
    onPress: () => goToEntry(line.id),
  });
  return (
    <>
      <Section title="Readings">
        <DataTable
          caption="Readings against limits"
          columns={drawn}
          rows={against}
          rowKey={(l) => l.id}
          rowTarget={to}
          blocks={!wide}
          empty={<BodyText tone="soft">No reading was taken against a limit.</BodyText>}
        />
      </Section>
      {dead.length > 0 ? (
        <Section title="Discharging and proving dead">
          <DataTable caption="Readings of discharging and proving dead" columns={plain} rows={dead} rowKey={(l) => l.id} rowTarget={to} />
        </Section>
      ) : null}
    </>
  );
}

function Scale({ line }: { line: ReadingLine }) {
  const { factor, unit } = scaleOf(line);
  const by = (n: number | null) => (n === null ? null : n * factor);
  return (
    <ReadingScale
      value={by(line.needle)}
      low={by(line.low)}
      high={by(line.high)}
      guard={line.guard * factor}
      nominal={by(line.nominal)}
      unit={unit}
    />
  );
}
