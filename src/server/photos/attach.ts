import type { PhotoChoice } from '@/domain/api/schemas/photos';
import type { Actor } from '@/domain/people/may';
import { MOST_PHOTOS, type PhotoSubject } from '@/domain/photos/photos';
import { now } from '../clock';
import { app } from '../context';
import { invalid } from '../refusal';

interface Waiting {
  id: string;
  alt: string;
  hash: string;
}

const refuse = (i: number | null, message: string) =>
  invalid(message, [{ path: i === null ? 'photos' : `photos.${i}`, message }]);

/** My own photos that were not sent yet, in the order chosen, each with words for what it shows. */
async function chosen(actor: Actor, choices: readonly PhotoChoice[]): Promise<Waiting[]> {
  const { db } = await app();
  const wanted = choices.map((choice) => (typeof choice === 'string' ? { id: choice, alt: null } : choice));
  const rows = await db.read<Waiting>(
    'SELECT id, alt, hash FROM attachments WHERE uploaderId = :me AND subjectId IS NULL AND id IN (:ids)',
    { me: actor.personId, ids: wanted.length > 0 ? wanted.map(({ id }) => id) : [''] },
  );
  return wanted.map(({ id, alt }, i) => {
    const row = rows.find((one) => one.id === id);
    if (!row || wanted.findIndex((one) => one.id === id) < i)
      throw refuse(i, `Photo ${i + 1} is not there any more, or was sent already. Take it off and choose it again.`);
    const words = alt ?? row.alt;
    if (!words.trim()) throw refuse(i, `Say what photo ${i + 1} shows, for whoever cannot see it.`);
    return { ...row, alt: words.trim() };
  });
}

/** Those of the chosen photos that were not sent with anything yet. */
export async function unsentOf(actor: Actor, choices: readonly PhotoChoice[]): Promise<PhotoChoice[]> {
  const { db } = await app();
  const idOf = (choice: PhotoChoice) => (typeof choice === 'string' ? choice : choice.id);
  const sent = await db.read<{ id: string }>(
    'SELECT id FROM attachments WHERE uploaderId = :me AND subjectId IS NOT NULL AND id IN (:ids)',
    { me: actor.personId, ids: ['', ...choices.map(idOf)] },
  );
  return choices.filter((choice) => !sent.some(({ id }) => id === idOf(choice)));
}

/**
 * Sends uploaded photos with a message, a flag or a reason. Call it inside the `write` that stores that, so that both are kept or
 * neither. Returns what the audit trail notes of them. Refuses 422 with the path of the photo.
 */
export async function attachPhotos(
  actor: Actor,
  subject: { type: PhotoSubject; id: string },
  choices: readonly PhotoChoice[],
): Promise<{ photos?: { id: string; hash: string }[] }> {
  if (choices.length === 0) return {};
  const { db } = await app();
  const photos = await chosen(actor, choices);
  const [there] = await db.read<{ standing: number; next: number }>(
    `SELECT count(*) FILTER (WHERE removedAt IS NULL) AS standing, coalesce(max(place) + 1, 0) AS next
     FROM attachments WHERE subjectType = :type AND subjectId = :id`,
    subject,
  );
  const { standing = 0, next = 0 } = there ?? {};
  if (standing + photos.length > MOST_PHOTOS)
    throw refuse(null, `${MOST_PHOTOS} photos fit here. Take some off, or send them separately.`);
  const attachedAt = now();
  for (const [i, { id, alt }] of photos.entries())
    await db.models.Attachment.update(
      { subjectType: subject.type, subjectId: subject.id, place: next + i, alt, attachedAt },
      { where: { id } },
    );
  return { photos: photos.map(({ id, hash }) => ({ id, hash })) };
}
