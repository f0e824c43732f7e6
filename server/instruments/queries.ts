/** Queries of instruments. */
import type { Tx } from '@/db/createDb';
import type { InstrumentRow } from '@/db/tables';

/** All instruments of the workshop, by their tag. */
export function findInstruments(tx: Tx): Promise<InstrumentRow[]> {
  return tx.selectFrom('instruments').selectAll().orderBy('tag').execute();
}
