import type { Membership } from '../models/people';

/** The invented network that DEMO loads. Every name is made up; the addresses end in the reserved `.example` (RFC 2606). */
export const DEMONSTRATION_PASSWORD = 'matchmark-demo';

export const SHOPS = {
  northgate: 'Northgate Engine Works',
  pierstreet: 'Pier Street Motors',
  sawmill: 'Sawmill Lane Marine',
} as const;
export type ShopKey = keyof typeof SHOPS;

export interface SeedPerson {
  email: string;
  name: string;
  /** Shown on the sign-in page beside the role that the person holds twice. */
  title?: string;
  in: ShopKey | 'common' | 'network';
  role: Membership['role'];
  units?: 'metric' | 'inch';
}

export const PEOPLE: readonly SeedPerson[] = [
  { email: 'apprentice@northgate.example', name: 'Mika Thornbury', in: 'northgate', role: 'apprentice' },
  { email: 'technician@northgate.example', name: 'Dafydd Lorne', in: 'northgate', role: 'technician' },
  { email: 'senior@northgate.example', name: 'Greta Halvorsen', in: 'northgate', role: 'senior' },
  { email: 'owner@northgate.example', name: 'Cyrus Pemberwick', in: 'northgate', role: 'owner' },
  { email: 'senior@pierstreet.example', name: 'Rowan Achterberg', in: 'pierstreet', role: 'senior' },
  { email: 'editor@pierstreet.example', name: 'Yusra Delacourt', in: 'pierstreet', role: 'editor' },
  { email: 'owner@pierstreet.example', name: 'Bram Kettleby', in: 'pierstreet', role: 'owner', units: 'inch' },
  { email: 'apprentice@sawmill.example', name: 'Lotte Vance', in: 'sawmill', role: 'apprentice', units: 'inch' },
  { email: 'editor@sawmill.example', name: 'Piran Holm', in: 'sawmill', role: 'editor' },
  { email: 'owner@sawmill.example', name: 'Saoirse Wendt', in: 'sawmill', role: 'owner' },
  { email: 'editor@halden.example', name: 'Ines Okafor', in: 'common', role: 'editor' },
  { email: 'editor2@halden.example', name: 'Tobias Marchetti', title: 'Second editor', in: 'common', role: 'editor' },
  { email: 'steward@halden.example', name: 'Evelyn Strand', in: 'network', role: 'steward' },
];
