/** A photo, whole and as wide as there is room, with what is marked on it. */
import { useState } from 'react';
import { Image, View } from 'react-native';
import Svg, { Circle, Line } from 'react-native-svg';

import { BodyText } from '@/shared/ui/components/BodyText';
import { line, space } from '@/shared/ui/theme/space';
import { useTheme } from '@/shared/ui/theme/useTheme';

/** A place on a photo, in fractions of its width and height. */
export interface PhotoMark {
  readonly x: number;
  readonly y: number;
}

interface Props {
  /** its address */
  source: string;
  /** what it shows, for those who do not see it and while it is away */
  says: string;
  mark?: PhotoMark | undefined;
}

/** Until it has come the frame stands at 4 : 3, so that nothing jumps under a finger. */
const USUAL_RATIO = 4 / 3;
const RING_PX = 22;

/** The mark is a ring with cross hairs in two colours, to be seen on dark and on bright parts alike. */
export function Photo({ source, says, mark }: Props) {
  const { colors } = useTheme();
  const [ratio, setRatio] = useState(USUAL_RATIO);
  const [lost, setLost] = useState<string | null>(null);
  if (lost === source) {
    return (
      <View style={{ borderWidth: line.hair, borderColor: colors.rule, padding: space.m }}>
        <BodyText size="small" tone="soft">{`${says}: it cannot be shown now.`}</BodyText>
      </View>
    );
  }
  return (
    <View style={{ alignSelf: 'stretch', maxWidth: 720, aspectRatio: ratio, borderWidth: line.hair, borderColor: colors.rule, backgroundColor: colors.raised }}>
      <Image
        source={{ uri: source }}
        accessibilityLabel={says}
        resizeMode="contain"
        style={{ width: '100%', height: '100%' }}
        onLoad={({ nativeEvent }) => {
          const { width, height } = sizeOf(nativeEvent);
          if (width > 0 && height > 0) setRatio(width / height);
        }}
        onError={() => setLost(source)}
      />
      {mark === undefined ? null : <Mark {...mark} />}
    </View>
  );
}

/** Pixels of a picture that has come: the web hands on the browser's own event, other platforms a size. */
function sizeOf(event: { source?: { width: number; height: number }; target?: unknown }): { width: number; height: number } {
  const { naturalWidth = 0, naturalHeight = 0 } = (event.target ?? {}) as Partial<HTMLImageElement>;
  return event.source ?? { width: naturalWidth, height: naturalHeight };
}

function Mark({ x, y }: PhotoMark) {
  const { colors } = useTheme();
  const size = RING_PX * 2 + 24;
  const c = size / 2;
  const strokes = [
    { stroke: '#ffffff', strokeWidth: 7 },
    { stroke: colors.alarm, strokeWidth: 3 },
  ];
  return (
    <View aria-hidden style={{ position: 'absolute', left: `${x * 100}%`, top: `${y * 100}%`, marginLeft: -c, marginTop: -c }}>
      <Svg width={size} height={size}>
        {strokes.map((look) => (
          <Circle key={look.stroke} cx={c} cy={c} r={RING_PX} fill="none" {...look} />
        ))}
        {strokes.flatMap((look) => [
          <Line key={`h${look.stroke}`} x1={0} y1={c} x2={c - RING_PX} y2={c} {...look} />,
          <Line key={`v${look.stroke}`} x1={c} y1={0} x2={c} y2={c - RING_PX} {...look} />,
          <Line key={`r${look.stroke}`} x1={c + RING_PX} y1={c} x2={size} y2={c} {...look} />,
          <Line key={`d${look.stroke}`} x1={c} y1={c + RING_PX} x2={c} y2={size} {...look} />,
        ])}
      </Svg>
    </View>
  );
}
