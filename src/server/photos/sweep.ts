import { rm } from 'node:fs/promises';
import { KEPT_UNSENT_MS } from '@/domain/photos/photos';
import { now } from '../clock';
import { app } from '../context';
import { deleteFiles } from '../files/store';
import { uploadFolder } from '../http/multipart';
import { fullKey, smallKey } from './row';

/** How many are thrown away at once, so that no upload waits long for it. */
const AT_ONCE = 20;

/**
 * Throws away photos that were uploaded more than a day ago and never sent. Its own faults are only told: they must stop nobody's
 * upload and no start, and the next sweep tries again.
 */
export async function sweepPhotos(): Promise<number> {
  const { db } = await app();
  const before = new Date(Date.parse(now()) - KEPT_UNSENT_MS).toISOString();
  try {
    const old = await db.read<{ id: string }>(
      'SELECT id FROM attachments WHERE subjectId IS NULL AND at < :before ORDER BY at LIMIT :most',
      { before, most: AT_ONCE },
    );
    for (const { id } of old) {
      // Asked again: it may have been sent this very moment.
      const gone = await db.write(() => db.models.Attachment.destroy({ where: { id, subjectId: null } }));
      // Not inside the write: a store that hangs must hold up nobody who saves.
      if (gone > 0) await deleteFiles([fullKey(id), smallKey(id)]);
    }
    return old.length;
  } catch (error) {
    console.warn('Old photos could not be thrown away; it is tried again later.', error);
    return 0;
  }
}

/** What a server that was stopped in the middle of an upload left behind. */
export async function emptyUploads(): Promise<void> {
  await rm(await uploadFolder(), { recursive: true, force: true });
}
