/** Where a kept photo or paper is read. */
import { pathOf } from '@/shared/contract/defineRoute';
import { routes } from '@/shared/contract/routes';

/** Address of the file of that hash; `small` for lists. */
export function fileAddress(hash: string, size: 'full' | 'small' = 'full'): string {
  return `${pathOf(routes.file, { hash })}${size === 'small' ? '?size=small' : ''}`;
}
