/** The connectors of the harness: which conductors each carries, on which pins, and which boards lose a rail when it is off. */
import type { Conductor, Profile } from './profile';

export interface HarnessConnector {
  /** made from its name, unique in the profile */
  id: string;
  /** as “J4, pins 1, 2: Return 1, Return 2” */
  name: string;
  /** the rails that it serves, and the boards on them */
  note: string;
}

/** One for each connector that a conductor of the profile names, in the order in which they are first named. */
export function connectorsOf(profile: Profile): HarnessConnector[] {
  const byName = new Map<string, Conductor[]>();
  for (const c of profile.conductors) byName.set(c.connector, [...(byName.get(c.connector) ?? []), c]);
  const taken = new Set<string>();
  return [...byName].map(([name, conductors]) => {
    const pins = conductors.map((c) => c.pin);
    return { id: uniqueId(name, taken), name: `${name}, ${pins.length === 1 ? 'pin' : 'pins'} ${pins.join(', ')}: ${conductors.map((c) => c.name).join(', ')}`, note: affectedWords(profile, conductors) };
  });
}

/** Boards that draw from a rail, as `Processor (slot 2)`. */
export function boardsOn(profile: Profile, rails: ReadonlySet<string>): string[] {
  return profile.boards.fitted.filter((b) => b.draws.some((d) => rails.has(d.rail))).map((b) => `${b.name} (slot ${b.slot})`);
}

function affectedWords(profile: Profile, conductors: readonly Conductor[]): string {
  const ids = new Set(conductors.flatMap((c) => c.rails));
  const rails = profile.rails.filter((r) => ids.has(r.id)).map((r) => r.name);
  const boards = boardsOn(profile, ids);
  if (rails.length === 0) return 'The profile names no rail for it.';
  return `Serves ${rails.join(', ')}. ${boards.length === 0 ? 'No board of the profile draws from there.' : `Boards on ${rails.length === 1 ? 'it' : 'them'}: ${boards.join(', ')}.`}`;
}

function uniqueId(name: string, taken: Set<string>): string {
  const plain = name.toLowerCase().replace(/[^a-z0-9]+/g, '-').replace(/^-+|-+$/g, '');
  let id = plain === '' ? 'connector' : plain;
  for (let n = 2; taken.has(id); n += 1) id = `${plain === '' ? 'connector' : plain}-${n}`;
  taken.add(id);
  return id;
}
