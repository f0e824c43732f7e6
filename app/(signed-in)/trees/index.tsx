import { TreesScreen } from '@/shared/ui/screens/trees/TreesScreen';

export default function Trees() {
  return <TreesScreen />;
}
