/** Releases and runs of a machine, newest first. */
import type { Release } from '@/shared/contract/machines';
import type { RunSummary } from '@/shared/contract/runSummary';
import { usePeople } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Mono } from '@/shared/ui/components/Mono';
import { Tag } from '@/shared/ui/components/Tag';
import { releaseWord } from '@/shared/ui/screens/machines/releaseWord';
import { endingWords, RUN_STATE_TAGS, RUN_STATE_WORDS } from '@/shared/ui/screens/shell/runWords';
import { dateTimeWords } from '@/shared/ui/screens/shell/dateWords';
import { personName } from '@/shared/ui/screens/shell/personName';
import { Section } from '@/shared/ui/screens/shell/Section';

interface Props {
  runs: readonly RunSummary[];
  releases: readonly Release[];
}

/** An open run leads to the bench, a closed one to its record. */
export function MachineHistory({ runs, releases }: Props) {
  const people = usePeople().data?.people;
  return (
    <>
      <Section title="Releases">
        <DataTable
          caption="Releases"
          rows={releases}
          rowKey={(r) => r.id}
          empty={<BodyText tone="soft">No supply of this machine has been released for refit.</BodyText>}
          columns={[
            { key: 'state', title: 'Release', cell: (r) => (r.valid ? releaseWord(r) : <BodyText>{releaseWord(r)}</BodyText>), grow: 1.5 },
            { key: 'by', title: 'Given by', cell: (r) => <BodyText>{personName(people, r.givenBy)}</BodyText> },
            {
              key: 'why',
              title: 'Void because',
              cell: (r) => <BodyText tone={r.voidReason ? 'ink' : 'soft'}>{r.voidReason ?? 'not void'}</BodyText>,
              grow: 1.6,
            },
            {
              key: 'record',
              title: 'Stands on',
              cell: (r) => (
                <LinkText label="Record" name={`Record of the release given ${dateTimeWords(r.givenAt)}`} href={`/records/${r.run}`} />
              ),
            },
          ]}
        />
      </Section>
      <Section title="Runs">
        <DataTable
          caption="Runs"
          rows={runs}
          rowKey={(r) => r.id}
          rowTarget={(r) => ({
            name: `Run of ${dateTimeWords(r.startedAt)}`,
            href: r.state === 'open' ? `/bench/${r.id}` : `/records/${r.id}`,
          })}
          empty={<BodyText tone="soft">No run has been made on this machine.</BodyText>}
          columns={[
            { key: 'when', title: 'When', cell: (r) => <Mono whole>{dateTimeWords(r.startedAt)}</Mono>, grow: 2.1 },
            { key: 'tree', title: 'Tree', cell: (r) => <BodyText>{`${r.tree.title}, version ${r.tree.version}`}</BodyText>, grow: 2.4 },
            { key: 'who', title: 'Restorer', cell: (r) => <BodyText>{personName(people, r.restorer)}</BodyText>, grow: 1.2 },
            {
              key: 'state',
              title: 'State',
              cell: (r) => <Tag word={RUN_STATE_WORDS[r.state]} kind={RUN_STATE_TAGS[r.state]} />,
              grow: 1.1,
            },
            { key: 'outcome', title: 'Outcome', cell: (r) => <BodyText>{endingWords(r.ended)}</BodyText>, grow: 1.3 },
          ]}
        />
      </Section>
    </>
  );
}
