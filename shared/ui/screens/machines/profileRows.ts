/** A machine's profile in rows of words. SI values printed as the rest of the product prints them. */
import type { Conductor, Profile, Rail, Store } from '@/flows/document/profile';
import type { Settings } from '@/flows/document/settings';
import { needsDischarge, storedJoules } from '@/flows/facts/stores';
import { formatNumber, formatQuantity } from '@/shared/quantity/formatQuantity';
import type { Unit } from '@/shared/quantity/units';
import type { FactRow } from '@/shared/ui/screens/shell/FactRows';

const print = (value: number, unit: Unit) => formatQuantity(value, unit);
const percent = (share: number) => `${formatNumber(share * 100)} %`;

const SUPPLY_KINDS: Readonly<Record<Profile['supplyKind'], string>> = {
  linear: 'linear',
  'switched-from-raw': 'switched from a raw rail',
  'switch-mode': 'switch-mode',
};
const SOURCE_KINDS: Readonly<Record<Profile['sources'][number]['kind'], string>> = {
  battery: 'battery',
  ups: 'uninterruptible supply',
  'second-feed': 'second feed',
  'connected-equipment': 'connected equipment',
  instrument: 'instrument',
};
const HAZARD_FLAGS: Readonly<Record<Profile['hazards'][number], string>> = {
  crt: 'picture tube under vacuum',
  'beryllium-oxide': 'beryllium oxide in power devices',
  pcb: 'PCB oil in capacitors',
  selenium: 'selenium rectifier',
  asbestos: 'asbestos sheet',
  mercury: 'mercury switch or rectifier',
  'x-ray': 'high-voltage shunt regulator (X-ray)',
  'lead-solder': 'lead solder',
  heavy: 'heavy transformer',
};

/** The plate: what feeds the machine and how it is protected. */
export function plateRows({ mains, supplyKind, machineClass, raw, outOfMachine, sources, hazards }: Profile): FactRow[] {
  return [
    { name: 'Kind', value: `${machineClass}; ${SUPPLY_KINDS[supplyKind]} supply` },
    { name: 'Mains', value: `${print(mains.volts, 'V')}, ${print(mains.hertz, 'Hz')}, ${print(mains.voltAmps, 'VA')}` },
    { name: 'Protective class', value: mains.protectiveClass === 'I' ? 'I: earthed case' : 'II: double insulation, no earth' },
    { name: 'Inlet', value: mains.inlet },
    { name: 'Fuse', value: `${print(mains.fuse.amps, 'A')}, ${mains.fuse.kind}` },
    { name: 'Protected at the bench by', value: mains.protection === 'rcd' ? 'RCD of 30 mA or less' : 'isolating transformer, one load' },
    { name: 'Earth lead', value: print(mains.earthLeadOhms, 'Ω') },
    { name: 'Insulation test', value: print(mains.insulationTestVolts, 'V') },
    { name: 'Raw node', value: raw === null ? 'none' : `${raw.name}: ${print(raw.volts, 'V')}, ${print(raw.ratedAmps, 'A')}` },
    {
      name: 'Other sources',
      value: sources.map((s) => `${s.name} (${SOURCE_KINDS[s.kind]}, ${print(s.volts, 'V')})`).join('; ') || 'none',
    },
    { name: 'Starts a run', value: outOfMachine ? 'as a supply on the bench, no load' : 'with its boards in' },
    { name: 'Known hazards', value: hazards.map((h) => HAZARD_FLAGS[h]).join('; ') || 'none beyond mains and stored charge' },
  ];
}

export interface RailLine {
  id: string;
  name: string;
  nominal: string;
  tolerance: string;
  amps: string;
  limit: string;
  /** null where it has none */
  trip: string | null;
  sense: string;
}

/** One line a rail. */
export function railLine(rail: Rail): RailLine {
  return {
    id: rail.id,
    name: rail.name,
    nominal: print(rail.nominal, 'V'),
    tolerance: `± ${percent(rail.tolerance)}`,
    amps: print(rail.maxAmps, 'A'),
    limit: print(rail.limitAmps, 'A'),
    trip: rail.trip === null ? null : `${formatNumber(rail.trip.lowVolts)}–${print(rail.trip.highVolts, 'V')}`,
    sense: `${rail.sense === 'remote' ? 'remote' : 'at the terminals'}${rail.takes ? '; also takes current' : ''}`,
  };
}

export interface ConductorLine {
  id: string;
  name: string;
  way: string;
  wire: string;
  pin: string;
  most: string;
}

/** One line a return or feed. */
export function conductorLine(conductor: Conductor): ConductorLine {
  return {
    id: conductor.id,
    name: conductor.name,
    way: `${conductor.from} to ${conductor.to}`,
    wire: `${formatNumber(conductor.squareMillimetres)} mm², ${formatNumber(conductor.metres)} m`,
    pin: `${conductor.connector} pin ${conductor.pin}`,
    most: print(conductor.maxOhms, 'Ω'),
  };
}

export interface StoreLine {
  id: string;
  name: string;
  size: string;
  volts: string;
  joules: string;
  /** whether house rule H3 asks for a discharge before it is proved dead */
  discharge: boolean;
  bleeder: string;
}

/** One line a part that stores energy. */
export function storeLine(store: Store, settings: Settings): StoreLine {
  return {
    id: store.id,
    name: store.name,
    size: print(store.farads, 'F'),
    volts: `${print(store.voltsWorked, 'V')} of ${print(store.voltsRated, 'V')}`,
    joules: formatQuantity(storedJoules(store), 'J', { digits: 3 }),
    discharge: needsDischarge(store, settings),
    bleeder: [
      store.bleederOhms === null ? 'no bleeder' : `bleeder ${print(store.bleederOhms, 'Ω')}`,
      ...(store.rebounds ? [`comes back: read again after ${formatNumber(store.reboundWaitSeconds)} s`] : []),
    ].join('; '),
  };
}
