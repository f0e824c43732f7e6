/** The invented people of the two demo workshops. */
import type { Role } from '@/shared/contract/people';

export const DEMO_PASSWORD = 'lampstep-demo';

export const demoWorkshops = {
  first: { id: '5f0c6a10-0000-4000-8000-000000000001', name: 'Quayside Computer Restoration' },
  second: { id: '5f0c6a10-0000-4000-8000-000000000002', name: 'Hollowfield Repair Room' },
} as const;

export interface DemoPerson {
  id: string;
  workshop: keyof typeof demoWorkshops;
  name: string;
  code: string;
  mail: string;
  roles: readonly Role[];
  /** false for somebody who is named in the records and never signs in */
  account: boolean;
}

const id = (n: number) => `5f0c6a11-0000-4000-8000-${String(n).padStart(12, '0')}`;

export const demoPeople = {
  restorer: { id: id(1), workshop: 'first', name: 'Ines Halloran', code: 'IH', mail: 'restorer@example.org', roles: ['restorer'], account: true },
  restorer2: { id: id(2), workshop: 'first', name: 'Tobias Renk', code: 'TR', mail: 'restorer2@example.org', roles: ['restorer'], account: true },
  senior: { id: id(3), workshop: 'first', name: 'Ruth Adeyar', code: 'RA', mail: 'senior@example.org', roles: ['senior'], account: true },
  senior2: { id: id(4), workshop: 'first', name: 'Marek Sollis', code: 'MS', mail: 'senior2@example.org', roles: ['senior'], account: true },
  senior3: { id: id(5), workshop: 'first', name: 'Priya Vantongeren', code: 'PV', mail: 'senior3@example.org', roles: ['senior'], account: true },
  reviewer: { id: id(6), workshop: 'first', name: 'Hedda Brookmire', code: 'HB', mail: 'reviewer@example.org', roles: ['reviewer'], account: true },
  keeper: { id: id(7), workshop: 'first', name: 'Owen Pellard', code: 'OP', mail: 'keeper@example.org', roles: ['keeper'], account: true },
  other: { id: id(8), workshop: 'second', name: 'Lena Farrow', code: 'LF', mail: 'other@example.org', roles: ['restorer', 'senior', 'reviewer', 'keeper'], account: true },
  otherRestorer: { id: id(9), workshop: 'second', name: 'Sam Orrin', code: 'SO', mail: 'sam.orrin@example.org', roles: ['restorer', 'senior', 'reviewer'], account: false },
} as const satisfies Record<string, DemoPerson>;

export type DemoPersonKey = keyof typeof demoPeople;
