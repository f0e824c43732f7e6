/** Who may see which version of a tree. */
import type { TreeVersionRow } from '@/db/tables';

import type { SignedIn } from '../session/access';

/** What is not issued yet is the seniors' own business: nobody works by it. */
export function maySeeVersion(who: SignedIn, version: Pick<TreeVersionRow, 'state'>): boolean {
  return version.state === 'issued' || version.state === 'withdrawn' || who.roles.includes('senior');
}
