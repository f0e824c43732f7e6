import { describe, expect, it } from 'vitest';

import { connectorsOf } from '@/flows/document/connectors';
import type { Conductor, Profile } from '@/flows/document/profile';
import { benchProfile } from '../support/bench';

const conductor = (id: string, connector: string, pin: string, rails: string[]): Conductor => ({ id, name: `Return ${id}`, kind: 'return', from: '0 V', to: 'cage', squareMillimetres: 1, metres: 1, connector, pin, maxOhms: 0.01, rails });
const rail = (id: string, name: string) => ({ ...benchProfile.rails[0]!, id, name });
const profile: Profile = {
  ...benchProfile,
  rails: [rail('p5', '+5 V'), rail('p12', '+12 V')],
  conductors: [conductor('a', 'J4', '1', ['p5']), conductor('b', 'J5', '4', ['p12', 'p5']), conductor('c', 'J4', '8', ['p5']), conductor('d', 'j-4', '1', [])],
  boards: { removable: true, fitted: [{ id: 'b1', name: 'Processor', slot: '1', draws: [{ rail: 'p5', amps: 1 }], biasFirst: null }, { id: 'b2', name: 'Line board', slot: '2', draws: [{ rail: 'p12', amps: 1 }], biasFirst: null }] },
};

describe('connectorsOf', () => {
  it('gathers the conductors of each connector, with the boards on their rails', () => {
    expect(connectorsOf(profile)).toEqual([
      { id: 'j4', name: 'J4, pins 1, 8: Return a, Return c', note: 'Serves +5 V. Boards on it: Processor (slot 1).' },
      { id: 'j5', name: 'J5, pin 4: Return b', note: 'Serves +5 V, +12 V. Boards on them: Processor (slot 1), Line board (slot 2).' },
      { id: 'j-4', name: 'j-4, pin 1: Return d', note: 'The profile names no rail for it.' },
    ]);
  });

  it('gives each an id of its own, whatever it is called', () => {
    const ids = connectorsOf({ ...profile, conductors: ['J 4', 'j-4', '!!', '??'].map((name, i) => conductor(String(i), name, '1', [])) }).map((c) => c.id);
    expect(ids).toEqual(['j-4', 'j-4-2', 'connector', 'connector-2']);
  });

  it('says when no board draws from its rails', () => {
    expect(connectorsOf({ ...profile, boards: { removable: true, fitted: [] } })[0]?.note).toBe('Serves +5 V. No board of the profile draws from there.');
  });
});
