import { capital } from '../wording';

/** A notice that reaches every reader of a book and stays on the sheet until each has read and signed it. */

export const BULLETIN_KINDS = ['withdrawn', 'brought back', 'critical change'] as const;
export type BulletinKind = (typeof BULLETIN_KINDS)[number];

const sentence = (words: string): string => {
  const text = words.trim();
  return `${capital(text)}${/[.!?…]$/.test(text) ? '' : '.'}`;
};

/**
 * What a publication tells everybody, as whole sentences; null where nobody need be told. A first revision changes
 * nothing that somebody has worked from, however many agreements it needed, so it makes no bulletin.
 *
 * @param told what a critical change did to the revision before, by `toldChanges`; empty for an ordinary one
 * @param supersedes letter of the revision before; null for the first one
 */
export function changeWords(told: readonly string[], supersedes: string | null): string[] | null {
  return supersedes === null || told.length === 0 ? null : told.map(sentence);
}

/** What of a bulletin and its reader decides whether the reader is asked to sign it. */
export interface Reading {
  kind: BulletinKind;
  at: string;
  /** A later withdrawal or bringing back of the same procedure says what holds now. */
  overtaken: boolean;
  /** The reader caused it: withdrew, brought back, published, wrote or agreed to it. */
  own: boolean;
  /** When the reader came to the book; what was changed before is no change to them. */
  readerSince: string;
  signedAt: string | null;
}

/** Whether the reader has still to read and sign it. */
export const asksFor = ({ at, overtaken, own, readerSince, signedAt }: Reading): boolean =>
  signedAt === null && !overtaken && !own && at >= readerSince;
