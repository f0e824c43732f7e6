/** Facts that a tree states in words (its start, a call, a re-entry), as statements that can be checked. */
import type { Claim } from '../document/steps';
import type { Profile } from '../document/profile';
import { tripRails } from '../document/profile';
import { holds } from './atoms';
import type { Atom } from './atoms';
import type { Facts } from './facts';

/** The statements behind a claim. */
export function claimAtoms(claim: Claim, profile: Profile): Atom[] {
  switch (claim) {
    case 'out':
      return [{ fact: 'all-out' }];
    case 'dead':
      return [{ fact: 'all-out' }, { fact: 'stored', least: 'proved' }];
    case 'looked':
    case 'earth':
    case 'insulation':
    case 'returns':
      return [{ fact: claim }];
    case 'trips':
      return tripRails(profile).map((r): Atom => ({ fact: 'trip', rail: r.id }));
    case 'proving-regulator':
      return [{ fact: 'proving', least: 'regulator' }];
    case 'proving-limited':
      return [{ fact: 'proving', least: 'limited' }];
    case 'proving-full':
      return [{ fact: 'proving', least: 'full' }];
    case 'load-none':
      return [{ fact: 'load', is: 'none' }];
    case 'load-boards':
      return [{ fact: 'load', is: 'boards' }];
    case 'release':
      return [{ fact: 'release' }];
    case 'nothing-fitted':
      return [{ fact: 'none-fitted' }];
  }
}

/** The claims that the facts do not bear out. */
export function unmetClaims(claims: readonly Claim[], facts: Facts, profile: Profile): Claim[] {
  return claims.filter((claim) => !claimAtoms(claim, profile).every((atom) => holds(facts, atom)));
}
