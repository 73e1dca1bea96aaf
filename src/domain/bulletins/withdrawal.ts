import { type Actor, type Book, may } from '../people/may';

export type WithdrawalAct = 'withdraw' | 'bringBack';

/** The last withdrawal or bringing back of a procedure. */
export interface LastAct {
  act: WithdrawalAct;
  personId: string;
  reason: string;
}

export interface WithdrawalFacts {
  number: string;
  book: Book;
  /** Something of it was published; before that there is nothing to withdraw. */
  published: boolean;
  withdrawn: boolean;
  last: LastAct | null;
}

/** `done` says that the same person has done this already, with the same reason: a press that came twice. */
export type WithdrawalDecision =
  | { ok: true; done: boolean; reason: string }
  | { ok: false; kind: 'hidden' | 'forbidden' | 'invalid' | 'conflict'; why: string };

const ASKED: Record<WithdrawalAct, string> = {
  withdraw: 'Write why nobody may work from it, so that the bench knows what to look out for.',
  bringBack: 'Write why it may be worked from again.',
};

/** Nothing is published on a withdrawn procedure; a proposal waits, with the agreements it has. */
export const WITHDRAWN_WAITS =
  'The procedure is withdrawn, so nothing is published on it. The proposal waits until an editor brings the sheet back.';

/** Whether somebody may take a published sheet out of use, or bring it back, as things stand. */
export function decideWithdrawal(
  act: WithdrawalAct,
  actor: Actor,
  { number, book, published, withdrawn, last }: WithdrawalFacts,
  given: string,
): WithdrawalDecision {
  const permission = may(actor, act, { book });
  if (!permission.ok) return { ok: false, kind: permission.visible ? 'forbidden' : 'hidden', why: permission.why };
  if (!published) return { ok: false, kind: 'hidden', why: 'There is no published sheet of that number.' };
  const reason = given.trim();
  if (!reason) return { ok: false, kind: 'invalid', why: ASKED[act] };
  if (withdrawn !== (act === 'withdraw')) return { ok: true, done: false, reason };
  if (last?.act === act && last.personId === actor.personId && last.reason === reason)
    return { ok: true, done: true, reason };
  const why = withdrawn ? `${number} is withdrawn already.` : `${number} is not withdrawn.`;
  return { ok: false, kind: 'conflict', why: `${why} Nothing was changed; look at its history.` };
}
