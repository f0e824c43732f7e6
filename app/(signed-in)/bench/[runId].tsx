import { useLocalSearchParams } from 'expo-router';

import { RunScreen } from '@/shared/ui/screens/run/RunScreen';

export default function Run() {
  const { runId } = useLocalSearchParams<{ runId: string }>();
  return <RunScreen key={runId} runId={runId} />;
}
