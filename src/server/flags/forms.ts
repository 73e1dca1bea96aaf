import type { UploadedPhoto } from '@/domain/api/schemas/photos';
import type { Actor } from '@/domain/people/may';
import { textOf } from '../http/form';
import { readPhotoForm, type PhotoForm } from '../photos/form';
import { Refusal } from '../refusal';
import { answerFlag, takeUpFlag, withdrawFlag } from './act';
import { raiseFlag, type Doubt } from './raise';

export type Raised =
  | { done: true }
  | {
      done: false;
      status: number;
      typed: { step: string; kind: string; text: string };
      /** Kept, so that they need not be chosen again. */
      photos: UploadedPhoto[];
      open: PhotoForm['open'];
      errors: Record<string, string>;
    };

/** Raises a flag from the page's form; what is refused comes back with what was typed and the photos that were taken. */
export async function raiseFromForm(actor: Actor, number: string, request: Request): Promise<Raised> {
  const { form, photos, open } = await readPhotoForm(actor, request);
  const typed = { step: textOf(form, 'step'), kind: textOf(form, 'kind'), text: textOf(form, 'text') };
  const refused = (status: number, errors: Record<string, string>): Raised => ({
    done: false,
    status,
    typed,
    photos,
    open,
    errors,
  });
  if (open.some(({ error }) => error !== null)) return refused(422, {});
  const doubt: Doubt = { ...typed, step: typed.step || null, photos: photos.map(({ id, alt }) => ({ id, alt })) };
  try {
    await raiseFlag(actor, number, doubt);
    return { done: true };
  } catch (error) {
    if (!(error instanceof Refusal) || !error.errors) throw error;
    const named = (path: string) =>
      path.replace(/^photos\.(\d+)$/, (_, i: string) => `alt-${photos[Number(i)]?.id ?? ''}`);
    return refused(error.status, Object.fromEntries(error.errors.map(({ path, message }) => [named(path), message])));
  }
}

export type Acted =
  | { done: 'answered' | 'withdrawn' }
  | { done: 'taken up'; proposal: string }
  | { done: null; status: number; id: string; text: string; error: string };

/** Answers, takes up or takes back a flag from the page's forms. */
export async function actFromForm(actor: Actor, form: FormData): Promise<Acted> {
  const [id, text, act] = [textOf(form, 'id'), textOf(form, 'text'), textOf(form, 'act')];
  try {
    if (act === 'take-up') {
      const { proposal } = await takeUpFlag(actor, id);
      return proposal ? { done: 'taken up', proposal: proposal.id } : { done: 'answered' };
    }
    if (act === 'withdraw') {
      await withdrawFlag(actor, id);
      return { done: 'withdrawn' };
    }
    await answerFlag(actor, id, text);
    return { done: 'answered' };
  } catch (error) {
    // What is unseen or not theirs is a page of its own; what they can mend stays on this one.
    if (!(error instanceof Refusal) || (error.status !== 422 && error.status !== 409)) throw error;
    return { done: null, status: error.status, id, text, error: error.detail };
  }
}
