import { z } from 'zod';
import type { Actor } from '@/domain/people/may';
import { Refusal, type RefusalError } from '../refusal';
import { saveProposal } from './saveProposal';
import { submit } from './submit';

/** What the plain form of the writing page sends, where there is no script. */
const PlainForm = z.object({
  source: z.string(),
  reason: z.string(),
  version: z.coerce.number().int(),
  act: z.enum(['keep', 'propose']),
});

export type PlainOutcome =
  | { done: 'kept' | 'proposed' }
  /** Refused: what was typed stands in the form again, with the version to save it over once it was compared. */
  | { refusal: { detail: string; errors: RefusalError[] }; source: string; reason: string };

/** Keeps a draft from a plain form, and proposes it where that was the button. Passes on 403 and 404. */
export async function writePlainly(actor: Actor, id: string, form: FormData): Promise<PlainOutcome> {
  const read = PlainForm.safeParse(Object.fromEntries(form));
  if (!read.success)
    throw new Refusal(
      400,
      'malformed',
      'Not understood',
      'The form came without some of its fields. Go back and send it again.',
    );
  const { reason, version, act } = read.data;
  // A browser sends every line end of a form as CRLF.
  const source = read.data.source.replace(/\r\n/g, '\n');
  try {
    const saved = await saveProposal(actor, id, version, { source, reason });
    if (act === 'keep') return { done: 'kept' };
    await submit(actor, id, saved.version);
    return { done: 'proposed' };
  } catch (error) {
    if (!(error instanceof Refusal) || ![409, 422].includes(error.status)) throw error;
    return { refusal: { detail: error.detail, errors: error.errors ?? [] }, source, reason };
  }
}
