/** Rails, conductors, parts that store energy, points and boards of a profile. */
import type { Point, Profile } from '@/flows/document/profile';
import { formatQuantity } from '@/shared/quantity/formatQuantity';
import { useSettings } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import { Mono } from '@/shared/ui/components/Mono';
import { Notice } from '@/shared/ui/components/Notice';
import { Tag } from '@/shared/ui/components/Tag';
import { conductorLine, railLine, storeLine } from '@/shared/ui/screens/machines/profileRows';
import { Section } from '@/shared/ui/screens/shell/Section';

/** Ruled tables, one a kind of thing; what the profile does not have is left out. */
export function ProfileTables({ profile }: { profile: Profile }) {
  const returns = profile.conductors.filter((c) => c.kind === 'return').map(conductorLine);
  const feeds = profile.conductors.filter((c) => c.kind === 'feed').map(conductorLine);
  return (
    <>
      <Section title="Rails">
        <DataTable
          caption="Rails"
          rows={profile.rails.map(railLine)}
          rowKey={(r) => r.id}
          columns={[
            { key: 'name', title: 'Rail', cell: (r) => r.name },
            { key: 'nominal', title: 'Nominal', cell: (r) => <Mono whole>{`${r.nominal} ${r.tolerance}`}</Mono>, grow: 1.7 },
            { key: 'amps', title: 'Most amps', cell: (r) => <Mono whole>{r.amps}</Mono> },
            { key: 'limit', title: 'Limit', cell: (r) => <Mono whole>{r.limit}</Mono> },
            {
              key: 'trip',
              title: 'Trips at',
              cell: (r) => (r.trip === null ? <BodyText tone="soft">no trip: hold point</BodyText> : <Mono whole>{r.trip}</Mono>),
              grow: 1.4,
            },
            { key: 'sense', title: 'Sensed', cell: (r) => <BodyText>{r.sense}</BodyText>, grow: 1.2 },
          ]}
        />
      </Section>
      {[
        { title: 'Returns', lines: returns },
        { title: 'Feeds', lines: feeds },
      ]
        .filter(({ lines }) => lines.length > 0)
        .map(({ title, lines }) => (
          <Section key={title} title={title}>
            <DataTable
              caption={title}
              rows={lines}
              rowKey={(c) => c.id}
              columns={[
                { key: 'name', title: 'Conductor', cell: (c) => c.name },
                { key: 'way', title: 'From, to', cell: (c) => <BodyText>{c.way}</BodyText>, grow: 1.6 },
                { key: 'wire', title: 'Wire', cell: (c) => <BodyText>{c.wire}</BodyText>, grow: 1.2 },
                { key: 'pin', title: 'Pin', cell: (c) => <Mono whole>{c.pin}</Mono> },
                { key: 'most', title: 'At most', cell: (c) => <Mono whole>{c.most}</Mono> },
              ]}
            />
          </Section>
        ))}
      <Stores profile={profile} />
      <Section title="Points">
        <DataTable caption="Points" rows={profile.points} rowKey={(p) => p.id} columns={pointColumns} />
      </Section>
      <Boards profile={profile} />
    </>
  );
}

const pointColumns = [
  { key: 'name', title: 'Point', cell: (p: Point) => p.name, grow: 1.4 },
  { key: 'pin', title: 'Connector, pin', cell: (p: Point) => <Mono>{`${p.connector} ${p.pin}`}</Mono> },
  {
    key: 'neighbours',
    title: 'Do not touch beside it',
    cell: (p: Point) => <BodyText tone={p.neighbours.length > 0 ? 'ink' : 'soft'}>{p.neighbours.join(', ') || 'nothing near'}</BodyText>,
    grow: 2,
  },
];

function Stores({ profile }: { profile: Profile }) {
  const settings = useSettings();
  if (profile.stores.length === 0) return null;
  const given = settings.data?.settings;
  return (
    <Section title="Parts that store energy">
      {given ? (
        <DataTable
          caption="Parts that store energy"
          rows={profile.stores.map((store) => storeLine(store, given))}
          rowKey={(s) => s.id}
          columns={[
            { key: 'name', title: 'Part', cell: (s) => s.name, grow: 1.4 },
            { key: 'size', title: 'Size', cell: (s) => <Mono whole>{s.size}</Mono> },
            { key: 'volts', title: 'Works at', cell: (s) => <BodyText>{s.volts}</BodyText>, grow: 1.3 },
            {
              key: 'joules',
              title: 'Holds',
              cell: (s) => (
                <Mono bold whole>
                  {s.joules}
                </Mono>
              ),
            },
            {
              key: 'discharge',
              title: 'Before work',
              cell: (s) => (s.discharge ? <Tag word="discharge, H3" kind="look" /> : <BodyText>prove dead</BodyText>),
              grow: 1.7,
            },
            { key: 'bleeder', title: 'Bleeder', cell: (s) => <BodyText>{s.bleeder}</BodyText>, grow: 1.7 },
          ]}
        />
      ) : null}
      <Notice kind="note">
        What a part can hold is reckoned from its size and the volts that it works at. The meter has the last word: discharge, wait, read
        again.
      </Notice>
    </Section>
  );
}

function Boards({ profile: { boards, rails } }: { profile: Profile }) {
  if (boards.fitted.length === 0) return null;
  const railName = (id: string) => rails.find((r) => r.id === id)?.name ?? id;
  return (
    <Section title="Boards">
      {boards.removable ? null : (
        <Notice>The boards cannot be parted from the supply. A hold point takes the place of taking them out.</Notice>
      )}
      <DataTable
        caption="Boards"
        rows={boards.fitted}
        rowKey={(b) => b.id}
        columns={[
          { key: 'name', title: 'Board', cell: (b) => b.name, grow: 1.4 },
          { key: 'slot', title: 'Slot', cell: (b) => <Mono>{b.slot}</Mono> },
          {
            key: 'draws',
            title: 'Draws',
            cell: (b) => (
              <BodyText>{b.draws.map((d) => `${railName(d.rail)} ${formatQuantity(d.amps, 'A')}`).join(', ') || 'nothing'}</BodyText>
            ),
            grow: 2,
          },
          { key: 'bias', title: 'First rail', cell: (b) => <BodyText>{b.biasFirst ? railName(b.biasFirst) : 'any'}</BodyText> },
        ]}
      />
    </Section>
  );
}
