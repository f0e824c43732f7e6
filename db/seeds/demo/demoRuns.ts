/** The runs of the demo, oldest first: what happened, step by step where it was not as good as can be. */
import type { DemoChoices, DemoRun } from '../DemoContent';

/** A linear regulator has no freewheel diode. */
const LINEAR: DemoChoices = { 'regulator-kind': 'linear' };
const first = { workshop: 'first', tree: 'first-power', version: 2, countersign: 'senior' } as const;
const DAY = 24;

export const demoRuns: readonly DemoRun[] = [
  {
    ...first,
    key: 'corvane-proven',
    machine: 'corvane',
    restorer: 'restorer',
    hoursAgo: 40 * DAY,
    moves: [{ to: 'end', choices: LINEAR }, { close: true }],
    review: [
      { submit: 'All three rails held through the soak. The fan bearing is noisy; it is noted on the tag.' },
      { finding: 'Good practice: both dummy loads were named on the tag before power.', grade: 'note', step: 'full-loads', by: 'reviewer' },
      { accepted: 'I have read every entry and its readings. The supply may go back into its machine.', release: true, by: 'reviewer' },
    ],
  },
];
