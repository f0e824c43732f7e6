/** What a machine's profile says for a sheet of workings: inputs in SI, to be filled into its form and changed there. */
import { formatNumber } from '@/shared/quantity/formatQuantity';

import type { Profile } from '../document/profile';
import type { Settings } from '../document/settings';
import { lostReturnOf } from './lostReturnOf';

/** One of several alike things of a machine for which a sheet can be worked out. */
export interface ProfilePick {
  id: string;
  name: string;
}

/** What has to be chosen before a sheet can be filled, in a word, with what there is to choose from. */
export interface ProfilePicks {
  what: 'rail' | 'part' | 'conductor';
  picks: readonly ProfilePick[];
}

type Inputs = Record<string, unknown>;
type Known = { profile: Profile; settings: Settings };

interface Fill {
  of: 'machine' | ProfilePicks['what'];
  /** null where the profile does not know enough */
  inputs: (known: Known, pick: string) => Inputs | null;
}

const rail = ({ profile }: Known, id: string) => profile.rails.find((r) => r.id === id);
const store = ({ profile }: Known, id: string) => profile.stores.find((s) => s.id === id);
/** A rail's tolerance is a fraction in the profile and percent on a sheet; twelve figures drop what binary adds. */
const percent = (fraction: number) => Number((fraction * 100).toPrecision(12));

const FILLS: Readonly<Record<string, Fill>> = {
  'series-lamp': {
    of: 'machine',
    inputs: ({ profile: { mains, supplyKind } }) => ({
      supplyVolts: mains.volts,
      lampVolts: mains.volts,
      load: supplyKind === 'switch-mode' ? 'switch-mode' : 'rectifier',
      loadWatts: mains.voltAmps,
    }),
  },
  'bleed-down': {
    of: 'part',
    inputs: (known, id) => {
      const part = store(known, id);
      return part === undefined ? null : { farads: part.farads, volts: part.voltsWorked, safeVolts: known.settings.deadVolts, bleederOhms: part.bleederOhms };
    },
  },
  reforming: {
    of: 'part',
    inputs: (known, id) => {
      const part = store(known, id);
      return part === undefined ? null : { farads: part.farads, ratedVolts: part.voltsRated, targetVolts: part.voltsWorked };
    },
  },
  'rail-load-plan': {
    of: 'machine',
    inputs: ({ profile: { rails, minimumLoad, boards } }) => ({
      rails: rails.map((of) => ({
        name: of.name,
        nominalVolts: of.nominal,
        tolerancePercent: percent(of.tolerance),
        maxAmps: of.maxAmps,
        minimumAmps: minimumLoad.find((least) => least.rail === of.id)?.amps ?? 0,
        sense: of.sense,
        first: boards.fitted.some((board) => board.biasFirst === of.id) ? 'yes' : 'no',
      })),
    }),
  },
  'rail-limits': {
    of: 'rail',
    inputs: (known, id) => {
      const of = rail(known, id);
      return of === undefined ? null : { nominalVolts: of.nominal, tolerancePercent: percent(of.tolerance) };
    },
  },
  'reading-limit': {
    of: 'rail',
    inputs: (known, id) => {
      const of = rail(known, id);
      if (of === undefined) return null;
      const [a, b] = [of.nominal * (1 - of.tolerance), of.nominal * (1 + of.tolerance)].map((v) => Number(v.toPrecision(12)));
      return { quantity: 'volts-dc', low: Math.min(a ?? 0, b ?? 0), high: Math.max(a ?? 0, b ?? 0) };
    },
  },
  'wire-drop': {
    of: 'conductor',
    inputs: ({ profile }, id) => {
      const wire = profile.conductors.find((c) => c.id === id);
      return wire === undefined ? null : { awg: null, squareMillimetres: wire.squareMillimetres, metres: wire.metres, path: 'one-way' };
    },
  },
  'pass-element': {
    of: 'rail',
    inputs: (known, id) => {
      const [of, { raw, supplyKind }] = [rail(known, id), known.profile];
      // a primary switch works on the mains side: that is no pass element between raw and rail
      if (of === undefined || raw === null || supplyKind === 'switch-mode') return null;
      return { inputVolts: raw.volts, outputVolts: Math.abs(of.nominal), amps: of.maxAmps, style: supplyKind === 'linear' ? 'linear' : 'switching' };
    },
  },
  'switching-regulator': {
    of: 'rail',
    inputs: (known, id) => {
      const [of, { raw, supplyKind, devices }] = [rail(known, id), known.profile];
      if (of === undefined || raw === null || supplyKind !== 'switched-from-raw') return null;
      const diode = devices.find((d) => d.rail === id && (d.kind === 'diode' || d.kind === 'schottky'));
      return { inputVolts: raw.volts, outputVolts: Math.abs(of.nominal), amps: of.maxAmps, diodeAmps: diode?.ratedAmps ?? null };
    },
  },
  'smoothing-ripple': {
    of: 'part',
    inputs: (known, id) => {
      const part = store(known, id);
      return part === undefined ? null : { mainsHertz: known.profile.mains.hertz, farads: part.farads };
    },
  },
  'fuse-inrush': {
    of: 'machine',
    inputs: ({ profile: { mains } }) => ({ speed: mains.fuse.kind, ratedAmps: mains.fuse.amps, loadAmps: Number((mains.voltAmps / mains.volts).toPrecision(6)) }),
  },
  'over-voltage-trip': {
    of: 'rail',
    inputs: (known, id) => {
      const of = rail(known, id);
      if (of === undefined || of.trip === null) return null;
      const { lowVolts, highVolts } = of.trip;
      const middle = (lowVolts + highVolts) / 2;
      return {
        nominalVolts: of.nominal,
        tolerancePercent: percent(of.tolerance),
        kind: 'set-point',
        tripVolts: Number(middle.toPrecision(12)),
        tripTolerancePercent: percent((highVolts - lowVolts) / 2 / middle),
        limitAmps: of.limitAmps,
      };
    },
  },
  'lost-return': { of: 'machine', inputs: ({ profile }) => lostReturnOf(profile) },
  'refit-trip': {
    of: 'rail',
    inputs: (known, id) => {
      const of = rail(known, id);
      return of === undefined ? null : { nominalVolts: of.nominal, railAmps: of.maxAmps, ownLimitAmps: of.limitAmps };
    },
  },
};

