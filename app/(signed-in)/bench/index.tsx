import { useLocalSearchParams } from 'expo-router';

import { BenchScreen } from '@/shared/ui/screens/bench/BenchScreen';

export default function Bench() {
  const { machine } = useLocalSearchParams<{ machine?: string }>();
  return <BenchScreen machine={machine} />;
}
