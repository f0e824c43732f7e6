/** What a run carries from event to event. Plain data: it can be written down and read back. */
import type { Facts, PowerKind } from '../facts/facts';

export type Phase = 'opening' | 'warning' | 'hold' | 'hold-wait' | 'guard' | 'act' | 'paused' | 'ended' | 'closed';

/** Why the machine's own steps are being walked. */
export type Purpose =
  | { is: 'none' }
  /** before the first step: what an earlier run has left is put back */
  | { is: 'begin' }
  /** something has lapsed; the run goes on at `to` */
  | { is: 'mend'; to: string }
  | { is: 'stop' }
  /** close-out before an end; `key` is null for a run closed as stopped */
  | { is: 'end'; key: string | null };

export interface RowAnswer {
  id: string;
  result: string;
  value: number | 'over' | null;
  /** expanded uncertainty of a twin's reading: what is held against it carries both */
  uncertainty?: number;
  at: number;
}

export interface RunEnd {
  says: 'fault-found' | 'supply-proven' | 'cleared' | 'stopped' | 'referred' | 'in-service';
  key: string | null;
}

export interface RunContext {
  facts: Facts;
  key: string;
  phase: Phase;
  rows: RowAnswer[];
  /** wall time at which the step was entered; waits count from it */
  enteredAt: number;
  counters: { key: string; n: number }[];
  /** a countersign that has not been used up */
  grant: { kind: PowerKind; key: string; at: number; by: string; facts: string } | null;
  /** the energise in force: its end time and where abort leads */
  live: { key: string; since: number; until: number; abort: string } | null;
  purpose: Purpose;
  visited: string[];
  restorer: string;
  restorerIsSenior: boolean;
  /** everybody who has led this run, the first one first: none of them is ever its witness */
  restorers: string[];
  /** the run is offered to this person, who has not taken it yet */
  handing: { to: string; at: number } | null;
  /** somebody else leads now, or nobody was here for long: load and fitted are read back before the run goes on */
  readBack: boolean;
  second: string | null;
  /** wall time of the last prove-dead that passed */
  provedAt: number | null;
  /** instrument of the prove-dead under way */
  proofInstrument: string | null;
  last: { at: number; monotonic: number; boot: string };
  /** where the next transition leads; null while the step goes on */
  goto: string | null;
  end: RunEnd | null;
  /** the last outcome, for the record */
  outcome: { key: string; outcome: string; exit: string | null; verdict: string | null } | null;
}
