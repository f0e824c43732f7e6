/** Day or night as the device has it. */
import { useSyncExternalStore } from 'react';
import { Appearance } from 'react-native';

import type { Scheme } from '@/shared/ui/theme/palette';

function subscribe(onChange: () => void): () => void {
  const subscription = Appearance.addChangeListener(() => {
    onChange();
  });
  return () => {
    subscription.remove();
  };
}

const read = (): Scheme => (Appearance.getColorScheme() === 'dark' ? 'dark' : 'light');

/** The device's scheme; a change between the first drawing and the subscription is not missed. */
export function useSystemScheme(): Scheme {
  return useSyncExternalStore(subscribe, read, read);
}
