/** The electrical description of a machine, `format: 1`. Every change of it is a new revision. SI units throughout. */
import { z } from 'zod';

import { idSchema } from './ids';

const name = z.string().trim().min(1).max(80);
const positive = z.number().positive().max(1e9);
const notNegative = z.number().nonnegative().max(1e9);

const mains = z.strictObject({
  /** r.m.s. volts of the mains that the machine is set for */
  volts: z.number().min(10).max(500),
  hertz: z.number().min(40).max(500),
  /** plate rating */
  voltAmps: z.number().positive().max(20_000),
  protectiveClass: z.enum(['I', 'II']),
  inlet: name,
  fuse: z.strictObject({ amps: positive, kind: z.enum(['slow', 'fast']) }),
  /** what stands between the bench outlet and the machine */
  protection: z.enum(['rcd', 'isolating-transformer']),
  /** resistance of the protective conductor of the supply lead; it is added to the earth limit */
  earthLeadOhms: notNegative,
  /** insulation test voltage, 250 V where suppressors are fitted */
  insulationTestVolts: z.number().min(50).max(1000),
});

const otherSource = z.strictObject({
  id: idSchema,
  name,
  kind: z.enum(['battery', 'ups', 'second-feed', 'connected-equipment', 'instrument']),
  volts: notNegative,
});

const rail = z.strictObject({
  id: idSchema,
  name,
  /** signed volts */
  nominal: z.number().min(-10_000).max(10_000).refine((v) => v !== 0, 'a rail at 0 V is a return'),
  /** fraction of nominal, 0.05 is ± 5 % */
  tolerance: z.number().positive().max(0.5),
  maxAmps: positive,
  limitAmps: positive,
  /** over-voltage trip band in volts of size, or null where the rail has none (a hold point then takes its place) */
  trip: z.strictObject({ lowVolts: positive, highVolts: positive }).nullable(),
  sense: z.enum(['terminals', 'remote']),
  /** true where the rail can also take current */
  takes: z.boolean(),
});

const conductor = z.strictObject({
  id: idSchema,
  name,
  kind: z.enum(['return', 'feed']),
  from: name,
  to: name,
  squareMillimetres: positive,
  metres: positive,
  connector: name,
  pin: name,
  /** acceptance limit end to end, contact included */
  maxOhms: positive,
  rails: z.array(idSchema).max(32),
});

const store = z.strictObject({
  id: idSchema,
  name,
  farads: z.number().positive().max(10),
  voltsWorked: positive,
  voltsRated: positive,
  bleederOhms: positive.nullable(),
  /** climbs back after discharge; it is read again after `reboundWaitSeconds` */
  rebounds: z.boolean(),
  reboundWaitSeconds: notNegative,
  /** the point at which it is discharged and read */
  point: idSchema,
});

const device = z.strictObject({
  id: idSchema,
  name,
  kind: z.enum(['diode', 'schottky', 'rectifier', 'pass', 'thyristor', 'zener', 'reference']),
  rail: idSchema.nullable(),
  ratedAmps: positive.nullable(),
  ratedVolts: positive.nullable(),
  /** what a diode at a rail is there for; freewheel where it is not said, rectifier for a rectifier */
  part: z.enum(['freewheel', 'rectifier', 'clamp']).optional(),
  /** saturation current in amps and emission coefficient of its card; typical ones where they are not said */
  saturationAmps: z.number().min(1e-18).max(1e-2).optional(),
  emission: z.number().min(0.5).max(10).optional(),
  /** of chip and leads, and of the choke where one lies in its path */
  seriesOhms: z.number().min(1e-4).max(100).optional(),
});

const board = z.strictObject({
  id: idSchema,
  name,
  slot: name,
  draws: z.array(z.strictObject({ rail: idSchema, amps: notNegative })).max(32),
  /** the rail that must stand before the others do */
  biasFirst: idSchema.nullable(),
  /** the far end of the return at which it hangs, by its name among the conductors; the one that serves most of its rails where it is not said */
  zero: name.optional(),
});

