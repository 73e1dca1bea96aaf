import { WITHDRAWN_WAITS } from '../bulletins/withdrawal';
import type { Book, ProposalSubject } from '../people/may';
import type { FailingTorque } from '../revision/failingTorques';
import type { RevisionState } from '../revision/types';
import { openQuestionWords } from './openQuestions';
import { openTorques, type Override, overrideMissing } from './overrides';

/** An agreement is to one exact text on one exact base; when either changes, it no longer stands. */
export interface Agreement {
  personId: string;
  /** SHA-256 of the canonical text that was agreed to. */
  hash: string;
  /** Letter of the base that it was compared with; null for a new procedure. */
  base: string | null;
}

/** All that the rules of review need to know of a proposal. */
export interface ProposalFacts {
  book: Book;
  authorId: string;
  state: RevisionState;
  everProposed: boolean;
  /** SHA-256 of the canonical text as it stands. */
  hash: string;
  /** Letter of the revision that the text stands on; null for a new procedure. */
  base: string | null;
  /** Letter of the revision published now; null where there is none. */
  current: string | null;
  /** True where the text says the same as its base. */
  identical: boolean;
  /** The author's reason. */
  reason: string;
  /** From the comparison with the base; empty for an ordinary change. */
  criticalReasons: readonly string[];
  agreements: readonly Agreement[];
  /** The procedure is withdrawn: a proposal waits. */
  withdrawn?: boolean;
  /** Torques that fail the clamp check, so that an editor must override it; see `failingTorques`. */
  failing: readonly FailingTorque[];
  overrides: readonly Override[];
  /** People who are editors of this book now. */
  editorIds: readonly string[];
  /** In a shop book: its senior technicians and owners now. Empty in the common book. */
  standInIds: readonly string[];
  /** What each open question is tied to, in words: no text is published over one. */
  openQuestions?: readonly string[];
}

/** A critical change needs two different people, any other one. */
export const agreementsNeeded = (criticalReasons: readonly string[]): number => (criticalReasons.length > 0 ? 2 : 1);

export const isStale = (facts: Pick<ProposalFacts, 'base' | 'current'>): boolean => facts.base !== facts.current;

/** The proposal as `may` asks for it. */
export const subjectOf = (facts: ProposalFacts): ProposalSubject => ({
  book: facts.book,
  authorId: facts.authorId,
  everProposed: facts.everProposed,
  critical: facts.criticalReasons.length > 0,
  editors: new Set(facts.editorIds).size,
});

/**
 * People whose agreement stands: given to this text on this base, by somebody other than the author who still holds
 * the role that lets them agree. A person who lost the role no longer answers for the book.
 */
export function standing(facts: ProposalFacts): { editors: string[]; standIns: string[] } {
  const people = new Set(
    facts.agreements
      .filter((a) => a.hash === facts.hash && a.base === facts.base && a.personId !== facts.authorId)
      .map((a) => a.personId),
  );
  const editors = [...people].filter((id) => facts.editorIds.includes(id));
  const { critical, editors: count } = subjectOf(facts);
  const allowed = facts.book.kind === 'shop' && critical && count === 1;
  const standIns = allowed ? [...people].filter((id) => !editors.includes(id) && facts.standInIds.includes(id)) : [];
  return { editors, standIns };
}

export interface Tally {
  needed: number;
  /** How many stand; somebody who stands in for a second editor counts once, and never as the first. */
  given: number;
  complete: boolean;
  /** What is missing, in words; null where nothing is. */
  missing: string | null;
}

/** How far a proposal is from being published. */
export function tally(facts: ProposalFacts): Tally {
  const { editors, standIns } = standing(facts);
  const needed = agreementsNeeded(facts.criticalReasons);
  const given = Math.min(needed, editors.length + Math.min(1, standIns.length));
  const complete = editors.length > 0 && given >= needed;
  return { needed, given, complete, missing: complete ? null : missing(facts, editors.length, needed - given) };
}

function missing(facts: ProposalFacts, editors: number, short: number): string {
  const [first] = facts.criticalReasons;
  const because = first ? `, because ${first}` : '';
  const oneEditor = facts.book.kind === 'shop' && new Set(facts.editorIds).size === 1;
  if (oneEditor && first && editors > 0)
    return `A senior technician or the owner of the shop must agree too${because}.`;
  if (editors === 0 && short < 2) return `An editor must agree${first ? ' too' : ''}${because}.`;
  if (short === 1) return `One more editor must agree${because}.`;
  return oneEditor
    ? `The editor and a senior technician or the owner must agree${because}.`
    : `Two editors must agree${because}.`;
}

/** Whether it may be published as it stands, and if not, why not in words. */
export function canPublish(facts: ProposalFacts): { ok: true } | { ok: false; why: string } {
  if (facts.withdrawn) return { ok: false, why: WITHDRAWN_WAITS };
  if (isStale(facts)) return { ok: false, why: staleWords(facts) };
  const why = [
    tally(facts).missing,
    overrideMissing(openTorques(facts)),
    // Last: the page tells the questions apart, each with the way to it.
    openQuestionWords(facts.openQuestions ?? []),
  ].filter((one) => one !== null);
  return why.length === 0 ? { ok: true } : { ok: false, why: why.join(' ') };
}

export function staleWords({ base, current }: Pick<ProposalFacts, 'base' | 'current'>): string {
  if (base === null)
    return `Revision ${current} was published meanwhile, and this text was written as a new procedure.`;
  if (current === null) return `This text stands on revision ${base}, which is no longer the current sheet.`;
  return `Revision ${current} was published after this text was written on revision ${base}. The author must bring it up to revision ${current} first.`;
}
