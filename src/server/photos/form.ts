import type { UploadedPhoto } from '@/domain/api/schemas/photos';
import type { Actor } from '@/domain/people/may';
import { FORM_PHOTOS, LARGEST_FILE, LONGEST_ALT } from '@/domain/photos/photos';
import { app } from '../context';
import { readForm, textOf } from '../http/form';
import { isMultipart, receive, type Sent, type SentFile } from '../http/multipart';
import { countCall } from '../http/rateLimit';
import { Refusal } from '../refusal';
import { photoOf } from './row';
import { uploadPhoto } from './upload';

/** What a form may carry in all; server.mjs lets as much through. */
const FORM_BYTES = 64 * 1024 * 1024;

/** A plain form with its photos, which are kept whatever becomes of the form. */
export interface PhotoForm {
  form: FormData;
  /** Those that came with it and those that it brought back from an earlier try, with the words of the form. */
  photos: UploadedPhoto[];
  /** Fields for a file that hold something still: words without their file, and what became of a file that was not taken. */
  open: { words: string; error: string | null }[];
}

/** Photos that the form names, because they were uploaded before: mine, and not sent yet. */
async function broughtBack(actor: Actor, form: FormData): Promise<UploadedPhoto[]> {
  const ids = [...new Set(form.getAll('photo').flatMap((id) => (typeof id === 'string' ? [id] : [])))];
  if (ids.length === 0) return [];
  const { db } = await app();
  const rows = await db.read<UploadedPhoto>(
    `SELECT id, width, height, bytes, alt FROM attachments
     WHERE uploaderId = :me AND subjectId IS NULL AND id IN (:ids)`,
    { me: actor.personId, ids },
  );
  return ids.flatMap((id) => {
    const row = rows.find((one) => one.id === id);
    return row ? [photoOf({ ...row, alt: textOf(form, `alt-${id}`) || row.alt })] : [];
  });
}

/** Why a file was not taken; null where it was, and is now among `photos`. */
async function take(actor: Actor, file: SentFile, words: string, photos: UploadedPhoto[]): Promise<string | null> {
  if (file.overlong) return 'This photo has more than 15 MB. Choose a smaller one.';
  try {
    await countCall(actor.personId, 'photos');
    photos.push(await uploadPhoto(actor, file.path, words));
    return null;
  } catch (error) {
    if (!(error instanceof Refusal) || error.status === 403) throw error;
    if (error.status >= 500) console.error('A photo of a form was not kept.', error.cause ?? error);
    return error.detail;
  }
}

async function taken(actor: Actor, { fields, files }: Sent): Promise<Omit<PhotoForm, 'form'>> {
  const photos = await broughtBack(actor, fields);
  const open: PhotoForm['open'] = [];
  for (let i = 0; i < FORM_PHOTOS; i++) {
    const words = textOf(fields, `file-alt-${i}`).trim().slice(0, LONGEST_ALT);
    const file = files.find(({ field, bytes }) => field === `file-${i}` && bytes > 0);
    const error = file ? await take(actor, file, words, photos) : null;
    if (error !== null || (!file && words)) open.push({ words, error });
  }
  return { photos, open };
}

/** Reads a form that may carry photos; one without files is read as any other. Refuses 400 and 413 like `receive`. */
export async function readPhotoForm(actor: Actor, request: Request): Promise<PhotoForm> {
  if (!isMultipart(request)) {
    const form = await readForm(request);
    return { form, photos: await broughtBack(actor, form), open: [] };
  }
  await countCall(actor.personId, 'photos');
  const sent = await receive(request, {
    what: 'photo',
    files: FORM_PHOTOS,
    fileBytes: LARGEST_FILE,
    bodyBytes: FORM_BYTES,
    overlong: 'mark',
  });
  try {
    return { form: sent.fields, ...(await taken(actor, sent)) };
  } finally {
    await sent.dispose();
  }
}
