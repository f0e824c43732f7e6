import { InstrumentsScreen } from '@/shared/ui/screens/workshop/InstrumentsScreen';

export default function Instruments() {
  return <InstrumentsScreen />;
}
