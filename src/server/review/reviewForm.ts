import { GiveOverride, GiveReason } from '@/domain/api/schemas/proposals';
import type { Actor } from '@/domain/people/may';
import { textOf } from '../http/form';
import { malformed, Refusal } from '../refusal';
import { agree } from './agree';
import { decline, returnToAuthor } from './giveBack';
import { overrideClamp } from './override';
import { publish } from './publish';

export const REVIEW_ACTS = ['agree', 'publish', 'return', 'decline', 'override'] as const;
export type ReviewAct = (typeof REVIEW_ACTS)[number];
export const isReviewAct = (name: unknown): name is ReviewAct => REVIEW_ACTS.some((act) => act === name);

/** What a form of the review page came to. Where it was refused, all that was typed comes back. */
export type ReviewOutcome =
  | { kind: 'done'; act: ReviewAct }
  | {
      kind: 'refused';
      act: ReviewAct;
      status: number;
      detail: string;
      field: string | null;
      typed: string;
      anchor: string | null;
      /** Key of the torque whose clamp check was to be overridden. */
      torque: string;
    };

/**
 * Acts on a form of the review page: `act`, `version`, `reason` and `anchor` where it gives the text back, and `reason` and
 * `torque` where it overrides a clamp check. Refusals
 * that the reviewer can do something about come back as words; others are thrown.
 */
export async function actOnReviewForm(actor: Actor, id: string, form: FormData): Promise<ReviewOutcome> {
  const text = (name: string) => textOf(form, name);
  const act = text('act');
  // Nobody agrees by a form that lost its fields, nor to another text than the one that was on the screen.
  if (!isReviewAct(act) || !/^\d{1,9}$/.test(text('version')))
    throw malformed('The form came without some of its fields. Go back and send it again.');
  const version = Number(text('version'));
  const typed = text('reason');
  const anchor = text('anchor') || null;
  const refused = (status: number, detail: string, field: string | null = null): ReviewOutcome => ({
    kind: 'refused',
    act,
    status,
    detail,
    field,
    typed,
    anchor,
    torque: text('torque'),
  });
  try {
    if (act === 'agree') await agree(actor, id, version);
    else if (act === 'publish') await publish(actor, id, version);
    else if (act === 'override') {
      const given = GiveOverride.safeParse({ reason: typed, torque: text('torque') });
      if (!given.success) return refused(422, 'Nothing was sent yet.', given.error.issues[0]?.message ?? null);
      await overrideClamp(actor, id, given.data, version);
    } else {
      const given = GiveReason.safeParse({ reason: typed, anchor });
      if (!given.success) return refused(422, 'Nothing was sent yet.', given.error.issues[0]?.message ?? null);
      await (act === 'return' ? returnToAuthor : decline)(actor, id, given.data, version);
    }
    return { kind: 'done', act };
  } catch (error) {
    if (error instanceof Refusal && [403, 409, 422].includes(error.status)) return refused(error.status, error.detail);
    throw error;
  }
}
