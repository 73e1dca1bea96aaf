import type { Role } from '@/domain/people/may';
import { appendAudit } from '@/server/audit/append';
import { app } from '@/server/context';
import { headOf } from '@/server/book/head';
import { hashOf, parsedText } from '@/server/book/parsed';
import { indexRevision } from '@/server/book/indexRevision';
import { keepRendering } from '@/server/book/rendering';
import { whoIs } from '@/server/accounts/whoIs';
import { text } from './text';

type Place = 'common' | 'network' | { shop: string };

/** A person with one role, found by a short name such as `north.senior`. */
export interface Member {
  id: string;
  name: string;
}

/** Two shops with a person for every role in each, two editors of the common book, a steward, and somebody without a role. */
export interface Network {
  north: string;
  pier: string;
  people: Record<string, Member>;
}

export const SHOP_ROLES = ['apprentice', 'technician', 'senior', 'editor', 'owner'] as const;

export async function addShop(name: string): Promise<string> {
  const { db } = await app();
  return (await db.models.Shop.create({ name })).id;
}

let count = 0;
export async function addPerson(name: string, roles: { in: Place; role: Role }[], currentShopId: string | null = null) {
  const { db } = await app();
  count += 1;
  const person = await db.models.Person.create({
    name,
    email: `person${count}@test.example`,
    // Never signed in with: tests put the person into the request themselves.
    passwordHash: 'unused',
    currentShopId,
  });
  for (const { in: place, role } of roles)
    await db.models.Membership.create({
      personId: person.id,
      scope: typeof place === 'string' ? place : 'shop',
      shopId: typeof place === 'string' ? null : place.shop,
      role,
    });
  return { id: person.id, name };
}

export async function makeNetwork(): Promise<Network> {
  const { db } = await app();
  return db.write(async () => {
    const north = await addShop('Test shop north');
    const pier = await addShop('Test shop pier');
    const people: Record<string, Member> = {};
    for (const [short, shop] of Object.entries({ north, pier }))
      for (const role of SHOP_ROLES)
        people[`${short}.${role}`] = await addPerson(`${short} ${role}`, [{ in: { shop }, role }], shop);
    for (const name of ['common.editor', 'common.editor2'])
      people[name] = await addPerson(name, [{ in: 'common', role: 'editor' }]);
    people['steward'] = await addPerson('steward', [{ in: 'network', role: 'steward' }]);
    people['nobody'] = await addPerson('nobody', []);
    return { north, pier, people };
  });
}

/** Puts a procedure into a book as published revision A, as a release does. */
export async function publishFirst(number: string, { shopId = null as string | null, source = text() } = {}) {
  const { db } = await app();
  const parsed = await parsedText(source);
  if (!parsed.ok) throw new Error(parsed.errors.map((e) => `${e.line}: ${e.message}`).join('\n'));
  const { canonical, rendered } = parsed;
  await db.write(async () => {
    const release = await db.models.Person.create({ kind: 'release', email: null, name: 'Release' });
    const procedure = await db.models.Procedure.create({ number, bookKind: shopId ? 'shop' : 'common', shopId });
    const revision = await db.models.Revision.create({
      procedureId: procedure.id,
      letter: 'A',
      state: 'published',
      source: canonical,
      hash: hashOf(canonical),
      head: headOf(rendered),
      authorId: release.id,
      reason: 'First issue',
      publishedAt: '2026-01-02T03:04:05.000Z',
    });
    await procedure.update({ currentRevisionId: revision.id });
    await keepRendering(hashOf(canonical), rendered);
    await indexRevision(procedure.id, rendered);
    await appendAudit({
      actorId: release.id,
      act: 'revision.published',
      subject: { type: 'revision', id: revision.id },
      detail: { number, letter: 'A', hash: hashOf(canonical), supersedes: null },
    });
  });
}

export async function signedIn(person: Member) {
  const { db } = await app();
  const row = await db.models.Person.findByPk(person.id);
  const who = await whoIs({ personId: person.id, tokenVersion: row?.tokenVersion ?? 0 });
  if (!who) throw new Error(`${person.name} cannot sign in.`);
  return who;
}
