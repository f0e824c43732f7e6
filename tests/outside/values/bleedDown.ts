/** Published values of discharge. */
import { energyJoules, secondsToFall } from '@/shared/workings/discharge';
import { CHARGE_LIMITS, REBOUND_SHARES, voltsAtLimit } from '@/shared/workings/touchLimits';
import type { OutsideValue, SheetValue } from '@/tests/outside/outsideValue';

const tool = 'TT electronics/Welwyn, “Design Tool 4”, S. J. Oxley, March 2005: 195 μF, 1500 V to 320 V, 50 Ω';
const argued = 'IEC 61010-1, 6.3.1 c): 4.4 μF at 80 V, case argued in a standards mailing list (emc-pstc)';
const sheet = 'bleed-down';

const row = (what: string, source: string, given: Record<string, unknown>, read: string, expected: number, within: number): SheetValue => ({
  sheet,
  what,
  source,
  given,
  read,
  expected,
  within,
});
const falls = (
  what: string,
  source: string,
  seconds: number,
  within: number,
  ...[farads, ohms, from, to]: [number, number, number, number]
): OutsideValue => ({
  sheet,
  what,
  source,
  expected: seconds,
  within,
  gives: () => secondsToFall(farads, ohms, from, to),
});
const bank = { farads: 195e-6, volts: 1500, toolOhms: 50, tolerancePercent: 0 };
const small = { farads: 4.4e-6, volts: 80, toolOhms: 1000 };

export const values: readonly OutsideValue[] = [
  falls('195 μF, 1500 V to 320 V, 50 Ω', tool, 0.015062769, 5e-10, 195e-6, 50, 1500, 320),
  row('195 μF at 1500 V, 50 Ω, peak watts', tool, bank, 'toolPeakWatts', 45_000, 1e-6),
  row('195 μF, 50 Ω, time constant', tool, bank, 'timeConstantSeconds', 0.00975, 1e-9),
  row('195 μF at 1500 V, energy', tool, bank, 'joules', 219.375, 1e-6),
  falls(
    '0.47 μF, one time constant',
    'IEC 60950-1, 2.1.1.7: time constant of 1 s or less; 2.128 MΩ worked out',
    1,
    0.0005,
    0.47e-6,
    2.1277e6,
    340,
    340 / Math.E,
  ),
  falls(
    '0.22 μF, 325 V to 34 V',
    'IEC 60335-1, 22.5: 34 V one second after the plug is out; 2.014 MΩ worked out',
    1,
    0.0005,
    0.22e-6,
    2.0135e6,
    325,
    34,
  ),
  falls('1000 μF, 450 V to 50 V', 'NEC 460.6(A): 50 V within one minute; 27.3 kΩ worked out', 60, 0.005, 1000e-6, 27.307e3, 450, 50),
  falls(
    '340 V peak after one time constant',
    'IEC 60950 form, printed as 125.8 V with 0.37; 1 ÷ e gives 125.1 V',
    1,
    0.006,
    1e-6,
    1e6,
    340,
    125.8,
  ),
  row(
    '4700 μF, 40 V to 5 V, 100 Ω',
    'V = V₀·e^(−t/RC), any textbook; worked out by hand',
    { farads: 4700e-6, volts: 40, toolOhms: 100 },
    'secondsToSafe',
    0.97734,
    0.00001,
  ),
  row('4.4 μF at 80 V, charge', argued, small, 'coulombs', 352e-6, 1e-9),
  row('4.4 μF at 80 V, energy', argued, small, 'joules', 0.0141, 0.00005),
  row(
    '0.1 μF at 450 V, charge',
    'IEC 60335-1, 8.1.4: its two bands meet at 45 μC',
    { farads: 0.1e-6, volts: 450, toolOhms: 1000 },
    'coulombs',
    45e-6,
    1e-12,
  ),
  {
    sheet,
    what: '3.11 nF at 15 kV, energy',
    source: 'IEC 60335-1, 8.1.4: 350 mJ above 15 kV',
    expected: 0.35,
    within: 0.0005,
    gives: () => energyJoules(3.111e-9, 15_000),
  },
  {
    sheet,
    what: 'the exempt 60 μC are what 1 μF holds at 60 V',
    source: 'IEC 60204-1, 6.2.4 (clause text): down to 60 V, parts of 60 μC exempt',
    expected: 60,
    within: 0.001,
    gives: () => (CHARGE_LIMITS[0] === undefined ? 0 : voltsAtLimit(CHARGE_LIMITS[0], 1e-6)),
  },
  {
    sheet,
    what: 'an electrolytic may come back to, percent',
    source: 'Public encyclopaedia, dielectric absorption: as much as 15 % for electrolytic capacitors',
    expected: 15,
    within: 0,
    gives: () => REBOUND_SHARES.electrolytic * 100,
  },
  {
    sheet,
    what: 'a ceramic one, percent',
    source: 'WIMA, technical information, dielectric absorption: Z5U 2.00 to 2.50 %',
    expected: 2.5,
    within: 0,
    gives: () => REBOUND_SHARES.ceramic * 100,
  },
];
