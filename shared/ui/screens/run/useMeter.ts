/** The instrument in use for a row: chosen, remembered, or the one with which the proof was begun. */
import { useState } from 'react';

import type { ReadingRow } from '@/flows/machine/rows';
import type { Instrument } from '@/shared/contract/instruments';
import { firstMeter, metersFor } from '@/shared/ui/screens/run/meters';
import type { Meter } from '@/shared/ui/screens/run/meters';
import { rememberedMeter, rememberMeter } from '@/shared/ui/screens/run/rememberMeter';
import type { Run } from '@/shared/ui/screens/run/Run';

export interface MeterInUse {
  meters: readonly Meter[];
  chosen: Instrument | null;
  choose(instrument: Instrument): void;
  /** remembers it for the next reading of this quantity */
  use(instrument: Instrument): void;
}

/** Reads the instruments of the run's bundle. */
export function useMeter(run: Run, row: ReadingRow): MeterInUse {
  const kind = run.view.step?.kind ?? 'measure';
  const meters = metersFor(run.bundle.instruments, {
    quantity: row.quantity,
    kind,
    only: kind === 'prove-dead' ? run.state.context.proofInstrument : null,
  });
  const about = row.nominal ?? row.high ?? row.low ?? 1;
  const [picked, setPicked] = useState<string | null>(null);
  const chosen =
    meters.find((m) => m.instrument.id === picked && m.barred === null)?.instrument ??
    firstMeter(meters, rememberedMeter(row.quantity), run.bundle.tree, { quantity: row.quantity, about });
  return { meters, chosen, choose: (i) => setPicked(i.id), use: (i) => rememberMeter(row.quantity, i.id) };
}
