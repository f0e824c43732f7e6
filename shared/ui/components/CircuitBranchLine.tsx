/** What joins two nodes: its symbol on its wire, the way of the current, and its number. */
import { Circle, G, Path, Text as SvgText } from 'react-native-svg';

import type { PlacedBranch } from '@/shared/ui/components/circuitModel';
import { CIRCUIT_SYMBOLS, SYMBOL_LENGTH } from '@/shared/ui/components/circuitSymbols';
import { face, smallestTextPx } from '@/shared/ui/theme/type';
import { useTheme } from '@/shared/ui/theme/useTheme';

const STUD = 11;
/** from here on a current is drawn with its way */
const LEAST_AMPS = 1e-6;

/** The lit way is thick and in brass with arrows; an opened wire has a gap with a cross; nothing is told by colour alone. */
export function CircuitBranchLine({ placed }: { placed: PlacedBranch }) {
  const { colors } = useTheme();
  const { branch, number, x1, y1, x2, y2, share, numberAt, drops } = placed;
  const lit = branch.lit === true;
  const opened = branch.mark === 'opened';
  const stroke = lit ? colors.brass : colors.ink;
  const width = lit ? 4.5 : 1.8;
  const length = Math.hypot(x2 - x1, y2 - y1);
  const turn = (Math.atan2(y2 - y1, x2 - x1) * 180) / Math.PI;
  // where the symbol begins
  const begin = Math.max(0, length * share - SYMBOL_LENGTH / 2);
  const symbol = CIRCUIT_SYMBOLS[branch.kind];
  const level = Math.abs(y2 - y1) < 1;
  const [mx, my] = [x1 + (x2 - x1) * share, y1 + (y2 - y1) * share];
  const [sx, sy] = level ? [mx, my - 21] : [mx + (numberAt === 'right' ? 24 : -24), my];
  const backwards = (branch.amps ?? 0) < 0;
  const flows = !opened && Math.abs(branch.amps ?? 0) > LEAST_AMPS;
  return (
    <G>
      {drops.map((drop) => (
        <Path key={drop.x} d={`M${drop.x} ${drop.y1}V${drop.y2}`} stroke={stroke} strokeWidth={width} fill="none" />
      ))}
      <Circle cx={x1} cy={drops[0]?.y1 ?? y1} r={3.5} fill={colors.ink} />
      <Circle cx={x2} cy={drops.at(-1)?.y1 ?? y2} r={3.5} fill={colors.ink} />
      <G transform={`translate(${x1} ${y1}) rotate(${turn})`}>
        {opened ? (
          <G>
            <Path d={`M0 0H${begin}M${begin + SYMBOL_LENGTH} 0H${length}`} stroke={colors.ink} strokeWidth={1.8} strokeDasharray="5 4" />
            <Path d={`M${begin + 9} -8 ${begin + 25} 8M${begin + 9} 8 ${begin + 25} -8`} stroke={colors.ink} strokeWidth={3.5} />
          </G>
        ) : (
          <G>
            <Path d={`M0 0H${begin}M${begin + SYMBOL_LENGTH} 0H${length}`} stroke={stroke} strokeWidth={width} />
            <G transform={`translate(${begin} 0)`}>
              {symbol.body === undefined ? null : <Path d={symbol.body} fill={colors.raised} stroke={stroke} strokeWidth={lit ? 3 : 1.8} />}
              {symbol.line === '' ? null : <Path d={symbol.line} fill="none" stroke={stroke} strokeWidth={lit ? 3.5 : 1.8} />}
              {symbol.solid === undefined ? null : <Path d={symbol.solid} fill={stroke} />}
            </G>
            {branch.kind === 'source' ? <Plus at={begin} turn={turn} color={colors.ink} /> : null}
            {flows ? (
              <Path
                d={backwards ? `M${begin - 3} -6L${begin - 13} 0 ${begin - 3} 6z` : `M${begin + SYMBOL_LENGTH + 3} -6l10 6 -10 6z`}
                fill={stroke}
              />
            ) : null}
            {branch.mark === 'accused' ? (
              <Path
                d={`M${begin - 2} -13H${begin + 36}V13H${begin - 2}z`}
                fill="none"
                stroke={colors.ink}
                strokeWidth={2}
                strokeDasharray="4 3"
              />
            ) : null}
          </G>
        )}
      </G>
      <Circle cx={sx} cy={sy} r={STUD} fill={opened || lit ? colors.ink : colors.paper} stroke={colors.ink} strokeWidth={1.5} />
      <SvgText
        x={sx}
        y={sy + 5.5}
        textAnchor="middle"
        fill={opened || lit ? colors.paper : colors.ink}
        fontFamily={face.mono}
        fontSize={smallestTextPx}
      >
        {number}
      </SvgText>
    </G>
  );
}

/** The plus of a source, upright whichever way its wire runs. */
function Plus({ at, turn, color }: { at: number; turn: number; color: string }) {
  return (
    <G transform={`translate(${at + 9} 0) rotate(${-turn})`}>
      <Path d="M-4 0H4M0 -4V4" stroke={color} strokeWidth={1.8} />
    </G>
  );
}
