import { WorkingsScreen } from '@/shared/ui/screens/workings/WorkingsScreen';

export default function Workings() {
  return <WorkingsScreen />;
}
