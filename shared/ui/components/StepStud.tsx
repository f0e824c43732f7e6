/** A step's number in a ruled circle, like the call-outs of a service manual. */
import { Text, View } from 'react-native';

import { line, stud } from '@/shared/ui/theme/space';
import { type } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** `now` is where the run stands, `close` wants a second look, `broken` breaks a safety rule. */
export type StudState = 'now' | 'done' | 'ahead' | 'close' | 'broken';

interface Props {
  /** none draws the small open stud of a neighbour */
  number?: number | string | undefined;
  state?: StudState | undefined;
  /** colour behind the stud, so that the rule does not show through it */
  ground?: string | undefined;
}

/** The stud alone; `StudRail` joins studs with their rule. */
export function StepStud({ number, state = 'ahead', ground }: Props) {
  const { colors } = useTheme();
  const side = number === undefined ? stud.small : stud.size;
  const edge = { now: colors.ink, done: colors.inkSoft, ahead: colors.inkSoft, close: colors.brass, broken: colors.alarm }[state];
  const filled = state === 'now';
  return (
    <View
      style={{
        width: side,
        height: side,
        borderRadius: side / 2,
        borderWidth: number === undefined ? line.hair : line.rule,
        borderColor: edge,
        backgroundColor: filled ? colors.ink : (ground ?? colors.paper),
        alignItems: 'center',
        justifyContent: 'center',
      }}
    >
      {number === undefined ? null : <Text style={[type.sub, { color: filled ? colors.paper : edge }]}>{number}</Text>}
    </View>
  );
}
