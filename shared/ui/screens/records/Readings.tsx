/** The readings of a record: those against limits drawn, those of proving dead in a plain table. */
import { useWindowDimensions, View } from 'react-native';

import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { Mono } from '@/shared/ui/components/Mono';
import { Verdict } from '@/shared/ui/components/Verdict';
import { ReadingBlock } from '@/shared/ui/screens/records/ReadingBlock';
import { goToEntry } from '@/shared/ui/screens/records/goToEntry';
import type { ReadingLine } from '@/shared/ui/screens/records/readingsOf';
import { RecordScale } from '@/shared/ui/screens/records/RecordScale';
import { Section } from '@/shared/ui/screens/shell/Section';
import { isWide } from '@/shared/ui/theme/space';

const drawn: Column<ReadingLine>[] = [
  { key: 'seq', title: 'Entry', grow: 0.9, cell: (r) => <Mono whole>{r.seq}</Mono> },
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
  {
    key: 'reading',
    title: 'Reading',
    grow: 1.3,
    cell: (r) => (
      <Mono bold whole>
        {r.reading}
      </Mono>
    ),
  },
  { key: 'scale', title: 'Against its limit', grow: 3.6, cell: (r) => <RecordScale reading={r} /> },
  { key: 'verdict', title: 'Verdict', grow: 1.3, cell: (r) => <Verdict mark={r.mark} word={r.verdict} /> },
];

const plain: Column<ReadingLine>[] = [
  { key: 'seq', title: 'Entry', grow: 0.8, cell: (r) => <Mono whole>{r.seq}</Mono> },
  { key: 'what', title: 'Point', grow: 2.6, cell: (r) => <BodyText>{r.label}</BodyText> },
  {
    key: 'reading',
    title: 'Reading',
    grow: 1,
    cell: (r) => (
      <Mono bold whole>
        {r.reading}
      </Mono>
    ),
  },
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
        {against.length === 0 ? <BodyText tone="soft">No reading was taken against a limit.</BodyText> : null}
        {wide ? (
          <DataTable caption="Readings against limits" columns={drawn} rows={against} rowKey={(l) => l.id} rowTarget={to} />
        ) : (
          <View role="list" aria-label="Readings against limits">
            {against.map((l) => (
              <ReadingBlock key={l.id} reading={l} />
            ))}
          </View>
        )}
      </Section>
      {dead.length > 0 ? (
        <Section title="Discharging and proving dead">
          <DataTable caption="Readings of discharging and proving dead" columns={plain} rows={dead} rowKey={(l) => l.id} rowTarget={to} />
        </Section>
      ) : null}
    </>
  );
}
