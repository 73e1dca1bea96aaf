import { z } from 'zod';
import type { Person } from '@db/models/people';
import { UnitSystem } from '@/domain/api/schemas/common';
import type { Actor } from '@/domain/people/may';
import { isOneLine, NOT_ONE_LINE } from '@/domain/procedure/characters';
import { appendAudit } from '../audit/append';
import { app } from '../context';
import { invalid, notFound, signedOut } from '../refusal';
import type { SignedIn } from './checkSignIn';
import { assertGoodPassword, hashPassword, verifyPassword } from './passwords';
import { countTry } from './tries';

const Profile = z.object({
  name: z
    .string()
    .trim()
    .min(1, 'Write your name.')
    .max(80, 'Use 80 characters or fewer.')
    .refine(isOneLine, NOT_ONE_LINE),
  units: UnitSystem,
  shortcuts: z.boolean(),
});

async function self(actor: Actor) {
  const { db } = await app();
  const person = await db.models.Person.findByPk(actor.personId);
  if (!person) throw signedOut();
  return person;
}

/** Changes what is given of the actor's own name and settings. Refuses 422 with the field that is wrong. */
export async function saveProfile(
  actor: Actor,
  change: { name?: string; units?: string; shortcuts?: boolean },
): Promise<void> {
  const { db } = await app();
  const read = Profile.partial().safeParse(change);
  if (!read.success)
    throw invalid(
      'Some of it cannot be saved.',
      read.error.issues.map(({ path, message }) => ({ path: path.join('.'), message })),
    );
  await db.write(async () => {
    const person = await self(actor);
    const { name: before } = person;
    await person.update(read.data);
    if (person.name !== before)
      await appendAudit({
        actorId: actor.personId,
        act: 'person.renamed',
        subject: { type: 'person', id: person.id },
        detail: { from: before, to: person.name },
      });
  });
}

/** Chooses the shop the actor works in from now on; one they have no role in is not found. */
export async function setCurrentShop(actor: Actor, shopId: string): Promise<void> {
  const { db } = await app();
  if (!actor.memberships.some((m) => m.in === 'shop' && m.shopId === shopId))
    throw notFound('You hold no role in such a shop.');
  await db.write(async () => {
    const person = await self(actor);
    await person.update({ currentShopId: shopId });
  });
}

/**
 * Changes the actor's own password and ends every session they have. Give the browser that asked a new
 * one (`newSession`) of what this returns. The present password is asked for, and wrong ones are counted.
 */
export async function changePassword(
  actor: Actor,
  { current, next }: { current: string; next: string },
): Promise<SignedIn> {
  const { db } = await app();
  const { email, passwordHash } = await self(actor);
  assertGoodPassword(next, 'next');
  const tried = await countTry(email ?? '');
  if (!passwordHash || !(await verifyPassword(passwordHash, current)))
    throw invalid('The password was not changed.', [
      { path: 'current', message: 'This is not your present password.' },
    ]);
  await tried.right();
  const nextHash = await hashPassword(next);
  return db.write(async () => {
    const person = await self(actor);
    // Two changes at once: the second was checked against a password that is no longer the present one.
    if (person.passwordHash !== passwordHash)
      throw invalid('The password was changed a moment ago from another browser.');
    await person.update({ passwordHash: nextHash });
    return endSessions(person, 'person.password-changed');
  });
}

/** Ends every session of the actor, this one too. */
export async function signOutEverywhere(actor: Actor): Promise<void> {
  const { db } = await app();
  await db.write(async () => endSessions(await self(actor), 'person.signed-out-everywhere'));
}

async function endSessions(person: Person, act: string): Promise<SignedIn> {
  const tokenVersion = person.tokenVersion + 1;
  await person.update({ tokenVersion });
  await appendAudit({ actorId: person.id, act, subject: { type: 'person', id: person.id } });
  return { personId: person.id, tokenVersion };
}
