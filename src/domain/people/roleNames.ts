import type { Role } from './may';

/** What each role is called on screen. */
export const ROLE_NAMES: Record<Role, string> = {
  apprentice: 'Apprentice',
  technician: 'Technician',
  senior: 'Senior technician',
  editor: 'Editor',
  owner: 'Owner',
  steward: 'Network steward',
};
