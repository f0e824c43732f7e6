import { useLocalSearchParams } from 'expo-router';

import { SheetScreen } from '@/shared/ui/screens/workings/SheetScreen';

export default function Sheet() {
  const { sheet, ...given } = useLocalSearchParams<{ sheet: string }>();
  return <SheetScreen sheetId={sheet} given={given} />;
}
