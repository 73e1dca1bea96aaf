/** The only place that knows what a role may do. The server guards with it and the page hides with it. */

export const ROLES = ['apprentice', 'technician', 'senior', 'editor', 'owner', 'steward'] as const;
export type Role = (typeof ROLES)[number];

/** A book belongs to the whole network or to one shop. */
export type Book = { kind: 'common' } | { kind: 'shop'; shopId: string };

/** A role held in a shop, as editor of the common book, or as steward of the network. */
export type Membership =
  | { in: 'shop'; shopId: string; role: Exclude<Role, 'steward'> }
  | { in: 'common'; role: 'editor' }
  | { in: 'network'; role: 'steward' };

export interface Actor {
  personId: string;
  memberships: readonly Membership[];
}
