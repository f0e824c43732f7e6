/** An instrument as the contract shows it. */
import type { InstrumentRow } from '@/db/tables';
import type { Instrument, InstrumentRange } from '@/shared/contract/instruments';

/** `now` in epoch milliseconds; an instrument may be used on the last day of its calibration, counted in UTC. */
export function instrumentToWire(row: InstrumentRow, now: number): Instrument {
  return {
    id: row.id,
    tag: row.tag,
    name: row.name,
    kind: row.kind,
    serial: row.serial,
    ranges: row.ranges as InstrumentRange[],
    category: row.category,
    twoPole: row.two_pole,
    calibratedUntil: row.calibrated_until,
    outOfDate: row.calibrated_until < new Date(now).toISOString().slice(0, 10),
  };
}
