import type { RevisionSummary } from '@/domain/api/schemas/book';
import type { Actor } from '@/domain/people/may';
import { compareRevisions, type ComparedRevisions } from './compare';
import { readLetters } from './history';

export interface ComparePage {
  /** Every published revision, latest first. */
  revisions: Pick<RevisionSummary, 'letter' | 'publishedAt'>[];
  /** The letters that are compared or were asked for. */
  from: string;
  to: string;
  /** Null where there is nothing to compare; `problem` then says why. */
  compared: ComparedRevisions | null;
  problem: string | null;
}

/**
 * Two published revisions of a procedure. Without letters, the current one and the one before it. Refuses 404 an
 * unknown procedure; an unknown letter comes back as a sentence.
 */
export async function readComparePage(
  actor: Actor,
  number: string,
  asked: { from: string | null; to: string | null },
): Promise<ComparePage> {
  const revisions = await readLetters(actor, number);
  const letters = revisions.map(({ letter }) => letter);
  const to = (asked.to ?? letters[0] ?? '').trim().toUpperCase();
  const from = (asked.from ?? letters[letters.indexOf(to) + 1] ?? letters.at(-1) ?? '').trim().toUpperCase();
  const page = { revisions, from, to, compared: null };
  const unknown = [...new Set([from, to])].filter((letter) => !letters.includes(letter));
  if (unknown.length > 0) {
    const asking = unknown.map((letter) => (letter ? `“${letter.slice(0, 12)}”` : 'without a letter')).join(' or ');
    const known =
      letters.length === 1
        ? `only revision ${letters[0] ?? ''}`
        : `revisions ${letters.at(-1) ?? ''} to ${letters[0] ?? ''}`;
    return { ...page, problem: `${number} has no revision ${asking}. It has ${known}.` };
  }
  if (letters.length === 1)
    return { ...page, problem: `${number} has only revision ${to}, so there is nothing to compare it with yet.` };
  return { ...page, compared: await compareRevisions(actor, number, from, to), problem: null };
}
