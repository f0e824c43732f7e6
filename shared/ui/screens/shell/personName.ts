/** A person of the workshop by name. */
import type { Person } from '@/shared/contract/people';

/** Name with the short sign; records carry ids only, so one who has left may have no name here. */
export function personName(people: readonly Person[] | undefined, id: string): string {
  if (people === undefined) return '…';
  if (id === 'machine') return 'the machine itself';
  return people.find((p) => p.id === id)?.name ?? 'somebody who has left';
}

/** The short sign used in records. */
export function personCode(people: readonly Person[] | undefined, id: string): string {
  return people === undefined ? '…' : (people.find((p) => p.id === id)?.code ?? '–');
}
