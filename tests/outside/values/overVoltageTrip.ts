/** Published values of over-voltage trips. */
import type { OutsideValue, SheetValue } from '@/tests/outside/outsideValue';

const factory = 'Power-One linear supply data sheet MCD10016: factory over-voltage protection 6.2 V ± 0.4 V on 5 V';
const logic = 'TI SDLS025B (absolute maximum VCC 7 V) and Fairchild DM74LS08 (recommended 4.75 to 5.25 V)';
const teaching = 'Teaching circuit, 6.2 V Zener and thyristor before 7.0 V logic (studylib.net, “Overvoltage protection”)';
const sensing = 'onsemi MC3423 data sheet: sense trip 2.45, 2.6, 2.75 V; trip = 2.6 V × (1 + R1 ÷ R2)';

const row = (
  what: string,
  source: string,
  given: Record<string, unknown>,
  read: string,
  expected: number | string,
  within = 1e-9,
): SheetValue => ({
  sheet: 'over-voltage-trip',
  what,
  source,
  given: { nominalVolts: 5, mostVolts: 7, ...given },
  read,
  expected,
  within,
});
const stated = { kind: 'set-point', tripVolts: 6.2, tripTolerancePercent: (0.4 / 6.2) * 100 };
const zener = { kind: 'zener-gate', tripVolts: 6.2 };
const divider = { kind: 'divider', tripVolts: 2.6, tripTolerancePercent: (0.15 / 2.6) * 100, upperOhms: 3600, lowerOhms: 2700 };

export const values: readonly OutsideValue[] = [
  row('5 V ± 5 %, rail at most', logic, stated, 'railHighVolts', 5.25),
  row('factory trip, least', factory, stated, 'tripLowVolts', 5.8),
  row('factory trip, most', factory, stated, 'tripHighVolts', 6.6),
  row('rail to factory trip', `${factory}; ${logic}; the difference is worked out`, stated, 'marginBelowVolts', 0.55),
  row('factory trip to 7 V', `${factory}; ${logic}; the difference is worked out`, stated, 'marginAboveVolts', 0.4),
  row('factory trip stands in order', `${factory}; ${logic}`, stated, 'says', 'in-order'),
  // The circuit's text takes 6.2 V for the trip; the gate comes on top of it.
  row(
    '6.2 V Zener and a gate of 0.7 V',
    `${teaching}; gate volts from memory`,
    { ...zener, gateLeastVolts: 0.7, gateMostVolts: 0.7 },
    'tripVolts',
    6.9,
  ),
  row('6.2 V Zener ± 5 % before 7 V logic', `${teaching}; Zener tolerance of 5 %: usual E24 part`, zener, 'says', 'too-late'),
  row(
    '5.1 V Zener with a gate of 0.6 to 0.8 V',
    'Common practice, no source: Zener volts plus 0.7 V',
    { ...zener, tripVolts: 5.1 },
    'tripVolts',
    5.8,
  ),
  row(
    '5.6 V Zener with a gate of 0.6 to 0.8 V',
    'Common practice, no source: Zener volts plus 0.7 V',
    { ...zener, tripVolts: 5.6 },
    'tripVolts',
    6.3,
  ),
  row('sensing circuit, 3.6 kΩ over 2.7 kΩ', sensing, divider, 'tripVolts', 6.0667, 0.0001),
  row('sensing circuit, least', `${sensing}; 2.45 V × (1 + 3.6 ÷ 2.7)`, divider, 'tripLowVolts', 5.7167, 0.0001),
  row('sensing circuit, most', `${sensing}; 2.75 V × (1 + 3.6 ÷ 2.7)`, divider, 'tripHighVolts', 6.4167, 0.0001),
  row(
    'trip of 6 V by the printed formula for the upper resistor',
    'Note on the LTC1696 (makecreativeprojects.com): R1 = 33 kΩ × (V limit − 0.88 V) ÷ 0.88 V, so 192 kΩ for 6 V',
    { kind: 'divider', tripVolts: 0.88, upperOhms: 192e3, lowerOhms: 33e3 },
    'tripVolts',
    6,
    0.001,
  ),
  row(
    'a fired trip in a 5 A limit burns',
    'Power Designs TP340 manual, 2.4: after the trip the output is about 1 V',
    { ...stated, limitAmps: 5 },
    'heldWatts',
    5,
  ),
  row(
    '10 mF at 6.6 V through 20 mΩ, I²t',
    'Littelfuse fuse guide, chart 1: exponential, ½ × peak² × time constant; 330 A and 200 μs worked out',
    { ...stated, farads: 0.01, seriesOhms: 0.02 },
    'fault.ampSquaredSeconds',
    10.89,
    0.005,
  ),
];
