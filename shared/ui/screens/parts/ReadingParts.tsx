/** The reading scale in every case that a meter can make, entries and verdicts. */
import { useState } from 'react';
import { View } from 'react-native';

import { Label } from '@/shared/ui/components/Label';
import { ReadingEntry } from '@/shared/ui/components/ReadingEntry';
import { ReadingScale } from '@/shared/ui/components/ReadingScale';
import type { ScaleInput } from '@/shared/ui/components/scaleModel';
import { Verdict } from '@/shared/ui/components/Verdict';
import { Part } from '@/shared/ui/screens/parts/Part';
import { space } from '@/shared/ui/theme/space';

const cases: { title: string; unit: string; scale: ScaleInput }[] = [
  { title: 'In', unit: 'V', scale: { value: 5.02, low: 4.75, high: 5.25, guard: 0.03, nominal: 5 } },
  { title: 'In, but close', unit: 'V', scale: { value: 11.43, low: 11.4, high: 12.6, guard: 0.05, nominal: 12 } },
  { title: 'A negative rail', unit: 'V', scale: { value: -12.11, low: -12.6, high: -11.4, guard: 0.05, nominal: -12 } },
  { title: 'Far above', unit: 'V', scale: { value: 17.8, low: 4.75, high: 5.25, guard: 0.03, nominal: 5 } },
  { title: 'Reversed', unit: 'V', scale: { value: -4.9, low: 4.75, high: 5.25, guard: 0.03, nominal: 5 } },
  { title: 'At most', unit: 'Ω', scale: { value: 0.07, low: null, high: 0.1, guard: 0.01 } },
  { title: 'At least', unit: 'MΩ', scale: { value: 2.4, low: 1, high: null, guard: 0.1 } },
  { title: 'Nothing read yet', unit: 'V', scale: { value: null, low: 4.75, high: 5.25, guard: 0.03, nominal: 5 } },
  { title: 'No limit', unit: 'mV', scale: { value: 37, low: null, high: null, guard: 0 } },
];

/** Scales, then what is typed and what is said. */
export function ReadingParts() {
  const [text, setText] = useState('4k7x');
  return (
    <Part title="Readings">
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.xl }}>
        {cases.map(({ title, unit, scale }) => (
          <View key={title} style={{ flexGrow: 1, flexBasis: 310, maxWidth: 520 }}>
            <Label>{`${title}, ${unit}`}</Label>
            <ReadingScale {...scale} unit={unit} />
          </View>
        ))}
      </View>
      <View style={{ maxWidth: 480, gap: space.l }}>
        <ReadingEntry
          label="R14, one end lifted"
          value={text}
          unit="Ω"
          meter="Meter B, 60 kΩ"
          error="4k7x is not a resistance. Type it as 4.7k, 4k7 or 4700."
          hint="Letters k, M, m and μ may stand for the point."
          onChangeText={setText}
        />
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.xl }}>
        <Verdict mark="in" word="In" note="clear of both guard bands (±0.04 V)" />
        <Verdict mark="close" word="In, but close" note="0.03 from the low limit, meter ±0.05" />
        <Verdict mark="out" word="High" note="0.55 V above the limit" />
        <Verdict mark="unsure" word="Not sure" />
        <Verdict mark="none" word="Not measured" />
      </View>
    </Part>
  );
}
