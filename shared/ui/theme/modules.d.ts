declare module '*.ttf' {
  /** what Metro hands out for a font file; expo-font takes it as it is */
  const asset: number;
  export default asset;
}

declare module 'react-native-paper/lib/module/styles/themes' {
  export { MD3DarkTheme, MD3LightTheme } from 'react-native-paper';
}

declare module 'react-dom' {
  import type { ReactNode, ReactPortal } from 'react';

  export function createPortal(children: ReactNode, container: Element): ReactPortal;
}
