import { useLocalSearchParams } from 'expo-router';

import { MachineScreen } from '@/shared/ui/screens/machines/MachineScreen';

export default function Machine() {
  const { machineId } = useLocalSearchParams<{ machineId: string }>();
  return <MachineScreen machineId={machineId} />;
}
