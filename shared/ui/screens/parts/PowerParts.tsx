/** The power band and strip in every state. */
import { View } from 'react-native';

import { PowerBand } from '@/shared/ui/components/PowerBand';
import { PowerStrip } from '@/shared/ui/components/PowerStrip';
import type { PowerSegment } from '@/shared/ui/components/powerVisual';
import { Part } from '@/shared/ui/screens/parts/Part';
import { space } from '@/shared/ui/theme/space';

const segments: PowerSegment[] = [
  { state: 'unknown', seconds: 120 },
  { state: 'off', seconds: 180 },
  { state: 'proved-dead', seconds: 940 },
  { state: 'lamp', seconds: 520 },
  { state: 'off', seconds: 170 },
  { state: 'bench', seconds: 500 },
  { state: 'proved-dead', seconds: 480 },
  { state: 'mains', seconds: 1240 },
  { state: 'off', seconds: 240 },
  { state: 'proved-dead', seconds: 430 },
];

/** Bands as they stand at the top of a run, and the strip of a record. */
export function PowerParts() {
  return (
    <Part title="Power band and strip">
      <View style={{ gap: space.m }}>
        <PowerBand state="unknown" detail="nothing is proved yet" place="1/31" />
        <PowerBand state="off" detail="plug out 00:42" place="3/31" />
        <PowerBand state="proved-dead" detail="every source out, 0.2 V on C1" place="9/31" onPressPlace={() => undefined} />
        <PowerBand state="lamp" detail="60 W in series, 230 V · live 01:12" place="14/31" onPressPlace={() => undefined} />
        <PowerBand state="bench" detail="9.0 V, limit 0.50 A, into raw" place="18/31" />
        <PowerBand state="mains" detail="230 V direct · live 00:09" />
      </View>
      <PowerStrip title="Power at the bench, 09:12 to 10:52" segments={segments} />
    </Part>
  );
}
