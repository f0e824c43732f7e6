import { Redirect, useLocalSearchParams } from 'expo-router';

import { PartsScreen } from '@/shared/ui/screens/parts/PartsScreen';
import { StepSheet } from '@/shared/ui/screens/parts/StepSheet';

export default function Parts() {
  const { view } = useLocalSearchParams<{ view?: string }>();
  const shown = __DEV__ || process.env['EXPO_PUBLIC_PARTS'] === '1';
  if (!shown) return <Redirect href="/" />;
  return view === 'step' ? <StepSheet /> : <PartsScreen />;
}
