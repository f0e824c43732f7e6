/** Paper's theme made from ours, so that what is left of Paper inside our components looks like the sheet. */
import { MD3DarkTheme, MD3LightTheme } from 'react-native-paper/lib/module/styles/themes';

import { palettes } from '@/shared/ui/theme/palette';
import type { Scheme } from '@/shared/ui/theme/palette';
import { face } from '@/shared/ui/theme/type';

type PaperTheme = typeof MD3LightTheme;

function fontsOf(base: PaperTheme['fonts']): PaperTheme['fonts'] {
  const fonts = Object.entries(base).map(([name, font]) => [name, { ...font, fontFamily: face.text, fontWeight: '400' }]);
  return Object.fromEntries(fonts) as PaperTheme['fonts'];
}

/** The Paper theme for a scheme: square, flat, set in our face. */
export function paperTheme(scheme: Scheme): PaperTheme {
  const base = scheme === 'dark' ? MD3DarkTheme : MD3LightTheme;
  const c = palettes[scheme];
  return {
    ...base,
    roundness: 0,
    fonts: fontsOf(base.fonts),
    colors: {
      ...base.colors,
      primary: c.action,
      onPrimary: c.onAction,
      secondary: c.brass,
      background: c.paper,
      onBackground: c.ink,
      surface: c.raised,
      surfaceVariant: c.raised,
      onSurface: c.ink,
      onSurfaceVariant: c.inkSoft,
      outline: c.ink,
      outlineVariant: c.rule,
      error: c.brass,
      onError: c.paper,
      backdrop: c.scrim,
    },
  };
}
