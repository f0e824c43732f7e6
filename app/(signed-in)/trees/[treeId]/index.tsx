import { useLocalSearchParams } from 'expo-router';

import { TreeScreen } from '@/shared/ui/screens/trees/TreeScreen';

export default function Tree() {
  const { treeId, version } = useLocalSearchParams<{ treeId: string; version?: string }>();
  return <TreeScreen treeId={treeId} version={version} />;
}
