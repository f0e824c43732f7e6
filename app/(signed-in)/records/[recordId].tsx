import { useLocalSearchParams } from 'expo-router';

import { RecordScreen } from '@/shared/ui/screens/records/RecordScreen';

export default function Record() {
  const { recordId } = useLocalSearchParams<{ recordId: string }>();
  return <RecordScreen recordId={recordId} />;
}
