/** The accounts of the demo workshops, as `npm start` prints them; never loaded in production. */

export const demoPassword = 'lampstep-demo';

export const demoAccounts = [
  { mail: 'restorer@example.org', is: 'restorer' },
  { mail: 'restorer2@example.org', is: 'restorer' },
  { mail: 'senior@example.org', is: 'senior: writes fault trees, countersigns hold points' },
  { mail: 'senior2@example.org', is: 'senior' },
  { mail: 'senior3@example.org', is: 'senior' },
  { mail: 'reviewer@example.org', is: 'reviewer: judges the records' },
  { mail: 'keeper@example.org', is: 'keeper: account, members, instruments' },
  { mail: 'other@example.org', is: 'member of a second workshop, to see the walls' },
] as const;
