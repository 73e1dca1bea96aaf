import { DEMONSTRATION_PASSWORD, PEOPLE, SHOPS } from '@db/seeders/demonstration';
import { ROLE_NAMES } from '@/domain/people/roleNames';
import { app } from '../context';

/** Somebody to sign in as with one press, while the server runs the demonstration. */
export interface DemonstrationPerson {
  email: string;
  password: string;
  name: string;
  /** "Senior technician" */
  role: string;
  /** "Pier Street Motors", "Common book" or "Network" */
  at: string;
}

/** Empty on a server that does not run the demonstration. */
export async function demonstrationPeople(): Promise<DemonstrationPerson[]> {
  const { config } = await app();
  if (!config.demo) return [];
  return PEOPLE.map(({ email, name, title, in: where, role }) => ({
    email,
    password: DEMONSTRATION_PASSWORD,
    name,
    role: title ?? ROLE_NAMES[role],
    at: where === 'common' ? 'Common book' : where === 'network' ? 'Network' : SHOPS[where],
  }));
}
