/** The settings of a workshop in rows of words, beside the loosest value that the house rules allow. */
import { defaultSettings } from '@/flows/document/settings';
import type { Settings } from '@/flows/document/settings';
import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';

export interface SettingRow {
  key: keyof Settings;
  name: string;
  value: string;
  loosest: string;
  /** true where the workshop asks for more than the rules do */
  stricter: boolean;
}

type Shown = readonly [key: keyof Settings, name: string, print: (settings: Settings) => string];

const minutes = (n: number) => `${formatNumber(n)} min`;

const shown: readonly Shown[] = [
  ['deadVolts', 'Dead is', (s) => `${formatQuantity(s.deadVolts, 'V')} or less, AC and DC`],
  ['storedVolts', 'Discharge first: above', (s) => `${formatQuantity(s.storedVolts, 'V')} DC`],
  ['storedJoules', '… with more than', (s) => formatQuantity(s.storedJoules, 'J')],
  ['storedJoulesAnyVolts', '… or at any voltage above', (s) => formatQuantity(s.storedJoulesAnyVolts, 'J')],
  ['deadLapseMinutes', '“Proved dead” lapses after', (s) => minutes(s.deadLapseMinutes)],
  ['earthOhms', 'Earth, the lead’s own on top', (s) => `${formatQuantity(s.earthOhms, 'Ω')} or less`],
  ['insulationOhmsClassI', 'Insulation, class I', (s) => `${formatQuantity(s.insulationOhmsClassI, 'Ω')} or more`],
  ['insulationOhmsClassII', 'Insulation, class II', (s) => `${formatQuantity(s.insulationOhmsClassII, 'Ω')} or more`],
  ['benchLimitedAmps', 'Bench supply counts as limited up to', (s) => formatQuantity(s.benchLimitedAmps, 'A')],
  ['benchLimitedShare', '… or, where that is more, up to', (s) => `${formatNumber(s.benchLimitedShare * 100)} % of rated input amps`],
  ['secondPersonVoltsDc', 'Second person for live work above, DC', (s) => formatQuantity(s.secondPersonVoltsDc, 'V')],
  ['secondPersonVoltsAc', 'Second person for live work above, AC', (s) => formatQuantity(s.secondPersonVoltsAc, 'V')],
  ['guardHoldSeconds', 'Guard before power is held for', (s) => `${formatNumber(s.guardHoldSeconds)} s`],
  ['holdMinutes', 'A countersign is used up after', (s) => minutes(s.holdMinutes)],
  ['releaseDays', 'A release is good for', (s) => `${formatNumber(s.releaseDays)} days`],
  ['leaseHours', 'A run goes on offline for', (s) => `${formatNumber(s.leaseHours)} h`],
  ['clockJumpSeconds', 'A clock has jumped when off by more than', (s) => `${formatNumber(s.clockJumpSeconds)} s`],
  ['retries', 'Retries of one answer', (s) => formatNumber(s.retries)],
  ['emergencyNumber', 'Emergency number', (s) => s.emergencyNumber],
];

/** One row a setting, in the order in which a run meets them. */
export function settingRows(settings: Settings): SettingRow[] {
  return shown.map(([key, name, print]) => {
    const loosest = key === 'emergencyNumber' ? 'your country’s own' : print(defaultSettings);
    return { key, name, value: print(settings), loosest, stricter: key !== 'emergencyNumber' && settings[key] !== defaultSettings[key] };
  });
}
