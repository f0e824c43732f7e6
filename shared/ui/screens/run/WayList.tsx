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

const BEFORE = 6;
const AHEAD = 3;

/** Where the run stands, with a few steps before and behind it; the rest is only counted. */
export function WayList({ run }: { run: Run }) {
  const way = wayOf(run.program.layout, run.account, run.view.key);
  const now = way.findIndex((s) => s.state === 'now');
  // while the machine makes safe the run stands at no step of the tree: the last one visited is shown
  const at = now === -1 ? way.findLastIndex((s) => s.state === 'done') : now;
  const visited = way.slice(0, at + 1).filter((s) => s.state !== 'ahead');
  const shown = [...visited.slice(-BEFORE - 1), ...way.slice(at + 1, at + 1 + AHEAD)];
  return (
    <View style={{ gap: space.s }}>
      <Label level={2}>The way</Label>
      <View role="list" aria-label="The way" style={{ gap: space.s }}>
        {shown.map((s) => (
          <Line key={s.key} step={s} />
        ))}
      </View>
      <BodyText
        size="small"
        tone="soft"
      >{`${way.filter((s) => s.state === 'done').length} of ${way.length} steps of this tree visited`}</BodyText>
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
        <View
          role="img"
          aria-label={powerVisual(step.band).word}
          style={{
            width: 18,
            height: 32,
            borderWidth: line.hair,
            borderColor: colors.ink,
            backgroundColor: powerVisual(step.band).ground,
            overflow: 'hidden',
          }}
        >
          <PowerPattern state={step.band} width={18} height={32} />
        </View>
      )}
    </View>
  );
}
