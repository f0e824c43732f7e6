/** The form of the demo's content: machines, trees and runs as data, played through the engine when it is loaded. */
import type { Profile } from '@/flows/document/profile';
import type { Tree } from '@/flows/document/tree';

import type { DemoPersonKey } from './demoPeople';

export type DemoWorkshopKey = 'first' | 'second';

export interface DemoMachine {
  /** names it in runs of this content */
  key: string;
  workshop: DemoWorkshopKey;
  name: string;
  serial: string;
  profile: Profile;
}

export interface DemoTree {
  workshop: DemoWorkshopKey;
  document: Tree;
  version: number;
  state: 'draft' | 'in-check' | 'issued' | 'withdrawn';
  author: DemoPersonKey;
  /** wanted once issued; never the author */
  checker: DemoPersonKey | null;
  daysAgo: number;
}

/** What is answered at a step, by its key or its id in whichever call: an answer, or readings (SI) and words by row, `*` for every row. */
export type DemoChoice = string | Readonly<Record<string, number | 'over' | string>>;
/** A list is used up one visit at a time; after that, and for every other step, the answer is a good one. */
export type DemoChoices = Readonly<Record<string, DemoChoice | readonly DemoChoice[]>>;

export type DemoMove =
  /** goes on until the run stands at that step (at its warning, if it has one) or has reached an end; hold points are countersigned */
  | { to: string | 'end'; choices?: DemoChoices }
  /** walks up to the next hold point and asks; the run is left waiting there */
  | { askHold: true; choices?: DemoChoices }
  /** walks up to the next hold point, which is refused */
  | { refuseHold: string; by?: DemoPersonKey; choices?: DemoChoices }
  /** Stop, and make-safe up to the choice of how it goes on */
  | { stop: true }
  /** pauses, waits so many minutes and resumes */
  | { pauseMinutes: number; reason?: string }
  | { second: DemoPersonKey }
  | { reenter: string }
  /** closes the run, after the machine's close-out */
  | { close: true };

export type DemoReview =
  | { submit: string | null }
  /** about the last entry of that step and kind */
  | { finding: string; grade: 'note' | 'minor' | 'major'; step: string; kind?: string; by: DemoPersonKey }
  | { returned: string[]; by: DemoPersonKey }
  | { reply: string }
  | { accepted: string; release?: boolean; by: DemoPersonKey };

export interface DemoRun {
  /** names it in errors; its ids are made from it */
  key: string;
  workshop: DemoWorkshopKey;
  machine: string;
  tree: string;
  version: number;
  restorer: DemoPersonKey;
  countersign: DemoPersonKey;
  /** when it begins, before the time of loading */
  hoursAgo: number;
  moves: readonly DemoMove[];
  /** one act a few hours after the other */
  review: readonly DemoReview[];
}

export interface DemoContent {
  machines: readonly DemoMachine[];
  trees: readonly DemoTree[];
  /** in the order in which they happened */
  runs: readonly DemoRun[];
}
