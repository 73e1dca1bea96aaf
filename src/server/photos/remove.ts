import type { Photo } from '@/domain/api/schemas/photos';
import type { Actor } from '@/domain/people/may';
import { LONGEST_REASON, mayRemove } from '@/domain/photos/photos';
import { appendAudit } from '../audit/append';
import { now } from '../clock';
import { app } from '../context';
import { deleteFiles } from '../files/store';
import { textOf } from '../http/form';
import { conflict, invalid, notFound, Refusal, refusalOf } from '../refusal';
import { photosOf } from './load';
import { fullKey, smallKey } from './row';
import { readPhoto, seenPhoto } from './seen';

/** Takes a photo off that nobody else has seen; nothing stays of it. Refuses 409 one that was sent. */
export async function takeOffPhoto(actor: Actor, id: string): Promise<void> {
  const { db } = await app();
  await db.write(async () => {
    const { uploaderId, on } = await seenPhoto(actor, id);
    if (uploaderId !== actor.personId)
      throw conflict('This photo was sent. An editor of the book removes it, with a reason.');
    const photo = on && (await photosOf(actor, on.type, [on.id], () => on.hanging))(on.id).find((one) => one.id === id);
    if (photo && !photo.may.takeOff) throw conflict('This photo was sent. It is removed with a reason that stays.');
    await db.models.Attachment.destroy({ where: { id } });
    // Last, so that the row stays where the store fails.
    await deleteFiles([fullKey(id), smallKey(id)]);
  });
}

/** Removes a photo that was sent. Its place stays, with who removed it and why; the picture is gone for good. */
export async function removePhoto(actor: Actor, id: string, reason: string): Promise<Photo> {
  const { db } = await app();
  await db.write(async () => {
    const { photo, seen } = await readPhoto(actor, id);
    const { on } = seen;
    if (!on) throw notFound();
    if (photo.may.takeOff) throw conflict('Nobody has seen this photo yet. Take it off instead.');
    const facts = {
      book: on.hanging.book,
      uploaderId: seen.uploaderId,
      attachedAt: photo.at,
      removed: seen.removed,
      unsent: false,
    };
    const verdict = mayRemove(actor, facts, now());
    if (!verdict.ok) throw refusalOf(verdict);
    const why = reason.trim();
    if (!why)
      throw invalid('Write why, for whoever saw it.', [{ path: 'reason', message: 'Write why, for whoever saw it' }]);
    await db.models.Attachment.update(
      { removedById: actor.personId, removedAt: now(), removedWhy: why },
      { where: { id } },
    );
    await appendAudit({
      actorId: actor.personId,
      act: 'photo.removed',
      subject: { type: 'photo', id },
      shopId: on.shopId,
      detail: { number: on.number, from: on.type, of: on.id, hash: seen.hash, reason: why },
    });
    // Last: where the store fails, nothing was removed and it can be tried again.
    await deleteFiles([fullKey(id), smallKey(id)]);
  });
  return (await readPhoto(actor, id)).photo;
}

export type Removal = { done: true } | { done: false; status: number; reason: string; error: string };

/** Removes a photo from the page's form. What can be put right comes back with what was typed; other refusals are thrown. */
export async function removeFromForm(actor: Actor, id: string, form: FormData): Promise<Removal> {
  const reason = textOf(form, 'reason').slice(0, LONGEST_REASON);
  try {
    await removePhoto(actor, id, reason);
    return { done: true };
  } catch (error) {
    if (!(error instanceof Refusal) || ![409, 422, 503].includes(error.status)) throw error;
    return { done: false, status: error.status, reason, error: error.detail };
  }
}
