/** Hold points at which somebody waits for a senior. */
import { View } from 'react-native';

import type { Hold } from '@/shared/contract/holds';
import { useHolds } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import type { Column } from '@/shared/ui/components/DataTable';
import { Mono } from '@/shared/ui/components/Mono';
import { Tag } from '@/shared/ui/components/Tag';
import { dateTimeWords } from '@/shared/ui/screens/shell/dateWords';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { Section } from '@/shared/ui/screens/shell/Section';

const columns: Column<Hold>[] = [
  {
    key: 'machine',
    title: 'Machine',
    grow: 2,
    cell: (h) => (
      <View>
        <BodyText bold>{`${h.run.machine.name}, serial ${h.run.machine.serial}`}</BodyText>
        <BodyText size="small" tone="soft">
          {h.run.tree.title}
        </BodyText>
      </View>
    ),
  },
  { key: 'step', title: 'Step', grow: 2, cell: (h) => h.step.title },
  { key: 'asked', title: 'Asked', cell: (h) => <Mono>{dateTimeWords(h.askedAt)}</Mono> },
  { key: 'who', title: 'Answer', cell: (h) => (h.mayAnswer ? <Tag word="wanted" kind="look" /> : <Tag word="your own run" kind="over" />) },
];

/** Nothing is shown while nobody waits. */
export function HoldsWanted() {
  const holds = useHolds();
  if (holds.data?.holds.length === 0) return null;
  return (
    <Section title="Countersigns wanted">
      <Fetched query={holds} what="the hold points">
        {({ holds: all }) => (
          <DataTable
            caption="Countersigns wanted"
            columns={columns}
            rows={all}
            rowKey={(h) => h.entry}
            rowTarget={(h) => ({ name: `Read and answer: ${h.run.machine.name}, ${h.step.title}`, href: `/bench/${h.run.id}` })}
          />
        )}
      </Fetched>
    </Section>
  );
}
