import type { PersonRef } from '@/domain/api/schemas/common';
import type { Actor } from '@/domain/people/may';
import { personColumn, personRef } from '../../book/columns';
import { app } from '../../context';
import type { Loaded } from '../proposals';

/**
 * Whom somebody can name in a thread: people who may see it, and of whom this person may know. In the common book
 * those are its editors, the people of their own shops, the author, and who takes part already.
 */
export async function nameable(actor: Actor, { id, authorId, facts }: Loaded): Promise<PersonRef[]> {
  const { db } = await app();
  const { book } = facts;
  const mine = actor.memberships.flatMap((m) => (m.in === 'shop' ? [m.shopId] : []));
  const shops = book.kind === 'shop' ? [book.shopId] : mine;
  const rows = await db.read<{ person: string }>(
    `SELECT ${personColumn('a')} AS person FROM people a
     WHERE a.kind = 'person' AND a.id <> :me AND (
       EXISTS (SELECT 1 FROM memberships m WHERE m.personId = a.id AND (
         (m.scope = 'shop' AND m.shopId IN (:shops)) OR (:common AND m.scope = 'common')))
       OR (:common AND EXISTS (SELECT 1 FROM memberships m WHERE m.personId = a.id) AND (a.id = :authorId
         OR a.id IN (SELECT m.personId FROM threadMessages m JOIN threads t ON t.id = m.threadId WHERE t.revisionId = :id))))
     ORDER BY a.name, a.id`,
    {
      me: actor.personId,
      shops: shops.length > 0 ? shops : [''],
      common: book.kind === 'common' ? 1 : 0,
      authorId,
      id,
    },
  );
  return rows.map(({ person }) => personRef(person));
}
