/** What working on, fitting into or trimming an area takes back (C6). */
import type { Area } from '../document/ids';
import type { Op } from './ops';

const SUPPLY: readonly Area[] = ['supply', 'primary', 'raw', 'regulator', 'trip'];

/** Primary, raw, regulator and trip are parts of the supply. */
export function isSupplyArea(area: Area): boolean {
  return SUPPLY.includes(area);
}

const unknown = (fact: 'looked' | 'earth' | 'insulation' | 'returns'): Op => ({ op: 'proof', fact, to: 'unknown' });
const provingNone: Op = { op: 'proving', to: 'none' };

/** Repair or replacement in an area: on any part of the supply everything that was proved of it goes. */
export function workVoids(area: Area): Op[] {
  if (isSupplyArea(area)) {
    return [unknown('earth'), unknown('insulation'), unknown('returns'), unknown('looked'), { op: 'trip', rail: 'all', proved: false }, provingNone, { op: 'powered-void' }, { op: 'release-void' }];
  }
  return fitVoids(area);
}

/** Fitting, taking out or trimming in an area. */
export function fitVoids(area: Area): Op[] {
  const release: Op[] = isSupplyArea(area) ? [{ op: 'release-void' }] : [];
  switch (area) {
    case 'supply':
      return workVoids('supply');
    case 'earth':
    case 'primary':
      return [unknown('earth'), unknown('insulation'), provingNone, ...release];
    case 'raw':
    case 'regulator':
      return [provingNone, ...release];
    case 'trip':
      return [{ op: 'trip', rail: 'all', proved: false }, provingNone, ...release];
    case 'harness':
      return [unknown('returns'), provingNone];
    case 'boards':
      return [unknown('returns')];
    case 'part':
    case 'clip':
      return [];
  }
}
