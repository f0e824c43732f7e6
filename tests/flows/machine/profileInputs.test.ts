import { readdirSync, readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { parseProfile } from '@/flows/document/parseTree';
import type { Profile } from '@/flows/document/profile';
import { defaultSettings } from '@/flows/document/settings';
import { canTakeFrom, fromProfile, picksOf } from '@/flows/machine/profileInputs';
import { SHEETS } from '@/shared/workings/list';
import { runSheet } from '@/shared/workings/sheet';

import { benchProfile, must } from '../support/bench';

const folder = 'db/seeds/demo/profiles';
const profiles: [string, Profile][] = [
  ['a test supply', benchProfile],
  ...readdirSync(folder).map((file): [string, Profile] => [file, must(parseProfile(JSON.parse(readFileSync(`${folder}/${file}`, 'utf8'))))]),
];
const sheets = SHEETS.filter((sheet) => canTakeFrom(sheet.id));

describe.each(profiles)('%s', (_, profile) => {
  it.each(sheets.map((sheet) => [sheet.id, sheet] as const))('fills %s with inputs that the sheet knows and takes', (id, sheet) => {
    const picks = picksOf(id, profile)?.picks.map((pick) => pick.id) ?? [null];
    for (const pick of picks) {
      const inputs = fromProfile(id, profile, defaultSettings, pick);
      if (inputs === null) continue;
      const example = sheet.inputs.parse(sheet.example) as Record<string, unknown>;
      expect(Object.keys(example)).toEqual(expect.arrayContaining(Object.keys(inputs)));
      // the sheet may find that the numbers do not go together; each number by itself is in its range
      for (const [name, value] of Object.entries(inputs)) expect(sheet.inputs.shape[name]?.safeParse(value), `${id} ${name}`).toMatchObject({ success: true });
      const answer = runSheet(sheet, { ...example, ...inputs });
      if (!answer.ok) expect(answer.say).toMatch(/\w.*[.?]$/);
    }
  });
});

describe('what a profile says for a sheet', () => {
  it('is what stands in the profile', () => {
    expect(fromProfile('rail-limits', benchProfile, defaultSettings, 'p5')).toEqual({ nominalVolts: 5, tolerancePercent: 5 });
    expect(fromProfile('bleed-down', benchProfile, defaultSettings, 'c1')).toEqual({ farads: 0.068, volts: 20, safeVolts: 5, bleederOhms: null });
    expect(fromProfile('series-lamp', benchProfile, defaultSettings, null)).toEqual({ supplyVolts: 230, lampVolts: 230, load: 'rectifier', loadWatts: 120 });
    expect(fromProfile('over-voltage-trip', benchProfile, defaultSettings, 'p5')).toMatchObject({ tripVolts: 6.2, tripTolerancePercent: 6.45161290323 });
  });

  it('is nothing for a rail or part that the machine does not have, and for a sheet that no profile can fill', () => {
    expect(fromProfile('rail-limits', benchProfile, defaultSettings, 'p99')).toBeNull();
    expect(fromProfile('rail-limits', benchProfile, defaultSettings, null)).toBeNull();
    expect(fromProfile('junction-test', benchProfile, defaultSettings, null)).toBeNull();
    expect(canTakeFrom('junction-test')).toBe(false);
  });

  it('offers each rail, part and conductor by its name', () => {
    expect(picksOf('rail-limits', benchProfile)).toEqual({ what: 'rail', picks: [{ id: 'p5', name: '+5 V' }] });
    expect(picksOf('wire-drop', benchProfile)?.picks.map((pick) => pick.name)).toEqual(['return 1']);
    expect(picksOf('series-lamp', benchProfile)).toBeNull();
  });
});
