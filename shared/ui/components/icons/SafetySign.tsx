/** Safety signs after the meaning and shape rules of ISO 7010 / ISO 3864, in drawings of our own. */
import Svg, { Circle, G, Path } from 'react-native-svg';

import { safety } from '@/shared/ui/theme/palette';

export type SignName = 'general' | 'electricity' | 'charge' | 'hot' | 'rotating' | 'burst' | 'toxic' | 'xray' | 'heavy' | 'eyes';

interface Mark {
  stroke?: string;
  fill?: string;
}

const marks: Readonly<Record<Exclude<SignName, 'eyes'>, Mark>> = {
  general: { stroke: 'M32 22v16M32 45v2' },
  electricity: { fill: 'M35 17 22 37h8.5L27 52l14.5-20H32.5z' },
  charge: { fill: 'M33 15 25 27h5.5L28.5 36l9-12H32z', stroke: 'M22 40h20M22 46h20M32 40v-3M32 46v6' },
  hot: { stroke: 'M18 50h28M24 44c-4-5 4-8 0-14M32 44c-4-5 4-8 0-16M40 44c-4-5 4-8 0-14' },
  rotating: { stroke: 'M32 25a11.5 11.5 0 1011.5 11.5M32 20l6 5-6 5M32 36.5h.1M27 36.5h10' },
  burst: { stroke: 'M32 44V33M26 38l-7-6M38 38l7-6M27 44l-9 2M37 44l9 2M32 28v-6M26 50h12' },
  toxic: { stroke: 'M26 50h12M28 20h8M30 20v9L21 46l2 4h18l2-4-9-17v-9M25 41h14' },
  xray: {
    fill: 'M34.1 43.6L38.5 51.3A13 13 0 0125.5 51.3L29.9 43.6A4.2 4.2 0 0034.1 43.6zM27.8 40.0L19.0 40.0A13 13 0 0125.5 28.7L29.9 36.4A4.2 4.2 0 0027.8 40.0zM34.1 36.4L38.5 28.7A13 13 0 0145.0 40.0L36.2 40.0A4.2 4.2 0 0034.1 36.4zM32 37.6a2.4 2.4 0 100 4.8 2.4 2.4 0 000-4.8z',
  },
  heavy: { stroke: 'M22 34h20l3 15H19zM32 34v-5M28.5 25.5a3.5 3.5 0 107 0 3.5 3.5 0 00-7 0' },
};

interface Props {
  name: SignName;
  size: number;
}

/** A warning triangle (or, for `eyes`, a mandatory disc). Always beside its words: hidden from screen readers. */
export function SafetySign({ name, size }: Props) {
  return (
    <Svg width={size} height={size} viewBox="-2 -1 68 65" aria-hidden>
      {name === 'eyes' ? <EyesDisc /> : <Triangle mark={marks[name]} />}
    </Svg>
  );
}

function Triangle({ mark }: { mark: Mark }) {
  return (
    <G>
      <Path d="M32 4 62 58H2z" fill="none" stroke={safety.yellow} strokeWidth={7} strokeLinejoin="round" />
      <Path d="M32 4 62 58H2z" fill={safety.yellow} stroke={safety.black} strokeWidth={4} strokeLinejoin="round" />
      {mark.fill ? <Path d={mark.fill} fill={safety.black} /> : null}
      {mark.stroke ? (
        <Path d={mark.stroke} fill="none" stroke={safety.black} strokeWidth={3.5} strokeLinecap="round" strokeLinejoin="round" />
      ) : null}
    </G>
  );
}

function EyesDisc() {
  return (
    <G>
      <Circle cx={32} cy={32} r={29} fill={safety.blue} />
      <Path
        d="M11 28h42M14 28v7a8 8 0 0016 0v-4h4v4a8 8 0 0016 0v-7"
        fill="none"
        stroke={safety.white}
        strokeWidth={4}
        strokeLinejoin="round"
      />
    </G>
  );
}