const heatsink = z.strictObject({ id: idSchema, name, live: z.boolean() });

const point = z.strictObject({
  id: idSchema,
  name,
  connector: name,
  pin: name,
  rail: idSchema.nullable(),
  /** content hash of a photo with the mark in fractions of its width and height */
  mark: z.strictObject({ photo: z.string().regex(/^[0-9a-f]{64}$/), x: z.number().min(0).max(1), y: z.number().min(0).max(1) }).nullable(),
  /** what lies beside it and must not be touched */
  neighbours: z.array(name).max(12),
});

/** The shape alone; `profileSchema` also checks that what is named exists. */
export const profileShape = z.strictObject({
  format: z.literal(1),
  title: name,
  machineClass: name,
  supplyKind: z.enum(['linear', 'switched-from-raw', 'switch-mode']),
  mains,
  /** the raw node that a bench supply can feed */
  raw: z.strictObject({ name, volts: positive, ratedAmps: positive, point: idSchema }).nullable(),
  sources: z.array(otherSource).max(8),
  rails: z.array(rail).min(1).max(16),
  conductors: z.array(conductor).max(64),
  /** ends of conductors that are one piece of metal, such as the two bars of a backplane */
  joined: z.array(z.array(name).min(2).max(16)).max(32).optional(),
  stores: z.array(store).max(64),
  devices: z.array(device).max(128),
  boards: z.strictObject({
    /** false where boards cannot be parted from the supply; a hold point then takes the place of "boards out" */
    removable: z.boolean(),
    fitted: z.array(board).max(64),
  }),
  heatsinks: z.array(heatsink).max(32),
  points: z.array(point).max(128),
  /** the point that the black probe goes to when a step does not name one */
  zeroPoint: idSchema,
  /** least load of a switch-mode supply, a rail at a time */
  minimumLoad: z.array(z.strictObject({ rail: idSchema, amps: positive })).max(16),
  hazards: z.array(z.enum(['crt', 'beryllium-oxide', 'pcb', 'selenium', 'asbestos', 'mercury', 'x-ray', 'lead-solder', 'heavy'])).max(9),
  ownerLimits: z.array(z.string().trim().min(1).max(200)).max(20),
  /** a supply that lies on the bench without its machine starts a run with no load */
  outOfMachine: z.boolean(),
});

export type Profile = z.infer<typeof profileShape>;
export type Rail = Profile['rails'][number];
export type Conductor = Profile['conductors'][number];
export type Store = Profile['stores'][number];
export type Point = Profile['points'][number];

