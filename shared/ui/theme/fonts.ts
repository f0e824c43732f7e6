/** Loads the five shipped font files, and never keeps a step from a person because a font is late. */
import { useFonts } from 'expo-font';
import { useEffect, useState } from 'react';

import monoRegular from '@/fonts/atkinson-hyperlegible-mono/AtkinsonHyperlegibleMono_400Regular.ttf';
import monoBold from '@/fonts/atkinson-hyperlegible-mono/AtkinsonHyperlegibleMono_700Bold.ttf';
import textRegular from '@/fonts/atkinson-hyperlegible-next/AtkinsonHyperlegibleNext_400Regular.ttf';
import textBold from '@/fonts/atkinson-hyperlegible-next/AtkinsonHyperlegibleNext_700Bold.ttf';
import headSemiBold from '@/fonts/barlow-condensed/BarlowCondensed_600SemiBold.ttf';

const files = {
  'Lampstep Text': textRegular,
  'Lampstep Text Bold': textBold,
  'Lampstep Head': headSemiBold,
  'Lampstep Mono': monoRegular,
  'Lampstep Mono Bold': monoBold,
};

const patienceMs = 1500;

/** True once the fonts are there, have failed, or have taken longer than a person should wait. */
export function useFontsSettled(): boolean {
  const [loaded, error] = useFonts(files);
  const [waited, setWaited] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setWaited(true), patienceMs);
    return () => clearTimeout(timer);
  }, []);
  return loaded || error !== null || waited;
}
