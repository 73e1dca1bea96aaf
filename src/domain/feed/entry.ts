import { changeWords } from '../bulletins/bulletin';
import { capital } from '../wording';

/** What a feed tells of: a text was published, a sheet was withdrawn, or brought back. */
export const FEED_KINDS = ['published', 'withdrawn', 'brought back'] as const;
export type FeedKind = (typeof FEED_KINDS)[number];

export interface FeedEvent {
  /** Of the revision or of the bulletin; it names the entry for ever. */
  id: string;
  kind: FeedKind;
  /** ISO 8601 in UTC. */
  at: string;
  number: string;
  letter: string;
  title: string;
  book: string;
  /** Who wrote the text, withdrew the sheet or brought it back. */
  author: string;
  /** Who agreed to the text; nobody for a withdrawal. */
  reviewers: readonly string[];
  reason: string;
  /** Why the change was critical, in words and without numbers. */
  criticalReasons: readonly string[];
  /** Letter that it took the place of; null for a first revision. */
  supersedes: string | null;
}

/** "P-0142 C, Reseal the valve cover: published" */
export const titleOf = ({ number, letter, title, kind }: FeedEvent): string => `${number} ${letter}, ${title}: ${kind}`;

const ended = (text: string): string => (/[.!?…]$/.test(text) ? text : `${text}.`);

const NEXT: Record<FeedKind, string> = {
  published: 'Work from the sheet in the book, not from this notice.',
  withdrawn: 'Do not work from this sheet, on paper neither.',
  'brought back': 'It may be worked from again; open the sheet in the book.',
};

/**
 * Reason and what changed, in plain sentences. Of the sheet's own text there is nothing here, so no torque or limit is
 * read without its condition in a program that we know nothing of.
 */
export function summaryOf(event: FeedEvent): string {
  const { kind, reason, criticalReasons, supersedes } = event;
  const why = reason.trim() === '' ? [] : [ended(capital(reason.trim()))];
  const changes = kind === 'published' ? (changeWords(criticalReasons, supersedes) ?? []) : [];
  const first = kind === 'published' && supersedes === null ? ['First revision.'] : [];
  return [...first, ...why, ...(changes.length ? ['What changed:', ...changes] : []), NEXT[kind]].join('\n');
}
