/** A row of the sheet that hangs on the vertical rule by its stud. */
import type { ReactNode } from 'react';
import { View } from 'react-native';

import { StepStud } from '@/shared/ui/components/StepStud';
import type { StudState } from '@/shared/ui/components/StepStud';
import { line, space, stud } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

interface Props {
  number: number | string;
  state?: StudState | undefined;
  /** the rule goes on to a row above */
  above?: boolean | undefined;
  /** the rule goes on to a row below */
  below?: boolean | undefined;
  /** draws the small open stud of the step to come at the foot of the rule */
  next?: boolean | undefined;
  /** fills the height that is left */
  grow?: boolean | undefined;
  children: ReactNode;
}

const inset = space.l;
const axis = stud.column / 2;

/** Stud at the left on its rule, content at the right. */
export function StudRail({ number, state = 'ahead', above = false, below = false, next = false, grow = false, children }: Props) {
  const { colors } = useTheme();
  const ruleAt = { position: 'absolute', left: axis - 1, width: line.rule, backgroundColor: colors.rule } as const;
  const centre = inset + stud.size / 2;
  return (
    <View style={{ flexDirection: 'row', alignSelf: 'stretch', ...(grow ? { flexGrow: 1 } : {}) }}>
      <View style={{ width: stud.column, alignItems: 'center', paddingTop: inset }} aria-hidden>
        {above ? <View style={[ruleAt, { top: 0, height: centre }]} /> : null}
        {below ? <View style={[ruleAt, { top: centre, bottom: 0 }]} /> : null}
        <StepStud number={number} state={state} />
        {below && next ? (
          <View style={{ position: 'absolute', bottom: space.xl }}>
            <StepStud state="ahead" />
          </View>
        ) : null}
      </View>
      <View style={{ flex: 1, minWidth: 0, paddingVertical: inset, paddingRight: space.m, gap: space.m }}>{children}</View>
    </View>
  );
}
