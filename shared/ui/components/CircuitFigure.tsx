/** A circuit with what flows in it: the drawing, a numbered key below it, and what it shows in words. */
import { useId, useState } from 'react';
import { ScrollView, View } from 'react-native';
import Svg from 'react-native-svg';

import { BodyText } from '@/shared/ui/components/BodyText';
import { CircuitKey } from '@/shared/ui/components/CircuitKey';
import { circuitModel } from '@/shared/ui/components/circuitModel';
import { CircuitNodeRule } from '@/shared/ui/components/CircuitNodeRule';
import { CircuitBranchLine } from '@/shared/ui/components/CircuitBranchLine';
import { Label } from '@/shared/ui/components/Label';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';
import { webProps } from '@/shared/ui/theme/webStyle';
import type { Circuit } from '@/shared/workings/plot';

const FIRST_WIDTH = 358;
/** Narrower than this there is no room for the axes. */
const LEAST_WIDTH = 120;

/** Fills the width that it is given; a larger circuit scrolls sideways in its own frame. */
export function CircuitFigure({ circuit }: { circuit: Circuit }) {
  const { colors } = useTheme();
  const id = useId();
  const [given, setGiven] = useState(FIRST_WIDTH);
  const { width, height, nodes, branches } = circuitModel(circuit, given);
  const wider = width > given;
  return (
    <View style={{ alignSelf: 'stretch', gap: space.s }}>
      <Label level={3}>{circuit.title}</Label>
      <View
        style={{ alignSelf: 'stretch', backgroundColor: colors.raised, borderWidth: line.hair, borderColor: colors.rule }}
        // a page on its way out is laid out with no width at all
        onLayout={({ nativeEvent: { layout } }) => setGiven(layout.width > LEAST_WIDTH ? Math.floor(layout.width - 2 * line.hair) : FIRST_WIDTH)}
      >
        <ScrollView
          horizontal
          {...(wider ? webProps({ tabIndex: 0, role: 'group', 'aria-label': `${circuit.title}, scrolls sideways` }) : {})}
        >
          <View role="img" aria-label={circuit.title} aria-describedby={id} style={{ width, height }}>
            <Svg width={width} height={height} aria-hidden>
              {nodes.map((placed) => (
                <CircuitNodeRule key={placed.node.id} placed={placed} />
              ))}
              {branches.map((placed) => (
                <CircuitBranchLine key={placed.branch.id} placed={placed} />
              ))}
            </Svg>
          </View>
        </ScrollView>
      </View>
      {wider ? (
        <BodyText size="small" tone="soft">
          The drawing is wider than the page: move it sideways.
        </BodyText>
      ) : null}
      <CircuitKey circuit={circuit} />
      <BodyText id={id} size="small" tone="soft">
        {circuit.words}
      </BodyText>
    </View>
  );
}
