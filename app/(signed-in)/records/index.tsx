import { useLocalSearchParams } from 'expo-router';

import { RecordsScreen } from '@/shared/ui/screens/records/RecordsScreen';

export default function Records() {
  // not `state`, which the router takes for its own
  const { show } = useLocalSearchParams<{ show?: string }>();
  return <RecordsScreen show={show} />;
}
