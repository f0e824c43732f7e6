/** The issued trees for one machine, and the start. */
import { useQueries, useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';

import { misfits } from '@/flows/document/admits';
import type { Profile } from '@/flows/document/profile';
import type { Machine } from '@/shared/contract/machines';
import type { TreeVersion } from '@/shared/contract/trees';
import { client } from '@/shared/ui/api/client';
import { queryKeyOf, queryOf, useMachine, useTrees } from '@/shared/ui/api/queries';
import { steadyMs } from '@/shared/ui/hooks/benchClock';
import { BigAnswer } from '@/shared/ui/components/BigAnswer';
import { BodyText } from '@/shared/ui/components/BodyText';
import { Choice } from '@/shared/ui/components/Choice';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { Loading } from '@/shared/ui/components/Loading';
import { Notice } from '@/shared/ui/components/Notice';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { groupedByPurpose } from '@/shared/ui/screens/trees/groupedByPurpose';
import { space } from '@/shared/ui/theme/space';

/** Shows them once a machine is chosen. */
export function TreesFor({ machine }: { machine: Machine }) {
  const dossier = useMachine(machine.id);
  const trees = useTrees();
  return (
    <Fetched query={trees} what="the fault trees">
      {({ trees: all }) => (
        <Fetched query={dossier} what="the machine">
          {({ profile }) => <Start machine={machine} profile={profile.document} issued={all.flatMap((t) => newestIssued(t.versions))} />}
        </Fetched>
      )}
    </Fetched>
  );
}

function newestIssued(versions: readonly TreeVersion[]): TreeVersion[] {
  const issued = versions.filter((v) => v.state === 'issued').sort((a, b) => b.version - a.version);
  return issued.slice(0, 1);
}

interface Props {
  machine: Machine;
  profile: Profile;
  issued: readonly TreeVersion[];
}

function Start({ machine, profile, issued }: Props) {
  const router = useRouter();
  const queries = useQueryClient();
  const documents = useQueries({ queries: issued.map((v) => queryOf('treeVersion', { params: { tree: v.tree, version: v.version } })) });
  const [chosen, setChosen] = useState<string | null>(null);
  const [id] = useState(() => uuidv7());
  const [fault, setFault] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  if (documents.some((d) => d.isPending)) return <Loading what="the trees that apply" />;
  // a called tree such as "make dead" is a part of others and is not started alone at the bench
  const called = new Set(documents.flatMap((d) => d.data?.document.steps.flatMap((s) => (s.kind === 'call' ? [s.tree] : [])) ?? []));
  const fitting = issued.filter((v, i) => {
    const document = documents[i]?.data?.document;
    return document !== undefined && !called.has(v.tree) && misfits(document, profile, machine.serial).length === 0;
  });
  if (fitting.length === 0)
    return (
      <EmptyState
        title="No tree applies"
        text={`No issued tree of this workshop applies to ${machine.name}. A senior can write one, or widen what a tree applies to.`}
      />
    );
  const version = fitting.find((v) => v.tree === chosen) ?? (fitting.length === 1 ? fitting[0] : undefined);
  const start = async () => {
    if (version === undefined) return;
    setBusy(true);
    setFault(null);
    const started = await client.call('startRun', {
      body: { id, machine: machine.id, tree: version.tree, version: version.version, monotonic: steadyMs() },
    });
    setBusy(false);
    if (started.kind === 'problem') {
      setFault(started.say);
      return;
    }
    queries.setQueryData(queryKeyOf('run', { params: { run: id } }), started.data);
    void queries.invalidateQueries({ queryKey: queryKeyOf('machines') });
    void queries.invalidateQueries({ queryKey: queryKeyOf('runs') });
    router.push(`/bench/${id}`);
  };
  return (
    <View style={{ gap: space.m, alignSelf: 'stretch' }}>
      {groupedByPurpose(fitting).map(({ purpose, name, trees }) => (
        <Choice
          key={purpose}
          label={`Fault tree: ${name.toLowerCase()}`}
          value={version?.tree ?? null}
          options={trees.map((v) => ({ value: v.tree, label: v.title, detail: `${v.symptom}. Version ${v.version}, ${v.steps} steps` }))}
          onChange={setChosen}
        />
      ))}
      <BodyText size="small" tone="soft">
        Local electrical codes, the maker’s data and licensed practice come first. Where they and a tree differ, stop and follow them.
      </BodyText>
      {fault === null ? null : <Notice live>{fault}</Notice>}
      <BigAnswer
        kind="primary"
        label={busy ? 'Starting …' : 'Start the run'}
        disabled={busy || version === undefined}
        onPress={() => void start()}
      />
    </View>
  );
}
