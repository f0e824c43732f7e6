import { Slot } from 'expo-router';

import { ThemeProvider } from '@/shared/ui/theme/useTheme';
import { useFontsSettled } from '@/shared/ui/theme/fonts';

export default function RootLayout() {
  const settled = useFontsSettled();
  return <ThemeProvider>{settled ? <Slot /> : null}</ThemeProvider>;
}
