import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';
import { z } from 'zod';

import { parseProfile, parseTree } from '@/flows/document/parseTree';
import { defaultSettings } from '@/flows/document/settings';
import { advance, startRun } from '@/flows/machine/advance';
import type { Advanced } from '@/flows/machine/advance';
import { machineEventSchema } from '@/flows/machine/events';
import { view } from '@/flows/machine/view';
import { prove } from '@/flows/proof/prove';
import { verifyExport } from '@/shared/record/verifyExport';
import { must, program } from '../support/bench';
import { makeDead } from './walk';

const text = (name: string) => readFileSync(new URL(`../../../docs/examples/${name}`, import.meta.url), 'utf8');
const json = (name: string): unknown => JSON.parse(text(name));

describe('the example files', () => {
  const tree = must(parseTree(json('TREE.json')));
  const profile = must(parseProfile(json('PROFILE.json')));
  const whole = program(tree, profile, [makeDead]);

  const play = (name: string) => {
    const events = z.array(machineEventSchema).parse(json(name));
    let state = startRun(whole, { restorer: 'restorer', restorerIsSenior: false, release: false, fitted: [], killers: [], at: events[0]?.at ?? 0 });
    for (const event of events) {
      const advanced: Advanced = advance(whole, state, event);
      if (!advanced.ok) return { refusal: advanced.refusal, run: view(whole, state) };
      state = advanced.state;
    }
    return { refusal: null, run: view(whole, state) };
  };

  it('hold a tree that keeps every house rule on its machine', () => {
    expect(prove({ tree, callees: [makeDead], profile, settings: defaultSettings }).rules.filter((rule) => !rule.holds).map((rule) => rule.story)).toEqual([]);
  });

  it('hold answers that walk it to its end, and others that are refused', () => {
    const good = play('ANSWERS.json');
    expect(good.refusal).toBeNull();
    expect(good.run).toMatchObject({ phase: 'closed', end: { says: 'cleared' }, band: 'proved-dead' });
    expect(play('ANSWERS-unsafe.json').refusal).toMatchObject({ rule: 'H2' });
  });

  it('hold a record that verifies against its published keys, and no longer does with one letter changed', async () => {
    const keys = json('KEYS.json') as Parameters<typeof verifyExport>[1];
    expect(await verifyExport(text('RECORD.json'), keys)).toMatchObject({ ok: true, trusted: true });
    const file = json('RECORD.json') as { payload: string };
    const changed = Buffer.from(Buffer.from(file.payload, 'base64url').toString('utf8').replace('hairline', 'Hairline')).toString('base64url');
    const read = await verifyExport(JSON.stringify({ ...file, payload: changed }), keys);
    expect(read.ok && read.trusted).toBe(false);
  });
});
