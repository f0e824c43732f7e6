/** Machines at the edges of what a profile can be: a tree that is issued has to hold on each that it applies to. */
import type { Profile, Rail } from '../document/profile';

const rail = (id: string, nominal: number, trip = false): Rail => ({ id, name: `${nominal > 0 ? '+' : '−'}${Math.abs(nominal)} V`, nominal, tolerance: 0.05, maxAmps: 10, limitAmps: 12, trip: trip ? { lowVolts: Math.abs(nominal) * 1.16, highVolts: Math.abs(nominal) * 1.32 } : null, sense: 'terminals', takes: false });
const point = (id: string, of: string | null = null): Profile['points'][number] => ({ id, name: id, connector: 'T1', pin: id, rail: of, mark: null, neighbours: [] });

const THREE: Rail[] = [rail('p5', 5, true), rail('p12', 12), rail('m12', -12)];
const SIX: Rail[] = [...THREE, rail('m5', -5), rail('p24', 24, true), rail('p15', 15)];

interface Oddity {
  title: string;
  rails: Rail[];
  returns: number;
  stores: { farads: number; volts: number; rebounds: boolean }[];
  protectiveClass?: 'I' | 'II';
  supplyKind?: Profile['supplyKind'];
  outOfMachine?: boolean;
  removable?: boolean;
  battery?: boolean;
  /** false where no bench supply can reach the raw side */
  raw?: boolean;
  isolated?: boolean;
  heatsink?: boolean;
  /** rails that need a least load; the first one where it is not said and the supply is switch-mode */
  least?: number;
  hazards?: Profile['hazards'];
}

const big = { farads: 0.047, volts: 40, rebounds: true };
const small = { farads: 100e-6, volts: 16, rebounds: false };
const bulk = { farads: 220e-6, volts: 325, rebounds: true };
const housekeeping = { farads: 47e-6, volts: 22, rebounds: false };

const ODDITIES: readonly Oddity[] = [
  { title: 'one rail, no return named, nothing stored', rails: [rail('p5', 5, true)], returns: 0, stores: [] },
  { title: 'one rail, one return, stored charge below the limits', rails: [rail('p5', 5, true)], returns: 1, stores: [small] },
  { title: 'three rails, one return, stored charge above the limits', rails: THREE, returns: 1, stores: [big] },
  { title: 'three rails, many returns, boards in', rails: THREE, returns: 9, stores: [big, small], outOfMachine: false },
  { title: 'three rails, nothing above the limits', rails: THREE, returns: 2, stores: [small] },
  { title: 'three rails, Class II', rails: THREE, returns: 2, stores: [big], protectiveClass: 'II' },
  { title: 'three rails, boards that cannot be parted', rails: THREE, returns: 4, stores: [big], outOfMachine: false, removable: false },
  { title: 'three rails from a raw rail, a battery besides', rails: THREE, returns: 4, stores: [big], supplyKind: 'switched-from-raw', battery: true },
  { title: 'three rails, a part that may hold beryllium oxide', rails: THREE, returns: 4, stores: [big], supplyKind: 'switched-from-raw', hazards: ['beryllium-oxide'] },
  { title: 'six rails, two trips', rails: SIX, returns: 6, stores: [big, bulk] },
  { title: 'two rails without a trip', rails: [rail('p5', 5), rail('p12', 12)], returns: 2, stores: [big] },
  { title: 'switch-mode with a bulk capacitor and a minimum load', rails: THREE, returns: 2, stores: [bulk], supplyKind: 'switch-mode' },
  { title: 'switch-mode, several stores, Class II, a battery, an isolating transformer, boards in', rails: THREE, returns: 3, stores: [bulk, bulk, housekeeping, small], supplyKind: 'switch-mode', protectiveClass: 'II', battery: true, isolated: true, outOfMachine: false, least: 2 },
  { title: 'switched from raw volts, one negative rail without a trip, Class II, a battery, boards in', rails: [rail('m15', -15)], returns: 1, stores: [big, small, small], supplyKind: 'switched-from-raw', protectiveClass: 'II', battery: true, outOfMachine: false },
  { title: 'linear, raw side out of reach, no heatsink', rails: THREE, returns: 0, stores: [small], raw: false, heatsink: false },
  { title: 'switch-mode, one rail, Class II', rails: [rail('p5', 5)], returns: 1, stores: [bulk], supplyKind: 'switch-mode', protectiveClass: 'II' },
];

/** The built-in odd machines. */
export const oddProfiles: readonly Profile[] = ODDITIES.map(profileOf);

function profileOf(o: Oddity): Profile {
  const switcher = o.supplyKind === 'switch-mode';
  return {
    format: 1,
    title: o.title,
    machineClass: 'odd',
    supplyKind: o.supplyKind ?? 'linear',
    mains: { volts: 230, hertz: 50, voltAmps: 150, protectiveClass: o.protectiveClass ?? 'I', inlet: 'lead', fuse: { amps: 1, kind: 'slow' }, protection: o.isolated === true ? 'isolating-transformer' : 'rcd', earthLeadOhms: 0.05, insulationTestVolts: 250 },
    raw: switcher || o.raw === false ? null : { name: 'raw', volts: 28, ratedAmps: 10, point: 'raw' },
    sources: o.battery === true ? [{ id: 'cell', name: 'memory battery', kind: 'battery', volts: 3.6 }] : [],
    rails: o.rails,
    conductors: Array.from({ length: o.returns }, (_, i) => ({ id: `r${i + 1}`, name: `return ${i + 1}`, kind: 'return' as const, from: '0 V', to: 'cage', squareMillimetres: 2.5, metres: 0.5, connector: 'J1', pin: String(i + 1), maxOhms: 0.01, rails: o.rails.map((r) => r.id) })),
    stores: o.stores.map((s, i) => ({ id: `c${i + 1}`, name: `C${i + 1}`, farads: s.farads, voltsWorked: s.volts, voltsRated: s.volts * 1.25, bleederOhms: null, rebounds: s.rebounds, reboundWaitSeconds: s.rebounds ? 300 : 0, point: `c${i + 1}` })),
    devices: [{ id: 'd1', name: 'D1', kind: 'diode', rail: o.rails[0]?.id ?? null, ratedAmps: 10, ratedVolts: 60 }],
    boards: { removable: o.removable ?? true, fitted: [{ id: 'b1', name: 'board 1', slot: '1', draws: o.rails.map((r) => ({ rail: r.id, amps: 0.5 })), biasFirst: null }] },
    heatsinks: o.heatsink === false ? [] : [{ id: 'h1', name: 'heatsink', live: true }],
    points: [point('zero'), point('raw'), ...o.rails.map((r) => point(`t-${r.id}`, r.id)), ...o.stores.map((_, i) => point(`c${i + 1}`))],
    zeroPoint: 'zero',
    minimumLoad: switcher ? o.rails.slice(0, o.least ?? 1).map((r) => ({ rail: r.id, amps: 1 })) : [],
    hazards: o.hazards ?? [],
    ownerLimits: [],
    outOfMachine: o.outOfMachine ?? true,
  };
}
