/** Renders a component under the theme, as the app's layout does. */
import { cleanup, render } from '@testing-library/react';
import type { ReactNode } from 'react';
import { afterEach } from 'vitest';

import { ThemeProvider } from '@/shared/ui/theme/useTheme';

afterEach(() => cleanup());

/** Renders under the theme; what testing-library returns. */
export function renderSheet(children: ReactNode) {
  return render(<ThemeProvider>{children}</ThemeProvider>);
}
