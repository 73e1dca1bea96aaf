import { z } from 'zod';
import type { Actor } from '@/domain/people/may';
import { textsOf } from '../http/form';
import { asRefusal, malformed, type RefusalError } from '../refusal';
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
  /**
   * Refused, with the status to answer: what was typed stands in the form again, with the version to save it over once
   * it was compared.
   */
  | { refusal: { status: number; detail: string; errors: RefusalError[] }; source: string; reason: string };

/** What the author can do nothing about by sending the form again. */
const THROWN = [401, 403, 404, 500];

/**
 * Keeps a draft from a plain form, and proposes it where that was the button. Whatever is refused that another press can
 * put right, a full disk too, comes back with what was typed; 403, 404 and faults are passed on, and 400 a form without
 * its fields.
 */
export async function writePlainly(actor: Actor, id: string, form: FormData): Promise<PlainOutcome> {
  const read = PlainForm.safeParse(textsOf(form));
  if (!read.success) throw malformed('The form came without some of its fields. Go back and send it again.');
  const { source, reason, version, act } = read.data;
  try {
    const saved = await saveProposal(actor, id, version, { source, reason });
    if (act === 'keep') return { done: 'kept' };
    await submit(actor, id, saved.version);
    return { done: 'proposed' };
  } catch (error) {
    const { status, detail, errors = [] } = asRefusal(error);
    if (THROWN.includes(status)) throw error;
    if (status >= 500) console.error(error);
    return { refusal: { status, detail, errors }, source, reason };
  }
}
