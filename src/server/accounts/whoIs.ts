import type { Me } from '@/domain/api/schemas/me';
import { ROLES, type Actor, type Membership } from '@/domain/people/may';
import { app } from '../context';
import type { SignedIn } from './checkSignIn';
import { chosenShop } from './currentShop';

/** Somebody who is not signed in. No rule lets them do anything. */
export const NOBODY: Actor = { personId: '', memberships: [] };

type Role = Me['roles'][number];

interface Row {
  id: string;
  name: string;
  email: string;
  units: Me['units'];
  shortcuts: 0 | 1;
  tokenVersion: number;
  currentShopId: string | null;
  roles: string;
}

// One statement a request: person, roles and the names of the shops, as they stand now.
const WHO = `SELECT p.id, p.name, p.email, p.units, p.shortcuts, p.tokenVersion, p.currentShopId,
    (SELECT json_group_array(json_object('in', m.scope, 'shopId', m.shopId, 'role', m.role, 'name',
        CASE m.scope WHEN 'shop' THEN s.name WHEN 'common' THEN 'Common book' ELSE 'Network' END))
      FROM memberships m LEFT JOIN shops s ON s.id = m.shopId WHERE m.personId = p.id) AS roles
  FROM people p
  WHERE p.id = :personId AND p.kind = 'person' AND p.passwordHash IS NOT NULL AND (p.demonstration = 0 OR :demo)`;

/** The person a session stands for, with the roles they hold now; null where the session was ended. */
export async function whoIs({ personId, tokenVersion }: SignedIn): Promise<{ actor: Actor; me: Me } | null> {
  const { db, config } = await app();
  const [row] = await db.read<Row>(WHO, { personId, demo: config.demo });
  if (!row || row.tokenVersion !== tokenVersion) return null;
  const roles = (JSON.parse(row.roles) as Role[]).sort(
    (a, b) => a.name.localeCompare(b.name) || ROLES.indexOf(a.role) - ROLES.indexOf(b.role),
  );
  const shops = roles.flatMap(({ in: scope, shopId, name }) =>
    scope === 'shop' && shopId ? [{ id: shopId, name }] : [],
  );
  const current = chosenShop(
    shops.map(({ id }) => id),
    row.currentShopId,
  );
  return {
    actor: { personId: row.id, memberships: roles.map(membership) },
    me: {
      id: row.id,
      name: row.name,
      email: row.email,
      units: row.units,
      shortcuts: row.shortcuts === 1,
      shop: shops.find(({ id }) => id === current) ?? null,
      roles,
    },
  };
}

/** The table's own checks say which parts go together. */
const membership = ({ in: scope, shopId, role }: Role) =>
  (scope === 'shop' ? { in: scope, shopId, role } : { in: scope, role }) as Membership;
