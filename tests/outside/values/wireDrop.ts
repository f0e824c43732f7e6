/** Published values of copper wire. */
import type { OutsideValue } from '@/tests/outside/outsideValue';

const floyd =
  'Floyd, Electric Circuit Fundamentals, wire gauge table as printed by HyperPhysics; same in a cable tester maker’s calculator';
const iec = 'IEC 60228, table of maximum d.c. resistance at 20 °C, from four agreeing cable makers’ pages';

// Ohms per 1000 ft at 20 °C as printed.
const gauges: readonly (readonly [awg: number, ohms: number, within: number])[] = [
  [10, 0.9989, 0.001],
  [12, 1.588, 0.001],
  [14, 2.525, 0.001],
  [16, 4.016, 0.001],
  [18, 6.385, 0.001],
  [20, 10.15, 0.005],
  [22, 16.14, 0.005],
  [24, 25.67, 0.005],
  [26, 40.81, 0.005],
  [28, 64.9, 0.05],
  [30, 103.2, 0.05],
];

const cables: readonly (readonly [kind: string, squareMillimetres: number, ohmsPerKilometre: number])[] = [
  ['solid', 0.75, 24.5],
  ['solid', 1.5, 12.1],
  ['solid', 6, 3.08],
  ['flexible', 0.5, 39],
  ['flexible', 0.75, 26],
  ['flexible', 1, 19.5],
  ['flexible', 2.5, 7.98],
  ['flexible', 4, 4.95],
  ['flexible-tinned', 0.75, 26.7],
  ['flexible-tinned', 2.5, 8.21],
];

export const values: readonly OutsideValue[] = [
  ...gauges.map(([awg, expected, within]) => ({
    sheet: 'wire-drop',
    what: `AWG ${String(awg)}, ohms per 1000 ft`,
    source: floyd,
    expected,
    within,
    given: { awg, metres: 304.8, amps: 1 },
    read: 'ohms',
  })),
  ...cables.map(([kind, squareMillimetres, expected]) => ({
    sheet: 'wire-drop',
    what: `${String(squareMillimetres)} mm² ${kind}, most ohms per kilometre`,
    source: iec,
    expected,
    within: 1e-9,
    given: { squareMillimetres, kind, metres: 1000, amps: 1 },
    read: 'worstOhms',
  })),
  {
    sheet: 'wire-drop',
    what: '50 ft of 12 AWG out and back, ohms',
    source: 'Cable tester maker’s wire resistance calculator (cirris.com): 100 ft of 12 AWG, 0.15880 Ω',
    expected: 0.1588,
    within: 0.00005,
    given: { awg: 12, metres: 15.24, path: 'there-and-back', amps: 1 },
    read: 'ohms',
  },
  {
    sheet: 'wire-drop',
    what: '100 ft circuit of No. 16 at 4 A, warm, volts lost',
    // The NEC table gives 4.99 Ω per 1000 ft for stranded No. 16 at 75 °C; the strands are 2 % longer than the wire.
    source: 'electrician2.com, class 2 wiring example: 2 × 100 ft × 4.99 Ω ÷ 1000 × 4 A = 4.0 V (NEC, chapter 9, table 8)',
    expected: 4.0,
    within: 0.1,
    given: { awg: 16, metres: 30.48, path: 'there-and-back', amps: 4, celsius: 75 },
    read: 'volts',
  },
  {
    sheet: 'wire-drop',
    what: '12 AWG, 100 ft, 20 A, volts lost there and back',
    source: 'voltagedropcalculator.net, first example: 2 × 0.017241 × 20 × 30.48 ÷ 3.31, printed as 6.4 V',
    expected: 6.4,
    within: 0.06,
    given: { squareMillimetres: 3.31, metres: 30.48, path: 'there-and-back', amps: 20 },
    read: 'volts',
  },
  {
    sheet: 'wire-drop',
    what: 'copper at 75 °C has 1.21615 times its ohms at 20 °C',
    source: 'α = 0.00393 per kelvin for annealed copper: NBS Handbook 100, Copper Wire Tables (from memory; the factor is worked out)',
    expected: 1.21615,
    within: 0.00001,
    given: { squareMillimetres: 17.241, metres: 1000, amps: 1, celsius: 75 },
    read: 'ohms',
  },
  {
    sheet: 'wire-drop',
    what: 'kilometre of 1 mm² at 50 °C brought back to 20 °C by the factor 0.893',
    // 17.241 Ω ÷ 0.893; the standard's factor is 250 ÷ (230 + t), which lies up to 0.4 % from copper's own.
    source: 'IEC 60228, temperature correction factor at 50 °C, from a cable maker’s page (uecables.com)',
    expected: 17.241 / 0.893,
    within: 0.08,
    given: { squareMillimetres: 1, metres: 1000, amps: 1, celsius: 50 },
    read: 'ohms',
  },
  {
    sheet: 'wire-drop',
    what: '1.8 m of 0.75 mm² flexible, most ohms',
    source: 'IEC 60228, class 5: 26.0 Ω/km; the length is worked out',
    expected: 0.0468,
    within: 1e-9,
    given: { squareMillimetres: 0.75, metres: 1.8, amps: 1 },
    read: 'worstOhms',
  },
  {
    sheet: 'wire-drop',
    what: 'two leads of 0.3 Ω hide a sound 27 mΩ wire: with four wires it reads as expected',
    source: 'Test leads have 0.2 to 0.5 Ω and must be subtracted: note on low ohms after a meter maker’s guide (gvda-instrument.com)',
    expected: 'as-expected',
    given: { squareMillimetres: 0.75, metres: 1.2, amps: 3, readOhms: 0.328, leadOhms: 0.3 },
    read: 'reading.says',
  },
];
