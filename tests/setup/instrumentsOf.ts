/** Instruments for tests: one that reads everything finely, one plain multimeter, one whose calibration has ended. */
import type { InsertableInstrumentRow } from '@/db/tables';
import { QUANTITY_NAMES } from '@/flows/document/ids';

/** Instruments of a workshop that are in date until the end of 2027, and one that was so until the end of 2024. */
export function instrumentsOf(workshop: string, ids: { tester: string; meter: string; old: string }): InsertableInstrumentRow[] {
  const every = QUANTITY_NAMES.map((quantity) => ({ quantity, fullScale: 1e10, resolution: 1e-4, percent: 0, counts: 1 }));
  const volts = [
    { quantity: 'volts-dc', fullScale: 20, resolution: 0.01, percent: 0.5, counts: 2 },
    { quantity: 'volts-dc', fullScale: 600, resolution: 1, percent: 0.8, counts: 3 },
  ];
  const common = { workshop, category: 'CAT III 600 V', serial: 'S-1' };
  return [
    { ...common, id: ids.tester, tag: 'T1', name: 'Two-pole tester', kind: 'two-pole-tester', ranges: JSON.stringify(every), two_pole: true, calibrated_until: '2027-12-31' },
    { ...common, id: ids.meter, tag: 'M1', name: 'Multimeter', kind: 'multimeter', ranges: JSON.stringify(volts), two_pole: false, calibrated_until: '2027-12-31' },
    { ...common, id: ids.old, tag: 'M2', name: 'Old tester', kind: 'two-pole-tester', ranges: JSON.stringify(every), two_pole: true, calibrated_until: '2024-12-31' },
  ];
}
