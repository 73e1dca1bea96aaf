import type { Me } from '@/domain/api/schemas/me';
import type { Proposal } from '@/domain/api/schemas/proposals';
import { may, type Actor, type Book } from '@/domain/people/may';
import { readDraft } from '@/domain/writing/readDraft';
import { parsedText } from '../book/parsed';
import { readSheet } from '../book/sheet';
import { app } from '../context';
import { readProposal } from './readProposal';
import { startProposal } from './startProposal';

/** A published text that a draft is set against. */
export interface Standing {
  letter: string;
  source: string;
}

export interface Writing {
  proposal: Proposal;
  /** The draft as the form takes it: as it was typed, or in canonical form where only that fits the form. */
  source: string;
  /** What the draft stands on; null for a new procedure. */
  base: Standing | null;
  /** What is published now, where that is no longer the base. */
  current: Standing | null;
}

/** A text as the form takes it: as it was typed, or in canonical form where only that fits the form. */
async function formable(source: string): Promise<string> {
  if (readDraft(source)) return source;
  const parsed = await parsedText(source);
  return parsed.ok ? parsed.canonical : source;
}

/** All that the author needs to go on writing. Refuses 404 like `readProposal`; whether they may edit stands in `proposal.may`. */
export async function readWriting(actor: Actor, id: string): Promise<Writing> {
  const proposal = await readProposal(actor, id);
  const { number, base: baseLetter, currentLetter } = proposal;
  const standing = async (letter: string | null): Promise<Standing | null> =>
    letter === null ? null : { letter, source: (await readSheet(actor, number, letter)).source };
  const base = await standing(baseLetter);
  return {
    proposal,
    source: await formable(proposal.source),
    base,
    current: currentLetter === baseLetter ? null : await standing(currentLetter),
  };
}

/**
 * The draft in which this person changes a procedure: the one they have open already, returned ones included, or a
 * new one on the current revision. Refuses as `readSheet` and `startProposal` do.
 */
export async function openDraft(actor: Actor, number: string): Promise<string> {
  const sheet = await readSheet(actor, number);
  const { db } = await app();
  const [open] = await db.read<{ id: string }>(
    `SELECT r.id FROM revisions r JOIN procedures p ON p.id = r.procedureId
     WHERE p.number = :number AND r.authorId = :me AND r.state IN ('draft', 'returned') ORDER BY r.updatedAt DESC, r.id LIMIT 1`,
    { number, me: actor.personId },
  );
  if (open) return open.id;
  const { id } = await startProposal(actor, number, {
    base: sheet.revision.letter,
    source: sheet.source,
    reason: '',
  });
  return id;
}

/** The books that somebody may write a new procedure for, as `startProcedure` names them. */
export function booksFor(actor: Actor, person: Me): { book: string; name: string }[] {
  const shops = new Map(
    person.roles.flatMap(({ in: scope, shopId, name }) =>
      scope === 'shop' && shopId ? [[shopId, name] as const] : [],
    ),
  );
  const allowed = (book: Book) => may(actor, 'propose', { book }).ok;
  return [
    ...(allowed({ kind: 'common' }) ? [{ book: 'common', name: 'The common book, for every shop' }] : []),
    ...[...shops].flatMap(([shopId, name]) =>
      allowed({ kind: 'shop', shopId }) ? [{ book: shopId, name: `${name}, for this shop only` }] : [],
    ),
  ];
}
