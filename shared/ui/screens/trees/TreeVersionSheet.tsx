/** The document of one version: what it is for at the side, its steps in the middle. */
import { View } from 'react-native';

import { FIRST_CAUTION } from '@/flows/document/hazards';
import type { Tree } from '@/flows/document/tree';
import type { TreeVersion } from '@/shared/contract/trees';
import { usePeople, useTreeVersion } from '@/shared/ui/api/queries';
import { BodyText } from '@/shared/ui/components/BodyText';
import { DataTable } from '@/shared/ui/components/DataTable';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Notice } from '@/shared/ui/components/Notice';
import { Columns } from '@/shared/ui/screens/shell/Columns';
import { dateWords } from '@/shared/ui/screens/shell/dateWords';
import { FactRows } from '@/shared/ui/screens/shell/FactRows';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { personName } from '@/shared/ui/screens/shell/personName';
import { Section } from '@/shared/ui/screens/shell/Section';
import { TreeStep } from '@/shared/ui/screens/trees/TreeStep';
import { appliesToWords, CLAIM_WORDS, MODE_WORDS } from '@/shared/ui/screens/trees/treeWords';
import { VERSION_STATE_WORDS } from '@/shared/ui/screens/trees/versionShown';
import { space } from '@/shared/ui/theme/space';

interface Props {
  version: TreeVersion;
  versions: readonly TreeVersion[];
}

/** Fetches the document and lays it out. */
export function TreeVersionSheet({ version, versions }: Props) {
  const query = useTreeVersion(version.tree, version.version);
  const people = usePeople();
  const name = (id: string | null) => (id === null ? 'nobody yet' : personName(people.data?.people, id));
  return (
    <Fetched query={query} what="the steps">
      {({ document, callees }) => (
        <Columns
          side={
            <>
              <Section title="What it is for" look="label">
                <BodyText>{document.symptom}</BodyText>
                {document.about ? <BodyText tone="soft">{document.about}</BodyText> : null}
                <FactRows
                  caption="What it is for"
                  rows={[
                    { name: 'Applies to', value: appliesToWords(document.appliesTo) },
                    { name: 'Needs at the start', value: document.needsAtStart.map((claim) => CLAIM_WORDS[claim]).join(', ') || 'nothing' },
                    { name: 'Written by', value: name(version.author) },
                    { name: 'Checked by', value: name(version.checker) },
                    { name: 'Issued', value: version.issuedAt ? dateWords(version.issuedAt) : 'not yet' },
                  ]}
                />
              </Section>
              <Opening tree={document} />
              <OtherVersions version={version} versions={versions} />
            </>
          }
        >
          <Notice kind="note">{FIRST_CAUTION}</Notice>
          <Suspects tree={document} />
          <Section title="Steps">
            <View role="list" aria-label="Steps">
              {document.steps.map((step, at) => (
                <TreeStep
                  key={step.id}
                  tree={document}
                  callee={step.kind === 'call' ? callees.find((tree) => tree.id === step.tree) : undefined}
                  at={at}
                />
              ))}
            </View>
          </Section>
        </Columns>
      )}
    </Fetched>
  );
}

function Opening({ tree: { opening } }: { tree: Tree }) {
  const lists = [
    { title: 'Tools', names: opening.tools.map((t) => t.name) },
    { title: 'Instruments', names: opening.instruments.map((i) => (i.range ? `${i.name}, ${i.range}` : i.name)) },
    { title: 'Parts', names: opening.parts.map((p) => p.name) },
    { title: 'Conditions', names: opening.conditions.map((c) => c.name) },
  ].filter(({ names }) => names.length > 0);
  if (lists.length === 0) return null;
  return (
    <Section title="Opening list" look="label">
      {lists.map(({ title, names }) => (
        <View key={title} style={{ gap: space.xs }}>
          <BodyText bold>{title}</BodyText>
          {names.map((name) => (
            <View key={name} style={{ flexDirection: 'row', gap: space.s }}>
              <BodyText tone="soft">–</BodyText>
              <View style={{ flex: 1 }}>
                <BodyText>{name}</BodyText>
              </View>
            </View>
          ))}
        </View>
      ))}
    </Section>
  );
}

function Suspects({ tree }: { tree: Tree }) {
  if (tree.suspects.length === 0) return null;
  const whole = tree.suspects.reduce((sum, s) => sum + s.prior, 0);
  return (
    <Section title="Suspects">
      <DataTable
        caption="Suspects"
        rows={tree.suspects}
        rowKey={(s) => s.id}
        columns={[
          { key: 'part', title: 'Part', grow: 2, cell: (s) => s.part },
          { key: 'mode', title: 'Fails by being', grow: 1.2, cell: (s) => <BodyText>{MODE_WORDS[s.mode]}</BodyText> },
          {
            key: 'prior',
            title: 'Before any check',
            grow: 1.2,
            cell: (s) => <BodyText>{`${Math.max(1, Math.round((100 * s.prior) / whole))} in 100`}</BodyText>,
          },
          {
            key: 'killers',
            title: 'Known killers',
            grow: 1.6,
            cell: (s) => (
              <BodyText tone={s.killedBy.length > 0 ? 'ink' : 'soft'}>
                {s.killedBy.map((id) => killerWords(tree, id)).join('; ') || 'none'}
              </BodyText>
            ),
          },
        ]}
      />
    </Section>
  );
}

/** A part can be a killer in more than one way: its mode tells which. */
function killerWords(tree: Tree, id: string): string {
  const killer = tree.suspects.find((k) => k.id === id);
  return killer === undefined ? id : `${killer.part}, ${MODE_WORDS[killer.mode]}`;
}

function OtherVersions({ version, versions }: Props) {
  const others = versions.filter((v) => v.version !== version.version).sort((a, b) => b.version - a.version);
  if (others.length === 0) return null;
  return (
    <Section title="Other versions" look="label">
      <View>
        {others.map((v) => (
          <LinkText
            key={v.version}
            label={`Version ${v.version}, ${VERSION_STATE_WORDS[v.state]}`}
            href={`/trees/${v.tree}?version=${v.version}`}
          />
        ))}
      </View>
    </Section>
  );
}
