import type { Bulletin } from '@/domain/api/schemas/bulletins';
import type { Actor } from '@/domain/people/may';
import { appendAudit } from '../audit/append';
import { now } from '../clock';
import { app } from '../context';
import { notFound } from '../refusal';
import { loadBulletins } from './read';

/**
 * Signs a bulletin as read, once; signing again changes nothing and answers the first signature. Refuses 404 what is
 * unknown or stands in a book the person may not read.
 *
 * @param id of the bulletin, or of the revision whose critical change it tells of
 */
export async function readAndSign(actor: Actor, id: string): Promise<Bulletin> {
  const { db } = await app();
  const find = async () => {
    const [found] = await loadBulletins(actor, `b.id = :id OR (b.revisionId = :id AND b.kind = 'critical change')`, {
      id,
    });
    if (!found) throw notFound();
    return found;
  };
  await db.write(async () => {
    const { id: bulletinId, signedAt, number, kind, book, revision } = await find();
    if (signedAt !== null) return;
    await db.models.ReadAndSign.create({ personId: actor.personId, bulletinId, at: now() });
    await appendAudit({
      actorId: actor.personId,
      act: 'bulletin.signed',
      subject: { type: 'bulletin', id: bulletinId },
      shopId: book.shopId,
      detail: { number, kind, letter: revision.letter },
    });
  });
  return find();
}
