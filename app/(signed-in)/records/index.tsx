import { useLocalSearchParams } from 'expo-router';

import { RecordsScreen } from '@/shared/ui/screens/records/RecordsScreen';

export default function Records() {
  const { state } = useLocalSearchParams<{ state?: string }>();
  return <RecordsScreen state={state} />;
}