/** A profile whose names are unique and whose references all exist; every fault is reported with its key. */
export const profileSchema = profileShape.superRefine((p, ctx) => {
  const lists = ['sources', 'rails', 'conductors', 'stores', 'devices', 'heatsinks', 'points'] as const;
  for (const list of lists) {
    const seen = new Set<string>();
    p[list].forEach((item, i) => {
      if (seen.has(item.id)) ctx.addIssue({ code: 'custom', path: [list, i, 'id'], message: `"${item.id}" is there twice` });
      seen.add(item.id);
    });
  }
  for (const [i, s] of p.sources.entries()) {
    if (s.id === 'mains' || s.id === 'bench') ctx.addIssue({ code: 'custom', path: ['sources', i, 'id'], message: `"${s.id}" is always there` });
  }
  const rails = new Set(p.rails.map((r) => r.id));
  const points = new Set(p.points.map((q) => q.id));
  const wantRail = (id: string | null, path: (string | number)[]) => {
    if (id !== null && !rails.has(id)) ctx.addIssue({ code: 'custom', path, message: `no rail "${id}"` });
  };
  p.conductors.forEach((c, i) => c.rails.forEach((r, j) => wantRail(r, ['conductors', i, 'rails', j])));
  p.devices.forEach((d, i) => wantRail(d.rail, ['devices', i, 'rail']));
  p.points.forEach((q, i) => wantRail(q.rail, ['points', i, 'rail']));
  p.minimumLoad.forEach((m, i) => wantRail(m.rail, ['minimumLoad', i, 'rail']));
  p.boards.fitted.forEach((b, i) => {
    b.draws.forEach((d, j) => wantRail(d.rail, ['boards', 'fitted', i, 'draws', j, 'rail']));
    wantRail(b.biasFirst, ['boards', 'fitted', i, 'biasFirst']);
    if (b.zero !== undefined && !p.conductors.some((c) => c.kind === 'return' && c.to === b.zero)) ctx.addIssue({ code: 'custom', path: ['boards', 'fitted', i, 'zero'], message: `no return goes to "${b.zero}"` });
  });
  p.joined?.forEach((ends, i) =>
    ends.forEach((end, j) => {
      if (!p.conductors.some((c) => c.from === end || c.to === end)) ctx.addIssue({ code: 'custom', path: ['joined', i, j], message: `no conductor ends at "${end}"` });
    }),
  );
  if (!points.has(p.zeroPoint)) ctx.addIssue({ code: 'custom', path: ['zeroPoint'], message: `no point "${p.zeroPoint}"` });
  if (p.raw && !points.has(p.raw.point)) ctx.addIssue({ code: 'custom', path: ['raw', 'point'], message: `no point "${p.raw.point}"` });
  p.stores.forEach((s, i) => {
    if (!points.has(s.point)) ctx.addIssue({ code: 'custom', path: ['stores', i, 'point'], message: `no point "${s.point}"` });
    if (s.voltsWorked > s.voltsRated) ctx.addIssue({ code: 'custom', path: ['stores', i, 'voltsWorked'], message: 'works above its rating' });
    if (s.rebounds && s.reboundWaitSeconds === 0) ctx.addIssue({ code: 'custom', path: ['stores', i, 'reboundWaitSeconds'], message: 'a part that rebounds needs a wait' });
  });
  p.rails.forEach((r, i) => {
    if (r.trip && r.trip.lowVolts >= r.trip.highVolts) ctx.addIssue({ code: 'custom', path: ['rails', i, 'trip'], message: 'the trip band is empty' });
    if (r.trip && r.trip.lowVolts <= Math.abs(r.nominal)) ctx.addIssue({ code: 'custom', path: ['rails', i, 'trip', 'lowVolts'], message: 'the trip lies at or below the rail itself' });
    if (r.limitAmps < r.maxAmps) ctx.addIssue({ code: 'custom', path: ['rails', i, 'limitAmps'], message: 'the limit lies below the rating' });
  });
});

/** Every source that an isolate step must find out, in document order: mains, bench supply, then the profile's others. */
export function sourceIds(profile: Profile): string[] {
  return ['mains', 'bench', ...profile.sources.map((s) => s.id)];
}

/** Rails whose over-voltage trip has to be proved. */
export function tripRails(profile: Profile): Rail[] {
  return profile.rails.filter((r) => r.trip !== null);
}

/** Names by which a tree speaks of points that every profile has, so that it fits any machine. */
export const GENERIC_POINTS = ['each-rail', 'each-return', 'each-store', 'zero', 'raw'] as const;

/** The point of the profile that a tree names, generic names included; `row` is the row's own id. Null when the profile has none. */
export function resolvePoint(profile: Profile, name: string, row: string | null): Point | null {
  const byId = (id: string | undefined) => profile.points.find((p) => p.id === id) ?? null;
  switch (name) {
    case 'each-rail':
      return profile.points.find((p) => p.rail !== null && p.rail === row) ?? null;
    case 'each-store':
      return byId(profile.stores.find((s) => s.id === row)?.point);
    case 'each-return':
      return null;
    case 'zero':
      return byId(profile.zeroPoint);
    case 'raw':
      return byId(profile.raw?.point);
    default:
      return byId(name);
  }
}
