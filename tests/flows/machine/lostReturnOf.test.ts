import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { parseProfile, parseTree } from '@/flows/document/parseTree';
import type { Profile } from '@/flows/document/profile';
import { defaultSettings } from '@/flows/document/settings';
import { lostReturnOf } from '@/flows/machine/lostReturnOf';
import { workingsOf } from '@/flows/machine/stepWorkings';
import { oddProfiles } from '@/flows/proof/oddProfiles';
import { sheet } from '@/shared/workings/lostReturn';
import { runSheet } from '@/shared/workings/sheet';

import { must } from '../support/bench';

const json = (path: string): unknown => JSON.parse(readFileSync(new URL(`../../../${path}`, import.meta.url), 'utf8'));
const demo = (name: string): Profile => must(parseProfile(json(`db/seeds/demo/profiles/${name}.json`)));
const ostrel = demo('ostrel-16');

describe('lostReturnOf', () => {
  it('makes a network of each demo machine that the sheet works out', () => {
    for (const name of ['corvane-12', 'brindle-80', 'ostrel-16', 'wendle-5']) {
      const answer = runSheet(sheet, lostReturnOf(demo(name)));
      if (!answer.ok) throw new Error(`${name}: ${answer.field}: ${answer.say}`);
      expect(answer.result.powerImbalance).toBeLessThan(1e-9);
    }
  });

  it('makes one of each odd machine, or none where no return is named', () => {
    for (const profile of oddProfiles) {
      const inputs = lostReturnOf(profile);
      if (inputs === null) expect(profile.conductors.filter(({ kind }) => kind === 'return')).toEqual([]);
      else expect(runSheet(sheet, inputs).ok, profile.title).toBe(true);
    }
  });

  it('hangs a board on the return that serves most of its rails, or on the one that the profile names', () => {
    const to = (profile: Profile) => lostReturnOf(profile)?.loads.filter(({ name }) => name === 'Line board').map((load) => load.to);
    expect(new Set(to(ostrel))).toEqual(new Set(['line cage']));
    const fitted = ostrel.boards.fitted.map((board) => (board.id === 'io' ? { ...board, zero: 'drive cage' } : board));
    expect(new Set(to({ ...ostrel, boards: { ...ostrel.boards, fitted } }))).toEqual(new Set(['drive cage']));
  });

  it('takes ends that the profile joins for one', () => {
    const joined = [['backplane, left bar', 'backplane, right bar', 'backplane, centre', 'line cage', 'drive cage']];
    const answer = runSheet(sheet, lostReturnOf({ ...ostrel, joined }));
    if (!answer.ok) throw new Error(answer.say);
    expect(answer.result.verdict).toBe('harmless');
  });

  it('takes the diode of the profile with its rating and card, and assumes a rectifier where none is named', () => {
    const devices = ostrel.devices.map((device) => (device.id === 'd7' ? { ...device, seriesOhms: 0.009, emission: 1.1 } : device));
    const inputs = lostReturnOf({ ...ostrel, devices });
    expect(inputs?.diodes?.[0]).toMatchObject({ part: 'freewheel', anode: '0 V', cathode: '+5 V', ratedAmps: 20, seriesOhms: 0.009, emission: 1.1 });
    expect(inputs?.diodes?.[2]).toMatchObject({ part: 'rectifier', anode: '−12 V', cathode: '0 V' });
  });

  it('refuses a board at a return that is not there, and a joined end that no conductor has', () => {
    const fitted = ostrel.boards.fitted.map((board) => ({ ...board, zero: 'nowhere' }));
    const bad = parseProfile({ ...ostrel, boards: { ...ostrel.boards, fitted }, joined: [['stud E2', 'elsewhere']] });
    expect(JSON.stringify(bad)).toContain('no return goes to \\"nowhere\\"');
    expect(JSON.stringify(bad)).toContain('no conductor ends at \\"elsewhere\\"');
  });
});

describe('a step that shows a lost return', () => {
  it('says what this machine does, the same each time it is asked', () => {
    const tree = must(parseTree(json('flows/library/lost-return.json')));
    const step = tree.steps.find(({ id }) => id === 'look');
    if (step === undefined) throw new Error('no such step');
    const shown = workingsOf(step, ostrel, defaultSettings);
    expect(shown?.answer.ok === true ? shown.answer.headline : '').toMatch(
      /^With −12 V on and \+5 V off.*, opening Return 4 pulls \+5 V to −0\.\d+ V through its D7 freewheel diode at up to [\d.]+ A: destructive\.$/,
    );
    expect(workingsOf(step, ostrel, defaultSettings)).toBe(shown);
  });
});