/** True where the sheet has inputs that a machine's profile knows. */
export function canTakeFrom(sheetId: string): boolean {
  return Object.hasOwn(FILLS, sheetId);
}

/** What has to be chosen of this machine for the sheet, or null where the machine alone says it. */
export function picksOf(sheetId: string, profile: Profile): ProfilePicks | null {
  const of = FILLS[sheetId]?.of;
  switch (of) {
    case undefined:
    case 'machine':
      return null;
    case 'rail':
      return { what: of, picks: profile.rails.map(({ id, name }) => ({ id, name })) };
    case 'part':
      return { what: of, picks: profile.stores.map(({ id, name, voltsWorked }) => ({ id, name: `${name}, ${formatNumber(voltsWorked)} V` })) };
    case 'conductor':
      return { what: of, picks: profile.conductors.map(({ id, name }) => ({ id, name })) };
  }
}

/**
 * The inputs of a sheet that this machine's profile knows.
 * @param pick the rail, part or conductor; ignored where the machine alone says it
 * @returns inputs in SI, or null where the profile does not know enough
 */
export function fromProfile(sheetId: string, profile: Profile, settings: Settings, pick: string | null): Inputs | null {
  const fill = FILLS[sheetId];
  if (fill === undefined || (fill.of !== 'machine' && pick === null)) return null;
  return fill.inputs({ profile, settings }, pick ?? '');
}
