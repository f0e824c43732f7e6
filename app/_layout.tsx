import { Slot } from 'expo-router';

import { ApiProvider } from '@/shared/ui/api/ApiProvider';
import { ThemeProvider } from '@/shared/ui/theme/useTheme';
import { useFontsSettled } from '@/shared/ui/theme/fonts';

export default function RootLayout() {
  const settled = useFontsSettled();
  return (
    <ApiProvider>
      <ThemeProvider>{settled ? <Slot /> : null}</ThemeProvider>
    </ApiProvider>
  );
}
