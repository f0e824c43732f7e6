/** Conditions under which a load or soak is run, as the machine stands in service. */

export const TEST_CONDITIONS = {
  'cover-on': { name: 'Cover on, as in service', missing: 'the cover is not confirmed on, as this step states' },
  'forced-air': { name: 'Forced air, as in service', missing: 'the forced air is not confirmed, as this step states' },
} as const;

export type TestCondition = keyof typeof TEST_CONDITIONS;
export const TEST_CONDITION_IDS = Object.keys(TEST_CONDITIONS) as [TestCondition, ...TestCondition[]];
