import { BenchScreen } from '@/shared/ui/screens/bench/BenchScreen';

export default function Bench() {
  return <BenchScreen />;
}
