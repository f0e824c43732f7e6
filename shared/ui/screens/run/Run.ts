/** What every part of the run screen is given. */
import type { Program } from '@/flows/machine/compile';
import type { RunBundle } from '@/shared/contract/runs';
import type { RunMachine } from '@/shared/ui/hooks/useRunMachine';

export interface Run extends RunMachine {
  program: Program;
  bundle: RunBundle;
  /** sends at once what waits, and asks for what others have added */
  poll(): Promise<void>;
  /** place of the last entry that the server has */
  headSeq(): number;
}
