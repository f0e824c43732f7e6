import { Redirect } from 'expo-router';

import { PartsScreen } from '@/shared/ui/screens/parts/PartsScreen';

export default function Parts() {
  const shown = __DEV__ || process.env['EXPO_PUBLIC_PARTS'] === '1';
  return shown ? <PartsScreen /> : <Redirect href="/" />;
}
