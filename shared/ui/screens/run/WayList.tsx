/** The way through the tree: studs on their rule, each with the power in which it was left. */
import { View } from 'react-native';

import { BodyText } from '@/shared/ui/components/BodyText';
import { Label } from '@/shared/ui/components/Label';
import { PowerPattern } from '@/shared/ui/components/PowerPattern';
import { powerVisual } from '@/shared/ui/components/powerVisual';
import { StepStud } from '@/shared/ui/components/StepStud';
import type { Run } from '@/shared/ui/screens/run/Run';
import { wayOf } from '@/shared/ui/screens/run/wayOf';
import type { WayStep } from '@/shared/ui/screens/run/wayOf';
import { line, space, stud } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** Steps where the run has been, the one where it stands, and the next few; the rest is only counted. */
export function WayList({ run }: { run: Run }) {
  const way = wayOf(run.program.layout, run.account, run.view.key);
  const at = way.findIndex((s) => s.state === 'now');
  const shown = way.filter((s, i) => s.state !== 'ahead' || (i > at && i <= at + 3));
  return (
    <View role="list" aria-label="The way so far" style={{ gap: space.s }}>
      <Label level={2}>The way</Label>
      {shown.map((s) => (
        <Line key={s.key} step={s} />
      ))}
      <BodyText size="small" tone="soft">{`${way.filter((s) => s.state === 'done').length} of ${way.length} steps of this tree visited`}</BodyText>
    </View>
  );
}

function Line({ step }: { step: WayStep }) {
  const { colors } = useTheme();
  return (
    <View role="listitem" style={{ flexDirection: 'row', alignItems: 'center', gap: space.s, minHeight: stud.size }}>
      <StepStud number={step.stud} state={step.state} ground={colors.raised} />
      <View style={{ flex: 1, minWidth: 0 }}>
        <BodyText size="small" bold={step.state === 'now'} tone={step.state === 'ahead' ? 'soft' : 'ink'}>
          {step.title}
        </BodyText>
      </View>
      {step.band === null ? null : (
        <View role="img" aria-label={powerVisual(step.band).word} style={{ width: 18, height: 32, borderWidth: line.hair, borderColor: colors.ink, backgroundColor: powerVisual(step.band).ground, overflow: 'hidden' }}>
          <PowerPattern state={step.band} width={18} height={32} />
        </View>
      )}
    </View>
  );
}
