/** One fault tree, to read. */
import { View } from 'react-native';

import type { TreeVersion } from '@/shared/contract/trees';
import { useTrees } from '@/shared/ui/api/queries';
import { EmptyState } from '@/shared/ui/components/EmptyState';
import { LinkText } from '@/shared/ui/components/LinkText';
import { Notice } from '@/shared/ui/components/Notice';
import { Page } from '@/shared/ui/components/Page';
import { Tag } from '@/shared/ui/components/Tag';
import { Fetched } from '@/shared/ui/screens/shell/Fetched';
import { TreeVersionSheet } from '@/shared/ui/screens/trees/TreeVersionSheet';
import { VERSION_STATE_TAGS, VERSION_STATE_WORDS, versionShown } from '@/shared/ui/screens/trees/versionShown';
import { space } from '@/shared/ui/theme/space';

interface Props {
  treeId: string;
  /** from the address; without it the leading version is shown */
  version: string | undefined;
}

/** Head, opening list, suspects and steps of one version, with the way to its others. */
export function TreeScreen({ treeId, version }: Props) {
  const trees = useTrees();
  const versions = trees.data?.trees.find((tree) => tree.id === treeId)?.versions ?? [];
  const shown = versionShown(versions, version);
  return (
    <Page
      title={shown?.title ?? 'Fault tree'}
      eyebrow={shown ? `Fault tree · version ${shown.version} · ${shown.steps} steps` : undefined}
      aside={shown ? <Tag word={VERSION_STATE_WORDS[shown.state]} kind={VERSION_STATE_TAGS[shown.state]} /> : null}
      maxWidth={1280}
    >
      <Fetched query={trees} what="the fault tree">
        {() =>
          shown ? (
            <>
              <StateNotice shown={shown} versions={versions} />
              <TreeVersionSheet version={shown} versions={versions} />
            </>
          ) : (
            <EmptyState
              title={versions.length > 0 ? `No version ${version ?? ''}` : 'No such tree'}
              text={
                versions.length > 0 ? 'This tree has no version of that number.' : 'There is no fault tree of that name in this workshop.'
              }
              action={<LinkText label="All fault trees" href="/trees" />}
            />
          )
        }
      </Fetched>
    </Page>
  );
}

function StateNotice({ shown, versions }: { shown: TreeVersion; versions: readonly TreeVersion[] }) {
  const issued = versions.find((v) => v.state === 'issued' && v.version !== shown.version);
  const instead = issued ? (
    <LinkText label={`Version ${issued.version} is issued`} href={`/trees/${issued.tree}?version=${issued.version}`} />
  ) : null;
  if (shown.state === 'withdrawn') {
    return (
      <View style={{ gap: space.s }}>
        <Notice title="Withdrawn">No run can be started from this version. Records that were made with it still name it.</Notice>
        {instead}
      </View>
    );
  }
  if (shown.state === 'draft' || shown.state === 'in-check') {
    return (
      <View style={{ gap: space.s }}>
        <Notice title={shown.state === 'draft' ? 'Draft' : 'In check'}>
          Not issued: no run can be started from it until a second senior has checked it.
        </Notice>
        {instead}
      </View>
    );
  }
  return null;
}
