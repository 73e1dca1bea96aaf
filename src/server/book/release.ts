import type { RenderedProcedure } from '@/domain/procedure/types';
import { nextLetter } from '@/domain/revision/letters';
import { appendAudit } from '../audit/append';
import { tellOfChange } from '../bulletins/write';
import { now } from '../clock';
import { app } from '../context';
import { columnsOf, type Weighed } from '../review/draftText';
import { indexRevision } from './indexRevision';
import { keepRendering } from './rendering';

export interface Standing {
  procedureId: string;
  number: string;
  bookKind: 'common' | 'shop';
  /** Nothing is published on it, by a release neither. */
  withdrawn: boolean;
  current: { id: string; letter: string; hash: string } | null;
}
type Published = Standing & { current: NonNullable<Standing['current']> };

/** A procedure by its number, and what is published of it; null where the number is free. */
export async function standingOf(number: string): Promise<Standing | null> {
  const { db } = await app();
  const [row] = await db.read<{ id: string; bookKind: Standing['bookKind']; withdrawn: 0 | 1; current: string | null }>(
    `SELECT p.id, p.bookKind, p.withdrawnAt IS NOT NULL AS withdrawn, (SELECT json_object('id', r.id, 'letter', r.letter, 'hash', r.hash)
       FROM revisions r WHERE r.id = p.currentRevisionId) AS current
     FROM procedures p WHERE p.number = :number`,
    { number },
  );
  if (!row) return null;
  const current = row.current === null ? null : (JSON.parse(row.current) as Published['current']);
  return { procedureId: row.id, number, bookKind: row.bookKind, withdrawn: row.withdrawn === 1, current };
}

/** The author of what comes with the product. It is no person and never signs in. */
async function releaseId(): Promise<string> {
  const { db } = await app();
  const [release] = await db.models.Person.findOrCreate({
    where: { kind: 'release' },
    defaults: { kind: 'release', email: null, name: 'Matchmark release' },
  });
  return release.id;
}

/** A new procedure of the common book, published as revision A. */
export async function addFromRelease(number: string, text: Weighed, rendered: RenderedProcedure): Promise<void> {
  const { db } = await app();
  const { id } = await db.models.Procedure.create({ number, bookKind: 'common' });
  await publishFromRelease(
    { procedureId: id, number, bookKind: 'common', withdrawn: false, current: null },
    text,
    rendered,
  );
}

/** The next revision of a procedure that the book has not changed since the last release. */
export async function reviseFromRelease(
  standing: Published,
  text: Weighed,
  rendered: RenderedProcedure,
): Promise<void> {
  const { db } = await app();
  await db.models.Revision.update({ state: 'superseded' }, { where: { id: standing.current.id } });
  await publishFromRelease(standing, text, rendered);
}

async function publishFromRelease(
  { procedureId, number, current }: Standing,
  text: Weighed,
  rendered: RenderedProcedure,
): Promise<void> {
  const { db } = await app();
  const authorId = await releaseId();
  const letter = nextLetter(current?.letter ?? null);
  const revision = await db.models.Revision.create({
    ...columnsOf(text),
    procedureId,
    parentId: current?.id ?? null,
    letter,
    state: 'published',
    authorId,
    reason: current ? 'Changed in a later release of the common book.' : 'First issue of the common book.',
    publishedAt: now(),
  });
  const { hash, reason, publishedAt } = revision;
  await db.models.Procedure.update({ currentRevisionId: revision.id }, { where: { id: procedureId } });
  await tellOfChange({
    procedureId,
    shopId: null,
    revisionId: revision.id,
    told: text.told(),
    supersedes: current?.letter ?? null,
    byId: authorId,
  });
  await keepRendering(text.hash, rendered);
  await indexRevision(procedureId, rendered);
  await appendAudit({
    actorId: authorId,
    act: 'revision.published',
    subject: { type: 'revision', id: revision.id },
    detail: { number, letter, hash, supersedes: current?.letter ?? null, author: authorId, reason, publishedAt },
  });
}

/**
 * Puts the text of a release before the reviewers: of a procedure that the book has changed itself, or of a torque that
 * fails the clamp check, which an editor must override. A proposal
 * of an earlier release that still waits takes the new text, so that the desk holds one.
 */
export async function proposeFromRelease(
  { procedureId, number, withdrawn, current }: Published,
  text: Weighed,
  rendered: RenderedProcedure,
): Promise<void> {
  const { db } = await app();
  const authorId = await releaseId();
  const { Revision } = db.models;
  const waiting = await Revision.findOne({ where: { procedureId, authorId, state: ['proposed', 'returned'] } });
  const change = { ...columnsOf(text), parentId: current.id, state: 'proposed', proposedAt: now() } as const;
  const proposal = waiting
    ? await waiting.update({ ...change, version: waiting.version + 1 })
    : await Revision.create({
        ...change,
        procedureId,
        authorId,
        everProposed: true,
        reason: withdrawn
          ? 'A later release of the common book changed this sheet, which is withdrawn. Judge whether it mends what it was withdrawn for.'
          : text.failingTorques.length > 0
            ? 'A later release of the common book changed this sheet, with a torque that fails the clamp check. Judge whether to take it over.'
            : 'A later release of the common book changed this sheet, and so did this book. Judge what of it to take over.',
      });
  await keepRendering(text.hash, rendered);
  await appendAudit({
    actorId: authorId,
    act: 'proposal.submitted',
    subject: { type: 'revision', id: proposal.id },
    detail: { number, base: current.letter, hash: text.hash, critical: text.critical },
  });
}
