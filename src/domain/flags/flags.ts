import { may, type Actor, type Book } from '../people/may';

/** What somebody can say of a step. */
export const FLAG_KINDS = {
  wrong: 'Something is wrong',
  unclear: 'Something is unclear',
  missing: 'Something is missing',
} as const;
export type FlagKind = keyof typeof FLAG_KINDS;
export const isFlagKind = (text: unknown): text is FlagKind =>
  typeof text === 'string' && Object.hasOwn(FLAG_KINDS, text);

/** Characters of a flag and of its answer, at most. */
export const LONGEST_FLAG = 2000;

/**
 * open → answered (nothing had to change, or the sheet says it already), or open → taken up (a draft that changes the sheet was
 * started); or withdrawn by whoever raised it. Each end is final: a new doubt is a new flag.
 */
export const FLAG_STATES = ['open', 'answered', 'taken up', 'withdrawn'] as const;
export type FlagState = (typeof FLAG_STATES)[number];

export interface FlagFacts {
  book: Book;
  raisedBy: string;
  /** Shops that the person who raised it is in now: their seniors may answer for a sheet of the common book. */
  raiserShops: readonly string[];
  state: FlagState;
}

export type FlagAct = { act: 'answer'; text: string } | { act: 'take up' } | { act: 'withdraw' };

export type FlagDecision =
  | { ok: true; state: FlagState }
  /** `hidden` answers 404, `forbidden` 403, `invalid` 422, `conflict` 409. */
  | { ok: false; kind: 'hidden' | 'forbidden' | 'invalid' | 'conflict'; why: string };

const ENDED: Record<Exclude<FlagState, 'open'>, string> = {
  answered: 'This flag has been answered already.',
  'taken up': 'Somebody has taken this flag up already.',
  withdrawn: 'This flag was taken back by whoever raised it.',
};

const refuse = (kind: Exclude<FlagDecision, { ok: true }>['kind'], why: string): FlagDecision => ({
  ok: false,
  kind,
  why,
});

/** Whether this person sees the flag at all: whoever raised it, and whoever may answer it. */
export const readsFlag = (actor: Actor, flag: FlagFacts): boolean =>
  may(actor, 'readBook', { book: flag.book }).ok &&
  (flag.raisedBy === actor.personId || may(actor, 'answerFlag', flag).ok);

/** What becomes of a flag when somebody acts on it. */
export function decideFlag(what: FlagAct, actor: Actor, flag: FlagFacts): FlagDecision {
  const own = flag.raisedBy === actor.personId;
  if (!readsFlag(actor, flag)) return refuse('hidden', 'There is no such flag here, or it is not yours to see.');
  if (what.act === 'withdraw' && !own) return refuse('forbidden', 'Only whoever raised a flag takes it back.');
  if (what.act !== 'withdraw') {
    const permission = may(actor, 'answerFlag', flag);
    if (!permission.ok) return refuse('forbidden', permission.why);
  }
  if (flag.state !== 'open') return refuse('conflict', ENDED[flag.state]);
  switch (what.act) {
    case 'answer':
      return what.text.trim()
        ? { ok: true, state: 'answered' }
        : refuse('invalid', 'Write the answer for whoever asked.');
    case 'take up':
      return may(actor, 'propose', { book: flag.book }).ok
        ? { ok: true, state: 'taken up' }
        : refuse('forbidden', 'You do not hold a role that may propose a change to this book.');
    case 'withdraw':
      return { ok: true, state: 'withdrawn' };
  }
}
