/** Published currents against which the limit for the next board is worked out. */
import type { OutsideValue, SheetValue } from '@/tests/outside/outsideValue';

const gates =
  'TI SDLS025B: supply current of a 7400 with outputs low 12 mA typical, 22 mA most (from memory); ten of them on a board worked out';
const hub = 'USB 2.0 specification, 7.2.1.1: a bus-powered hub takes one unit load of 100 mA for itself and gives four (from memory)';

const row = (
  what: string,
  source: string,
  given: Record<string, unknown>,
  read: string,
  expected: number | string,
  within = 1e-9,
): SheetValue => ({
  sheet: 'refit-trip',
  what,
  source,
  given: { nominalVolts: 5, ...given },
  read,
  expected,
  within,
});
const board = { lastAmps: 0, boardAmps: 0.12, spreadPercent: (10 / 12) * 100 };
const ports = { lastAmps: 0.4, boardAmps: 0.1, spreadPercent: 0, railAmps: 0.5 };
const negative = { nominalVolts: -12, lastAmps: 0, boardAmps: 0.5, railAmps: 5, ownLimitAmps: 20 };
const practice = 'Common practice, no source: a negative rail rated 5 A may limit only near 20 A';

export const values: readonly OutsideValue[] = [
  row('ten 7400, typical', gates, board, 'expectedAmps', 0.12),
  row('ten 7400, most, is the limit', gates, board, 'limitAmps', 0.22),
  row('fifth unit load on a hub', hub, ports, 'limitAmps', 0.5),
  row('fifth unit load on a hub fits', `${hub}: 500 mA in all`, { ...ports, newAmps: 0.5 }, 'reading', 'as-expected'),
  row('−12 V into a fault at the supply’s own limit', `${practice}; 12 V × 20 A worked out`, negative, 'ownLimitWatts', 240),
  row(
    '−12 V into a fault at the limit that was set',
    'Common practice, no source: the limit just above what is expected; 12 V × 0.625 A worked out',
    negative,
    'faultWatts',
    7.5,
  ),
  row('0.8 Ω read dead on a 5 V board', 'Ohm’s law: 5 V ÷ 0.8 Ω', { ...board, boardOhms: 0.8 }, 'deadAmps', 6.25),
  row(
    '0.8 Ω read dead is not fitted',
    'Common practice, no source: no board goes in with a short',
    { ...board, boardOhms: 0.8 },
    'dead',
    'would-trip',
  ),
];
