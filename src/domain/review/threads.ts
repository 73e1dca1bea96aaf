import { may, type Actor } from '../people/may';
import { decide } from './decide';
import { type ProposalFacts, subjectOf } from './rules';
import type { Suggestion } from './suggestions';

export const THREAD_KINDS = ['remark', 'question', 'suggestion'] as const;
export type ThreadKind = (typeof THREAD_KINDS)[number];

/** What the rules ask of a thread; its words stand with its messages. */
export interface ThreadFacts {
  kind: ThreadKind;
  /** Who started it. */
  personId: string;
  state: 'open' | 'resolved';
  /** True once the author took a suggestion up. */
  accepted: boolean;
  /** Who wrote each message, oldest first; the first one is the thread's own. */
  writers: readonly string[];
  /** How many messages stood when it was opened, the last time that it was: an answer comes after these. */
  openedAt: number;
  suggestion: Suggestion | null;
}

export type ThreadAct = 'start' | 'reply' | 'resolve' | 'reopen' | 'accept';

/** `hidden` answers 404, `forbidden` 403, `conflict` 409: not as the proposal or the thread stands. */
export type ThreadVerdict = { ok: true } | { ok: false; kind: 'hidden' | 'forbidden' | 'conflict'; why: string };
const YES: ThreadVerdict = { ok: true };
const forbidden = (why: string): ThreadVerdict => ({ ok: false, kind: 'forbidden', why });
const conflict = (why: string): ThreadVerdict => ({ ok: false, kind: 'conflict', why });

/** Threads are written while a text is under review. Before, nobody else sees it; afterwards they are a record. */
const UNDER_REVIEW = ['proposed', 'returned'];

/** Somebody other than who asked has written since it was asked, or asked again. */
export const isAnswered = ({ writers, openedAt, personId }: Pick<ThreadFacts, 'writers' | 'openedAt' | 'personId'>) =>
  writers.slice(openedAt).some((writer) => writer !== personId);

/**
 * Who writes in a thread: the author, and whoever sees the text and may propose in its book (so its editors too). An
 * apprentice or the steward reads.
 */
function asWriter(actor: Actor, facts: ProposalFacts): ThreadVerdict {
  const subject = subjectOf(facts);
  const read = may(actor, 'readProposal', subject);
  if (!read.ok) return { ok: false, kind: 'hidden', why: read.why };
  const writes = actor.personId === facts.authorId || may(actor, 'propose', { book: facts.book }).ok;
  if (!writes) return forbidden('A technician, senior technician, editor or owner takes part in the review of a text.');
  return UNDER_REVIEW.includes(facts.state)
    ? YES
    : conflict('Nothing is added to this any more: the text is not under review.');
}

export function mayStart(actor: Actor, facts: ProposalFacts, kind: ThreadKind): ThreadVerdict {
  const writer = asWriter(actor, facts);
  if (!writer.ok) return writer;
  return kind === 'suggestion' && actor.personId === facts.authorId
    ? forbidden('You wrote this text: change it yourself instead of suggesting it.')
    : YES;
}

export const mayReply = (actor: Actor, facts: ProposalFacts): ThreadVerdict => asWriter(actor, facts);

/** A question is closed by who asked it or by another editor, and only with an answer; anything else also by the author. */
export function mayResolve(actor: Actor, facts: ProposalFacts, thread: ThreadFacts): ThreadVerdict {
  const writer = asWriter(actor, facts);
  if (!writer.ok) return writer;
  const starter = actor.personId === thread.personId;
  const editor = may(actor, 'return', subjectOf(facts)).ok;
  if (thread.kind === 'question' && !starter && !editor)
    return forbidden('A question is resolved by who asked it, or by an editor.');
  if (!starter && !editor && actor.personId !== facts.authorId)
    return forbidden('This is resolved by the author, by an editor or by who wrote it.');
  if (thread.state === 'resolved') return conflict('This is resolved already.');
  return thread.kind === 'question' && !isAnswered(thread) ? conflict('Nobody has answered this question yet.') : YES;
}

export function mayReopen(actor: Actor, facts: ProposalFacts, thread: ThreadFacts): ThreadVerdict {
  const writer = asWriter(actor, facts);
  if (!writer.ok) return writer;
  if (thread.state === 'open') return conflict('This is open already.');
  return thread.accepted
    ? conflict('This suggestion was taken up. Start another one where the text is still not right.')
    : YES;
}

/** The author takes a suggestion up, while the text is theirs to change. */
export function mayAccept(actor: Actor, facts: ProposalFacts, thread: ThreadFacts): ThreadVerdict {
  const writer = asWriter(actor, facts);
  if (!writer.ok) return writer;
  if (thread.kind !== 'suggestion' || !thread.suggestion) return conflict('There is nothing suggested here.');
  if (actor.personId !== facts.authorId) return forbidden('Only the author accepts a suggestion.');
  if (thread.accepted) return conflict('This suggestion was taken up already.');
  if (thread.state === 'resolved') return conflict('This is resolved. Reopen it to accept the suggestion.');
  if (facts.state === 'proposed')
    return conflict('What is under review does not change. You can accept this once the text is returned to you.');
  const edit = decide({ act: 'edit' }, actor, facts);
  return edit.ok ? YES : edit.kind === 'invalid' ? conflict(edit.why) : { ok: false, kind: edit.kind, why: edit.why };
}
