/** The warning gate under each signal word, and the hold-to-confirm button. */
import { useState } from 'react';
import { View } from 'react-native';

import { HoldButton } from '@/shared/ui/components/HoldButton';
import { SafetySign } from '@/shared/ui/components/icons/SafetySign';
import type { SignName } from '@/shared/ui/components/icons/SafetySign';
import { WarningGate } from '@/shared/ui/components/WarningGate';
import type { Hazard } from '@/shared/ui/components/WarningGate';
import { Part } from '@/shared/ui/screens/parts/Part';
import { space } from '@/shared/ui/theme/space';

const mains: Hazard = {
  id: 'mains',
  signal: 'danger',
  sign: 'electricity',
  hazard: '230 V mains on the inlet and the fuse',
  result: 'Shock can kill.',
  avoid: ['Hands and tools off the machine.', 'A second person in the room who knows the emergency-off.'],
};
const charge: Hazard = {
  id: 'charge',
  signal: 'warning',
  sign: 'charge',
  hazard: 'C2, 68 000 μF at 24 V, holds 19.6 J',
  result: 'A short burns skin and throws metal.',
  avoid: ['Discharge through the resistor, never with a screwdriver.'],
};
const hot: Hazard = {
  id: 'hot',
  signal: 'caution',
  sign: 'hot',
  hazard: 'Lamp and load resistors',
  result: 'Hot for ten minutes after.',
  avoid: ['Let them cool before you move them.'],
};
const part: Hazard = {
  id: 'part',
  signal: 'notice',
  sign: null,
  hazard: 'Memory board without bias',
  result: 'Its devices cannot be bought any more.',
  avoid: ['Bias rail first, last off.'],
};
const signs: SignName[] = ['general', 'electricity', 'charge', 'hot', 'rotating', 'burst', 'toxic', 'xray', 'heavy', 'eyes'];

/** Several hazards in one gate; the same gate read; the milder words. */
export function WarningParts() {
  const [read, setRead] = useState(false);
  const [held, setHeld] = useState(0);
  return (
    <Part title="Warning gate and hold to confirm">
      <View style={{ gap: space.l, maxWidth: 560 }}>
        <WarningGate hazards={[mains, charge]} acknowledged={read} onAcknowledge={() => setRead(true)} />
        <WarningGate hazards={[charge]} acknowledged={false} onAcknowledge={() => undefined} />
        <WarningGate hazards={[hot]} acknowledged onAcknowledge={() => undefined} />
        <WarningGate hazards={[part]} acknowledged onAcknowledge={() => undefined} />
        <HoldButton key={held} label="Put mains in" onConfirm={() => undefined} />
        <HoldButton label="Put mains in, guard not clear" disabled onConfirm={() => setHeld(held + 1)} />
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.m }}>
        {signs.map((name) => (
          <SafetySign key={name} name={name} size={72} />
        ))}
      </View>
    </Part>
  );
}
