/** The theme of the page: scheme, colours, and the way to change them. */
import { createContext, useContext, useEffect, useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import { PaperProvider } from 'react-native-paper';

import { palettes } from '@/shared/ui/theme/palette';
import type { Palette, Scheme } from '@/shared/ui/theme/palette';
import { paperTheme } from '@/shared/ui/theme/paperTheme';
import { keepSchemeChoice, readSchemeChoice, schemeFor } from '@/shared/ui/theme/schemeChoice';
import type { SchemeChoice } from '@/shared/ui/theme/schemeChoice';
import { useSystemScheme } from '@/shared/ui/theme/useSystemScheme';

export interface Theme {
  scheme: Scheme;
  colors: Palette;
  choice: SchemeChoice;
  setChoice: (choice: SchemeChoice) => void;
}

const ThemeContext = createContext<Theme>({ scheme: 'light', colors: palettes.light, choice: 'system', setChoice: () => undefined });

/** Colours and scheme for the page below; follows the system until a person chooses. */
export function ThemeProvider({ children }: { children: ReactNode }) {
  const system = useSystemScheme();
  const [choice, setKept] = useState<SchemeChoice>(readSchemeChoice);
  const scheme = schemeFor(choice, system);
  const theme = useMemo<Theme>(
    () => ({
      scheme,
      colors: palettes[scheme],
      choice,
      setChoice: (next) => {
        keepSchemeChoice(next);
        setKept(next);
      },
    }),
    [scheme, choice],
  );
  useEffect(() => {
    document.documentElement.dataset['scheme'] = scheme;
  }, [scheme]);
  return (
    <ThemeContext.Provider value={theme}>
      <PaperProvider theme={paperTheme(scheme)}>{children}</PaperProvider>
    </ThemeContext.Provider>
  );
}

/** The theme of the page. */
export function useTheme(): Theme {
  return useContext(ThemeContext);
}
