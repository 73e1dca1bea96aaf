import { v7 } from 'uuid';
import type { UploadedPhoto } from '@/domain/api/schemas/photos';
import { may, type Actor } from '@/domain/people/may';
import { MOST_WAITING } from '@/domain/photos/photos';
import { now } from '../clock';
import { app } from '../context';
import { deleteFiles, putFile } from '../files/store';
import { conflict, forbidden } from '../refusal';
import { makePicture } from './picture';
import { fullKey, PHOTO_TYPE, photoOf, smallKey } from './row';
import { sweepPhotos } from './sweep';

async function refuseHoard(actor: Actor): Promise<void> {
  const { db } = await app();
  const [row] = await db.read<{ n: number }>(
    'SELECT count(*) AS n FROM attachments WHERE uploaderId = :me AND subjectId IS NULL',
    { me: actor.personId },
  );
  if ((row?.n ?? 0) >= MOST_WAITING)
    throw conflict(
      `You have uploaded ${MOST_WAITING} photos that were not sent with anything. Send or take off some; the rest goes after a day.`,
    );
}

/**
 * Keeps a photo that nobody but this person sees until it is sent with something.
 *
 * @param path of the file as it came
 * Refuses 403 people without a role, 409 too many that wait, 415 and 422 like `makePicture`, 503 where the store fails.
 */
export async function uploadPhoto(actor: Actor, path: string, alt = ''): Promise<UploadedPhoto> {
  const permission = may(actor, 'addPhoto', null);
  if (!permission.ok) throw forbidden(permission.why);
  await sweepPhotos();
  await refuseHoard(actor);
  const { full, small, width, height, hash } = await makePicture(path);
  const { db } = await app();
  const photo = { id: v7(), width, height, bytes: full.length, alt };
  // The row comes first: should all end between the two, the sweep finds what is left. A file without a row nobody would find.
  await db.write(async () => {
    await db.models.Attachment.create({ ...photo, uploaderId: actor.personId, hash, at: now() });
  });
  try {
    await putFile(fullKey(photo.id), full, PHOTO_TYPE);
    await putFile(smallKey(photo.id), small, PHOTO_TYPE);
  } catch (error) {
    await db.write(async () => {
      await db.models.Attachment.destroy({ where: { id: photo.id } });
    });
    await deleteFiles([fullKey(photo.id), smallKey(photo.id)]).catch(() => undefined);
    throw error;
  }
  return photoOf(photo);
}
