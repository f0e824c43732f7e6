/** The runs of the demo, oldest first: what happened, step by step where it was not as good as can be. */
import type { DemoChoices, DemoRun } from '../DemoContent';

/** A linear regulator has no freewheel diode. */
const LINEAR: DemoChoices = { 'regulator-kind': 'linear' };
const first = { workshop: 'first', tree: 'first-power', version: 2, countersign: 'senior' } as const;
const second = { workshop: 'second', tree: 'first-power', version: 1, countersign: 'other' } as const;
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
  {
    ...first,
    key: 'ostrel-freewheel',
    machine: 'ostrel',
    restorer: 'restorer2',
    hoursAgo: 33 * DAY,
    moves: [{ to: 'end', choices: { freewheel: { reading: 'over' } } }, { close: true }],
    review: [
      { submit: 'D7 is open both ways. Its ring joint is brown; a photo of it lies with the job card.' },
      { accepted: 'Found dead, on the first reading that could show it. The verdict stands; no release is given.', by: 'reviewer' },
    ],
  },
  {
    ...first,
    key: 'wendle-proven',
    machine: 'wendle',
    restorer: 'restorer2',
    countersign: 'senior3',
    hoursAgo: 30 * DAY,
    moves: [{ to: 'rails-cold' }, { pauseMinutes: 47, reason: 'Midday; the bench is signed off.' }, { to: 'end', choices: { ...LINEAR, earth: [{ earth: 0.31 }] } }, { close: true }],
    review: [
      { submit: 'The earth lug was loose and was re-made; it read well afterwards.' },
      { accepted: 'The readings after the re-made earth are all in. The supply may go back into its machine.', release: true, by: 'reviewer' },
    ],
  },
  {
    ...first,
    key: 'wendle-b-stopped',
    machine: 'wendle-b',
    restorer: 'restorer',
    countersign: 'senior2',
    hoursAgo: 12 * DAY,
    moves: [{ to: 'rails-lamp', choices: LINEAR }, { stop: true }, { close: true }],
    review: [],
  },
  {
    ...first,
    key: 'ostrel-b-return',
    machine: 'ostrel-b',
    restorer: 'restorer',
    hoursAgo: 8 * DAY,
    moves: [{ to: 'end', choices: { returns: [{ r4: 1.62 }, { r4: 0.94 }] } }, { close: true }],
    review: [
      { submit: 'Return 4 stays high after cleaning. J6 pin 4 is loose in a brown housing.' },
      { finding: 'The second reading is lower than the first. Was the connector moved between reading and entry?', grade: 'minor', step: 'returns', by: 'reviewer' },
      { returned: ['Say whether J6 was reseated twice, as the step asks.', 'Name the pin as it is stamped on the housing.'], by: 'reviewer' },
    ],
  },
  {
    ...first,
    key: 'wendle-weak',
    machine: 'wendle',
    restorer: 'restorer',
    countersign: 'senior3',
    hoursAgo: 4 * DAY,
    moves: [
      { to: 'trip-back', choices: LINEAR },
      { to: 'bench-loads', choices: { 'rails-bench': [{ p12: 'not-sure' }] } },
      { to: 'ask-bench', choices: { 'rails-bench': [{ p12: 'not-sure' }] } },
      { to: 'end', choices: { 'rails-full': { p5: 4.31 }, 'weak-which': 'sagged' } },
      { close: true },
    ],
    review: [{ submit: 'The +5 V rail sagged within a minute of full load. Light load was fine twice.' }],
  },
  {
    ...first,
    key: 'corvane-b-trip',
    machine: 'corvane-b',
    restorer: 'restorer2',
    hoursAgo: 2 * DAY,
    moves: [{ to: 'end', choices: { ...LINEAR, trip: { p5: 5.32 } } }, { close: true }],
    review: [{ submit: 'The trip fires at 5.3 V each time. Its trimmer carries fresh paint that is not ours.' }],
  },
  {
    ...second,
    key: 'second-proven',
    machine: 'corvane',
    restorer: 'otherRestorer',
    hoursAgo: 20 * DAY,
    moves: [{ to: 'end', choices: LINEAR }, { close: true }],
    review: [{ submit: 'All rails held.' }, { accepted: 'Read and accepted. The supply may go back into its machine.', release: true, by: 'other' }],
  },
  {
    ...first,
    key: 'ostrel-waiting',
    machine: 'ostrel',
    restorer: 'restorer',
    hoursAgo: 2,
    moves: [{ to: 'lamp-fit' }, { askHold: true }],
    review: [],
  },
  {
    workshop: 'first',
    tree: 'look-over',
    version: 1,
    countersign: 'senior',
    key: 'brindle-open',
    machine: 'brindle',
    restorer: 'restorer2',
    hoursAgo: 0.4,
    moves: [{ to: 'filter' }],
    review: [],
  },
];
