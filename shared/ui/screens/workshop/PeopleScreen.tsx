/** The people of the workshop. */
import { usePeople } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Mono } from '@/shared/ui/components/Mono';
import { Page } from '@/shared/ui/components/Page';
import { FactRows } from '@/shared/ui/screens/shell/FactRows';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { Section } from '@/shared/ui/screens/shell/Section';

const roles = [
  { name: 'Restorer', value: 'Works at the bench, led by a tree. Can neither countersign nor review the own run.' },
  { name: 'Senior', value: 'Writes and checks trees, countersigns hold points of others.' },
  { name: 'Reviewer', value: 'Reads records of others, returns or accepts them, gives the release.' },
  { name: 'Keeper', value: 'Keeps the workshop’s account, members and instruments.' },
];

/** Who they are and what each may do. */
export function PeopleScreen() {
  const people = usePeople();
  return (
    <Page title="People and roles" eyebrow="Workshop" maxWidth={860}>
      <Fetched query={people} what="the people">
        {({ people: all }) => (
          <DataTable
            caption="People"
            rows={all}
            rowKey={(p) => p.id}
            empty={<EmptyState title="Nobody here" text="The keeper of the workshop invites its members." />}
            columns={[
              { key: 'name', title: 'Name', grow: 1.6, cell: (p) => p.name },
              { key: 'code', title: 'Code', cell: (p) => <Mono>{p.code}</Mono> },
              {
                key: 'roles',
                title: 'Roles',
                grow: 1.8,
                cell: (p) => <BodyText tone={p.roles.length > 0 ? 'ink' : 'soft'}>{p.roles.join(', ') || 'none'}</BodyText>,
              },
            ]}
          />
        )}
      </Fetched>
      <Section title="What the roles may do" look="label">
        <FactRows caption="What the roles may do" rows={roles} />
      </Section>
      <LinkText label="Workshop" href="/workshop" />
    </Page>
  );
}
