/** The parts sheet: one ruled page with every part in every state. For development only. */
import { View } from 'react-native';

import { Choice } from '@/shared/ui/components/Choice';
import { Page } from '@/shared/ui/components/Page';
import { PlacesFrame } from '@/shared/ui/components/PlacesFrame';
import type { Place } from '@/shared/ui/components/placesShown';
import { StopBar } from '@/shared/ui/components/StopBar';
import { FormParts } from '@/shared/ui/screens/parts/FormParts';
import { PowerParts } from '@/shared/ui/screens/parts/PowerParts';
import { ReadingParts } from '@/shared/ui/screens/parts/ReadingParts';
import { RunParts } from '@/shared/ui/screens/parts/RunParts';
import { SheetParts } from '@/shared/ui/screens/parts/SheetParts';
import { WarningParts } from '@/shared/ui/screens/parts/WarningParts';
import type { SchemeChoice } from '@/shared/ui/theme/schemeChoice';
import { useTheme } from '@/shared/ui/theme/useTheme';

const places: Place[] = (['Bench', 'Trees', 'Machines', 'Records', 'Workings', 'Workshop'] as const).map((name) => ({ name, href: '/' }));
const schemes = [
  { value: 'system', label: 'As the device' },
  { value: 'light', label: 'Sheet (light)' },
  { value: 'dark', label: 'Night bench (dark)' },
];

/** Shown only where the build asks for it; no menu leads here. */
export function PartsScreen() {
  const { choice, setChoice } = useTheme();
  return (
    <PlacesFrame places={places} current="Workings">
      <Page title="Parts sheet" eyebrow="Lampstep · development" foot={<StopBar onPress={() => undefined} />}>
        <View style={{ maxWidth: 430 }}>
          <Choice label="Scheme" options={schemes} value={choice} onChange={(value) => setChoice(value as SchemeChoice)} />
        </View>
        <RunParts />
        <PowerParts />
        <WarningParts />
        <ReadingParts />
        <FormParts />
        <SheetParts />
      </Page>
    </PlacesFrame>
  );
}
