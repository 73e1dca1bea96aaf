import type { Database } from '../database';
import { PEOPLE, SHOPS, type ShopKey } from './demonstration';

/**
 * Adds what is missing of the demonstration's shops and people; leaves alone what is there.
 * `passwordHashes` is asked for one hash a person, so that each has a salt of its own.
 */
export async function seedNetwork(db: Database, passwordHash: () => Promise<string>): Promise<void> {
  const { Shop, Person, Membership } = db.models;
  const missing = await newPeople(db);
  const hashes = await Promise.all(missing.map(() => passwordHash()));
  await db.write(async () => {
    const shopIds = new Map<string, string>();
    for (const key of Object.keys(SHOPS) as ShopKey[]) {
      const [shop] = await Shop.findOrCreate({
        where: { name: SHOPS[key] },
        defaults: { name: SHOPS[key], demonstration: true },
      });
      shopIds.set(key, shop.id);
    }
    for (const [i, { email, name, in: where, role, units = 'metric' }] of missing.entries()) {
      const shopId = shopIds.get(where) ?? null;
      const person = await Person.create({
        email,
        name,
        units,
        passwordHash: hashes[i] ?? null,
        currentShopId: shopId,
        demonstration: true,
      });
      const scope = where === 'common' || where === 'network' ? where : 'shop';
      await Membership.create({ personId: person.id, scope, shopId, role });
    }
  });
}

async function newPeople(db: Database) {
  const there = await db.read<{ email: string }>('SELECT lower(email) AS email FROM people WHERE kind = :kind', {
    kind: 'person',
  });
  const emails = new Set(there.map((row) => row.email));
  return PEOPLE.filter(({ email }) => !emails.has(email));
}
