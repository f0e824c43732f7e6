import { MachinesScreen } from '@/shared/ui/screens/machines/MachinesScreen';

export default function Machines() {
  return <MachinesScreen />;
}
